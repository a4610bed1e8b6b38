import type { EntityManager } from 'typeorm';
import { OneTimeTokenEntity } from './one-time-token-entity.ts';
import type { PersonEntity } from './person-entity.ts';

/** Stores a new password: links issued before it die, and the count of wrong ones begins anew. */
export async function setPassword(
  manager: EntityManager,
  person: PersonEntity,
  passwordHash: string,
): Promise<void> {
  Object.assign(person, {
    ...{ passwordHash, passwordVersion: person.passwordVersion + 1, failedSignIns: 0 },
  });
  await manager.save(person);
  await manager.delete(OneTimeTokenEntity, { personId: person.id });
}
