import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type { Letter } from './letter.ts';
import { OutgoingMailEntity } from './outgoing-mail-entity.ts';

/** Puts a letter into the outbox, in the transaction of what causes it; the outbox sends it after the commit. */
export async function queueLetter(
  manager: EntityManager,
  letter: Letter,
  atMs: number,
): Promise<void> {
  await manager.insert(OutgoingMailEntity, {
    ...{ id: randomUUID(), ...letter, createdAtMs: atMs },
    ...{ attempts: 0, nextAttemptAtMs: atMs, sentAtMs: null },
  });
}
