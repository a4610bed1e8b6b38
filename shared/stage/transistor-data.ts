import * as z from 'zod';
import {
  capacitance,
  celsius,
  current,
  currentOrZero,
  gainFigure,
  line,
  optional,
  orElse,
  power,
  resistance,
  thermalResistance,
  time,
  tolerance,
  voltage,
} from './ranges.ts';

/** Printed hFE at one collector current; PNP figures are magnitudes throughout. */
export const GainRow = z.strictObject({
  icA: current,
  vceV: optional(voltage),
  min: optional(gainFigure),
  typ: optional(gainFigure),
  max: optional(gainFigure),
  tempDegC: orElse(celsius, 25),
});
export type GainRow = z.infer<typeof GainRow>;

/** Printed VCE(sat) at a pair of collector and base current, 25 °C. */
export const SaturationRow = z.strictObject({
  icA: current,
  ibA: current,
  typV: optional(voltage),
  maxV: optional(voltage),
});
export type SaturationRow = z.infer<typeof SaturationRow>;

/** Printed VBE, saturated (`sat`) or at a given VCE (`on`), 25 °C. */
export const BaseEmitterRow = z.strictObject({
  kind: orElse(z.enum(['sat', 'on'], { error: 'expected "sat" or "on"' }), 'sat'),
  icA: current,
  ibA: optional(current),
  minV: optional(voltage),
  typV: optional(voltage),
  maxV: optional(voltage),
});
export type BaseEmitterRow = z.infer<typeof BaseEmitterRow>;

export const LeakageRow = z.strictObject({
  kind: z.enum(['icbo', 'ices', 'icex', 'iceo'], {
    error: 'expected "icbo", "ices", "icex" or "iceo"',
  }),
  currentA: currentOrZero,
  voltageV: optional(voltage),
  tempDegC: orElse(celsius, 25),
});
export type LeakageRow = z.infer<typeof LeakageRow>;

export const SwitchingRow = z.strictObject({
  tdSec: optional(time),
  trSec: optional(time),
  tsSec: optional(time),
  tfSec: optional(time),
  icA: optional(current),
  ib1A: optional(current),
  ib2A: optional(current),
});
export type SwitchingRow = z.infer<typeof SwitchingRow>;

/** Resistors inside a pre-biased part: R1 in series with the base, R2 = ratio·R1 base to emitter. */
export const InternalResistors = z.strictObject({
  r1Ohm: resistance,
  r2Ohm: optional(resistance),
  r1Tolerance: orElse(tolerance, 0.3),
  ratioTolerance: orElse(tolerance, 0.2),
  input: optional(
    z.strictObject({
      onV: optional(voltage),
      onOutputA: optional(current),
      offV: optional(voltage),
      currentA: optional(current),
      testV: optional(voltage),
      gi: optional(gainFigure),
      maximumV: optional(voltage),
    }),
  ),
});

/** The part data a stage is judged with, as printed on its data sheet. */
export const TransistorData = z.strictObject({
  partNumber: line(60),
  polarity: z.enum(['npn', 'pnp'], { error: 'expected "npn" or "pnp"' }),
  darlington: orElse(z.boolean({ error: 'expected true or false' }), false),
  package: optional(line(40)),
  source: optional(line(400)),
  limits: z.strictObject({
    vceoV: voltage.nullable(),
    vcboV: optional(voltage),
    veboV: optional(voltage),
    icA: current.nullable(),
    icPeakA: optional(current),
    ibA: optional(current),
    powerW: power.nullable(),
    tjMaxDegC: celsius,
  }),
  thermal: z.strictObject({
    rthJaKPerW: thermalResistance.nullable(),
    rthJcKPerW: optional(thermalResistance),
  }),
  gain: z.array(GainRow).max(200),
  saturation: z.array(SaturationRow).max(200),
  baseEmitter: z.array(BaseEmitterRow).max(200),
  leakage: orElse(z.array(LeakageRow).max(200), []),
  switching: optional(SwitchingRow),
  capacitanceF: optional(capacitance),
  model: z
    .strictObject({
      earlyV: optional(voltage),
      betaR: optional(gainFigure),
      isA: optional(current),
      rcOhm: optional(resistance),
    })
    .nullable()
    .default({ earlyV: null, betaR: null, isA: null, rcOhm: null }),
  internal: optional(InternalResistors),
});
export type TransistorData = z.infer<typeof TransistorData>;
