import type { DeskItem } from '../../shared/contract/desk.ts';
import { type ProjectRole, revisionLetter } from '../../shared/review/revision-state.ts';
import type { RevisionLine } from '../revisions/revision-line.ts';
import type { RevisionPersonEntity } from '../revisions/revision-person-entity.ts';
import { leastOf } from '../stages/stage-list.ts';
import type { DeskMaterial } from './desk-material.ts';

/** An item before the name of whom it comes from is looked up. */
export type UnnamedItem = Omit<DeskItem, 'from'> & { readonly fromId: string | null };

export function deskItem(
  { projects }: DeskMaterial,
  line: RevisionLine,
  wait: { readonly sinceMs: number; readonly fromId?: string | null; readonly note?: string },
): UnnamedItem {
  const project = projects.get(line.projectId);
  const { projectId, reference, stageId, state, title, verdict } = line;
  return {
    ...{ revisionId: line.id, stageId, projectId, reference, title, state, verdict },
    ...{ projectCode: project?.code ?? '', projectTitle: project?.title ?? '' },
    letter: revisionLetter(line.number),
    least: leastOf(line.leastCriterion, line.leastMargin),
    ...{ sinceMs: wait.sinceMs, fromId: wait.fromId ?? null, note: wait.note ?? null },
  };
}

/** A revision that waits since somebody's last move of a kind. */
export function movedItem(
  desk: DeskMaterial,
  line: RevisionLine,
  wanted: 'submit' | 'pass',
): UnnamedItem {
  const last = desk.moves.findLast(
    ({ move, revisionId }) => revisionId === line.id && move === wanted,
  );
  const sinceMs = last?.atMs ?? line.savedAtMs;
  return deskItem(desk, line, { sinceMs, fromId: last?.personId ?? null });
}

/** Whether the person of the desk has a role in the project of a revision. */
export function hasRole(
  { roles }: DeskMaterial,
  { projectId }: RevisionLine,
  role: ProjectRole,
): boolean {
  return roles.get(projectId)?.includes(role) ?? false;
}

/** Whether the person of the desk had a hand in a revision. */
export function isHand(
  { actor, hands }: DeskMaterial,
  { id }: RevisionLine,
  hand: RevisionPersonEntity['hand'],
): boolean {
  return hands.some(
    (row) => row.revisionId === id && row.hand === hand && row.personId === actor.id,
  );
}
