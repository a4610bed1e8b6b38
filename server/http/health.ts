import { statfs } from 'node:fs/promises';
import { type RequestHandler, Router } from 'express';
import type { Database } from '../persistence/database.ts';

const LEAST_FREE_BYTES = 500 * 2 ** 20;
const MOST_PENDING_WRITES = 200;

/** Whether the process lives, and whether it should be sent requests. Strangers learn no more than that. */
export class Health {
  stopping = false;

  constructor(
    private readonly database: Database,
    private readonly dataFolder: string,
    private readonly freeBytes = freeBytesOf,
  ) {}

  routes(): Router {
    const live: RequestHandler = (_request, response) => {
      response.json({ status: 'live' });
    };
    const ready: RequestHandler = async (request, response) => {
      const fault = await this.fault();
      if (fault !== null) request.log.warn({ event: 'not-ready', fault }, 'not ready');
      response
        .status(fault === null ? 200 : 503)
        .json({ status: fault === null ? 'ready' : 'not-ready' });
    };
    return Router().get('/livez', live).get('/readyz', ready);
  }

  /** What keeps the server from being ready, for the log; null when nothing does. */
  async fault(): Promise<string | null> {
    if (this.stopping) return 'stopping';
    if (this.database.pendingWrites > MOST_PENDING_WRITES) return 'writes pile up';
    try {
      await this.database.read((manager) => manager.query('SELECT 1'));
      if ((await this.freeBytes(this.dataFolder)) < LEAST_FREE_BYTES) return 'disk nearly full';
    } catch (error) {
      return error instanceof Error ? error.message : 'unreadable';
    }
    return null;
  }
}

async function freeBytesOf(folder: string): Promise<number> {
  const { bavail, bsize } = await statfs(folder);
  return bavail * bsize;
}
