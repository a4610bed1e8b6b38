import { obstacleTo } from '../checks/applicability.ts';
import { type Judge, judgeFor } from '../checks/judge.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { preferredValues } from '../units/preferred-values.ts';
import { conflictAt } from './conflict.ts';
import { candidateOf, type JudgedValue, obstacleAt } from './judged-value.ts';
import { DECIDED_BY_RB, movingCriteria } from './rb-dependence.ts';
import type { Candidate, Sizing } from './sizing.ts';

/** Values judged beyond both ends of those that can pass, so that the ladder shows what lies outside. */
const NEIGHBOURS = 3;

/** Rounds after which the window and the criteria that depend on RB must have settled on each other. */
const ROUNDS = 8;

const NOTHING: Sizing = {
  rbMinOhm: null,
  rbMaxOhm: null,
  setBy: { min: null, max: null },
  recommendedOhm: null,
  candidates: [],
  conflict: null,
};

/**
 * Sizes the base resistor: every preferred value that can pass is judged at all corners, and the window is
 * the values whose RB-dependent criteria are all pass or marginal.
 *
 * @param input a parsed stage; its own `baseResistor.valueOhm` is not looked at
 * @returns the window with its ends' criteria, the recommended value and the judged values, rising
 */
export function sizeStage(input: StageInput): Sizing {
  if (obstacleTo(input) !== null) return NOTHING;
  const judge = judgeFor(input);
  const judged = judgedValues(input, judge);
  const dependent = settledDependence(judged);
  const candidates = judged.map((value) => candidateOf(value, dependent));
  const window = windowOf(judged, dependent);
  if (window === null) {
    return { ...NOTHING, candidates, conflict: conflictAt(judged, nearest(candidates), dependent) };
  }
  const below = judged[window.first - 1];
  const above = judged[window.last + 1];
  return {
    rbMinOhm: judged[window.first]?.valueOhm ?? null,
    rbMaxOhm: judged[window.last]?.valueOhm ?? null,
    setBy: {
      min: below === undefined ? null : obstacleAt(below, dependent),
      max: above === undefined ? null : obstacleAt(above, dependent),
    },
    recommendedOhm: recommended(candidates),
    candidates,
    conflict: null,
  };
}

function judgedValues(input: StageInput, judge: Judge): JudgedValue[] {
  const { series, smallestOhm, largestOhm } = input.policy;
  const values = preferredValues(series, smallestOhm, largestOhm);
  const probed = values.map((valueOhm) => judge.probeMargin(valueOhm));
  const first = probed.findIndex((margin) => margin >= 0);
  const last = probed.findLastIndex((margin) => margin >= 0);
  const none = first < 0;
  const centre = none ? probed.indexOf(Math.max(...probed)) : first;
  const from = Math.max(0, centre - NEIGHBOURS);
  const to = (none ? centre : last) + NEIGHBOURS + 1;
  return values
    .slice(from, to)
    .map((valueOhm) => ({ valueOhm, criteria: judge.criteria(valueOhm) }));
}

/** First and last value in the window; null where it is empty. */
function windowOf(judged: readonly JudgedValue[], dependent: ReadonlySet<string>) {
  const stands = (value: JudgedValue) => obstacleAt(value, dependent) === null;
  const first = judged.findIndex(stands);
  return first < 0 ? null : { first, last: judged.findLastIndex(stands) };
}

/**
 * Which criteria depend on RB is asked between the ends of the window, and the window is what they leave:
 * both are taken in turn, from what RB decides by nature, until they agree.
 */
function settledDependence(judged: readonly JudgedValue[]): Set<string> {
  let dependent = new Set<string>(DECIDED_BY_RB);
  let ends = '';
  for (let round = 0; round < ROUNDS; round++) {
    const window = windowOf(judged, dependent);
    const [first, last] =
      window === null || window.first === window.last
        ? [0, judged.length - 1]
        : [window.first, window.last];
    const now = `${first} ${last}`;
    if (now === ends) break;
    ends = now;
    dependent = movingCriteria(judged[first]?.criteria ?? [], judged[last]?.criteria ?? []);
  }
  return dependent;
}

const marginOf = ({ margin }: Candidate) => margin ?? -Infinity;

/** Index of the value with the largest smallest margin, ties to the larger value. */
function nearest(candidates: readonly Candidate[]): number {
  return candidates.reduce(
    (best, each, k) => (marginOf(each) >= marginOf(candidates[best] ?? each) ? k : best),
    0,
  );
}

/** The largest value that passes: least drive that is fully sufficient; else the one with most margin. */
function recommended(candidates: readonly Candidate[]): number | null {
  const passing = candidates.findLast(({ verdict }) => verdict === 'pass');
  if (passing !== undefined) return passing.valueOhm;
  const inside = candidates.filter(({ verdict }) => verdict === 'marginal');
  return inside[nearest(inside)]?.valueOhm ?? null;
}
