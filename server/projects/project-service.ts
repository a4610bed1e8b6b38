import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { createProject, Project, saveMembers } from '../../shared/contract/project.ts';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { invalidField } from '../http/invalid-field.ts';
import { expectVersion, type Versioned } from '../http/versioned.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { judgeDrafts, storeJudgedDrafts } from '../revisions/policy-change.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { MembershipEntity } from './membership-entity.ts';
import { accessProject, projectIdsOf, requireManager } from './project-access.ts';
import { ProjectEntity } from './project-entity.ts';
import { projectReply, projectSummaries } from './project-reply.ts';

type Fields = z.output<typeof createProject.body>;
type Members = z.output<typeof saveMembers.body>['members'];

export interface ProjectAnswer {
  readonly body: z.input<typeof Project>;
  readonly etag: Versioned;
}

/** Projects, what they adopt and who does what in them. */
export class ProjectService {
  constructor(private readonly database: Database) {}

  list(actor: Actor): ReturnType<typeof projectSummaries> {
    return this.database.read(async (manager) =>
      projectSummaries(manager, actor, await projectIdsOf(manager, actor, 'visible')),
    );
  }

  read(actor: Actor, projectId: string): Promise<ProjectAnswer> {
    return this.database.read((manager) => answer(manager, actor, projectId));
  }

  create(act: Act<Actor>, fields: Fields): Promise<ProjectAnswer> {
    return this.database.transaction(async (manager) => {
      await expectPolicy(manager, fields.policyId);
      await expectFreeCode(manager, fields.code, null);
      const id = randomUUID();
      const { actor } = act;
      await manager.insert(ProjectEntity, {
        ...fields,
        ...{ id, managerId: actor.id, createdAtMs: act.atMs, version: 1 },
      });
      await manager.insert(MembershipEntity, {
        ...{ projectId: id, personId: actor.id, roles: ['designer'] },
      });
      await recordAudit(manager, act, {
        action: 'project.created',
        ...audited({ id, code: fields.code }),
        summary: `created project ${fields.code}`,
        detail: { ...fields },
      });
      return answer(manager, actor, id);
    });
  }

  /** Stores the fields; under another policy every draft is judged anew in the same transaction. */
  async save(
    act: Act<Actor>,
    projectId: string,
    ifMatch: Versioned,
    fields: Fields,
  ): Promise<ProjectAnswer> {
    const judged = await judgeDrafts(this.database, act.actor, projectId, fields.policyId);
    return this.database.transaction(async (manager) => {
      const { project, ...access } = await accessProject(manager, act.actor, projectId);
      requireManager({ project, ...access });
      expectVersion(ifMatch, project);
      const policy = await expectPolicy(manager, fields.policyId);
      await expectFreeCode(manager, fields.code, projectId);
      await manager.update(
        ProjectEntity,
        { id: projectId },
        { ...fields, version: project.version + 1 },
      );
      const changed = changes(project, fields);
      if ('policyId' in changed) await storeJudgedDrafts(manager, projectId, policy, judged);
      await recordAudit(manager, act, {
        action: 'project.changed',
        ...audited({ id: projectId, code: fields.code }),
        summary: `changed project ${fields.code}`,
        detail: changed,
      });
      return answer(manager, act.actor, projectId);
    });
  }

  saveMembers(
    act: Act<Actor>,
    projectId: string,
    ifMatch: Versioned,
    members: Members,
  ): Promise<ProjectAnswer> {
    return this.database.transaction(async (manager) => {
      const access = await accessProject(manager, act.actor, projectId);
      requireManager(access);
      const { project } = access;
      expectVersion(ifMatch, project);
      const before = await manager.findBy(MembershipEntity, { projectId });
      await expectPeople(manager, members, before);
      await manager.delete(MembershipEntity, { projectId });
      for (const { personId, roles } of members) {
        await manager.insert(MembershipEntity, { projectId, personId, roles: [...new Set(roles)] });
      }
      await manager.update(ProjectEntity, { id: projectId }, { version: project.version + 1 });
      await recordAudit(manager, act, {
        action: 'project.members-changed',
        ...audited(project),
        summary: `changed the members of ${project.code}`,
        detail: { old: before.map(({ personId, roles }) => ({ personId, roles })), new: members },
      });
      return answer(manager, act.actor, projectId);
    });
  }
}

async function answer(
  manager: EntityManager,
  actor: Actor,
  projectId: string,
): Promise<ProjectAnswer> {
  const access = await accessProject(manager, actor, projectId);
  return { body: await projectReply(manager, access), etag: access.project };
}

function audited({ id, code }: { id: string; code: string }) {
  return { objectKind: 'project', objectId: id, objectName: code, projectId: id };
}

/** Old and new value of each field that differs. */
function changes(project: ProjectEntity, fields: Fields): Record<string, unknown> {
  return Object.fromEntries(
    (Object.keys(fields) as (keyof Fields)[])
      .filter((key) => project[key] !== fields[key])
      .map((key) => [key, { old: project[key], new: fields[key] }]),
  );
}

async function expectPolicy(manager: EntityManager, id: string): Promise<PolicyEntity> {
  const policy = await manager.findOneBy(PolicyEntity, { id });
  if (policy === null) throw invalidField('/policyId', 'expected a policy of the list');
  return policy;
}

async function expectFreeCode(
  manager: EntityManager,
  code: string,
  ownId: string | null,
): Promise<void> {
  const taken = await manager.findOneBy(ProjectEntity, { code });
  if (taken !== null && taken.id !== ownId) {
    throw invalidField('/code', `expected a code no other project has; ${code} is taken`);
  }
}

/** A member whose account was disabled may stay on the list. */
async function expectPeople(
  manager: EntityManager,
  members: Members,
  before: readonly MembershipEntity[],
): Promise<void> {
  const seen = new Set<string>();
  for (const [index, { personId }] of members.entries()) {
    const person = await manager.findOneBy(PersonEntity, { id: personId });
    const pointer = `/members/${index}/personId`;
    const stays = before.some((member) => member.personId === personId);
    if (person === null || (person.state === 'disabled' && !stays)) {
      throw invalidField(pointer, 'expected a person whose account is not disabled');
    }
    if (seen.has(personId)) throw invalidField(pointer, 'expected each person once');
    seen.add(personId);
  }
}
