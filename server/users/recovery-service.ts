import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { passwordChanged, passwordReset } from '../mail/letters.ts';
import type { Outbox } from '../mail/outbox.ts';
import { queueLetter } from '../mail/queue-letter.ts';
import type { Database } from '../persistence/database.ts';
import type { PasswordHash } from '../session/password-hash.ts';
import { actorOf } from '../session/sign-in-service.ts';
import { endSessions } from './end-sessions.ts';
import { deadLink, findToken, issueToken, useToken } from './one-time-tokens.ts';
import { ownWordsOf } from './own-words.ts';
import { requireGoodPassword } from './password-rules.ts';
import { personAudit } from './person-audit.ts';
import { PersonEntity } from './person-entity.ts';
import { setPassword } from './set-password.ts';

/** Ways in for people who cannot sign in: a reset, and an invitation's first password. */
export class RecoveryService {
  constructor(
    private readonly database: Database,
    private readonly hashes: PasswordHash,
    private readonly outbox: Outbox,
    private readonly origin: string,
  ) {}

  /** Answers and takes as long alike for an address nobody has. */
  async askReset(act: Act, email: string): Promise<void> {
    await this.database.transaction(async (manager) => {
      const person = await manager.findOneBy(PersonEntity, { email });
      if (person?.state !== 'active') {
        const unknown = { id: '', name: 'an unknown account' };
        await recordAudit(
          manager,
          act,
          personAudit(unknown, 'person.reset-asked', 'asked for a reset'),
        );
        return;
      }
      const token = await issueToken(manager, 'password-reset', person, act.atMs);
      await queueLetter(manager, passwordReset(this.origin, person, token), act.atMs);
      await recordAudit(
        manager,
        act,
        personAudit(person, 'person.reset-asked', 'asked for a reset'),
      );
    });
    this.outbox.wake();
  }

  /** Sets a new password and ends every session of the person. */
  async reset(act: Act, token: string, password: string): Promise<void> {
    const passwordHash = await this.#hashFor('password-reset', act, token, password);
    await this.database.transaction(async (manager) => {
      const { person } = await useToken(manager, 'password-reset', token, act.atMs);
      if (person.state !== 'active') throw deadLink();
      await setPassword(manager, person, passwordHash);
      await endSessions(manager, person.id);
      await queueLetter(manager, passwordChanged(person), act.atMs);
      const by = { ...act, actor: actorOf(person) };
      await recordAudit(
        manager,
        by,
        personAudit(person, 'person.password-reset', 'reset the password'),
      );
    });
    this.outbox.wake();
  }

  async acceptInvitation(act: Act, token: string, password: string): Promise<void> {
    const passwordHash = await this.#hashFor('invitation', act, token, password);
    await this.database.transaction(async (manager) => {
      const { person } = await useToken(manager, 'invitation', token, act.atMs);
      if (person.state !== 'invited') throw deadLink();
      person.state = 'active';
      await setPassword(manager, person, passwordHash);
      const actor: Actor = actorOf(person);
      await recordAudit(
        manager,
        { ...act, actor },
        personAudit(person, 'person.joined', 'took up the invitation'),
      );
    });
  }

  /** Checks link and password first: a refused password does not use the link up. */
  async #hashFor(
    kind: 'password-reset' | 'invitation',
    act: Act,
    token: string,
    password: string,
  ): Promise<string> {
    const words = await this.database.read(async (manager) => {
      const found = await findToken(manager, kind, token, act.atMs);
      if (!found) throw deadLink();
      return ownWordsOf(manager, found.person);
    });
    requireGoodPassword(password, words, '/password');
    return this.hashes.hash(password);
  }
}
