import type { InputFigures } from './input-rows.ts';
import type { LimitSet } from './transistor-limits.ts';

/**
 * The stage file's `internal` of a pre-biased part: nominal R1 and R2, tolerances as the larger of both
 * printed sides, the input rows at their first printed point.
 *
 * @returns null where no R1 is printed
 */
export function internalResistors(input: InputFigures | null, limits: LimitSet) {
  if (!input?.r1) return null;
  const { r1, r2, ratio } = input;
  const nominalR2Ohm = ratio === null ? null : r1.typOhm * ratio.typ;
  return {
    r1Ohm: r1.typOhm,
    r2Ohm: r2 === null ? nominalR2Ohm : r2.typOhm,
    r1Tolerance: spread(r1.minOhm, r1.typOhm, r1.maxOhm),
    ratioTolerance: ratio === null ? undefined : spread(ratio.min, ratio.typ, ratio.max),
    input: inputRows(input, limits),
  };
}

function inputRows({ on, off, current, gain }: InputFigures, limits: LimitSet) {
  return {
    onV: on[0]?.minV,
    onOutputA: on[0]?.outputA,
    offV: off[0]?.maxV,
    currentA: current[0]?.maxA,
    testV: current[0]?.inputV,
    gi: gain[0]?.min,
    maximumV: limits.inputMaxV,
  };
}

/** Larger distance of a printed end from nominal, as a fraction to four digits; undefined where unprinted. */
function spread(min: number | null, typ: number, max: number | null) {
  const ends = [min, max].filter((end) => end !== null);
  if (ends.length === 0) return undefined;
  return Number(Math.max(...ends.map((end) => Math.abs(end / typ - 1))).toFixed(4));
}
