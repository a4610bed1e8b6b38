import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { ApiError, notFound } from '../http/api-error.ts';
import { emailChange, passwordChanged } from '../mail/letters.ts';
import type { Outbox } from '../mail/outbox.ts';
import { queueLetter } from '../mail/queue-letter.ts';
import type { Database } from '../persistence/database.ts';
import type { PasswordHash } from '../session/password-hash.ts';
import { SessionEntity } from '../session/session-entity.ts';
import type { SignInService } from '../session/sign-in-service.ts';
import { endSessions } from './end-sessions.ts';
import { OneTimeTokenEntity } from './one-time-token-entity.ts';
import { issueToken, useToken } from './one-time-tokens.ts';
import { ownWordsOf } from './own-words.ts';
import { requireGoodPassword } from './password-rules.ts';
import { personAudit } from './person-audit.ts';
import { PersonEntity } from './person-entity.ts';
import { setPassword } from './set-password.ts';

/** What people do with their own account while signed in. */
export class AccountService {
  constructor(
    private readonly database: Database,
    private readonly hashes: PasswordHash,
    private readonly signIns: SignInService,
    private readonly outbox: Outbox,
    private readonly origin: string,
  ) {}

  /** Ends all other sessions; mails a notice. */
  async changePassword(
    act: Act<Actor>,
    passwords: { readonly current: string; readonly next: string },
    address: string,
    sessionIdHash: string,
  ): Promise<void> {
    await this.#requirePassword(act.actor.id, passwords.current, address, '/current');
    const words = await this.database.read((manager) => ownWordsOf(manager, act.actor));
    requireGoodPassword(passwords.next, words, '/next');
    const passwordHash = await this.hashes.hash(passwords.next);
    await this.database.transaction(async (manager) => {
      const person = await ownRow(manager, act.actor);
      await setPassword(manager, person, passwordHash);
      await endSessions(manager, person.id, sessionIdHash);
      await queueLetter(manager, passwordChanged(person), act.atMs);
      await recordAudit(
        manager,
        act,
        personAudit(person, 'person.password-changed', 'changed the password'),
      );
    });
    this.outbox.wake();
  }

  listSessions(act: Act<Actor>): Promise<SessionEntity[]> {
    return this.database.read((manager) =>
      manager.find(SessionEntity, {
        where: { personId: act.actor.id },
        order: { lastSeenAtMs: 'DESC' },
      }),
    );
  }

  /** @throws {ApiError} not-found, also for a session of somebody else */
  async endSession(act: Act<Actor>, publicId: string): Promise<void> {
    await this.database.transaction(async (manager) => {
      const person = await ownRow(manager, act.actor);
      const { affected } = await manager.delete(SessionEntity, { publicId, personId: person.id });
      if (!affected) throw notFound();
      await recordAudit(
        manager,
        act,
        personAudit(person, 'session.ended', 'ended a session of their own'),
      );
    });
  }

  /** Mails a link to the old and to the new address; nothing changes before both are opened. */
  async askEmailChange(
    act: Act<Actor>,
    wish: { readonly password: string; readonly email: string },
    address: string,
  ): Promise<void> {
    await this.#requirePassword(act.actor.id, wish.password, address, '/password');
    await this.database.transaction(async (manager) => {
      const person = await ownRow(manager, act.actor);
      const detail = { changeId: randomUUID(), email: wish.email };
      // an address somebody else has is answered alike, but gets no mail
      if (!(await manager.existsBy(PersonEntity, { email: wish.email }))) {
        for (const email of [person.email, wish.email]) {
          const token = await issueToken(manager, 'email-change', person, act.atMs, detail);
          const to = { name: person.name, email };
          await queueLetter(manager, emailChange(this.origin, to, wish.email, token), act.atMs);
        }
      }
      await recordAudit(
        manager,
        act,
        personAudit(person, 'person.email-change-asked', 'asked to change the e-mail address', {
          ...{ from: person.email, to: wish.email },
        }),
      );
    });
    this.outbox.wake();
  }

  /** @returns whether the address has changed, which the second of the two links does */
  async confirmEmailChange(act: Act, token: string): Promise<boolean> {
    return this.database.transaction(async (manager) => {
      const { row, person } = await useToken(manager, 'email-change', token, act.atMs);
      const { changeId, email } = row.detail as { changeId: string; email: string };
      const others = await manager.findBy(OneTimeTokenEntity, {
        ...{ personId: person.id, kind: 'email-change' as const },
      });
      const whole = !others.some(({ detail }) => detail['changeId'] === changeId);
      if (whole && (await manager.existsBy(PersonEntity, { email }))) {
        throw new ApiError('conflict', 'The new address belongs to another account.');
      }
      const from = person.email;
      if (whole) await manager.save(Object.assign(person, { email }));
      await recordAudit(
        manager,
        act,
        whole
          ? personAudit(person, 'person.email-changed', 'changed the e-mail address', {
              from,
              to: email,
            })
          : personAudit(
              person,
              'person.email-change-confirmed',
              'confirmed one of the two addresses',
            ),
      );
      return whole;
    });
  }

  async #requirePassword(
    personId: string,
    password: string,
    address: string,
    pointer: string,
  ): Promise<void> {
    try {
      await this.signIns.verifyPassword(personId, password, address);
    } catch (error) {
      if (!(error instanceof ApiError) || error.code !== 'wrong-credentials') throw error;
      // signed in already: a 401 would say otherwise
      const message = 'is not the current password';
      throw new ApiError('invalid-input', `${pointer}: ${message}`, {
        fields: [{ pointer, message }],
      });
    }
  }
}

async function ownRow(manager: EntityManager, actor: Actor): Promise<PersonEntity> {
  return manager.findOneByOrFail(PersonEntity, { id: actor.id });
}
