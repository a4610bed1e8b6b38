import type { FieldSpec, StageShape, ValueOf } from './field-spec.ts';
import { topologyName } from '../../../shared/report/schematic/schematic-name.ts';
import { TOPOLOGIES } from '../../../shared/stage/stage-input.ts';
import { CLAMP_FIELDS } from './clamp-fields.ts';
import { DRIVE_FIELDS } from './drive-fields.ts';
import { LOAD_FIELDS } from './load-fields.ts';
import { needed, pair, perhaps } from './field-units.ts';
import { PRE_DRIVER_FIELDS } from './pre-driver-fields.ts';

const shunt = ({ shuntFitted }: StageShape) => shuntFitted;
const preBiased = ({ topology }: StageShape) => topology === 'low-side-pre-biased';
const translates = ({ topology }: StageShape) => topology === 'level-translator';
const held = ({ frequencyHz }: StageShape) => frequencyHz === 0;
const coil = ({ loadKind }: StageShape) => loadKind === 'coil';

/**
 * Every field of the sheet by its path in the stage file, steps divided by slashes. Order within a group is order on the sheet.
 * The transistor's figures come whole from its record and have no field of their own.
 */
export const FIELDS = {
  reference: {
    kind: 'text',
    optional: false,
    maxLength: 20,
    group: 'stage',
    advanced: true,
    label: 'Designator',
    part: 'transistor',
    note: 'such as Q12',
  },
  title: {
    kind: 'text',
    optional: false,
    maxLength: 120,
    group: 'stage',
    advanced: true,
    label: 'Title',
    note: 'up to 120 letters',
  },
  quantity: needed('count', { group: 'stage', advanced: true, label: 'Per board' }),
  topology: {
    kind: 'choice',
    group: 'stage',
    label: 'Topology',
    note: 'where the switch sits',
    options: TOPOLOGIES.map((topology) => [topology, topologyName(topology)] as const),
  },
  supplyV: pair('volt', {
    group: 'supply',
    label: 'Supply at load',
    labelIn: (shape) => (translates(shape) ? 'Rail V2' : null),
    part: 'supply',
  }),
  ambientDegC: pair('celsius', { group: 'supply', label: 'Ambient' }),
  'supplyV/surge': perhaps('volt', {
    group: 'supply',
    label: 'Surge',
    advanced: true,
    part: 'supply',
  }),
  'supplyV/dip': perhaps('volt', {
    group: 'supply',
    label: 'Dip',
    advanced: true,
    part: 'supply',
    when: coil,
  }),
  ...DRIVE_FIELDS,
  ...LOAD_FIELDS,
  'baseResistor/valueOhm': perhaps('ohmOrZero', {
    group: 'base',
    label: 'RB',
    labelIn: (shape) => (preBiased(shape) ? 'Outer RB' : null),
    part: 'baseResistor',
    preferred: true,
  }),
  'baseResistor/tolerance': needed('tolerance', {
    group: 'base',
    label: 'RB tolerance',
    part: 'baseResistor',
    advanced: true,
  }),
  'baseResistor/ratingW': perhaps('watt', {
    group: 'base',
    label: 'RB rating',
    part: 'baseResistor',
    advanced: true,
  }),
  shuntFitted: {
    kind: 'flag',
    advanced: true,
    group: 'base',
    label: 'RBE fitted',
    note: 'base to emitter',
    part: 'shuntResistor',
    // A pre-biased part has its own; one that a file brings in can be taken away.
    when: (shape) => !preBiased(shape) || shape.shuntFitted,
  },
  'shuntResistor/valueOhm': needed('ohm', {
    group: 'base',
    label: 'RBE',
    part: 'shuntResistor',
    preferred: true,
    when: shunt,
  }),
  'shuntResistor/tolerance': needed('tolerance', {
    group: 'base',
    label: 'RBE tolerance',
    part: 'shuntResistor',
    advanced: true,
    when: shunt,
  }),
  'shuntResistor/ratingW': perhaps('watt', {
    group: 'base',
    label: 'RBE rating',
    part: 'shuntResistor',
    advanced: true,
    when: shunt,
  }),
  speedUpCapacitorF: perhaps('farad', {
    group: 'base',
    label: 'Speed-up capacitor',
    part: 'speedUpCapacitor',
    advanced: true,
  }),
  ...PRE_DRIVER_FIELDS,
  ...CLAMP_FIELDS,
  frequencyHz: needed('hertz', { group: 'switching', label: 'Frequency', note: '0: held on' }),
  duty: needed('share', { group: 'switching', label: 'Duty', note: 'on', advanced: held }),
  storageTimeLimitSec: perhaps('second', {
    group: 'switching',
    label: 'Storage time limit',
    note: 'empty: 10\u00a0% of the shorter part',
    advanced: held,
  }),
  saturationLimitV: perhaps('volt', {
    group: 'limits',
    advanced: true,
    label: 'VCE(sat) budget',
    part: 'transistor',
  }),
} as const satisfies Record<string, FieldSpec>;

export type FieldPath = keyof typeof FIELDS;
export const FIELD_PATHS = Object.keys(FIELDS) as FieldPath[];

/** What the form holds: one entry per field, in the units of the stage file. */
export type StageFormValue = { -readonly [P in FieldPath]: ValueOf<(typeof FIELDS)[P]> };

/** The specification of a field without its place in the table. */
export const fieldSpec = (path: FieldPath): FieldSpec => FIELDS[path];

/** The figures that decide which fields there are. */
export function shapeOf(value: StageFormValue): StageShape {
  return {
    topology: value.topology,
    driveKind: value['drive/kind'],
    loadKind: value['load/kind'],
    clampKind: value['clamp/kind'],
    resetKind: value['drive/reset/kind'],
    shuntFitted: value.shuntFitted,
    preShuntFitted: value.preShuntFitted,
    frequencyHz: value.frequencyHz,
  };
}

/** Whether a field stands behind "More" in a stage of this shape. */
export function isFolded(path: FieldPath, shape: StageShape): boolean {
  const { advanced } = fieldSpec(path);
  return typeof advanced === 'function' ? advanced(shape) : (advanced ?? false);
}

/** What a field is called in a stage of this shape. */
export function fieldLabel(path: FieldPath, shape: StageShape): string {
  const { label, labelIn } = fieldSpec(path);
  return labelIn?.(shape) ?? label;
}

/** Whether a field belongs to a stage of this shape. */
export const applies = (path: FieldPath, shape: StageShape): boolean =>
  fieldSpec(path).when?.(shape) ?? true;
