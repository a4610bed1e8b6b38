import 'reflect-metadata';
import type BetterSqlite3 from 'better-sqlite3';
import { DataSource } from 'typeorm';
import { entities } from './entities.ts';
import { migrations } from './migrations/index.ts';

const BUSY_TIMEOUT_MS = 2000;

/** What every connection must read back before it is used; WAL alone would drop synchronous to 1. */
const EXPECTED_PRAGMAS = {
  journal_mode: 'wal',
  synchronous: 2,
  foreign_keys: 1,
  busy_timeout: BUSY_TIMEOUT_MS,
  trusted_schema: 0,
} as const;

function dataSource(file: string, readonly: boolean): DataSource {
  return new DataSource({
    type: 'better-sqlite3',
    database: file,
    readonly,
    entities: [...entities],
    migrations: [...migrations],
    migrationsRun: false,
    migrationsTransactionMode: 'all',
    synchronize: false,
    logging: false,
    timeout: BUSY_TIMEOUT_MS,
    prepareDatabase: (connection: BetterSqlite3.Database) => {
      if (!readonly) connection.pragma('journal_mode = WAL');
      connection.pragma('synchronous = FULL');
      connection.pragma('foreign_keys = ON');
      connection.pragma('trusted_schema = OFF');
    },
  });
}

/** The writing connection, its schema brought up to date. */
export async function openWriter(file: string): Promise<DataSource> {
  const writer = await dataSource(file, false).initialize();
  await assertPragmas(writer);
  await writer.runMigrations();
  await assertPragmas(writer);
  return writer;
}

/** The read-only connection: sees the last committed state, never a transaction under way. */
export async function openReader(file: string): Promise<DataSource> {
  const reader = await dataSource(file, true).initialize();
  await assertPragmas(reader);
  return reader;
}

/** @throws {Error} naming the first pragma that does not read back as it must */
export async function assertPragmas(source: DataSource): Promise<void> {
  for (const [name, expected] of Object.entries(EXPECTED_PRAGMAS)) {
    const rows = await source.query<Record<string, unknown>[]>(`PRAGMA ${name}`);
    const found = Object.values(rows[0] ?? {})[0];
    if (found !== expected) {
      throw new Error(`database pragma ${name} is ${String(found)}, must be ${expected}`);
    }
  }
}
