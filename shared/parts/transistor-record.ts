import * as z from 'zod';
import { optional } from '../stage/ranges.ts';
import { InputFigures } from './input-rows.ts';
import { partHead } from './provenance.ts';
import { LimitSet, limitSetName } from './transistor-limits.ts';
import {
  BaseEmitterFigure,
  ClampDiode,
  GainFigure,
  LeakageFigure,
  OutputCapacitance,
  SaturationFigure,
  SwitchingFigure,
  TransitionFrequency,
} from './transistor-rows.ts';

export const TRANSISTOR_FAMILIES = [
  'transistor',
  'darlington',
  'pre-biased',
  'darlington-array',
] as const;

const slope = optional(z.number({ error: 'expected a slope in V/K' }).min(-0.1).max(0.1));

/** A transistor as its data sheets print it: every row, every maker, nothing derived. */
export const TransistorRecord = z
  .strictObject({
    kind: z.literal('transistor'),
    ...partHead,
    polarity: z.enum(['npn', 'pnp'], { error: 'expected "npn" or "pnp"' }),
    family: z
      .enum(TRANSISTOR_FAMILIES, { error: `expected one of ${TRANSISTOR_FAMILIES.join(', ')}` })
      .default('transistor'),
    limits: LimitSet,
    /** What other makers of the type, or other boards, print; left-out figures as in `limits`. */
    alternatives: z.array(LimitSet).max(20).default([]),
    gain: z.array(GainFigure).max(200).default([]),
    saturation: z.array(SaturationFigure).max(200).default([]),
    baseEmitter: z.array(BaseEmitterFigure).max(200).default([]),
    leakage: z.array(LeakageFigure).max(200).default([]),
    switching: z.array(SwitchingFigure).max(50).default([]),
    outputCapacitance: optional(OutputCapacitance),
    transitionFrequency: optional(TransitionFrequency),
    vbeOnTempcoVPerK: slope,
    vbeSatTempcoVPerK: slope,
    input: optional(InputFigures),
    clampDiode: optional(ClampDiode),
  })
  .check((context) => {
    const record = context.value;
    if (record.limits.tjMaxDegC === null) {
      context.issues.push({
        code: 'custom',
        path: ['limits', 'tjMaxDegC'],
        message: 'expected the highest junction temperature in °C',
        input: null,
      });
    }
    const names = [record.limits, ...record.alternatives].map(limitSetName);
    record.alternatives.forEach((set, index) => {
      if (names.indexOf(limitSetName(set)) === index + 1) return;
      context.issues.push({
        code: 'custom',
        path: ['alternatives', index, 'maker'],
        message: 'expected maker and mounting together to differ from every other set of limits',
        input: set.maker,
      });
    });
    if (record.family === 'pre-biased' && !record.input?.r1) {
      context.issues.push({
        code: 'custom',
        path: ['input', 'r1'],
        message: 'expected the resistor in series with the base: the part is pre-biased',
        input: null,
      });
    }
  });
export type TransistorRecord = z.infer<typeof TransistorRecord>;
