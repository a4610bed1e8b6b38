import type * as z from 'zod';
import type { CheckRecord, saveCheckRequest } from '../../../shared/contract/check.ts';

/** What a checker has entered so far: the body of the save. */
export type CheckDraft = z.output<typeof saveCheckRequest.body>;

export const EMPTY_CHECK: CheckDraft = {
  overdriveFactor: null,
  method: null,
  note: '',
  reason: '',
  justifications: {},
  read: [],
};

/** The part of a stored record that its checker enters. */
export function draftOf(record: CheckRecord | null): CheckDraft {
  if (record === null) return EMPTY_CHECK;
  const { overdriveFactor, method, note, reason, justifications, read } = record;
  return { overdriveFactor, method, note, reason, justifications, read };
}

/**
 * Puts one's own edits on top of what somebody else saved in the meantime: whatever one changed stays as
 * typed, everything else is theirs.
 *
 * @param base what both started from
 */
export function mergeDrafts(base: CheckDraft, mine: CheckDraft, theirs: CheckDraft): CheckDraft {
  const changed = (key: 'overdriveFactor' | 'method' | 'note' | 'reason') =>
    mine[key] === base[key] ? theirs : mine;
  const ids = new Set([...Object.keys(mine.justifications), ...Object.keys(theirs.justifications)]);
  const justification = (id: string) =>
    (mine.justifications[id] ?? '') === (base.justifications[id] ?? '')
      ? (theirs.justifications[id] ?? '')
      : (mine.justifications[id] ?? '');
  return {
    overdriveFactor: changed('overdriveFactor').overdriveFactor,
    method: changed('method').method,
    note: changed('note').note,
    reason: changed('reason').reason,
    justifications: Object.fromEntries([...ids].map((id) => [id, justification(id)])),
    read: mergeRead(base.read, mine.read, theirs.read),
  };
}

function mergeRead(base: readonly string[], mine: readonly string[], theirs: readonly string[]) {
  const taken = new Set(base.filter((id) => !mine.includes(id)));
  const added = mine.filter((id) => !base.includes(id));
  return [...new Set([...theirs.filter((id) => !taken.has(id)), ...added])];
}

/** Whether two drafts would be saved as the same. */
export function sameDraft(a: CheckDraft, b: CheckDraft): boolean {
  return JSON.stringify(normal(a)) === JSON.stringify(normal(b));
}

function normal(draft: CheckDraft) {
  const written = Object.entries(draft.justifications).filter(([, text]) => text.trim() !== '');
  return {
    ...draft,
    note: draft.note.trim(),
    reason: draft.reason.trim(),
    justifications: written.map(([id, text]) => [id, text.trim()]).sort(),
    read: [...draft.read].sort(),
  };
}
