import type { Criterion } from '../checks/evaluation.ts';
import { evenMargin, verdictOf } from '../checks/margin.ts';
import type { Candidate } from './sizing.ts';

/** A preferred value with all its criteria. */
export interface JudgedValue {
  readonly valueOhm: number;
  readonly criteria: readonly Criterion[];
}

/** A judged value as the ladder shows it: verdict and smallest margin of the RB-dependent criteria. */
export function candidateOf(judged: JudgedValue, dependent: ReadonlySet<string>): Candidate {
  const own = judged.criteria.filter(({ id }) => dependent.has(id));
  const worst = tightest(own);
  return {
    valueOhm: judged.valueOhm,
    margin: worst?.margin ?? null,
    worst: obstacleAt(judged, dependent) ?? worst?.id ?? null,
    verdict: verdictOf(own.map(({ status }) => status)),
  };
}

/** The criterion with the smallest margin; one with an infinite figure before all others. */
function tightest(criteria: readonly Criterion[]): Criterion | null {
  const judged = criteria.filter(({ status, margin }) => margin !== null || status === 'fail');
  return judged.reduce<Criterion | null>(
    (worst, each) => (worst === null || marginOrLess(each) < marginOrLess(worst) ? each : worst),
    null,
  );
}

const marginOrLess = ({ margin }: Criterion) => margin ?? -Infinity;

/** What keeps a value out of the window: the failing criterion with the smallest margin, else the open one. */
export function obstacleAt(judged: JudgedValue, dependent: ReadonlySet<string>): string | null {
  const own = judged.criteria.filter(({ id }) => dependent.has(id));
  const failing = tightest(own.filter(({ status }) => status === 'fail'));
  return (failing ?? own.find(({ status }) => status === 'open'))?.id ?? null;
}

/** An open criterion is missed, but by nothing that could be measured. */
const BARELY = -1e-12;

/** How near a criterion comes to being met, on one scale for both relations: below 0 it is missed. */
export function nearnessOf({ margin, relation, status }: Criterion): number {
  if (status === 'open') return BARELY;
  if (status === 'stated') return Infinity;
  return evenMargin(
    relation === '<=' ? 1 : -1,
    margin ?? (status === 'fail' ? -Infinity : Infinity),
  );
}

/** How near a value comes: its nearest-to-missed RB-dependent criterion. */
export function nearness(judged: JudgedValue, dependent: ReadonlySet<string>): number {
  return Math.min(...judged.criteria.filter(({ id }) => dependent.has(id)).map(nearnessOf));
}
