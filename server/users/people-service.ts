import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { ApiError, notFound } from '../http/api-error.ts';
import { expectVersion, type Versioned } from '../http/versioned.ts';
import { invitation } from '../mail/letters.ts';
import type { Outbox } from '../mail/outbox.ts';
import { queueLetter } from '../mail/queue-letter.ts';
import type { Database } from '../persistence/database.ts';
import { endSessions } from './end-sessions.ts';
import { issueToken } from './one-time-tokens.ts';
import { personAudit } from './person-audit.ts';
import { PersonEntity } from './person-entity.ts';
import { WorkspaceEntity } from './workspace-entity.ts';

export interface PersonChanges {
  readonly name?: string | undefined;
  readonly administrator?: boolean | undefined;
  readonly disabled?: boolean | undefined;
}

/** Accounts as the administrator handles them. */
export class PeopleService {
  constructor(
    private readonly database: Database,
    private readonly outbox: Outbox,
    private readonly origin: string,
  ) {}

  list(): Promise<PersonEntity[]> {
    return this.database.read((manager) =>
      manager.find(PersonEntity, { order: { name: 'ASC', email: 'ASC' } }),
    );
  }

  /** Whom one may put on a project. */
  colleagues(): Promise<PersonEntity[]> {
    return this.database.read((manager) =>
      manager.find(PersonEntity, { where: { state: 'active' }, order: { name: 'ASC' } }),
    );
  }

  read(id: string): Promise<PersonEntity> {
    return this.database.read((manager) => existing(manager, id));
  }

  /** @throws {ApiError} conflict when the address has an account already */
  async invite(
    act: Act<Actor>,
    wish: Pick<PersonEntity, 'name' | 'email' | 'administrator'>,
  ): Promise<PersonEntity> {
    const invited = await this.database.transaction(async (manager) => {
      if (await manager.existsBy(PersonEntity, { email: wish.email })) {
        throw new ApiError('conflict', `${wish.email} has an account already.`, {
          fields: [{ pointer: '/email', message: 'has an account already' }],
        });
      }
      const person = await manager.save(
        manager.create(PersonEntity, {
          ...{ ...wish, id: randomUUID(), state: 'invited', passwordHash: null },
          ...{ passwordVersion: 0, failedSignIns: 0, createdAtMs: act.atMs, lastSignInAtMs: null },
        }),
      );
      await this.#mailInvitation(manager, person, act.atMs);
      const { email, administrator } = person;
      await recordAudit(
        manager,
        act,
        personAudit(person, 'person.invited', `invited ${person.name}`, { email, administrator }),
      );
      return person;
    });
    this.outbox.wake();
    return invited;
  }

  /**
   * A new link for somebody who let the first one expire; an older one that still lives goes on doing so.
   *
   * @throws {ApiError} conflict when the person has an account in use, or is disabled
   */
  async inviteAgain(act: Act<Actor>, id: string): Promise<void> {
    await this.database.transaction(async (manager) => {
      const person = await existing(manager, id);
      if (person.state !== 'invited') {
        throw new ApiError('conflict', `${person.name} has no invitation to take up.`);
      }
      await this.#mailInvitation(manager, person, act.atMs);
      const summary = `invited ${person.name} again`;
      const { email } = person;
      await recordAudit(
        manager,
        act,
        personAudit(person, 'person.invited-again', summary, { email }),
      );
    });
    this.outbox.wake();
  }

  /** A person disabled, or with other rights, has to sign in anew. */
  change(
    act: Act<Actor>,
    id: string,
    ifMatch: Versioned,
    changes: PersonChanges,
  ): Promise<PersonEntity> {
    return this.database.transaction(async (manager) => {
      const person = await existing(manager, id);
      expectVersion(ifMatch, person);
      const before = describe(person);
      person.name = changes.name ?? person.name;
      person.administrator = changes.administrator ?? person.administrator;
      if (changes.disabled !== undefined) person.state = stateWhen(changes.disabled, person);
      await requireAdministrator(manager, person);
      const saved = await manager.save(person);
      const after = describe(saved);
      if (before.state !== after.state || before.administrator !== after.administrator) {
        await endSessions(manager, id);
      }
      const summary = `changed the account of ${saved.name}`;
      await recordAudit(
        manager,
        act,
        personAudit(saved, 'person.changed', summary, { before, after }),
      );
      return saved;
    });
  }

  async endSessionsOf(act: Act<Actor>, id: string): Promise<void> {
    await this.database.transaction(async (manager) => {
      const person = await existing(manager, id);
      await endSessions(manager, id);
      const summary = `ended all sessions of ${person.name}`;
      await recordAudit(manager, act, personAudit(person, 'session.ended', summary));
    });
  }

  async #mailInvitation(manager: EntityManager, person: PersonEntity, atMs: number): Promise<void> {
    const token = await issueToken(manager, 'invitation', person, atMs);
    const workspace = await manager.findOneBy(WorkspaceEntity, { id: 1 });
    const letter = invitation(this.origin, person, workspace?.name ?? '', token);
    await queueLetter(manager, letter, atMs);
  }
}

async function existing(manager: EntityManager, id: string): Promise<PersonEntity> {
  const person = await manager.findOneBy(PersonEntity, { id });
  if (!person) throw notFound();
  return person;
}

/** Enabling gives back what the account was: invited people still have no password. */
function stateWhen(disabled: boolean, { passwordHash }: PersonEntity): PersonEntity['state'] {
  if (disabled) return 'disabled';
  return passwordHash === null ? 'invited' : 'active';
}

/** @throws {ApiError} conflict when nobody would be left to administrate */
async function requireAdministrator(manager: EntityManager, changed: PersonEntity): Promise<void> {
  if (changed.administrator && changed.state === 'active') return;
  const others = await manager.findBy(PersonEntity, { administrator: true, state: 'active' });
  if (others.some(({ id }) => id !== changed.id)) return;
  throw new ApiError('conflict', 'Somebody has to stay administrator.');
}

function describe({ name, administrator, state }: PersonEntity) {
  return { name, administrator, state };
}
