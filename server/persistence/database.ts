import { AsyncLocalStorage } from 'node:async_hooks';
import type { DataSource, EntityManager } from 'typeorm';
import { openReader, openWriter } from './connection.ts';
import { TurnQueue } from './turn-queue.ts';

/**
 * The only door to SQLite. TypeORM's better-sqlite3 driver has one connection and one query runner, so two
 * overlapping transactions would share it and each could undo the other: writes take turns. Reads take turns
 * on a second, read-only connection, each in one snapshot of the last committed state.
 */
export class Database {
  readonly #writes = new TurnQueue();
  readonly #reads = new TurnQueue();
  readonly #inside = new AsyncLocalStorage<{ open: boolean }>();

  private constructor(
    private readonly writer: DataSource,
    private readonly reader: DataSource,
  ) {}

  static async open(file: string): Promise<Database> {
    const writer = await openWriter(file);
    return new Database(writer, await openReader(file));
  }

  /**
   * Runs `work` as one transaction: all of it is stored, or nothing. Keep it short SQL – no mail, no hashing,
   * no files – and hand its manager on: never call `transaction` or `read` from inside.
   *
   * @throws {ApiError} busy when too many writes wait, or this one waited too long
   */
  transaction<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    return this.#turn(this.#writes, this.writer, work);
  }

  /** Runs `work` on one consistent snapshot. A read that a write rests on belongs into the transaction. */
  read<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    return this.#turn(this.#reads, this.reader, work);
  }

  /** Writes that wait or run now. */
  get pendingWrites(): number {
    return this.#writes.pending;
  }

  /** Lets the queue run dry, folds the log into the database file and closes both connections. */
  async close(): Promise<void> {
    await Promise.all([this.#writes.drained(), this.#reads.drained()]);
    await this.reader.destroy();
    await this.writer.query('PRAGMA wal_checkpoint(TRUNCATE)');
    await this.writer.destroy();
  }

  #turn<T>(
    queue: TurnQueue,
    source: DataSource,
    work: (manager: EntityManager) => Promise<T>,
  ): Promise<T> {
    if (this.#inside.getStore()?.open === true) {
      throw new Error('nested use of the database: pass the manager on instead');
    }
    return queue.run(async () => {
      const turn = { open: true };
      try {
        return await this.#inside.run(turn, () => source.transaction(work));
      } finally {
        turn.open = false;
      }
    });
  }
}
