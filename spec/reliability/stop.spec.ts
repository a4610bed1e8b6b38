import { statSync } from 'node:fs';
import http from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { repeats } from '../long-run.ts';
import type { TestClient } from '../server/test-client.ts';
import { bundleServer, ServerProcess } from './server-process.ts';

const STOPS = repeats(5, 50);
const PER_SECOND = 100;
const LONGEST_STOP_MS = 15_000;

describe('SIGTERM', () => {
  let server: ServerProcess;
  beforeEach(async () => {
    server = await ServerProcess.create(bundleServer());
    await server.start();
  });
  afterEach(() => server.remove());

  it(
    `R-23: ${STOPS} stops under ${PER_SECOND} requests a second fail none but by a refused connection`,
    { timeout: 60_000 + STOPS * 30_000 },
    async () => {
      await server.setUp();
      const load = new Load(server);
      const tookMs: number[] = [];
      for (let stop = 0; stop < STOPS; stop++) {
        load.begin(await server.signIn());
        await load.served(PER_SECOND / 2);
        await pause((stop * 37) % 100);
        const startedAtMs = performance.now();
        expect(await server.end('SIGTERM')).toBe(0);
        tookMs.push(performance.now() - startedAtMs);
        const wal = `${server.dataFolder}/sinkwell.sqlite-wal`;
        expect(statSync(wal, { throwIfNoEntry: false })?.size ?? 0, 'log, bytes').toBe(0);
        await load.end();
        await server.start();
        await load.sendRefused(await server.signIn());
      }
      process.stdout.write(
        `${STOPS} stops: ${load.answered} requests, ${load.rate.toFixed(0)} a second, ${load.refused} refused and sent again, ` +
          `${load.failures.length} failed, longest stop ${Math.max(...tookMs).toFixed(0)} ms\n`,
      );
      expect(load.failures).toEqual([]);
      expect(Math.max(...tookMs)).toBeLessThan(LONGEST_STOP_MS);
      const { people } = (await (await server.signIn()).get('/api/people')).body;
      const stored = new Set(people.map((person: { email: string }) => person.email));
      expect(load.accepted.length).toBeGreaterThan(STOPS);
      expect(load.accepted.filter((email) => !stored.has(email))).toEqual([]);
    },
  );

  it('R-23: is not ready, yet alive, while it stops', async () => {
    const slow = http.request(`${server.url}/api/session`, { method: 'POST', agent: false });
    slow.on('error', () => undefined);
    slow.setHeader('Content-Type', 'application/json').setHeader('Content-Length', '10');
    slow.write('{"a"');
    const agent = new http.Agent({ keepAlive: true, maxSockets: 1 });
    expect(await send(`${server.url}/readyz`, agent, {})).toBe(200);
    const ending = server.end('SIGTERM');
    await pause(150);
    expect(await send(`${server.url}/readyz`, agent, {})).toBe(503);
    slow.end(':true}');
    expect(await ending).toBe(0);
  });
});

/** Reads and writes at a steady rate, whether the answers keep up or not, over connections kept alive. */
class Load {
  answered = 0;
  refused = 0;
  readonly failures: string[] = [];
  readonly accepted: string[] = [];
  readonly #agent = new http.Agent({ keepAlive: true, maxSockets: 10 });
  #again: number[] = [];
  #headers: Record<string, string> = {};
  #pending: Promise<void>[] = [];
  #running = false;
  #loop: Promise<void> = Promise.resolve();
  #sent = 0;
  #spentSec = 0;

  constructor(private readonly server: ServerProcess) {}

  /** Requests a second, over all rounds. */
  get rate(): number {
    return this.#sent / this.#spentSec;
  }

  begin(client: TestClient): void {
    this.#headers = headersOf(client);
    this.#running = true;
    this.#loop = this.#send();
  }

  /** Resolves when so many more have been answered. */
  async served(count: number): Promise<void> {
    const target = this.answered + count;
    while (this.answered < target) await pause(5);
  }

  async end(): Promise<void> {
    this.#running = false;
    await this.#loop;
    await Promise.all(this.#pending);
    this.#pending = [];
  }

  /** What a refused connection allows: to try again, at the server that has come back. */
  async sendRefused(client: TestClient): Promise<void> {
    this.#headers = headersOf(client);
    const again = this.#again;
    this.#again = [];
    this.refused += again.length;
    await Promise.all(again.map((number) => this.#one(number)));
    if (this.#again.length > 0) this.failures.push('refused by a running server');
  }

  async #send(): Promise<void> {
    const startedAtMs = performance.now();
    let sent = 0;
    while (this.#running) {
      const due = ((performance.now() - startedAtMs) / 1000) * PER_SECOND;
      for (; sent < due; sent++) {
        this.#sent += 1;
        this.#pending.push(this.#one(this.#sent));
      }
      await pause(2);
    }
    this.#spentSec += (performance.now() - startedAtMs) / 1000;
  }

  /** One in five writes. */
  async #one(number: number): Promise<void> {
    const email = `p${number}@works.example`;
    const writes = number % 5 === 0;
    const body = JSON.stringify({ name: `P ${number}`, email, administrator: false });
    const url = `${this.server.url}/api/${writes ? 'people' : 'policies'}`;
    const outcome = await send(url, this.#agent, this.#headers, writes ? body : undefined);
    if (outcome === 'ECONNREFUSED') this.#again.push(number);
    else if (outcome !== (writes ? 201 : 200)) this.failures.push(`${number}: ${outcome}`);
    else {
      this.answered += 1;
      if (writes) this.accepted.push(email);
    }
  }
}

function headersOf({ cookies, cookieHeader }: TestClient): Record<string, string> {
  return {
    ...{ Cookie: cookieHeader, 'Content-Type': 'application/json' },
    'X-XSRF-TOKEN': cookies.get('XSRF-TOKEN') ?? '',
  };
}

/** The status, or the code of the error. */
function send(
  url: string,
  agent: http.Agent,
  headers: Record<string, string>,
  body?: string,
): Promise<number | string> {
  return new Promise((resolve) => {
    const request = http.request(url, {
      agent,
      headers,
      method: body === undefined ? 'GET' : 'POST',
    });
    request.on('response', (response) => {
      response.resume();
      response.on('end', () => {
        resolve(response.statusCode ?? 0);
      });
    });
    request.on('error', (error: NodeJS.ErrnoException) => {
      resolve(error.code ?? error.message);
    });
    request.end(body);
  });
}
