import { type EntityManager, Not } from 'typeorm';
import { SessionEntity } from '../session/session-entity.ts';

/** Ends a person's sessions in the transaction of what makes them end; the next request with one is signed out. */
export async function endSessions(
  manager: EntityManager,
  personId: string,
  exceptIdHash?: string,
): Promise<void> {
  const kept = exceptIdHash === undefined ? {} : { idHash: Not(exceptIdHash) };
  await manager.delete(SessionEntity, { personId, ...kept });
}
