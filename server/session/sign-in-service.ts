import type { EntityManager } from 'typeorm';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { ApiError } from '../http/api-error.ts';
import type { Limits } from '../http/limits.ts';
import type { Database } from '../persistence/database.ts';
import { PersonEntity } from '../users/person-entity.ts';
import type { PasswordHash } from './password-hash.ts';
import { SignInThrottle } from './sign-in-throttle.ts';

/** Decides whether somebody is who they say; knows nothing of cookies. */
export class SignInService {
  readonly #throttle: SignInThrottle;

  constructor(
    private readonly database: Database,
    private readonly hashes: PasswordHash,
    private readonly limits: Limits,
  ) {
    this.#throttle = new SignInThrottle(limits);
  }

  /**
   * The person with this address and password. Wrong address, wrong password, disabled account and too many
   * misses in a row are told apart neither by the answer nor by the time it takes.
   *
   * @param address of the caller, for throttling
   * @throws {ApiError} wrong-credentials or too-many-requests
   */
  async signIn(act: Act, email: string, password: string, address: string): Promise<Actor> {
    await this.#throttle.begin(email, address);
    const found = await this.database.read((manager) => manager.findOneBy(PersonEntity, { email }));
    const right = await this.hashes.verify(password, found?.passwordHash ?? null);
    const outdated = right && found?.passwordHash && this.hashes.isOutdated(found.passwordHash);
    const renewed = outdated ? await this.hashes.hash(password) : null;
    const actor = await this.database.transaction((manager) =>
      this.#record(manager, act, email, found, right, renewed),
    );
    if (actor === null) throw wrongCredentials();
    await this.#throttle.succeeded(email, address);
    return actor;
  }

  /**
   * The second act of signing: whether the password given just now is the person's own. Call it outside of any
   * transaction: hashing takes its time.
   *
   * @throws {ApiError} wrong-credentials or too-many-requests
   */
  async verifyPassword(personId: string, password: string, address: string): Promise<void> {
    const key = `verify:${personId}`;
    await this.#throttle.begin(key, address);
    const person = await this.database.read((m) => m.findOneBy(PersonEntity, { id: personId }));
    if (!(await this.hashes.verify(password, person?.passwordHash ?? null))) {
      throw new ApiError('wrong-credentials', 'The password is not right.');
    }
    await this.#throttle.succeeded(key, address);
  }

  async #record(
    manager: EntityManager,
    act: Act,
    email: string,
    found: PersonEntity | null,
    right: boolean,
    renewedHash: string | null,
  ): Promise<Actor | null> {
    // read again: the account may have changed while the password was hashed
    const person = found && (await manager.findOneBy(PersonEntity, { id: found.id }));
    const same = person?.passwordHash === found?.passwordHash;
    const open = person && person.failedSignIns < this.limits.signInFailuresInARow;
    const admitted = right && same && open && person.state === 'active' && person.email === email;
    if (!person) {
      await recordAudit(manager, act, failure('', 'an unknown account'));
      return null;
    }
    if (!admitted) {
      // not by the ORM, which would count the version up: guessing must not spoil an administrator's edit
      await manager.query(`UPDATE person SET failed_sign_ins = failed_sign_ins + 1 WHERE id = ?`, [
        person.id,
      ]);
      await recordAudit(manager, act, failure(person.id, person.name));
      return null;
    }
    await manager.update(PersonEntity, person.id, {
      failedSignIns: 0,
      lastSignInAtMs: act.atMs,
      ...(renewedHash && { passwordHash: renewedHash }),
    });
    const actor = actorOf(person);
    await recordAudit(manager, { ...act, actor }, success(person));
    return actor;
  }
}

export function actorOf({ id, name, email, administrator }: PersonEntity): Actor {
  return { id, name, email, administrator };
}

function wrongCredentials(): ApiError {
  return new ApiError('wrong-credentials', 'E-mail or password is not right.');
}

function failure(personId: string, name: string) {
  const object = { objectKind: 'person', objectId: personId, objectName: name, projectId: null };
  return {
    action: 'session.refused',
    ...object,
    summary: `failed to sign in as ${name}`,
    detail: {},
  };
}

function success({ id, name }: PersonEntity) {
  const object = { objectKind: 'person', objectId: id, objectName: name, projectId: null };
  return { action: 'session.started', ...object, summary: 'signed in', detail: {} };
}
