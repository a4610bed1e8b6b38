import type { DESK_GROUPS } from '../../shared/contract/desk.ts';
import type { FindingEntity } from '../checks/finding-entity.ts';
import { partDataChanged } from '../revisions/part-standing.ts';
import type { RevisionLine } from '../revisions/revision-line.ts';
import { deskItem, hasRole, isHand, movedItem, type UnnamedItem } from './desk-item.ts';
import type { DeskMaterial } from './desk-material.ts';

type Kind = (typeof DESK_GROUPS)[number];

/** What waits for a person, by kind, the longest wait first. */
export function deskGroups(desk: DeskMaterial): Record<Kind, UnnamedItem[]> {
  const groups: Record<Kind, UnnamedItem[]> = {
    'to-check': desk.lines
      .filter((line) => line.state === 'in-check' && isOthersWork(desk, line))
      .map((line) => checkItem(desk, line)),
    'to-approve': desk.lines
      .filter((line) => waitsForLock(desk, line))
      .map((line) => movedItem(desk, line, 'pass')),
    'findings-to-answer': findingItems(desk, 'open', isOwnWork),
    'findings-to-close': findingItems(desk, 'answered', isOthersWork),
    'part-data-changed': changedItems(desk),
    'own-drafts': desk.lines
      .filter((line) => line.state === 'draft' && isOwnWork(desk, line))
      .map((line) => deskItem(desk, line, { sinceMs: line.savedAtMs })),
  };
  for (const items of Object.values(groups)) items.sort(byWait);
  return groups;
}

/** Own work that lies on other people's desks. */
export function waitingForOthers(desk: DeskMaterial): UnnamedItem[] {
  const submitted = desk.lines.filter(({ state }) => state === 'in-check' || state === 'checked');
  return submitted
    .filter((line) => isHand(desk, line, 'author'))
    .map((line) => movedItem(desk, line, line.state === 'checked' ? 'pass' : 'submit'))
    .sort(byWait);
}

const byWait = (a: UnnamedItem, b: UnnamedItem) => a.sinceMs - b.sinceMs;

function isOwnWork(desk: DeskMaterial, line: RevisionLine): boolean {
  return hasRole(desk, line, 'designer') && isHand(desk, line, 'author');
}

function isOthersWork(desk: DeskMaterial, line: RevisionLine): boolean {
  return hasRole(desk, line, 'checker') && !isHand(desk, line, 'author');
}

function waitsForLock(desk: DeskMaterial, line: RevisionLine): boolean {
  const touched = isHand(desk, line, 'author') || isHand(desk, line, 'checker');
  return line.state === 'checked' && hasRole(desk, line, 'approver') && !touched;
}

function checkItem(desk: DeskMaterial, line: RevisionLine): UnnamedItem {
  const round = desk.moves.filter(
    ({ move, revisionId }) => revisionId === line.id && move === 'submit',
  ).length;
  const begun = desk.checks.find((check) => check.revisionId === line.id && check.round === round);
  const note = begun ? `Begun, ${begun.read.length} criteria read` : null;
  return { ...movedItem(desk, line, 'submit'), note };
}

function findingItems(
  desk: DeskMaterial,
  state: FindingEntity['state'],
  isMine: (desk: DeskMaterial, line: RevisionLine) => boolean,
): UnnamedItem[] {
  return desk.findings.flatMap((finding) => {
    const line = desk.lines.find(({ id }) => id === finding.revisionId);
    if (finding.state !== state || line === undefined || !isMine(desk, line)) return [];
    const last = desk.events.findLast(({ findingId }) => findingId === finding.id);
    const subject = finding.subjectId.replaceAll('-', ' ');
    return [
      deskItem(desk, line, {
        sinceMs: last?.atMs ?? line.savedAtMs,
        fromId: last?.personId ?? null,
        note: `Finding ${finding.number} on ${subject}: ${finding.title}`,
      }),
    ];
  });
}

/** For those who design or check in the project: the library has newer data than the stage. */
function changedItems(desk: DeskMaterial): UnnamedItem[] {
  return desk.lines.flatMap((line) => {
    const concerned = hasRole(desk, line, 'designer') || hasRole(desk, line, 'checker');
    const changed = desk.standing.filter(
      (part) => part.revisionId === line.id && partDataChanged([part]),
    );
    if (!concerned || changed.length === 0 || line.state === 'withdrawn') return [];
    const notes = changed.map(
      ({ latestRevision, partNumber, revision }) =>
        `${partNumber}: library revision ${revision}, now ${latestRevision}`,
    );
    const sinceMs = Math.max(...changed.map(({ changedAtMs }) => changedAtMs));
    return [deskItem(desk, line, { sinceMs, note: notes.join('; ') })];
  });
}
