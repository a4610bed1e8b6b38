import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { raiseFindingRequest } from '../../shared/contract/check.ts';
import type { ReviewAction } from '../../shared/review/permission.ts';
import type { Act, Actor } from '../audit/act.ts';
import { ApiError, notFound } from '../http/api-error.ts';
import { invalidField } from '../http/invalid-field.ts';
import type { Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import { permit } from '../revisions/permit.ts';
import { auditRevision } from '../revisions/revision-audit.ts';
import { openRevision, type RevisionContext } from '../revisions/revision-context.ts';
import { answerRevision, type RevisionAnswer } from '../revisions/revision-reply.ts';
import { addHand, updateRevision } from '../revisions/revision-write.ts';
import { FindingEntity } from './finding-entity.ts';
import { FindingEventEntity } from './finding-event-entity.ts';

type Raised = z.output<typeof raiseFindingRequest.body>;

/** What may be said to a finding: by whom, from which states, and what it becomes. */
const ACTS = {
  answered: { action: 'answer', hand: 'author', from: ['open'], to: 'answered' },
  closed: { action: 'close', hand: 'checker', from: ['open', 'answered'], to: 'closed' },
  reopened: { action: 'close', hand: 'checker', from: ['answered', 'closed'], to: 'open' },
} as const satisfies Record<
  string,
  {
    action: ReviewAction;
    hand: 'author' | 'checker';
    from: readonly FindingEntity['state'][];
    to: FindingEntity['state'];
  }
>;

const TOLD = { answered: 'answered', closed: 'closed', reopened: 'kept open' } as const;

/** Findings of a check: raised and closed by checkers, answered by designers. */
export class FindingService {
  constructor(private readonly database: Database) {}

  raise(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    { subject, text, title }: Raised,
  ): Promise<RevisionAnswer> {
    return this.#change(act, revisionId, ifMatch, 'check', async (manager, context) => {
      expectSubject(context, subject);
      const id = randomUUID();
      const number = context.findings.length + 1;
      await manager.insert(FindingEntity, {
        ...{ id, revisionId, number, title, state: 'open' },
        ...{ subjectKind: subject.kind, subjectId: subject.id },
      });
      await say(manager, act, id, 'raised', text);
      await addHand(manager, revisionId, act.actor.id, 'checker');
      await auditRevision(
        manager,
        act,
        context,
        'finding.raised',
        (name) => `raised finding ${number} on ${name}`,
        { number, subject, title, text },
      );
    });
  }

  say(
    act: Act<Actor>,
    { findingId, revisionId }: { readonly findingId: string; readonly revisionId: string },
    ifMatch: Versioned,
    said: keyof typeof ACTS,
    text: string,
  ): Promise<RevisionAnswer> {
    const rule = ACTS[said];
    return this.#change(act, revisionId, ifMatch, rule.action, async (manager, context) => {
      const finding = context.findings.find(({ id }) => id === findingId);
      if (finding === undefined) throw notFound();
      if (!(rule.from as readonly string[]).includes(finding.state)) {
        throw new ApiError('conflict', `Finding ${finding.number} is ${finding.state}.`);
      }
      await say(manager, act, findingId, said, text);
      await manager.update(FindingEntity, { id: findingId }, { state: rule.to });
      await addHand(manager, revisionId, act.actor.id, rule.hand);
      await auditRevision(
        manager,
        act,
        context,
        `finding.${said}`,
        (name) => `${TOLD[said]} finding ${finding.number} on ${name}`,
        { number: finding.number, text },
      );
    });
  }

  #change(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    action: ReviewAction,
    work: (manager: EntityManager, context: RevisionContext) => Promise<void>,
  ): Promise<RevisionAnswer> {
    return this.database.transaction(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      permit(context, action, ifMatch);
      await work(manager, context);
      await updateRevision(manager, context.revision);
      return answerRevision(manager, act.actor, revisionId);
    });
  }
}

async function say(
  manager: EntityManager,
  act: Act<Actor>,
  findingId: string,
  said: FindingEventEntity['act'],
  text: string,
): Promise<void> {
  const sequence = (await manager.countBy(FindingEventEntity, { findingId })) + 1;
  await manager.insert(FindingEventEntity, {
    ...{ findingId, sequence, act: said, text },
    ...{ personId: act.actor.id, atMs: act.atMs },
  });
}

/** A finding is about a criterion the stage has, or a field of its definition. */
function expectSubject({ revision }: RevisionContext, { id, kind }: Raised['subject']): void {
  const found =
    kind === 'criterion'
      ? revision.evaluation.criteria.some((criterion) => criterion.id === id)
      : hasPath(revision.definition, id.split('.'));
  if (!found) throw invalidField('/subject/id', `expected a ${kind} of this stage`);
}

function hasPath(value: unknown, path: readonly string[]): boolean {
  const [key, ...rest] = path;
  if (key === undefined) return true;
  if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return false;
  return hasPath((value as Record<string, unknown>)[key], rest);
}
