import * as z from 'zod';
import { Verdict } from '../checks/evaluation.ts';

/** One preferred value, judged at all corners. `margin` is its smallest RB-dependent margin. */
export const Candidate = z.object({
  valueOhm: z.number(),
  margin: z.number().nullable(),
  worst: z.string().nullable(),
  verdict: Verdict,
});
export type Candidate = z.infer<typeof Candidate>;

/** The RB window; both ends null where no value stands in it. */
export const Sizing = z.object({
  rbMinOhm: z.number().nullable(),
  rbMaxOhm: z.number().nullable(),
  setBy: z.object({ min: z.string().nullable(), max: z.string().nullable() }),
  recommendedOhm: z.number().nullable(),
  candidates: z.array(Candidate),
  /** Set when the window is empty: the criteria in conflict, usually two, and in sentences what would open it. */
  conflict: z.object({ between: z.array(z.string()), ways: z.array(z.string()) }).nullable(),
});
export type Sizing = z.infer<typeof Sizing>;
