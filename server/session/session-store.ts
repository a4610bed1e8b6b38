import { createHash, randomUUID } from 'node:crypto';
import type { Request } from 'express';
import session, { type SessionData } from 'express-session';
import { LessThan } from 'typeorm';
import type { Database } from '../persistence/database.ts';
import { SessionEntity } from './session-entity.ts';

declare module 'express-session' {
  interface SessionData {
    passport?: { user: string };
    /** Browser as it named itself, shortened. */
    agent?: string;
    /** When the password was last entered, ms. */
    authenticatedAtMs?: number;
    /** Put in by the store when it reads. */
    lastSeenAtMs?: number;
  }
}

export const IDLE_MS = 30 * 60_000;
export const ABSOLUTE_MS = 12 * 3_600_000;
/** How stale the time of the last request may be, ms: not every read should cost a write. */
const TOUCH_AFTER_MS = 30_000;

type Done<T = void> = (error?: unknown, value?: T) => void;

/** Sessions in the database, under the hash of their id; expiry is judged at each read. */
export class SessionStore extends session.Store {
  /** Sessions read from the database: one that was ended meanwhile must not come back by being saved. */
  readonly #known = new WeakSet<object>();

  constructor(
    private readonly database: Database,
    private readonly now: () => number,
  ) {
    super();
  }

  override get(sid: string, done: Done<SessionData | null>): void {
    const found = this.database.read((manager) =>
      manager.findOneBy(SessionEntity, { idHash: hashOf(sid) }),
    );
    settle(
      found.then((row) => (row && this.#lives(row) ? dataOf(row) : null)),
      done,
    );
  }

  override createSession(request: Request, data: SessionData): session.Session & SessionData {
    const created = super.createSession(request, data);
    this.#known.add(created);
    return created;
  }

  override set(sid: string, data: SessionData, done: Done = () => undefined): void {
    const personId = data.passport?.user ?? null;
    const agent = data.agent ?? '';
    const changes = { personId, data, agent, lastSeenAtMs: this.now() };
    const idHash = hashOf(sid);
    const stored = this.database.transaction(async (manager) => {
      const row = await manager.findOneBy(SessionEntity, { idHash });
      if (row) await manager.save(Object.assign(row, changes));
      else if (!this.#known.has(data)) {
        const made = { idHash, publicId: randomUUID(), startedAtMs: this.now() };
        await manager.save(manager.create(SessionEntity, { ...made, ...changes }));
      }
    });
    settle(stored, done);
  }

  override touch(sid: string, data: SessionData, done: Done = () => undefined): void {
    if (this.now() - (data.lastSeenAtMs ?? 0) < TOUCH_AFTER_MS) {
      done();
      return;
    }
    const touched = this.database.transaction(async (manager) => {
      await manager.update(SessionEntity, { idHash: hashOf(sid) }, { lastSeenAtMs: this.now() });
    });
    settle(touched, done);
  }

  override destroy(sid: string, done: Done = () => undefined): void {
    const destroyed = this.database.transaction(async (manager) => {
      await manager.delete(SessionEntity, { idHash: hashOf(sid) });
    });
    settle(destroyed, done);
  }

  /** Removes what has expired; nothing rests on it, reads judge for themselves. */
  async sweep(): Promise<void> {
    await this.database.transaction(async (manager) => {
      await manager.delete(SessionEntity, { lastSeenAtMs: LessThan(this.now() - IDLE_MS) });
      await manager.delete(SessionEntity, { startedAtMs: LessThan(this.now() - ABSOLUTE_MS) });
    });
  }

  #lives(row: SessionEntity): boolean {
    const nowMs = this.now();
    return nowMs - row.lastSeenAtMs < IDLE_MS && nowMs - row.startedAtMs < ABSOLUTE_MS;
  }
}

/** Under which a session's row is kept: SHA-256 of the id, hex. */
export function hashOf(sid: string): string {
  return createHash('sha256').update(sid).digest('hex');
}

function dataOf(row: SessionEntity): SessionData {
  return { ...row.data, lastSeenAtMs: row.lastSeenAtMs };
}

function settle<T>(promise: Promise<T>, done: Done<T>): void {
  promise.then(
    (value) => {
      done(null, value);
    },
    (error: unknown) => {
      done(error);
    },
  );
}
