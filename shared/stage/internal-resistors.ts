import type { GainPoint } from '../physics/gain.ts';
import type { StageInput } from './stage-input.ts';
import type { TransistorData } from './transistor-data.ts';

type InputRows = NonNullable<NonNullable<TransistorData['internal']>['input']>;

/** The resistors inside a pre-biased part at their ends, and how its sheet says it turns on. */
export interface InsideModel {
  readonly r1Ohm: readonly [number, number];
  /** R2/R1; null where there is no R2. */
  readonly ratio: readonly [number, number] | null;
  readonly input: InputRows | null;
  /** Whether the sheet prints VI(on): then the input voltage decides, not a base current. */
  readonly byInput: boolean;
}

/** Base–emitter voltage that pre-biased sheets are read with, V at 25 °C. */
export const INSIDE_VBE_V = 0.55;

/** @returns null for a topology without pre-biased part */
export function insideModel({ topology, transistor }: StageInput): InsideModel | null {
  const { internal } = transistor;
  if (topology !== 'low-side-pre-biased' || internal === null) return null;
  const { r1Ohm, r2Ohm, r1Tolerance, ratioTolerance, input } = internal;
  const ratio = r2Ohm === null ? null : r2Ohm / r1Ohm;
  return {
    r1Ohm: [r1Ohm * (1 - r1Tolerance), r1Ohm * (1 + r1Tolerance)],
    ratio: ratio === null ? null : [ratio * (1 - ratioTolerance), ratio * (1 + ratioTolerance)],
    input,
    byInput: input?.onV != null,
  };
}

/**
 * Gain rows of the transistor inside: the sheet's figures are terminal ones, so what flows through R2 at the
 * test is taken off the input current.
 *
 *   hFE = IO/(IO/GI − 0.55/R2+)
 */
export function insideGain(rows: readonly GainPoint[], inside: InsideModel): GainPoint[] {
  const r2Ohm = inside.ratio === null ? Infinity : inside.ratio[1] * inside.r1Ohm[1];
  const corrected = (icA: number, gain: number | null) => {
    if (gain === null) return null;
    const baseA = icA / gain - INSIDE_VBE_V / r2Ohm;
    return baseA > 0 ? icA / baseA : null;
  };
  const printed = rows.length > 0 ? rows : inputGain(inside);
  return printed.map((row) => ({
    ...row,
    min: corrected(row.icA, row.min),
    typ: corrected(row.icA, row.typ),
    max: corrected(row.icA, row.max),
  }));
}

/** The GI figure of the input group as a gain row, where no row is given. */
function inputGain({ input }: InsideModel): GainPoint[] {
  if (input?.gi == null || input.onOutputA === null) return [];
  return [{ icA: input.onOutputA, vceV: null, min: input.gi, typ: null, max: null, tempDegC: 25 }];
}
