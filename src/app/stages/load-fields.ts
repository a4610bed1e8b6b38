import type { FieldSpec, StageShape } from './field-spec.ts';
import { needed, pair, perhaps } from './field-units.ts';

const load = { group: 'load', part: 'load' } as const;
const of =
  (...kinds: readonly string[]) =>
  ({ loadKind }: StageShape) =>
    kinds.includes(loadKind);
const coil = { ...load, when: of('coil') } as const;
const more = { ...coil, advanced: true } as const;
const leds = { ...load, when: of('led-string') } as const;
const lamp = { ...load, when: of('lamp') } as const;
const logic = { ...load, when: of('logic-input') } as const;
const input = { ...logic, part: 'logicInput' } as const;

/** The load. Resistance, tolerance and count mean another thing in another kind of load. */
export const LOAD_FIELDS = {
  'load/kind': {
    ...load,
    kind: 'choice',
    label: 'Kind',
    note: 'what is switched',
    options: [
      ['coil', 'Coil'],
      ['resistor', 'Resistor'],
      ['led-string', 'LED string'],
      ['lamp', 'Filament lamp'],
      ['logic-input', 'Logic input'],
    ],
  },
  'load/count': needed('count', {
    ...load,
    label: 'LEDs in series',
    labelIn: (shape) => (shape.loadKind === 'logic-input' ? 'Inputs driven' : null),
    when: of('led-string', 'logic-input'),
  }),
  'load/forwardV': pair('volt', { ...leds, label: 'Forward voltage', note: 'one LED, 25\u00a0°C' }),
  'load/resistanceOhm': needed('ohm', {
    ...load,
    label: 'Resistance',
    labelIn: (shape) => (shape.loadKind === 'led-string' ? 'Series resistor' : null),
    when: of('coil', 'resistor', 'led-string'),
  }),
  'load/nominalV': needed('volt', { ...lamp, label: 'Nominal voltage' }),
  'load/currentA': needed('ampere', { ...lamp, label: 'Nominal current', note: 'hot' }),
  'load/coldRatio': needed('factor', {
    ...lamp,
    label: 'Inrush over nominal',
    note: 'cold, usually 10 to 15',
  }),
  'load/pullUpOhm': needed('ohm', { ...logic, label: 'RC', note: 'to its own rail' }),
  'load/vilV': needed('volt', { ...input, label: 'VIL', note: 'largest low' }),
  'load/vihV': needed('volt', { ...input, label: 'VIH', note: 'smallest high' }),
  'load/tolerance': needed('tolerance', {
    ...load,
    label: 'Tolerance',
    labelIn: (shape) => (shape.loadKind === 'logic-input' ? 'RC tolerance' : null),
    advanced: true,
    when: of('coil', 'resistor', 'led-string', 'logic-input'),
  }),
  'load/ratingW': perhaps('watt', { ...logic, label: 'RC rating', advanced: true }),
  'load/leakageA': needed('ampereOrZero', {
    ...input,
    label: 'Input leakage',
    note: 'high, one input',
    advanced: true,
  }),
  'load/lowCurrentA': needed('ampereOrZero', {
    ...input,
    label: 'Input current, low',
    note: 'one input',
    advanced: true,
  }),
  'load/capacitanceF': perhaps('farad', {
    ...input,
    label: 'Input capacitance',
    note: 'all inputs',
    advanced: true,
  }),
  'load/wiringF': perhaps('farad', { ...input, label: 'Wiring capacitance', advanced: true }),
  'load/riseTimeLimitSec': perhaps('second', { ...input, label: 'Rise within', advanced: true }),
  'load/maximumA': perhaps('ampere', { ...leds, label: 'LED current, highest' }),
  'load/minimumA': perhaps('ampere', {
    ...leds,
    label: 'LED current, lowest',
    note: 'for its light',
    advanced: true,
  }),
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
