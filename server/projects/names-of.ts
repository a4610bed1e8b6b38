import { In, type EntityManager } from 'typeorm';
import { PersonEntity } from '../users/person-entity.ts';

/** Names of people by id, for replies. */
export async function namesOf(
  manager: EntityManager,
  ids: readonly string[],
): Promise<(id: string) => { id: string; name: string }> {
  const people = await manager.find(PersonEntity, {
    select: { id: true, name: true },
    where: { id: In([...new Set(ids)]) },
  });
  const names = new Map(people.map(({ id, name }) => [id, name]));
  return (id) => ({ id, name: names.get(id) ?? '' });
}
