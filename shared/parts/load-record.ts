import * as z from 'zod';
import {
  celsius,
  current,
  fraction,
  inductance,
  line,
  optional,
  power,
  resistance,
  span,
  time,
  tolerance,
  voltage,
} from '../stage/ranges.ts';
import { partHead, provenance } from './provenance.ts';

export const LOAD_FAMILIES = ['relay', 'contactor', 'solenoid', 'lamp', 'led'] as const;

/** A fraction of the nominal voltage; overload figures lie above 1. */
const share = z
  .number({ error: 'expected a fraction of the nominal voltage' })
  .gt(0, 'expected a fraction of the nominal voltage above 0')
  .max(10, 'expected a fraction of the nominal voltage up to 10');

/** Operate, release and overload voltages as fractions of nominal; `contacts` where they differ. */
const CoilLevels = z.strictObject({
  contacts: optional(line(40)),
  operate: optional(share),
  release: optional(share),
  maximum: optional(share),
  ...provenance,
});
export type CoilLevels = z.infer<typeof CoilLevels>;

/** One coil of a series; absolute voltages go before the fractions of the series. */
const Coil = z.strictObject({
  nominalV: voltage,
  resistanceOhm: optional(resistance),
  currentA: optional(current),
  powerW: optional(power),
  inductanceH: optional(inductance),
  operateV: optional(voltage),
  releaseV: optional(voltage),
  /** Operative range, absolute and as fractions of nominal. */
  rangeV: optional(span(voltage)),
  range: optional(span(share)),
  operateTimeSec: optional(time),
  releaseTimeSec: optional(time),
  ...provenance,
});
export type Coil = z.infer<typeof Coil>;

const CoilTemperature = z.strictObject({
  tempDegC: celsius,
  resistanceOhm: optional(resistance),
  operateV: optional(voltage),
  ...provenance,
});

const peak = optional(z.number({ error: 'expected a voltage' }).min(-1e4).max(1e4));

/** A published measurement of turn-off with one kind of suppression. */
const Suppression = z.strictObject({
  method: line(60),
  dropOutSec: time,
  theoreticalPeakV: peak,
  recordedPeakV: peak,
  ...provenance,
});

const Filament = z.strictObject({
  /** Cold over hot resistance. */
  coldRatio: span(fraction),
  nominalV: optional(voltage),
  currentA: optional(current),
  remarks: z.array(z.strictObject({ text: line(200), ...provenance })).default([]),
});

const Led = z.strictObject({
  colour: line(40),
  typV: optional(voltage),
  minV: optional(voltage),
  maxV: optional(voltage),
  currentA: optional(current),
  ...provenance,
});

/** A load as its maker prints it: a series of coils, a filament lamp, or LEDs by colour. */
export const LoadRecord = z.strictObject({
  kind: z.literal('load'),
  ...partHead,
  family: z.enum(LOAD_FAMILIES, { error: `expected one of ${LOAD_FAMILIES.join(', ')}` }),
  referenceDegC: optional(celsius),
  tolerance: optional(tolerance),
  /** Temperature the overload figures hold for. */
  maximumReferenceDegC: optional(celsius),
  levels: z.array(CoilLevels).max(20).default([]),
  coils: z.array(Coil).max(100).default([]),
  temperatures: z.array(CoilTemperature).max(50).default([]),
  suppression: z.array(Suppression).max(50).default([]),
  filament: optional(Filament),
  leds: z.array(Led).max(50).default([]),
});
export type LoadRecord = z.infer<typeof LoadRecord>;
