import type { FieldSpec, StageShape } from './field-spec.ts';
import { needed, perhaps } from './field-units.ts';

const load = { group: 'load', part: 'load' } as const;
const coil = { ...load, when: ({ loadKind }: StageShape) => loadKind === 'coil' } as const;
const more = { ...coil, advanced: true } as const;

/** The load. Resistance and tolerance are the coil's or the resistor's. */
export const LOAD_FIELDS = {
  'load/kind': {
    ...load,
    advanced: true,
    kind: 'choice',
    label: 'Kind',
    note: 'what is switched',
    options: [
      ['coil', 'Coil'],
      ['resistor', 'Resistor'],
    ],
  },
  'load/resistanceOhm': needed('ohm', { ...load, label: 'Resistance' }),
  'load/tolerance': needed('tolerance', { ...load, label: 'Tolerance', advanced: true }),
  'load/operateV': perhaps('volt', { ...coil, label: 'Must operate at' }),
  'load/releaseV': perhaps('volt', { ...more, label: 'Must release at' }),
  'load/inductanceH': perhaps('henry', { ...coil, label: 'Inductance', note: 'closed' }),
  'load/temperatureRiseK': needed('kelvin', {
    ...more,
    label: 'Temperature rise',
    note: 'settled',
  }),
  'load/referenceDegC': needed('celsius', { ...more, label: 'Resistance at' }),
  'load/operateReferenceDegC': perhaps('celsius', { ...more, label: 'Must operate, at' }),
  'load/holdV': perhaps('volt', { ...more, label: 'Holds down to' }),
  'load/maximumV': perhaps('volt', { ...more, label: 'Coil maximum' }),
  'load/maximumReferenceDegC': perhaps('celsius', { ...more, label: 'Coil maximum, at' }),
  'load/coilMaxDegC': perhaps('celsius', { ...more, label: 'Hottest coil' }),
  'load/releaseTimeLimitSec': perhaps('second', { ...more, label: 'Release within' }),
} as const satisfies Record<string, FieldSpec>;
