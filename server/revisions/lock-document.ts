import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';
import { In, type EntityManager } from 'typeorm';
import { revisionLetter } from '../../shared/review/revision-state.ts';
import type { CheckRecordEntity } from '../checks/check-record-entity.ts';
import type { FindingEntity } from '../checks/finding-entity.ts';
import { FindingEventEntity } from '../checks/finding-event-entity.ts';
import type { RevisionContext } from './revision-context.ts';

export const LOCK_FORMAT = 'sinkwell-lock/1';

/** What a signature stands under: the document as canonical JSON (RFC 8785) and its SHA-256. */
export interface LockedContent {
  readonly text: string;
  /** 64 hex digits. */
  readonly hash: string;
}

/** What the approver states by signing. */
export function meaningOf({ revision, stage }: RevisionContext): string {
  const letter = revisionLetter(revision.number);
  return `I have read the evidence for stage ${stage.reference} revision ${letter} and release it for production.`;
}

/**
 * Everything a lock covers, from the rows as they are now. The preview shows this hash, the lock signs it,
 * and verification makes it again.
 */
export async function lockContent(
  manager: EntityManager,
  context: RevisionContext,
  meaning: string,
): Promise<LockedContent> {
  const { moves, people, policy, revision, stage } = context;
  const last = (wanted: string) => moves.findLast(({ move }) => move === wanted)?.personId ?? null;
  return hashed({
    format: LOCK_FORMAT,
    meaning,
    projectId: stage.projectId,
    stageId: stage.id,
    revisionId: revision.id,
    reference: stage.reference,
    letter: revisionLetter(revision.number),
    engine: revision.evaluation.engine,
    policy: { id: policy.id, name: policy.name, version: policy.version },
    definition: revision.definition,
    designators: revision.designators,
    parts: revision.partSnapshot,
    evaluation: revision.evaluation,
    people: {
      authors: [...people.authors].sort(),
      checkers: [...people.checkers].sort(),
      submittedBy: last('submit'),
      checkedBy: last('pass'),
    },
    check: context.check && checkContent(context.check),
    findings: await findingContent(manager, context.findings),
  });
}

// Members are named one by one: a column added later must not change what was signed before.

function checkContent(check: CheckRecordEntity) {
  const { round, checkerId, savedAtMs, overdriveFactor, method } = check;
  const { note, reason, justifications, read } = check;
  return {
    ...{ round, checkerId, savedAtMs, overdriveFactor, method },
    ...{ note, reason, justifications, read },
  };
}

async function findingContent(manager: EntityManager, findings: readonly FindingEntity[]) {
  const events = await manager.find(FindingEventEntity, {
    where: { findingId: In(findings.map(({ id }) => id)) },
    order: { sequence: 'ASC' },
  });
  return findings.map(({ id, number, subjectKind, subjectId, title, state }) => ({
    ...{ number, subjectKind, subjectId, title, state },
    history: events
      .filter(({ findingId }) => findingId === id)
      .map(({ sequence, atMs, personId, act, text }) => ({ sequence, atMs, personId, act, text })),
  }));
}

/** SHA-256 over the canonical JSON of a value. */
export function hashed(value: unknown): LockedContent {
  const text = canonicalize(JSON.parse(JSON.stringify(value))) ?? '';
  return { text, hash: sha256(text) };
}

export function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}
