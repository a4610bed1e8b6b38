import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Reply } from '../server/test-client.ts';
import { bundleServer, ServerProcess } from './server-process.ts';

const AT_ONCE = 100;
/** Two are hashed at once, fifty wait in line; a few more get in where one is done before the last has come. */
const LEAST_TAKEN = 52;
const ROUNDS = 3;

describe('100 people signing in at once', () => {
  let server: ServerProcess;
  beforeAll(async () => {
    server = await ServerProcess.create(bundleServer());
    // an address for each: one address may only miss so often, and a try counts as a miss until it succeeds
    await server.start({ SINKWELL_SCRYPT_COST: '', SINKWELL_TRUST_PROXY: '1' }, { gauge: true });
    await server.setUp();
  }, 60_000);
  afterAll(() => server.remove());

  it(
    'S-05: at the shipped cost memory and event loop stay calm, and whoever finds the line full is told when to return',
    { timeout: 600_000 },
    async () => {
      const figures = [];
      // the best of three: what else the machine does is not the server's
      for (let round = 0; round < ROUNDS; round++) {
        const clients = await Promise.all(Array.from({ length: AT_ONCE }, () => server.visit()));
        await server.gauge('reset');
        const startedAtMs = performance.now();
        const replies = await Promise.all(
          clients.map((client, i) =>
            server.signInBy(client, { 'X-Forwarded-For': `198.51.100.${i}` }),
          ),
        );
        const tookSec = (performance.now() - startedAtMs) / 1000;
        expectSorted(replies);
        figures.push({ ...(await server.gauge('read')), tookSec });
        if (isCalm(figures.at(-1)!)) break;
      }
      process.stdout.write(`${AT_ONCE} sign-ins at once: ${JSON.stringify(figures)}\n`);
      expect(figures.some(isCalm), JSON.stringify(figures)).toBe(true);
    },
  );
});

function expectSorted(replies: readonly Reply[]): void {
  const refused = replies.filter(({ status }) => status !== 200);
  expect(replies.length - refused.length).toBeGreaterThanOrEqual(LEAST_TAKEN);
  expect(refused.length).toBeGreaterThan(0);
  for (const { status, body, headers } of refused) {
    expect([status, body.code, headers.get('retry-after')]).toEqual([503, 'busy', '5']);
  }
}

function isCalm(figures: { loopDelayP99Ms: number; rssGrowthMiB: number }): boolean {
  return figures.loopDelayP99Ms < 100 && figures.rssGrowthMiB < 400;
}
