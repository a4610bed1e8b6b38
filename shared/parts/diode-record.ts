import * as z from 'zod';
import {
  capacitance,
  celsius,
  current,
  currentOrZero,
  optional,
  power,
  span,
  thermalResistance,
  time,
  voltage,
} from '../stage/ranges.ts';
import { partHead, provenance } from './provenance.ts';

export const DIODE_FAMILIES = ['switching', 'rectifier', 'schottky', 'zener', 'tvs'] as const;

const Forward = z.strictObject({
  currentA: current,
  typV: optional(voltage),
  maxV: optional(voltage),
  tempDegC: celsius.default(25),
  ...provenance,
});

const Reverse = z.strictObject({
  maxA: currentOrZero,
  voltageV: voltage,
  tempDegC: celsius.default(25),
  ...provenance,
});

/** Breakdown of a zener, or of a TVS with its stand-off and clamping voltage. */
const Breakdown = z.strictObject({
  zenerV: span(voltage),
  testA: optional(current),
  standOffV: optional(voltage),
  clampingV: optional(voltage),
  clampingA: optional(current),
  ...provenance,
});

/** A diode as its data sheet prints it. */
export const DiodeRecord = z.strictObject({
  kind: z.literal('diode'),
  ...partHead,
  family: z.enum(DIODE_FAMILIES, { error: `expected one of ${DIODE_FAMILIES.join(', ')}` }),
  reverseV: optional(voltage),
  /** Average or continuous forward current. */
  currentA: optional(current),
  surgeA: optional(current),
  powerW: optional(power),
  rthJaKPerW: optional(thermalResistance),
  tjMaxDegC: optional(celsius),
  recoverySec: optional(time),
  capacitanceF: optional(capacitance),
  forward: z.array(Forward).max(50).default([]),
  reverse: z.array(Reverse).max(50).default([]),
  breakdown: optional(Breakdown),
});
export type DiodeRecord = z.infer<typeof DiodeRecord>;
