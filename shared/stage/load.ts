import * as z from 'zod';
import {
  capacitance,
  celsius,
  count,
  current,
  currentOrZero,
  factor,
  inductance,
  kelvin,
  optional,
  orElse,
  power,
  resistance,
  span,
  time,
  tolerance,
  voltage,
} from './ranges.ts';

/** Relay, contactor or solenoid coil; figures at `referenceDegC`, copper. */
export const CoilLoad = z.strictObject({
  kind: z.literal('coil'),
  resistanceOhm: resistance,
  tolerance,
  referenceDegC: celsius,
  temperatureRiseK: orElse(kelvin, 0),
  inductanceH: inductance.nullable(),
  operateV: voltage.nullable(),
  operateReferenceDegC: optional(celsius),
  releaseV: voltage.nullable(),
  holdV: optional(voltage),
  maximumV: voltage.nullable(),
  maximumReferenceDegC: optional(celsius),
  coilMaxDegC: optional(celsius),
  releaseTimeLimitSec: optional(time),
});
export type CoilLoad = z.infer<typeof CoilLoad>;

export const ResistorLoad = z.strictObject({
  kind: z.literal('resistor'),
  resistanceOhm: resistance,
  tolerance,
});
export type ResistorLoad = z.infer<typeof ResistorLoad>;

export const LedStringLoad = z.strictObject({
  kind: z.literal('led-string'),
  count,
  forwardV: span(voltage),
  resistanceOhm: resistance,
  tolerance,
  maximumA: current.nullable(),
  minimumA: current.nullable(),
});
export type LedStringLoad = z.infer<typeof LedStringLoad>;

export const LampLoad = z.strictObject({
  kind: z.literal('lamp'),
  nominalV: voltage,
  currentA: current,
  coldRatio: factor,
});
export type LampLoad = z.infer<typeof LampLoad>;

export const LogicInputLoad = z.strictObject({
  kind: z.literal('logic-input'),
  pullUpOhm: resistance,
  tolerance,
  ratingW: power.nullable(),
  count,
  vilV: voltage,
  vihV: voltage,
  leakageA: currentOrZero,
  lowCurrentA: currentOrZero,
  capacitanceF: capacitance.nullable(),
  wiringF: capacitance.nullable(),
  riseTimeLimitSec: time.nullable(),
});
export type LogicInputLoad = z.infer<typeof LogicInputLoad>;

export const Load = z.discriminatedUnion(
  'kind',
  [CoilLoad, ResistorLoad, LedStringLoad, LampLoad, LogicInputLoad],
  { error: 'expected a load kind: coil, resistor, led-string, lamp or logic-input' },
);
export type Load = z.infer<typeof Load>;
