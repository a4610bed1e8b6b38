import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setImmediate as nextTurn, setTimeout as pause } from 'node:timers/promises';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { ApiError } from '../../../server/http/api-error.ts';
import { assertPragmas, openReader, openWriter } from '../../../server/persistence/connection.ts';
import { Database } from '../../../server/persistence/database.ts';
import { migrations } from '../../../server/persistence/migrations/index.ts';
import { TurnQueue } from '../../../server/persistence/turn-queue.ts';
import { WorkspaceEntity } from '../../../server/users/workspace-entity.ts';
import { PersonEntity } from '../../../server/users/person-entity.ts';

describe('the database door', () => {
  let folder: string;
  let file: string;
  beforeEach(async () => {
    folder = await mkdtemp(path.join(tmpdir(), 'sinkwell-'));
    file = path.join(folder, 'test.sqlite');
  });
  afterEach(() => rm(folder, { recursive: true, force: true }));

  const person = (name: string): object => ({
    ...{ id: name, name, email: name, administrator: false, state: 'active', passwordHash: null },
    ...{ passwordVersion: 0, failedSignIns: 0, createdAtMs: 0, lastSignInAtMs: null },
  });

  it('R-13: keeps 500 overlapping transactions apart, a fifth of them failing', async () => {
    const database = await Database.open(file);
    const write = (i: number): Promise<void> =>
      database.transaction(async (manager) => {
        await manager.insert(PersonEntity, person(`p${i}`));
        if (i % 3 === 0) await nextTurn();
        if (i % 5 === 0) throw new Error('on purpose');
      });
    const results: PromiseSettledResult<void>[] = [];
    // a hundred at once: on a slow machine more would wait longer than the queue lets them
    for (let first = 0; first < 500; first += 100) {
      const batch = Array.from({ length: 100 }, (_, offset) => write(first + offset));
      results.push(...(await Promise.allSettled(batch)));
    }
    const acknowledged = results.flatMap((r, i) => (r.status === 'fulfilled' ? [`p${i}`] : []));
    const stored = await database.read((m) => m.find(PersonEntity));
    expect(acknowledged).toHaveLength(400);
    expect(stored.map(({ id }) => id).sort()).toEqual([...acknowledged].sort());
    await database.close();
  });

  it('shows a reader nothing of a transaction under way, and one snapshot throughout', async () => {
    const database = await Database.open(file);
    const write = database.transaction(async (manager) => {
      await manager.insert(PersonEntity, person('half'));
      await pause(30);
    });
    expect(await database.read((m) => m.count(PersonEntity))).toBe(0);
    const counts = await database.read(async (manager) => {
      const before = await manager.count(PersonEntity);
      await write;
      return [before, await manager.count(PersonEntity)];
    });
    expect(counts).toEqual([0, 0]);
    expect(await database.read((m) => m.count(PersonEntity))).toBe(1);
    await database.close();
  });

  it('refuses nested use instead of waiting for itself', async () => {
    const database = await Database.open(file);
    await expect(
      database.transaction(() => database.transaction(() => Promise.resolve())),
    ).rejects.toThrow('nested');
    await expect(
      database.read(() => database.transaction(() => Promise.resolve())),
    ).rejects.toThrow('nested');
    await database.close();
  });

  it('cannot write through the read-only connection', async () => {
    const database = await Database.open(file);
    await expect(
      database.read((manager) => manager.insert(WorkspaceEntity, { id: 1, name: 'x' })),
    ).rejects.toThrow(/readonly/);
    await database.close();
  });

  it('R-02: reads back every pragma on both connections', async () => {
    const writer = await openWriter(file);
    const reader = await openReader(file);
    for (const source of [writer, reader]) {
      const value = async (name: string): Promise<unknown> => {
        const rows: Record<string, unknown>[] = await source.query(`PRAGMA ${name}`);
        return Object.values(rows[0]!)[0];
      };
      expect(await value('journal_mode')).toBe('wal');
      expect(await value('synchronous')).toBe(2);
      expect(await value('foreign_keys')).toBe(1);
      expect(await value('busy_timeout')).toBe(2000);
      expect(await value('trusted_schema')).toBe(0);
    }
    await reader.destroy();
    await writer.destroy();
  });

  it('R-02: refuses a connection on which a pragma is off', async () => {
    const writer = await openWriter(file);
    await writer.query('PRAGMA synchronous = NORMAL');
    await expect(assertPragmas(writer)).rejects.toThrow('synchronous is 1, must be 2');
    await writer.destroy();
  });

  it('has no difference between entities and migrations', async () => {
    const writer = await openWriter(file);
    const { upQueries } = await writer.driver.createSchemaBuilder().log();
    expect(upQueries.map(({ query }) => query)).toEqual([]);
    await writer.destroy();
  });

  it('has only STRICT tables', async () => {
    const writer = await openWriter(file);
    const loose: { name: string }[] = await writer.query(
      `SELECT name FROM pragma_table_list WHERE schema = 'main' AND type = 'table' AND strict = 0
       AND name NOT LIKE 'sqlite_%' AND name <> 'migrations'`,
    );
    expect(loose).toEqual([]);
    await writer.destroy();
  });

  it('runs all migrations in one transaction, so that none can take child rows along', async () => {
    const writer = await openWriter(file);
    expect(writer.options.migrationsTransactionMode).toBe('all');
    const orphans: unknown[] = await writer.query('PRAGMA foreign_key_check');
    expect(orphans).toEqual([]);
    await writer.destroy();
  });

  it('can undo every migration and do it again', async () => {
    const writer = await openWriter(file);
    await migrations.reduce(
      (before) => before.then(() => writer.undoLastMigration()),
      Promise.resolve(),
    );
    const left: { name: string }[] = await writer.query(
      `SELECT name FROM sqlite_schema WHERE name NOT LIKE 'sqlite_%' AND name <> 'migrations'`,
    );
    expect(left).toEqual([]);
    expect(await writer.runMigrations()).toHaveLength(migrations.length);
    await writer.destroy();
  });
});

describe('the turn queue', () => {
  it('answers busy when too many wait, without running them', async () => {
    const queue = new TurnQueue(2, 1000);
    const ran: number[] = [];
    const results = await Promise.allSettled(
      [1, 2, 3].map((n) => queue.run(() => Promise.resolve(ran.push(n)))),
    );
    expect(results.map(({ status }) => status)).toEqual(['fulfilled', 'fulfilled', 'rejected']);
    expect((results[2] as PromiseRejectedResult).reason).toMatchObject({ code: 'busy' });
    expect(ran).toEqual([1, 2]);
    expect(queue.pending).toBe(0);
  });

  it('answers busy to what has waited too long', async () => {
    const queue = new TurnQueue(10, 300);
    const slow = queue.run(() => pause(600));
    await expect(queue.run(() => Promise.resolve())).rejects.toBeInstanceOf(ApiError);
    await slow;
  });
});
