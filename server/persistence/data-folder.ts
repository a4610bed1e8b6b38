import { randomBytes } from 'node:crypto';
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import Sqlite from 'better-sqlite3';
import { StartRefusal } from '../start-refusal.ts';

const SECRET_BYTES = 32;

/** The folder that holds everything this installation knows; one server at a time. */
export class DataFolder {
  readonly #lock: Sqlite.Database;

  /**
   * Makes the folder if it is not there, and takes it.
   *
   * @throws {StartRefusal} when another server has it, or it cannot be made
   */
  constructor(readonly folder: string) {
    try {
      mkdirSync(folder, { recursive: true, mode: 0o700 });
    } catch (error) {
      throw new StartRefusal(`SINKWELL_DATA: cannot make ${folder} (${codeOf(error)})`);
    }
    this.#lock = this.#take();
  }

  get databaseFile(): string {
    return path.join(this.folder, 'sinkwell.sqlite');
  }

  /** Mail of the local fake. */
  get mailbox(): string {
    return path.join(this.folder, 'mailbox');
  }

  /** Signs the session cookies when the environment names no secret; made once. */
  secret(): string {
    const file = path.join(this.folder, 'secret');
    try {
      writeFileSync(file, randomBytes(SECRET_BYTES).toString('hex'), { mode: 0o600, flag: 'wx' });
    } catch (error) {
      if (codeOf(error) !== 'EEXIST') throw error;
    }
    const secret = readFileSync(file, 'utf8').trim();
    if (Buffer.from(secret, 'hex').length >= SECRET_BYTES) return secret;
    throw new StartRefusal(`SINKWELL_DATA: ${file} holds no secret of ${SECRET_BYTES} bytes`);
  }

  release(): void {
    this.#lock.close();
  }

  /** SQLite's exclusive lock belongs to the process: the system frees it however the process ends. */
  #take(): Sqlite.Database {
    try {
      const lock = new Sqlite(path.join(this.folder, 'lock'), { timeout: 0 });
      lock.pragma('journal_mode = MEMORY'); // no journal file to be left behind
      lock.exec('BEGIN EXCLUSIVE');
      return lock;
    } catch (error) {
      const why = codeOf(error) === 'SQLITE_BUSY' ? 'is in use by another server' : codeOf(error);
      throw new StartRefusal(`SINKWELL_DATA: ${this.folder} ${why}`);
    }
  }
}

function codeOf(error: unknown): string {
  return error instanceof Error && 'code' in error ? String(error.code) : String(error);
}
