import type { Criterion, Evaluation } from './evaluation.ts';

/** The criteria that give the verdict, least margin first; one without a margin leads only where it is missed. */
export function decidingCriteria({ criteria, verdict }: Evaluation): Criterion[] {
  const without = verdict === 'fail' || verdict === 'open' ? -Infinity : Infinity;
  return criteria
    .filter(({ status }) => status === verdict)
    .sort((a, b) => (a.margin ?? without) - (b.margin ?? without));
}
