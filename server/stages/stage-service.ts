import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { createStage, readStage, RevisionSummary } from '../../shared/contract/stage.ts';
import { revisionLetter } from '../../shared/review/revision-state.ts';
import { policyDifference } from '../../shared/stage/policy.ts';
import type { Act, Actor } from '../audit/act.ts';
import { ApiError, notFound } from '../http/api-error.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { accessProject, requireRole } from '../projects/project-access.ts';
import { expectFreeReference } from '../revisions/draft-service.ts';
import { judge } from '../revisions/judge.ts';
import { storePartLinks } from '../revisions/part-links.ts';
import { auditRevision } from '../revisions/revision-audit.ts';
import { insertRevision } from '../revisions/insert-revision.ts';
import { linesOfStage, type RevisionLine } from '../revisions/revision-line.ts';
import { answerRevision } from '../revisions/revision-reply.ts';
import { designatorsFor } from './project-designators.ts';
import { StageEntity } from './stage-entity.ts';

type Body = z.output<typeof createStage.body>;

/** Stages of a project: making them, with a definition typed or read from a file, and reading them. */
export class StageService {
  constructor(private readonly database: Database) {}

  /** The project's policy takes the place of the definition's own. */
  async create(act: Act<Actor>, projectId: string, body: Body) {
    const { definition } = body;
    const policy = await this.database.read(async (manager) => {
      const access = await accessProject(manager, act.actor, projectId);
      requireRole(access, 'designer');
      return manager.findOneByOrFail(PolicyEntity, { id: access.project.policyId });
    });
    const judged = judge(definition, policy); // before the door: pure, and not short
    const answer = await this.database.transaction(async (manager) => {
      const access = await accessProject(manager, act.actor, projectId);
      requireRole(access, 'designer');
      if (access.project.policyId !== policy.id) throw policyMoved();
      const stage = await insertStage(manager, act, projectId, definition.reference);
      const revision = await insertRevision(manager, act, judged, {
        stageId: stage.id,
        number: 0,
        previousId: null,
        designators: await designatorsFor(
          manager,
          projectId,
          stage.id,
          definition,
          body.designators ?? {},
        ),
      });
      await storePartLinks(manager, revision.id, body.parts ?? {}, judged.definition);
      await auditRevision(
        manager,
        act,
        { revision, stage },
        'stage.created',
        (name) => `created ${name}`,
        { definition: judged.definition, verdict: judged.verdict },
      );
      return answerRevision(manager, act.actor, revision.id);
    });
    return {
      body: {
        revision: answer.body,
        policyDifference: policyDifference(definition.policy, judged.definition.policy),
      },
      etag: answer.etag,
    };
  }

  read(actor: Actor, stageId: string): Promise<{ body: z.input<typeof readStage.reply> }> {
    return this.database.read(async (manager) => {
      const { stage, lines } = await openStage(manager, actor, stageId);
      const current = lines.find((line) => line.current);
      const { id, projectId, reference } = stage;
      return {
        body: {
          ...{ id, projectId, reference },
          currentRevisionId: current?.id ?? '',
          revisions: lines.map(summary),
        },
      };
    });
  }
}

export interface OpenStage {
  readonly stage: StageEntity;
  readonly lines: readonly RevisionLine[];
  readonly access: Awaited<ReturnType<typeof accessProject>>;
}

/**
 * Opens a stage to a member of its project or to an administrator.
 *
 * @throws {ApiError} not-found, alike for a foreign stage and for none
 */
export async function openStage(
  manager: EntityManager,
  actor: Actor,
  stageId: string,
): Promise<OpenStage> {
  const stage = await manager.findOneBy(StageEntity, { id: stageId });
  if (stage === null) throw notFound();
  const access = await accessProject(manager, actor, stage.projectId);
  return { stage, access, lines: await linesOfStage(manager, stageId) };
}

async function insertStage(
  manager: EntityManager,
  act: Act,
  projectId: string,
  reference: string,
): Promise<Pick<StageEntity, 'id' | 'projectId' | 'reference'>> {
  await expectFreeReference(manager, projectId, reference);
  const stage = { id: randomUUID(), projectId, reference, createdAtMs: act.atMs };
  await manager.insert(StageEntity, stage);
  return stage;
}

function summary({ id, number, savedAtMs, state, verdict }: RevisionLine): RevisionSummary {
  return { id, letter: revisionLetter(number), state, verdict, savedAtMs };
}

function policyMoved(): ApiError {
  return new ApiError(
    'version-conflict',
    'The project adopted another policy in this moment. Nothing was saved: try again.',
  );
}
