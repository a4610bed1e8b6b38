import { obstacleTo } from '../checks/applicability.ts';
import { CRITERIA, type CriterionId } from '../checks/criteria.ts';
import { type Judge, judgeFor } from '../checks/judge.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { preferredValues } from '../units/preferred-values.ts';

/** A base–emitter resistor sized for a stage at its RB. */
export interface ShuntSizing {
  /** Largest preferred value that keeps the stage off and costs little drive; null where none does both. */
  readonly recommendedOhm: number | null;
  /** Largest preferred value that keeps the stage off, whatever it costs; null where none does. */
  readonly largestOhm: number | null;
  /** Off-state criterion that the next larger value misses, or that every value misses; null at the end of the series. */
  readonly setBy: CriterionId | null;
  /** Share of the drive current that `largestOhm` takes, at its worst corner; null without one, and where none is left. */
  readonly driveShare: number | null;
  /** The stage states no reset, so the pin was taken to float: what RBE is for. */
  readonly floatingAssumed: boolean;
}

/** Share of the drive current RBE may take. */
const MOST_SHARE = 0.1;

/** Off-state criteria that RBE does not decide. */
const NOT_BY_SHUNT = new Set<string>([
  'off-collector-voltage',
  'drive-maximum',
  'input-off',
] satisfies CriterionId[]);

/**
 * Sizes RBE at the stage's RB: the largest preferred value that passes every off-state criterion it decides, if that
 * costs at most a tenth of the drive. A smaller one would cost more, so where the largest costs too much there is none.
 *
 * @param input a parsed stage with its RB; a fitted RBE gives the tolerance, else 5 % is taken
 * @returns null for a stage that is not judged, has no RB or brings the resistor inside its transistor
 */
export function sizeShunt(input: StageInput): ShuntSizing | null {
  const rbOhm = input.baseResistor.valueOhm;
  const inside = input.topology === 'low-side-pre-biased';
  if (obstacleTo(input) !== null || rbOhm === null || inside) return null;
  const { policy } = input;
  const values = preferredValues(policy.series, policy.smallestOhm, policy.largestOhm);
  const floating = withFloatingPin(input);
  const missedAt = (index: number) => missed(judgeWith(floating, values[index] ?? NaN), rbOhm);
  const last = largestPassing(values.length, (index) => missedAt(index) === null);
  const found = { floatingAssumed: floating !== input };
  const largestOhm = values[last];
  if (largestOhm === undefined) {
    const setBy = missedAt(0);
    return { ...found, recommendedOhm: null, largestOhm: null, setBy, driveShare: null };
  }
  const driveShare = largestShare(judgeWith(floating, largestOhm), rbOhm);
  return {
    ...found,
    recommendedOhm: driveShare <= MOST_SHARE ? largestOhm : null,
    largestOhm,
    setBy: last === values.length - 1 ? null : missedAt(last + 1),
    driveShare: Number.isFinite(driveShare) ? driveShare : null,
  };
}

/** A pin that nothing is said about may float with its usual leakage; a PNP's open output floats by itself. */
function withFloatingPin(input: StageInput): StageInput {
  const { drive, topology } = input;
  if (drive.reset !== null || topology === 'high-side-pnp' || drive.kind !== 'push-pull') {
    return input;
  }
  if (topology === 'two-transistor-high-side') return input;
  return {
    ...input,
    drive: { ...drive, reset: { kind: 'high-z', leakageA: FLOATING_A, pullUpOhm: null } },
  };
}

/** Leakage of a floating pin, A: the stage file's own default. */
const FLOATING_A = 1e-6;
const USUAL_TOLERANCE = 0.05;

function judgeWith(input: StageInput, valueOhm: number): Judge {
  const fitted = input.shuntResistor ?? { tolerance: USUAL_TOLERANCE, ratingW: null };
  return judgeFor({ ...input, shuntResistor: { ...fitted, valueOhm } });
}

/** The off-state criterion of the output transistor that does not pass, the least margin first. */
function missed(judge: Judge, rbOhm: number): CriterionId | null {
  const off = judge
    .criteria(rbOhm)
    .filter(({ id, status }) => isDecided(id) && status !== 'pass' && status !== 'stated');
  off.sort((a, b) => (a.margin ?? -Infinity) - (b.margin ?? -Infinity));
  return (off[0]?.id as CriterionId | undefined) ?? null;
}

const isDecided = (id: string) =>
  Object.hasOwn(CRITERIA, id) &&
  !id.startsWith('pre-') &&
  CRITERIA[id as CriterionId].group === 'off-state' &&
  !NOT_BY_SHUNT.has(id);

/** Off-state figures rise with RBE: the last index that passes, −1 where none does. */
function largestPassing(count: number, passes: (index: number) => boolean): number {
  let low = -1;
  let high = count;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (passes(middle)) low = middle;
    else high = middle;
  }
  return low;
}

/** Largest share of the drive current that RBE takes, over the corners at start. */
function largestShare(judge: Judge, rbOhm: number): number {
  judge.criteria(rbOhm);
  const { point } = judge;
  const { count, shift } = judge.model.corners;
  let share = 0;
  for (let corner = 0; corner < count; corner++) {
    if (((corner >> shift.instant) & 1) === 1) continue;
    point.place(corner, rbOhm);
    point.solve(point.condition.ambientDegC);
    const shuntA = point.vbeV / point.rbeOhm;
    share = Math.max(share, point.driveA > 0 ? shuntA / point.driveA : Infinity);
  }
  return share;
}
