import type { EntityManager } from 'typeorm';
import { ProjectEntity } from '../projects/project-entity.ts';
import type { PersonEntity } from './person-entity.ts';
import { WorkspaceEntity } from './workspace-entity.ts';

/** What others know a person by and see every day: no part of a password's strength. */
export async function ownWordsOf(
  manager: EntityManager,
  person: Pick<PersonEntity, 'name' | 'email'>,
): Promise<string[]> {
  const workspace = await manager.findOneBy(WorkspaceEntity, { id: 1 });
  const projects = await manager.find(ProjectEntity, { select: { id: true, code: true } });
  return [person.name, person.email, workspace?.name ?? '', ...projects.map(({ code }) => code)];
}
