import type { CheckRecord, ReviewFinding } from '../../shared/contract/check.ts';
import type { PersonRef } from '../../shared/contract/common-fields.ts';
import { figureDifference } from '../../shared/review/pass-conditions.ts';
import { missingInCheck } from '../revisions/permit.ts';
import type { RevisionContext } from '../revisions/revision-context.ts';
import type { CheckRecordEntity } from './check-record-entity.ts';
import type { FindingEntity } from './finding-entity.ts';
import type { FindingEventEntity } from './finding-event-entity.ts';

type Named = (id: string) => PersonRef;

export function checkReply(
  context: RevisionContext,
  check: CheckRecordEntity,
  named: Named,
): CheckRecord {
  const { savedAtMs, overdriveFactor, method, note, reason, justifications, read } = check;
  return {
    ...{ savedAtMs, overdriveFactor, method, note, reason, justifications, read },
    checker: named(check.checkerId),
    difference: figureDifference(check, context.revision.evaluation.criteria),
    missing: missingInCheck(context),
  };
}

export function findingReplies(
  findings: readonly FindingEntity[],
  events: readonly FindingEventEntity[],
  named: Named,
): ReviewFinding[] {
  return findings.map(({ id, number, subjectKind, subjectId, title, state }) => ({
    ...{ id, number, title, state },
    subject: { kind: subjectKind, id: subjectId },
    history: events
      .filter(({ findingId }) => findingId === id)
      .map(({ act, atMs, personId, text }) => ({ act, atMs, text, by: named(personId) })),
  }));
}
