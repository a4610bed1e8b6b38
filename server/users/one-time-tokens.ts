import { createHash, randomBytes } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import { ApiError } from '../http/api-error.ts';
import { OneTimeTokenEntity } from './one-time-token-entity.ts';
import { PersonEntity } from './person-entity.ts';

const TOKEN_BYTES = 32;

/** How long each kind of link lives, ms. */
const LIFE_MS: Record<OneTimeTokenEntity['kind'], number> = {
  'password-reset': 10 * 60_000,
  invitation: 24 * 3_600_000,
  'email-change': 3_600_000,
};

/** Makes a token for a link; only its hash is stored. A later link of the same kind does not void this one. */
export async function issueToken(
  manager: EntityManager,
  kind: OneTimeTokenEntity['kind'],
  person: PersonEntity,
  atMs: number,
  detail: Record<string, string> = {},
): Promise<string> {
  const token = randomBytes(TOKEN_BYTES).toString('base64url');
  await manager.insert(OneTimeTokenEntity, {
    ...{ hash: hashOf(token), kind, personId: person.id, detail },
    ...{ passwordVersion: person.passwordVersion, expiresAtMs: atMs + LIFE_MS[kind] },
  });
  return token;
}

/** The live token and its person, without using it up; null when there is none. */
export async function findToken(
  manager: EntityManager,
  kind: OneTimeTokenEntity['kind'],
  token: string,
  atMs: number,
): Promise<{ row: OneTimeTokenEntity; person: PersonEntity } | null> {
  const row = await manager.findOneBy(OneTimeTokenEntity, { hash: hashOf(token), kind });
  const person = row && (await manager.findOneBy(PersonEntity, { id: row.personId }));
  const lives = person && row.expiresAtMs > atMs && row.passwordVersion === person.passwordVersion;
  return lives ? { row, person } : null;
}

/**
 * Uses a token up.
 *
 * @throws {ApiError} invalid-input when it was used, has expired, or the password has changed since
 */
export async function useToken(
  manager: EntityManager,
  kind: OneTimeTokenEntity['kind'],
  token: string,
  atMs: number,
): Promise<{ row: OneTimeTokenEntity; person: PersonEntity }> {
  const found = await findToken(manager, kind, token, atMs);
  if (!found) throw deadLink();
  await manager.delete(OneTimeTokenEntity, { hash: found.row.hash });
  return found;
}

export function deadLink(): ApiError {
  const message = 'was used already or has expired';
  return new ApiError('invalid-input', `The link ${message}. Ask for a new one.`, {
    fields: [{ pointer: '/token', message }],
  });
}

function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
