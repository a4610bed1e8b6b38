import type { EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { saveCheckRequest } from '../../shared/contract/check.ts';
import { figureDifference } from '../../shared/review/pass-conditions.ts';
import type { Act, Actor } from '../audit/act.ts';
import { invalidField } from '../http/invalid-field.ts';
import type { Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import { permit } from '../revisions/permit.ts';
import { auditRevision } from '../revisions/revision-audit.ts';
import { openRevision, roundOf, type RevisionContext } from '../revisions/revision-context.ts';
import { answerRevision, type RevisionAnswer } from '../revisions/revision-reply.ts';
import { addHand, updateRevision } from '../revisions/revision-write.ts';
import { CheckRecordEntity } from './check-record-entity.ts';

type Body = z.output<typeof saveCheckRequest.body>;

/** The checker's own figure, justifications and ticks. */
export class CheckService {
  constructor(private readonly database: Database) {}

  save(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    body: Body,
  ): Promise<RevisionAnswer> {
    return this.database.transaction(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      permit(context, 'check', ifMatch);
      expectCriteria(context, body);
      await storeCheck(manager, act, context, body);
      await addHand(manager, revisionId, act.actor.id, 'checker');
      await updateRevision(manager, context.revision);
      await auditRevision(
        manager,
        act,
        context,
        'check.saved',
        (name) => `saved the check of ${name}`,
        {
          ...body,
          difference: figureDifference(body, context.revision.evaluation.criteria),
        },
      );
      return answerRevision(manager, act.actor, revisionId);
    });
  }
}

async function storeCheck(
  manager: EntityManager,
  act: Act<Actor>,
  { moves, revision }: RevisionContext,
  body: Body,
): Promise<void> {
  const key = { revisionId: revision.id, round: roundOf(moves) };
  const fields = { ...body, checkerId: act.actor.id, savedAtMs: act.atMs };
  if (await manager.existsBy(CheckRecordEntity, key)) {
    await manager.update(CheckRecordEntity, key, fields);
  } else {
    await manager.insert(CheckRecordEntity, { ...key, ...fields });
  }
}

/** Ticks and justifications speak of criteria the stage has. */
function expectCriteria({ revision }: RevisionContext, { justifications, read }: Body): void {
  const known = new Set(revision.evaluation.criteria.map(({ id }) => id));
  for (const id of Object.keys(justifications)) {
    if (!known.has(id)) throw invalidField(`/justifications/${id}`, 'expected a criterion id');
  }
  for (const [index, id] of read.entries()) {
    if (!known.has(id)) throw invalidField(`/read/${index}`, 'expected a criterion id');
  }
}
