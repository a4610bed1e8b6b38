import http from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { bundleServer, ServerProcess } from './server-process.ts';

describe('SIGTERM', () => {
  let server: ServerProcess;
  beforeEach(async () => {
    server = await ServerProcess.create(bundleServer());
    await server.start();
  });
  afterEach(() => server.remove());

  it('R-23: under load fails no request but by a refused connection, and exits 0 within 15 s', async () => {
    const admin = await server.setUp();
    const agent = new http.Agent({ keepAlive: true, maxSockets: 10 });
    const cookie = [...admin.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const headers = { Cookie: cookie, 'Content-Type': 'application/json' };
    const token = { 'X-XSRF-TOKEN': admin.cookies.get('XSRF-TOKEN')! };
    let stopped = false;
    let served = 0;
    const failures: string[] = [];
    const accepted: string[] = [];
    const client = async (number: number): Promise<void> => {
      for (let i = 0; !stopped; i++) {
        const email = `p${number}.${i}@works.example`;
        const body = JSON.stringify({ name: `P ${number}`, email, administrator: false });
        const outcome = await send(
          `${server.url}/api/people`,
          agent,
          { ...headers, ...token },
          body,
        );
        if (outcome === 'ECONNREFUSED') return;
        if (outcome === 201) {
          served += 1;
          accepted.push(email);
        } else failures.push(String(outcome));
        await pause(5);
      }
    };
    const clients = Array.from({ length: 10 }, (_, i) => client(i));
    while (served < 30) await pause(10);
    const startedAtMs = performance.now();
    const code = await server.end('SIGTERM');
    stopped = true;
    await Promise.all(clients);
    expect({ code, failures }).toEqual({ code: 0, failures: [] });
    expect(performance.now() - startedAtMs).toBeLessThan(15_000);
    await server.start();
    const { people } = (await (await server.signIn()).get('/api/people')).body;
    const stored = new Set(people.map((person: { email: string }) => person.email));
    expect(accepted.filter((email) => !stored.has(email))).toEqual([]);
  });

  it('R-23: folds the write-ahead log into the database file', async () => {
    const { statSync } = await import('node:fs');
    await server.setUp();
    expect(await server.end('SIGTERM')).toBe(0);
    const wal = statSync(`${server.dataFolder}/sinkwell.sqlite-wal`, { throwIfNoEntry: false });
    expect(wal?.size ?? 0).toBe(0);
  });

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
