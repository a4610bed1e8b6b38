import type * as z from 'zod';
import type { Project } from '../../../shared/contract/project.ts';
import { STATE_WORDS, type RevisionState } from '../../../shared/review/revision-state.ts';

export type Counts = z.infer<typeof Project>['counts'];

/** In the order of the bar: what is finished first. */
export const COUNTED_STATES = [
  'locked',
  'checked',
  'in-check',
  'draft',
  'withdrawn',
] as const satisfies readonly RevisionState[];

/** Current revisions of a project: superseded ones belong to stages that are counted already. */
export function stageCount(counts: Counts | undefined): number {
  return counts ? COUNTED_STATES.reduce((sum, state) => sum + counts[state], 0) : 0;
}

/** `6 locked, 2 checked, 3 in check, 3 draft`; states without a stage are left out. */
export function countsText(counts: Counts | undefined): string {
  if (!counts) return '';
  return COUNTED_STATES.filter((state) => counts[state] > 0)
    .map((state) => `${counts[state]} ${STATE_WORDS[state].toLowerCase()}`)
    .join(', ');
}
