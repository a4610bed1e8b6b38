import type { Unit } from './evaluation.ts';

export type CriterionGroup = 'on-state' | 'off-state' | 'turn-off' | 'switching' | 'data';

/** What a criterion is called and how it reads; the symbol is split where a part is set below the line. */
export interface CriterionWords {
  readonly group: CriterionGroup;
  readonly name: string;
  readonly symbol: { readonly main: string; readonly sub: string } | null;
  readonly relation: '>=' | '<=';
  readonly unit: Unit;
}

const on = (
  name: string,
  relation: '>=' | '<=',
  unit: Unit,
  symbol: [string, string] | null = null,
) => words('on-state', name, relation, unit, symbol);

function words(
  group: CriterionGroup,
  name: string,
  relation: '>=' | '<=',
  unit: Unit,
  symbol: [string, string] | null = null,
): CriterionWords {
  const parts = symbol === null ? null : { main: symbol[0], sub: symbol[1] };
  return { group, name, symbol: parts, relation, unit };
}

const OWN = {
  'overdrive-factor': on('Overdrive factor', '>=', '1', ['ODF', '']),
  'input-on': on('Input voltage while on', '>=', 'V', ['V', 'I']),
  'forced-beta': on('Forced β', '<=', '1', ['β', 'f']),
  'load-voltage': on('Coil voltage', '>=', 'V', ['V', 'coil']),
  'saturation-voltage': on('VCE(sat)', '<=', 'V', ['V', 'CE(sat)']),
  'drive-current': on('Drive current', '<=', 'A', ['I', 'R']),
  'collector-current': on('Collector current', '<=', 'A', ['I', 'C']),
  'junction-temperature': on('Junction temperature', '<=', '°C', ['T', 'J']),
  dissipation: on('Dissipation', '<=', 'W', ['P', '']),
  'base-current': on('Base current', '<=', 'A', ['I', 'B']),
  'peak-current': on('Peak current', '<=', 'A', ['I', 'CM']),
  'load-current': on('Load current', '<=', 'A', ['I', 'load']),
  'load-current-low': on('Least load current', '>=', 'A', ['I', 'load']),
  'inrush-saturation': on('Saturation at inrush', '>=', '1', ['ODF', 'inrush']),
  'output-low': on('Low output level', '<=', 'V', ['V', 'OL']),
  'rise-time': on('Rise time', '<=', 's', ['t', 'r']),
  'rc-dissipation': on('RC dissipation', '<=', 'W', ['P', 'RC']),
  'input-voltage': on('Largest input voltage', '<=', 'V', ['V', 'I(max)']),
  'load-overvoltage': on('Coil overvoltage', '<=', 'V', ['V', 'coil']),
  'holding-voltage': on('Holding voltage', '>=', 'V', ['V', 'hold']),
  'rb-dissipation': on('RB dissipation', '<=', 'W', ['P', 'RB']),
  'rbe-dissipation': on('RBE dissipation', '<=', 'W', ['P', 'RBE']),
  'pull-up-dissipation': on('Pull-up dissipation', '<=', 'W', ['P', 'pull-up']),
  'off-base-voltage': words('off-state', 'Off-state VBE', '<=', 'V', ['V', 'BE(off)']),
  'input-off': words('off-state', 'Input voltage while off', '<=', 'V', ['V', 'I(off)']),
  'off-collector-current': words('off-state', 'Off-state current', '<=', 'A', ['I', 'C(off)']),
  'output-high': words('off-state', 'High output level', '>=', 'V', ['V', 'OH']),
  'off-collector-voltage': words('off-state', 'Off-state VCE', '<=', 'V', ['V', 'CE(off)']),
  'reset-off': words('off-state', 'VBE in reset', '<=', 'V', ['V', 'BE(reset)']),
  'reset-off-current': words('off-state', 'Current in reset', '<=', 'A', ['I', 'C(reset)']),
  'reverse-base-voltage': words('off-state', 'Reverse VBE', '<=', 'V', ['V', 'EB']),
  'drive-maximum': words('off-state', 'Voltage at the output', '>=', 'V', ['V', 'O(max)']),
  'peak-collector-voltage': words('turn-off', 'Peak VCE', '<=', 'V', ['V', 'CE(peak)']),
  'surge-voltage': words('turn-off', 'VCE in a surge', '<=', 'V', ['V', 'CE(surge)']),
  'release-time': words('turn-off', 'Release time', '<=', 's', ['t', 'rel']),
  'clamp-current': words('turn-off', 'Clamp current', '<=', 'A', ['I', 'clamp']),
  'clamp-power': words('turn-off', 'Clamp power', '<=', 'W', ['P', 'clamp']),
  'storage-time': words('switching', 'Storage and fall time', '<=', 's', ['t', 's']),
  'low-to-high-delay': words('switching', 'Low-to-high delay', '<=', 's', ['t', 'LH']),
  'tested-range': words('data', 'Figures beyond tested rows', '<=', '1'),
} as const satisfies Record<string, CriterionWords>;
type OwnId = keyof typeof OWN;

/** What only a project can be asked, over all its stages: see port-current.ts. */
const OF_PROJECT = {
  'port-current': on('Port current', '<=', 'A', ['I', 'port']),
} as const satisfies Record<string, CriterionWords>;

export type CriterionId = OwnId | keyof typeof OF_PROJECT | `pre-${OwnId}`;

/** Prefix of the criteria of the transistor in front of a two-transistor high side. */
export const PRE = 'pre-';

/** The same criteria of a transistor in front, named so. */
const IN_FRONT = Object.fromEntries(
  Object.entries<CriterionWords>(OWN).map(([id, each]) => [
    PRE + id,
    { ...each, name: `Pre-driver: ${each.name}` },
  ]),
) as Record<`pre-${OwnId}`, CriterionWords>;

/** Every criterion, in the order a result lists them. */
export const CRITERIA: Record<CriterionId, CriterionWords> = { ...OWN, ...OF_PROJECT, ...IN_FRONT };

const IDS = Object.keys(CRITERIA) as CriterionId[];

/** All criterion ids in the order of the table. */
export function criterionIds(): readonly CriterionId[] {
  return IDS;
}

/** The criteria that have a text of their own: those of a transistor in front ask the same of it. */
export function ownCriterionIds(): readonly CriterionId[] {
  return IDS.filter((id) => !id.startsWith(PRE));
}

/** Place of a criterion in the table: what the corner loop knows it by. */
export function criterionNumber(id: CriterionId): number {
  return IDS.indexOf(id);
}
