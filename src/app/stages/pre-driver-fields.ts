import type { FieldSpec, StageShape } from './field-spec.ts';
import { needed, perhaps } from './field-units.ts';

const two = ({ topology }: StageShape) => topology === 'two-transistor-high-side';
const shunt = (shape: StageShape) => two(shape) && shape.preShuntFitted;
const base = { group: 'preDriver', part: 'preBaseResistor', when: two } as const;
const shunted = { group: 'preDriver', part: 'preShuntResistor', when: shunt } as const;

/** The base network of the transistor in front of a two-transistor high side. */
export const PRE_DRIVER_FIELDS = {
  'preDriver/baseResistor/valueOhm': needed('ohm', { ...base, label: 'RB1', preferred: true }),
  'preDriver/baseResistor/tolerance': needed('tolerance', {
    ...base,
    label: 'RB1 tolerance',
    advanced: true,
  }),
  'preDriver/baseResistor/ratingW': perhaps('watt', {
    ...base,
    label: 'RB1 rating',
    advanced: true,
  }),
  preShuntFitted: {
    ...base,
    kind: 'flag',
    label: 'RBE1 fitted',
    note: 'base to emitter',
    part: 'preShuntResistor',
    advanced: true,
  },
  'preDriver/shuntResistor/valueOhm': needed('ohm', {
    ...shunted,
    label: 'RBE1',
    preferred: true,
  }),
  'preDriver/shuntResistor/tolerance': needed('tolerance', {
    ...shunted,
    label: 'RBE1 tolerance',
    advanced: true,
  }),
  'preDriver/shuntResistor/ratingW': perhaps('watt', {
    ...shunted,
    label: 'RBE1 rating',
    advanced: true,
  }),
} as const satisfies Record<string, FieldSpec>;
