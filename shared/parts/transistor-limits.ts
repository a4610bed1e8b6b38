import * as z from 'zod';
import {
  celsius,
  current,
  line,
  optional,
  power,
  signedVoltage,
  thermalResistance,
  voltage,
} from '../stage/ranges.ts';
import { provenance } from './provenance.ts';

const PowerAt = z.strictObject({
  place: z.enum(['ambient', 'case', 'mounting-base', 'soldering-point']),
  tempDegC: celsius,
  powerW: power,
});

const derating = optional(z.number({ error: 'expected a derating in W/K' }).gt(0).max(1e4));

/** One maker's absolute maximum ratings and thermal figures; PNP figures are magnitudes. */
export const LimitSet = z.strictObject({
  maker: optional(line(60)),
  /** Board or heat sink the thermal figures hold for. */
  mounting: optional(line(80)),
  vceoV: optional(voltage),
  vcboV: optional(voltage),
  veboV: optional(voltage),
  /** Output or supply rating of pre-biased parts and arrays, which print no VCEO. */
  vccV: optional(voltage),
  inputMinV: optional(signedVoltage),
  inputMaxV: optional(voltage),
  clampReverseV: optional(voltage),
  icA: optional(current),
  icPeakA: optional(current),
  /** Output current rating of pre-biased parts. */
  ioA: optional(current),
  ibA: optional(current),
  ibPeakA: optional(current),
  emitterTotalA: optional(current),
  /** At 25 °C ambient. */
  powerW: optional(power),
  /** At 25 °C case. */
  powerCaseW: optional(power),
  powerAt: z.array(PowerAt).max(10).default([]),
  deratingWPerK: derating,
  deratingCaseWPerK: derating,
  unclampedEnergyJ: optional(z.number({ error: 'expected an energy in J' }).gt(0).max(1e3)),
  rthJaKPerW: optional(thermalResistance),
  rthJcKPerW: optional(thermalResistance),
  rthJsKPerW: optional(thermalResistance),
  rthJaByPackage: z
    .array(z.strictObject({ package: line(40), rthJaKPerW: thermalResistance }))
    .max(20)
    .default([]),
  tjMaxDegC: optional(celsius),
  ...provenance,
});
export type LimitSet = z.infer<typeof LimitSet>;

/** How a set of limits is called in a choice: maker and mounting. */
export function limitSetName(set: Pick<LimitSet, 'maker' | 'mounting'>): string {
  const words = [set.maker, set.mounting].filter((word) => word !== null);
  return words.length === 0 ? 'as listed' : words.join(', ');
}
