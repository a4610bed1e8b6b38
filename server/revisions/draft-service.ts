import type * as z from 'zod';
import type { saveRevision } from '../../shared/contract/revision.ts';
import type { Act, Actor } from '../audit/act.ts';
import { invalidField } from '../http/invalid-field.ts';
import type { Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { designatorsFor } from '../stages/project-designators.ts';
import { StageEntity } from '../stages/stage-entity.ts';
import type { EntityManager } from 'typeorm';
import { columnsOf, judge } from './judge.ts';
import { storePartLinks } from './part-links.ts';
import { permit } from './permit.ts';
import { auditRevision } from './revision-audit.ts';
import { openRevision, type RevisionContext } from './revision-context.ts';
import { answerRevision, type RevisionAnswer } from './revision-reply.ts';
import { addHand, updateRevision } from './revision-write.ts';

type Body = z.output<typeof saveRevision.body>;

/** Reading revisions and saving drafts. */
export class DraftService {
  constructor(private readonly database: Database) {}

  read(actor: Actor, revisionId: string): Promise<RevisionAnswer> {
    return this.database.read((manager) => answerRevision(manager, actor, revisionId));
  }

  /** Stores the definition together with its fresh result under the project's policy, or nothing. */
  async save(
    act: Act<Actor>,
    revisionId: string,
    ifMatch: Versioned,
    { definition, designators, parts }: Body,
  ): Promise<RevisionAnswer> {
    const policy = await this.database.read(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      permit(context, 'save', ifMatch); // spares the engine what would be refused anyway
      const { policyId } = context.access.project;
      return manager.findOneByOrFail(PolicyEntity, { id: policyId });
    });
    const judged = judge(definition, policy); // before the door: pure, and not short
    return this.database.transaction(async (manager) => {
      const context = await openRevision(manager, act.actor, revisionId);
      permit(context, 'save', ifMatch); // adopting another policy moves the version on
      await rename(manager, context, definition.reference);
      await storePartLinks(manager, revisionId, parts, judged.definition);
      const { stage, revision } = context;
      await updateRevision(manager, revision, {
        ...columnsOf(judged),
        designators: await designatorsFor(
          manager,
          stage.projectId,
          stage.id,
          definition,
          designators,
        ),
        savedAtMs: act.atMs,
      });
      await addHand(manager, revisionId, act.actor.id, 'author');
      await auditRevision(manager, act, context, 'revision.saved', (name) => `saved ${name}`, {
        verdict: judged.verdict,
        old: { definition: revision.definition, designators: revision.designators },
        new: { definition: judged.definition, designators },
      });
      return answerRevision(manager, act.actor, revisionId);
    });
  }
}

/** The reference belongs to the stage: it may change until a revision is locked. */
async function rename(
  manager: EntityManager,
  { lines, stage }: RevisionContext,
  reference: string,
): Promise<void> {
  if (reference === stage.reference) return;
  if (lines.some(({ state }) => state === 'locked' || state === 'superseded')) {
    throw invalidField(
      '/definition/reference',
      `expected ${stage.reference}: a stage with a locked revision keeps its designator`,
    );
  }
  await expectFreeReference(manager, stage.projectId, reference);
  await manager.update(StageEntity, { id: stage.id }, { reference });
  stage.reference = reference;
}

/** @throws {ApiError} invalid-input when another stage of the project has the reference */
export async function expectFreeReference(
  manager: EntityManager,
  projectId: string,
  reference: string,
): Promise<void> {
  if (await manager.existsBy(StageEntity, { projectId, reference })) {
    throw invalidField(
      '/definition/reference',
      `expected a designator that is free in this project; ${reference} is taken`,
    );
  }
}
