import { FRONT_NEEDS, needsOf, type TopologyNeeds } from '../stage/topology-needs.ts';
import type { Topology } from '../stage/stage-input.ts';
import type { PartRecord } from './part-record.ts';

/** What a list knows of a part; null where its kind has no such thing. */
export interface PartTraits {
  readonly kind: PartRecord['kind'];
  readonly family: string | null;
  readonly polarity: string | null;
}

/** Places of a stage that a part of the library can fill. */
export type PartRole = 'transistor' | 'preDriver' | 'load' | 'drive' | 'clamp';

export const KIND_OF_ROLE: Readonly<Record<PartRole, PartRecord['kind']>> = {
  transistor: 'transistor',
  preDriver: 'transistor',
  load: 'load',
  drive: 'logic-output',
  clamp: 'diode',
};

/** Kinds of load by the library's family; LEDs print typical voltages only and are entered by hand. */
const LOAD_OF_FAMILY: Readonly<Record<string, 'coil' | 'lamp'>> = {
  relay: 'coil',
  contactor: 'coil',
  solenoid: 'coil',
  lamp: 'lamp',
};

/** Whether a part is what a place of a stage is made for, by its traits alone. */
export function partFits(role: PartRole, topology: Topology, part: PartTraits): boolean {
  if (part.kind !== KIND_OF_ROLE[role]) return false;
  switch (role) {
    case 'transistor':
      return suits(part, needsOf(topology));
    case 'preDriver':
      return suits(part, FRONT_NEEDS);
    case 'load': {
      const kind = LOAD_OF_FAMILY[part.family ?? ''];
      return kind !== undefined && needsOf(topology).loads.includes(kind);
    }
    case 'drive':
    case 'clamp':
      return true;
  }
}

function suits(
  { family, polarity }: PartTraits,
  needs: Pick<TopologyNeeds, 'polarity' | 'kinds'>,
): boolean {
  return polarity === needs.polarity && needs.kinds.some((kind) => kind === family);
}

/** What fits, in words, for the head of a list: `PNP`, `NPN pre-biased`. */
export function fitText(role: PartRole, topology: Topology): string {
  const needs =
    role === 'transistor' ? needsOf(topology) : role === 'preDriver' ? FRONT_NEEDS : null;
  if (needs === null) return '';
  const [kind] = needs.kinds;
  const word = { transistor: '', darlington: ' Darlington', 'pre-biased': ' pre-biased' };
  return `${needs.polarity.toUpperCase()}${kind === undefined ? '' : word[kind]}`;
}
