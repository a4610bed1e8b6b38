import * as z from 'zod';
import { celsius, current, line, optional, span, voltage, voltageOrZero } from '../stage/ranges.ts';
import { partHead, provenance } from './provenance.ts';

const anyCurrent = optional(current);

/**
 * Guaranteed levels at one supply and temperature. A high level is printed as a voltage (`highV`) or as
 * a drop below the rail (`highDropV`); supply null holds at any supply of the record, temperature null
 * over the whole range.
 */
const LevelPoint = z.strictObject({
  supplyV: optional(span(voltage)),
  tempDegC: optional(span(celsius)),
  highV: optional(voltage),
  highDropV: optional(voltageOrZero),
  sourceA: anyCurrent,
  lowV: optional(voltageOrZero),
  sinkA: anyCurrent,
  ...provenance,
});
export type LevelPoint = z.infer<typeof LevelPoint>;

const Recommended = z.strictObject({
  supplyV: optional(voltage),
  sourceA: anyCurrent,
  sinkA: anyCurrent,
  ...provenance,
});

/** A logic family's or controller's output as its data sheet prints it; currents are magnitudes. */
export const LogicOutputRecord = z.strictObject({
  kind: z.literal('logic-output'),
  ...partHead,
  output: z
    .enum(['push-pull', 'open-collector'], { error: 'expected "push-pull" or "open-collector"' })
    .default('push-pull'),
  /** Bipolar outputs do not reach their rail unloaded. */
  bipolar: z.boolean({ error: 'expected true or false' }).default(false),
  example: optional(line(120)),
  supplyV: optional(span(voltage)),
  /** Absolute maxima: one output, all outputs together, one group of pins, the supply pin. */
  outputA: anyCurrent,
  totalA: anyCurrent,
  groupA: anyCurrent,
  supplyPinA: anyCurrent,
  /** Highest voltage an open collector may be pulled up to. */
  maximumV: optional(voltage),
  recommended: z.array(Recommended).max(20).default([]),
  points: z.array(LevelPoint).max(100).default([]),
});
export type LogicOutputRecord = z.infer<typeof LogicOutputRecord>;
