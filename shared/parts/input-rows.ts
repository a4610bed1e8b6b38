import * as z from 'zod';
import {
  celsius,
  current,
  currentOrZero,
  gainFigure,
  optional,
  resistance,
  voltage,
} from '../stage/ranges.ts';
import { provenance } from './provenance.ts';

/** Figures printed for parts with resistors inside: pre-biased transistors and arrays. */

const Resistance = z.strictObject({
  minOhm: optional(resistance),
  typOhm: resistance,
  maxOhm: optional(resistance),
  ...provenance,
});

const Ratio = z.strictObject({
  min: optional(gainFigure),
  typ: gainFigure,
  max: optional(gainFigure),
  ...provenance,
});

/** Input voltage for a given output current and output voltage. Pre-biased parts print the minimum. */
const InputOn = z.strictObject({
  minV: optional(voltage),
  typV: optional(voltage),
  maxV: optional(voltage),
  outputV: optional(voltage),
  outputA: current,
  ...provenance,
});

const InputOff = z.strictObject({
  typV: optional(voltage),
  maxV: optional(voltage),
  vccV: optional(voltage),
  outputA: current,
  ...provenance,
});

const OutputOn = z.strictObject({
  typV: optional(voltage),
  maxV: optional(voltage),
  outputA: current,
  inputA: current,
  ...provenance,
});

const InputCurrent = z.strictObject({
  inputV: voltage,
  typA: optional(current),
  maxA: optional(current),
  ...provenance,
});

/** Input current below which the output stays off. */
const OffInputCurrent = z.strictObject({
  outputA: current,
  minA: optional(currentOrZero),
  typA: optional(currentOrZero),
  tempDegC: celsius,
  ...provenance,
});

const InputGain = z.strictObject({
  min: gainFigure,
  outputV: optional(voltage),
  outputA: current,
  ...provenance,
});

export const InputFigures = z.strictObject({
  /** In series with the base. */
  r1: optional(Resistance),
  /** Base to emitter. */
  r2: optional(Resistance),
  ratio: optional(Ratio),
  /** Base-emitter resistors of the stages inside an array, nominal. */
  baseEmitterOhm: z.array(resistance).max(10).default([]),
  on: z.array(InputOn).max(50).default([]),
  off: z.array(InputOff).max(50).default([]),
  outputOn: z.array(OutputOn).max(50).default([]),
  current: z.array(InputCurrent).max(50).default([]),
  offCurrent: z.array(OffInputCurrent).max(50).default([]),
  gain: z.array(InputGain).max(50).default([]),
});
export type InputFigures = z.infer<typeof InputFigures>;
