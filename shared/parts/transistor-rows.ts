import * as z from 'zod';
import {
  capacitance,
  celsius,
  current,
  currentOrZero,
  frequency,
  gainFigure,
  line,
  optional,
  signedVoltage,
  time,
  voltage,
  voltageOrZero,
} from '../stage/ranges.ts';
import { provenance } from './provenance.ts';

/** hFE at one operating point; `group` names the gain group where the row holds for one only. */
export const GainFigure = z.strictObject({
  icA: current,
  vceV: optional(voltage),
  min: optional(gainFigure),
  typ: optional(gainFigure),
  max: optional(gainFigure),
  tempDegC: celsius.default(25),
  group: optional(line(20)),
  ...provenance,
});
export type GainFigure = z.infer<typeof GainFigure>;

/** VCE(sat); `variant` names the temperature grade where the row holds for one only. */
export const SaturationFigure = z.strictObject({
  icA: current,
  ibA: current,
  typV: optional(voltage),
  maxV: optional(voltage),
  variant: optional(line(80)),
  ...provenance,
});
export type SaturationFigure = z.infer<typeof SaturationFigure>;

/** VBE, saturated at an IB (`sat`) or at a VCE (`on`). */
export const BaseEmitterFigure = z.strictObject({
  kind: z.enum(['sat', 'on'], { error: 'expected "sat" or "on"' }),
  icA: current,
  ibA: optional(current),
  vceV: optional(voltage),
  minV: optional(voltage),
  typV: optional(voltage),
  maxV: optional(voltage),
  ...provenance,
});
export type BaseEmitterFigure = z.infer<typeof BaseEmitterFigure>;

export const LEAKAGE_SYMBOLS = ['ICBO', 'ICES', 'ICEX', 'ICEO', 'IBL', 'IEBO', 'IO(off)'] as const;

/** Cut-off current under its printed test voltages. */
export const LeakageFigure = z.strictObject({
  symbol: z.enum(LEAKAGE_SYMBOLS, { error: `expected one of ${LEAKAGE_SYMBOLS.join(', ')}` }),
  maxA: currentOrZero,
  vcbV: optional(voltageOrZero),
  vceV: optional(voltageOrZero),
  vebV: optional(voltageOrZero),
  vbeV: optional(voltageOrZero),
  vccV: optional(voltageOrZero),
  tempDegC: celsius.default(25),
  ...provenance,
});
export type LeakageFigure = z.infer<typeof LeakageFigure>;

/** Largest switching times of one test; arrays print propagation delays instead. */
export const SwitchingFigure = z.strictObject({
  icA: optional(current),
  ib1A: optional(current),
  ib2A: optional(current),
  tdSec: optional(time),
  trSec: optional(time),
  tsSec: optional(time),
  tfSec: optional(time),
  tonSec: optional(time),
  toffSec: optional(time),
  lowToHighTypSec: optional(time),
  lowToHighMaxSec: optional(time),
  highToLowTypSec: optional(time),
  highToLowMaxSec: optional(time),
  vccOnV: optional(voltage),
  vccOffV: optional(voltage),
  vbeOffV: optional(signedVoltage),
  vebOffV: optional(voltage),
  ...provenance,
});
export type SwitchingFigure = z.infer<typeof SwitchingFigure>;

export const OutputCapacitance = z.strictObject({
  typF: optional(capacitance),
  maxF: optional(capacitance),
  vcbV: optional(voltage),
  ...provenance,
});

export const TransitionFrequency = z.strictObject({
  minHz: optional(frequency),
  typHz: optional(frequency),
  icA: optional(current),
  vceV: optional(voltage),
  ...provenance,
});

/** Free-wheel diode inside an array. */
export const ClampDiode = z.strictObject({
  forwardA: current,
  typV: optional(voltage),
  maxV: optional(voltage),
  leakage: z.array(z.strictObject({ tempDegC: celsius, maxA: currentOrZero })).default([]),
  ...provenance,
});
