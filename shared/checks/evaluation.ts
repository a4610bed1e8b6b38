import * as z from 'zod';

/** Bumped whenever a rule changes a figure or a verdict; stored with every evaluation. */
export const ENGINE_VERSION = '1.0.0';

export const VERDICTS = ['pass', 'marginal', 'open', 'fail'] as const;
export const Verdict = z.enum(VERDICTS);
export type Verdict = z.infer<typeof Verdict>;

/** `stated`: reported without a limit; it does not touch the verdict. */
export const CriterionStatus = z.enum([...VERDICTS, 'stated']);
export type CriterionStatus = z.infer<typeof CriterionStatus>;

/** Which end each varied quantity stood at, for example `{ supply: 'max', rb: '+' }`. */
export const Corner = z.record(z.string(), z.string());
export type Corner = z.infer<typeof Corner>;

/** SI unit symbols of criteria; ratios carry `1`. */
export const Unit = z.enum(['1', 'V', 'A', 'W', 'Ohm', '°C', 's']);
export type Unit = z.infer<typeof Unit>;

export const Criterion = z.object({
  id: z.string(),
  /** null where the figure is infinite or cannot be computed. */
  value: z.number().nullable(),
  limit: z.number().nullable(),
  relation: z.enum(['>=', '<=']),
  unit: Unit,
  /** Distance to the limit as a fraction of the limit, positive when met. */
  margin: z.number().nullable(),
  status: CriterionStatus,
  /** null for criteria that do not move with a corner. */
  corner: Corner.nullable(),
});
export type Criterion = z.infer<typeof Criterion>;

export const Finding = z.object({ id: z.string(), text: z.string() });
export type Finding = z.infer<typeof Finding>;

export const Nominal = z.object({
  icA: z.number().nullable(),
  ibA: z.number().nullable(),
  driveA: z.number().nullable(),
  vceV: z.number().nullable(),
  vbeV: z.number().nullable(),
  rceSatOhm: z.number().nullable(),
  forcedBeta: z.number().nullable(),
  overdriveFactor: z.number().nullable(),
  powerW: z.number().nullable(),
  tjDegC: z.number().nullable(),
});
export type Nominal = z.infer<typeof Nominal>;

/** What `evaluateStage` gives and the server stores. */
export const Evaluation = z.object({
  reference: z.string(),
  verdict: Verdict,
  engine: z.string(),
  corners: z.int(),
  /** RB the stage was judged at; the recommended value where the file left it open, else null. */
  baseResistorOhm: z.number().nullable(),
  criteria: z.array(Criterion),
  nominal: Nominal,
  findings: z.array(Finding),
});
export type Evaluation = z.infer<typeof Evaluation>;

/** The figures of one corner, for the drawing and the corner selector; null where not computable. */
export const CornerFigures = z.object({
  corner: Corner,
  supplyV: z.number(),
  ambientDegC: z.number(),
  outputV: z.number(),
  driveA: z.number(),
  ibA: z.number(),
  shuntA: z.number(),
  icA: z.number(),
  vceV: z.number(),
  vbeV: z.number(),
  forcedBeta: z.number().nullable(),
  overdriveFactor: z.number(),
  powerW: z.number(),
  tjDegC: z.number(),
  saturated: z.boolean(),
});
export type CornerFigures = z.infer<typeof CornerFigures>;
