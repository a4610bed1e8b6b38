import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { DataSource } from 'typeorm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openWriter } from '../../../server/persistence/connection.ts';
import { SHIPPED_POLICIES } from '../../../shared/stage/policy.ts';

let folder: string;
let writer: DataSource;

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sinkwell-'));
  writer = await openWriter(path.join(folder, 'drift.sqlite'));
});

afterAll(async () => {
  await writer.destroy();
  await rm(folder, { recursive: true, force: true });
});

describe('schema after all migrations', () => {
  it('is what the entities say', async () => {
    const difference = await writer.driver.createSchemaBuilder().log();
    expect(difference.upQueries.map(({ query }) => query)).toEqual([]);
  });

  it('has strict tables only', async () => {
    const loose = await writer.query<{ name: string }[]>(
      `SELECT name FROM pragma_table_list
       WHERE schema = 'main' AND type = 'table' AND strict = 0
         AND name NOT LIKE 'sqlite_%' AND name <> 'migrations'`,
    );
    expect(loose).toEqual([]);
  });

  it('keeps its guards: a rebuilt table would lose them silently', async () => {
    const triggers = await writer.query<{ tbl_name: string; name: string }[]>(
      `SELECT tbl_name, name FROM sqlite_master WHERE type = 'trigger' ORDER BY tbl_name, name`,
    );
    const byTable: Record<string, number> = {};
    for (const { tbl_name } of triggers) byTable[tbl_name] = (byTable[tbl_name] ?? 0) + 1;
    expect(byTable).toMatchObject({
      check_record: 3,
      finding: 5,
      finding_event: 6,
      part: 3,
      part_revision: 3,
      part_verification: 3,
      policy: 3,
      revision: 7,
      revision_move: 6,
      revision_part: 3,
      revision_person: 3,
      signature: 3,
      stage: 3,
    });
  });

  it('ships the two policies of the stage file as version 1', async () => {
    const rows = await writer.query<{ name: string; version: number; limits: string }[]>(
      `SELECT name, version, limits FROM policy ORDER BY name`,
    );
    expect(rows.map((row) => ({ ...row, limits: JSON.parse(row.limits) as unknown }))).toEqual(
      SHIPPED_POLICIES.map(({ name, ...limits }) => ({ name, version: 1, limits })),
    );
  });

  it('goes back down to nothing', async () => {
    const file = path.join(folder, 'down.sqlite');
    const other = await openWriter(file);
    for (let left = other.migrations.length; left > 0; left--) await other.undoLastMigration();
    const left = await other.query<unknown[]>(
      `SELECT name FROM sqlite_master WHERE type IN ('table', 'trigger')
         AND name NOT LIKE 'sqlite_%' AND name <> 'migrations'`,
    );
    await other.destroy();
    expect(left).toEqual([]);
  });
});
