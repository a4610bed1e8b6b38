import { obstacleTo } from '../checks/applicability.ts';
import { type Judge, judgeFor } from '../checks/judge.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { preferredValues } from '../units/preferred-values.ts';
import { conflictAt } from './conflict.ts';
import { candidateOf, type JudgedValue, nearness, obstacleAt } from './judged-value.ts';
import { DECIDED_BY_RB, MOVED_BY_ANY_RB, movingCriteria } from './rb-dependence.ts';
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

/** The values of a stage's base resistor that were judged, and what they come to. */
export interface SizedValues {
  readonly judged: readonly JudgedValue[];
  /** Ids of the criteria that move with RB. */
  readonly dependent: ReadonlySet<string>;
  readonly candidates: readonly Candidate[];
  readonly recommendedOhm: number | null;
  /** The value that comes nearest to meeting all that RB decides. */
  readonly nearest: JudgedValue | null;
  readonly judge: Judge;
  /** All preferred values of the policy, rising. */
  readonly values: readonly number[];
}

/**
 * Judges every preferred value of the base resistor that can pass at all corners.
 *
 * @param input a stage that can be judged
 */
export function sizedValues(input: StageInput): SizedValues {
  const { series, smallestOhm, largestOhm } = input.policy;
  const values = preferredValues(series, smallestOhm, largestOhm);
  const judge = judgeFor(input);
  const judged = judgedValues(values, judge);
  const dependent = settledDependence(judged);
  const candidates = judged.map((value) => candidateOf(value, dependent));
  return {
    judged,
    dependent,
    candidates,
    recommendedOhm: recommended(candidates),
    nearest: nearestOf(judged, dependent),
    judge,
    values,
  };
}

/**
 * Sizes the base resistor: every preferred value that can pass is judged at all corners, and the window is
 * the values whose RB-dependent criteria are all pass or marginal.
 *
 * @param input a parsed stage; its own `baseResistor.valueOhm` is not looked at
 * @returns the window with its ends' criteria, the recommended value and the judged values, rising
 */
export function sizeStage(input: StageInput): Sizing {
  if (obstacleTo(input) !== null) return NOTHING;
  const { judged, dependent, candidates, recommendedOhm, nearest, judge, values } =
    sizedValues(input);
  const window = windowOf(judged, dependent);
  if (window === null) {
    const conflict = nearest && conflictAt(judge, values, nearest, dependent);
    return { ...NOTHING, candidates: [...candidates], conflict };
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
    recommendedOhm,
    candidates: [...candidates],
    conflict: null,
  };
}

function judgedValues(values: readonly number[], judge: Judge): JudgedValue[] {
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
    if (window === null) for (const id of missedThroughout(judged)) dependent.add(id);
  }
  return dependent;
}

/** What any RB moves over the whole series, but fails at every judged value. */
function missedThroughout(judged: readonly JudgedValue[]): string[] {
  return MOVED_BY_ANY_RB.filter((id) =>
    judged.every(({ criteria }) =>
      criteria.some((each) => each.id === id && each.status === 'fail'),
    ),
  );
}

const marginOf = ({ margin }: Candidate) => margin ?? -Infinity;

/** The value that comes nearest to meeting everything that RB decides. */
function nearestOf(judged: readonly JudgedValue[], dependent: ReadonlySet<string>) {
  const near = judged.map((value) => nearness(value, dependent));
  return judged[near.indexOf(Math.max(...near))] ?? null;
}

/** Index of the value with the largest smallest margin, ties to the larger value. */
function widest(candidates: readonly Candidate[]): number {
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
  return inside[widest(inside)]?.valueOhm ?? null;
}
