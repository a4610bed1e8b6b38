import { createHash, randomBytes, randomUUID, timingSafeEqual } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { ApiError } from '../http/api-error.ts';
import type { Database } from '../persistence/database.ts';
import type { PasswordHash } from '../session/password-hash.ts';
import { actorOf } from '../session/sign-in-service.ts';
import { requireGoodPassword } from './password-rules.ts';
import { PersonEntity } from './person-entity.ts';
import { WorkspaceEntity } from './workspace-entity.ts';

export interface SetUpInput {
  readonly code: string;
  readonly workspace: string;
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/** Makes the first administrator, for whoever holds the code printed at start. */
export class SetupService {
  #codeHash: Buffer | null = null;

  constructor(
    private readonly database: Database,
    private readonly hashes: PasswordHash,
  ) {}

  isNeeded(): Promise<boolean> {
    return this.database.read(isEmpty);
  }

  /** The firm's name, shown before sign-in. */
  async workspaceName(): Promise<string> {
    const row = await this.database.read((m) => m.findOneBy(WorkspaceEntity, { id: 1 }));
    return row?.name ?? '';
  }

  /** A new code, to be printed; only its hash is kept, and only as long as the process runs. */
  issueCode(): string {
    const code = randomBytes(15).toString('hex').toUpperCase().match(/.{5}/g)?.join('-') ?? '';
    this.#codeHash = sha256(code);
    return code;
  }

  /**
   * @throws {ApiError} conflict once somebody exists; not-permitted for a wrong code; invalid-input for a weak
   * password
   */
  async setUp(act: Act, input: SetUpInput): Promise<Actor> {
    if (!(await this.isNeeded())) throw done();
    this.#requireCode(input.code);
    requireGoodPassword(input.password, [input.name, input.email, input.workspace], '/password');
    const passwordHash = await this.hashes.hash(input.password);
    const first = await this.database.transaction(async (manager) => {
      if (!(await isEmpty(manager))) throw done();
      await manager.save(manager.create(WorkspaceEntity, { id: 1, name: input.workspace }));
      const person = await manager.save(
        manager.create(PersonEntity, {
          ...{ id: randomUUID(), name: input.name, email: input.email, passwordHash },
          ...{ administrator: true, state: 'active', passwordVersion: 1, failedSignIns: 0 },
          ...{ createdAtMs: act.atMs, lastSignInAtMs: act.atMs },
        }),
      );
      const actor = actorOf(person);
      await recordAudit(
        manager,
        { ...act, actor },
        {
          ...{ action: 'workspace.set-up', objectKind: 'person', objectId: person.id },
          ...{ objectName: person.name, projectId: null },
          ...{ summary: 'set up the workspace and became its administrator' },
          detail: { workspace: input.workspace, email: person.email },
        },
      );
      return actor;
    });
    this.#codeHash = null; // only now: a code whose set-up was not stored must work again
    return first;
  }

  #requireCode(code: string): void {
    const given = sha256(code.trim().toUpperCase());
    if (this.#codeHash === null || !timingSafeEqual(given, this.#codeHash)) {
      throw new ApiError('not-permitted', 'The code is not the one the server printed.', {
        rule: 'setup-code',
        fields: [{ pointer: '/code', message: 'is not the one the server printed' }],
      });
    }
  }
}

async function isEmpty(manager: EntityManager): Promise<boolean> {
  return (await manager.count(PersonEntity)) === 0;
}

function done(): ApiError {
  return new ApiError('conflict', 'The workspace is set up already.');
}

function sha256(text: string): Buffer {
  return createHash('sha256').update(text).digest();
}
