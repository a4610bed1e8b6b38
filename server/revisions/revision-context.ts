import type { EntityManager } from 'typeorm';
import { type PortVerdict, portVerdicts } from '../../shared/checks/port-current.ts';
import type { RevisionPeople } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { CheckRecordEntity } from '../checks/check-record-entity.ts';
import { FindingEntity } from '../checks/finding-entity.ts';
import { notFound } from '../http/api-error.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { accessProject, type ProjectAccess } from '../projects/project-access.ts';
import { StageEntity } from '../stages/stage-entity.ts';
import { type RevisionPartStanding, standingOfRevision } from './part-standing.ts';
import { RevisionEntity } from './revision-entity.ts';
import { linesOfPort, linesOfStage, type RevisionLine } from './revision-line.ts';
import { RevisionMoveEntity } from './revision-move-entity.ts';
import { RevisionPersonEntity } from './revision-person-entity.ts';

/** A revision with everything its rules and its reply need, read in one transaction. */
export interface RevisionContext {
  readonly actor: Actor;
  readonly access: ProjectAccess;
  readonly stage: StageEntity;
  readonly revision: RevisionEntity;
  readonly policy: PolicyEntity;
  /** All revisions of the stage, oldest first. */
  readonly lines: readonly RevisionLine[];
  readonly people: RevisionPeople;
  /** Oldest first. */
  readonly moves: readonly RevisionMoveEntity[];
  /** Of the latest submission. */
  readonly check: CheckRecordEntity | null;
  readonly findings: readonly FindingEntity[];
  readonly standing: readonly RevisionPartStanding[];
  /** The port of the stage's pin, with this revision counted among the project's; null where it names none. */
  readonly port: PortVerdict | null;
}

/**
 * Opens a revision to a member of its project or to an administrator.
 *
 * @throws {ApiError} not-found, alike for a foreign revision and for none
 */
export async function openRevision(
  manager: EntityManager,
  actor: Actor,
  revisionId: string,
): Promise<RevisionContext> {
  const revision = await manager.findOneBy(RevisionEntity, { id: revisionId });
  if (revision === null) throw notFound();
  const stage = await manager.findOneByOrFail(StageEntity, { id: revision.stageId });
  const access = await accessProject(manager, actor, stage.projectId);
  const hands = await manager.findBy(RevisionPersonEntity, { revisionId });
  const moves = await manager.find(RevisionMoveEntity, {
    where: { revisionId },
    order: { sequence: 'ASC' },
  });
  return {
    ...{ actor, access, stage, revision, moves },
    policy: await manager.findOneByOrFail(PolicyEntity, { id: revision.policyId }),
    lines: await linesOfStage(manager, stage.id),
    people: { authors: peopleOf(hands, 'author'), checkers: peopleOf(hands, 'checker') },
    check: await manager.findOneBy(CheckRecordEntity, { revisionId, round: roundOf(moves) }),
    findings: await manager.find(FindingEntity, {
      where: { revisionId },
      order: { number: 'ASC' },
    }),
    standing: await standingOfRevision(manager, revisionId),
    port: await portOf(manager, access, revision),
  };
}

async function portOf(
  manager: EntityManager,
  { project }: ProjectAccess,
  revision: RevisionEntity,
): Promise<PortVerdict | null> {
  const { port, stageId } = revision;
  if (port === null) return null;
  const others = (await linesOfPort(manager, project.id, port)).filter(
    (line) =>
      line.current && line.port === port && line.state !== 'withdrawn' && line.stageId !== stageId,
  );
  const { limits } = await manager.findOneByOrFail(PolicyEntity, { id: project.policyId });
  const [verdict] = portVerdicts([...others, revision], limits.marginalBand);
  return verdict ?? null;
}

/** How often a revision was submitted. */
export function roundOf(moves: readonly RevisionMoveEntity[]): number {
  return moves.filter(({ move }) => move === 'submit').length;
}

/** This revision among those of its stage. */
export function ownLine({ lines, revision }: RevisionContext): RevisionLine {
  const line = lines.find(({ id }) => id === revision.id);
  if (line === undefined) throw new Error(`revision ${revision.id} is not one of its stage`);
  return line;
}

function peopleOf(
  hands: readonly RevisionPersonEntity[],
  hand: RevisionPersonEntity['hand'],
): string[] {
  return hands.filter((row) => row.hand === hand).map(({ personId }) => personId);
}
