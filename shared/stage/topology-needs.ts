import type { Load } from './load.ts';
import type { Topology } from './stage-input.ts';
import type { TransistorData } from './transistor-data.ts';

/** What a transistor is by its data; the library's families of single transistors have the same names. */
export type TransistorKind = 'transistor' | 'darlington' | 'pre-biased';

/** What a topology's output transistor must be and what it can drive. */
export interface TopologyNeeds {
  readonly polarity: 'npn' | 'pnp';
  /** The kinds it is made for, the plain one first. */
  readonly kinds: readonly TransistorKind[];
  readonly loads: readonly Load['kind'][];
}

const EARTHED = ['coil', 'resistor', 'led-string', 'lamp'] as const;
const ALL = [...EARTHED, 'logic-input'] as const;

const NEEDS: Readonly<Record<Topology, TopologyNeeds>> = {
  'low-side-npn': { polarity: 'npn', kinds: ['transistor'], loads: ALL },
  'high-side-pnp': { polarity: 'pnp', kinds: ['transistor', 'darlington'], loads: EARTHED },
  'two-transistor-high-side': {
    polarity: 'pnp',
    kinds: ['transistor', 'darlington'],
    loads: EARTHED,
  },
  'low-side-darlington': { polarity: 'npn', kinds: ['darlington'], loads: ALL },
  'low-side-pre-biased': { polarity: 'npn', kinds: ['pre-biased'], loads: ALL },
  'level-translator': { polarity: 'npn', kinds: ['transistor'], loads: ['logic-input'] },
};

/** What a topology asks of its output transistor and its load. */
export const needsOf = (topology: Topology): TopologyNeeds => NEEDS[topology];

/** What the transistor in front of a two-transistor high side must be. */
export const FRONT_NEEDS: Pick<TopologyNeeds, 'polarity' | 'kinds'> = {
  polarity: 'npn',
  kinds: ['transistor'],
};

const kindOf = ({ darlington, internal }: TransistorData): TransistorKind =>
  internal !== null ? 'pre-biased' : darlington ? 'darlington' : 'transistor';

/** Whether a transistor is what a place in a stage is made for. */
export const transistorSuits = (
  data: TransistorData,
  { polarity, kinds }: Pick<TopologyNeeds, 'polarity' | 'kinds'>,
): boolean => data.polarity === polarity && kinds.includes(kindOf(data));
