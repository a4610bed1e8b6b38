import type { CriterionId } from '../checks/criteria.ts';
import type { Criterion } from '../checks/evaluation.ts';

/** What a base resistor decides by its nature: where the search for the window starts. */
export const DECIDED_BY_RB: readonly CriterionId[] = [
  'overdrive-factor',
  'input-on',
  'forced-beta',
  'drive-current',
  'base-current',
  'rb-dissipation',
  'off-base-voltage',
  'off-collector-current',
  'reset-off',
  'storage-time',
  'tested-range',
  'pre-overdrive-factor',
  'pre-forced-beta',
  'pre-collector-current',
  'pre-dissipation',
  'pre-tested-range',
];

/** What no series of values leaves alone, even where the few that could be judged hardly move it. */
export const MOVED_BY_ANY_RB: readonly CriterionId[] = [
  'overdrive-factor',
  'input-on',
  'forced-beta',
];

/** Movement between the ends of the window above which a criterion counts as RB-dependent. */
const MOVES = 0.01;

/** Ids of the criteria that move between two judged values; `tested-range` always counts. */
export function movingCriteria(at: readonly Criterion[], other: readonly Criterion[]): Set<string> {
  const moving = new Set<string>(['tested-range', 'pre-tested-range']);
  for (const criterion of at) {
    const end = other.find(({ id }) => id === criterion.id);
    if (end !== undefined && moves(criterion.value, end.value)) moving.add(criterion.id);
  }
  return moving;
}

function moves(a: number | null, b: number | null): boolean {
  if (a === null || b === null) return a !== b;
  return Math.abs(a - b) > MOVES * Math.max(Math.abs(a), Math.abs(b));
}
