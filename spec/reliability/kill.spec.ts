import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { repeats, seed } from '../long-run.ts';
import { Designators, PartLinks } from '../../shared/contract/revision.ts';
import { allNull } from '../server/http/route-examples.ts';
import { GENERAL, projectFields } from '../server/project-floor.ts';
import { relayDriver } from '../shared/relay-stage.ts';
import type { TestClient } from '../server/test-client.ts';
import { openWriter } from '../../server/persistence/connection.ts';
import { bundleServer, ServerProcess } from './server-process.ts';

const ROUNDS = repeats(20, 200);
const SAVERS = 4;

/** Draws the moments of death; printed, so that a round can be had again. */
const SEED = seed(20260112);

describe('kill -9 during saves', () => {
  let server: ServerProcess;
  beforeAll(async () => {
    server = await ServerProcess.create(bundleServer());
    await server.start();
  });
  afterAll(() => server.remove());

  it(
    `R-01: loses no acknowledged save in ${ROUNDS} rounds, nothing is half-applied, the chain is whole (seed ${SEED})`,
    { timeout: 900_000 },
    async () => {
      let admin = await server.setUp();
      const made = await admin.post('/api/projects', {
        ...projectFields('CR-40'),
        policyId: GENERAL,
      });
      expect(made.status).toBe(201);
      const { id: projectId } = made.body as { id: string };
      const savers = await Promise.all(
        Array.from({ length: SAVERS }, (_, i) => new Saver(i, projectId).begin(admin)),
      );
      let random = SEED;
      for (let round = 0; round < ROUNDS; round++) {
        random = (random * 48_271) % 2_147_483_647; // Park & Miller, CACM 31 (1988) 1192
        const target = acknowledged(savers) + 1 + (random % 12);
        const saving = savers.map((saver) => saver.saveUntilCut(admin));
        await Promise.race([until(() => acknowledged(savers) >= target), Promise.all(saving)]);
        await pause(random % 50);
        await server.end('SIGKILL');
        await Promise.all(saving);
        await server.start();
        expect(server.stdout).toContain('is ready at');
        admin = await server.signIn();
        for (const saver of savers) await saver.compare(admin);
        const trail = await admin.get('/api/audit/verification');
        expect(trail.body).toMatchObject({ whole: true, faults: [] });
      }
      expect(await server.end('SIGTERM')).toBe(0);
      const writer = await openWriter(path.join(server.dataFolder, 'sinkwell.sqlite'));
      expect(await writer.query('PRAGMA integrity_check')).toEqual([{ integrity_check: 'ok' }]);
      expect(await writer.query('PRAGMA foreign_key_check')).toEqual([]);
      await writer.destroy();
    },
  );
});

function acknowledged(savers: readonly Saver[]): number {
  return savers.reduce((sum, saver) => sum + saver.acknowledged, 0);
}

async function until(holds: () => boolean): Promise<void> {
  while (!holds()) await pause(2);
}

/** One person who saves one stage over and over, each time with another title. */
class Saver {
  acknowledged = 0;
  #count = 0;
  #revisionId = '';
  #etag = '';
  /** Titles that may stand now: the last one acknowledged, or the one under way when the server died. */
  #possible: string[] = [];

  constructor(
    private readonly number: number,
    private readonly projectId: string,
  ) {}

  async begin(client: TestClient): Promise<this> {
    const definition = relayDriver({ reference: `Q${this.number + 1}`, title: 'begin' });
    const made = await client.post(`/api/projects/${this.projectId}/stages`, { definition });
    expect(made.status).toBe(201);
    this.#revisionId = (made.body as { revision: { id: string } }).revision.id;
    await this.#read(client);
    return this;
  }

  async saveUntilCut(client: TestClient): Promise<void> {
    for (;;) {
      this.#count += 1;
      const title = `save ${this.#count}`;
      this.#possible = [this.#possible.at(-1)!, title];
      try {
        const { status, etag } = await client.put(
          `/api/revisions/${this.#revisionId}`,
          this.#body(title),
          { 'If-Match': this.#etag },
        );
        expect(status).toBe(200);
        this.#etag = etag ?? '';
        this.#possible = [title];
        this.acknowledged += 1;
      } catch (error) {
        if (error instanceof TypeError) return; // fetch: the connection broke
        throw error;
      }
    }
  }

  async compare(client: TestClient): Promise<void> {
    const before = this.#possible;
    const title = await this.#read(client);
    expect(before).toContain(title);
  }

  async #read(client: TestClient): Promise<string> {
    const { body, etag } = await client.get(`/api/revisions/${this.#revisionId}`);
    const { definition, evaluation } = body as {
      definition: { title: string };
      evaluation: { criteria: unknown[] };
    };
    expect(evaluation.criteria.length).toBeGreaterThan(5);
    this.#etag = etag ?? '';
    this.#possible = [definition.title];
    return definition.title;
  }

  #body(title: string): object {
    return {
      definition: relayDriver({ reference: `Q${this.number + 1}`, title }),
      designators: allNull(Designators),
      parts: allNull(PartLinks),
    };
  }
}
