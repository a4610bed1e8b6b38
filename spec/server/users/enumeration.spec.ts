import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { SHIPPED_SCRYPT } from '../../../server/session/scrypt-cost.ts';
import { repeats } from '../../long-run.ts';
import type { Reply, TestClient } from '../test-client.ts';
import { PASSWORD, TestServer } from '../test-server.ts';

const TRIES = 200;
const DAY_MS = 24 * 3_600_000;
/** The target on a quiet machine, ms; five times that where a run is failed for its time alone. */
const TARGET_MS = 15;
const TOLERANCE = 5;
/** However cheap the hash: who skips it, answers in a fraction of the time. */
const MOST_APART = 2;

const FREE = 1e6;
const LIMITS = {
  ...{ ...SHIPPED_LIMITS, apiPerMinute: FREE, linkMailsPerHour: FREE, signInFailures: FREE },
  ...{ signInFailuresPerAddress: FREE, signInFailuresInARow: FREE },
};

type Ask = (client: TestClient, number: number) => Promise<Reply>;

describe(`S-07: ${TRIES} tries of each kind tell nobody whether there is an account`, () => {
  let server: TestServer;
  beforeEach(async () => {
    const scrypt = { ...SHIPPED_SCRYPT, logN: repeats(12, SHIPPED_SCRYPT.logN) };
    server = await TestServer.start({ limits: LIMITS, scrypt });
    await server.setUp();
  });
  afterEach(() => server.stop());

  it('at sign-in', { timeout: 900_000 }, async () => {
    const { email } = await server.addPerson('Dora Designer');
    const tryPassword = (address: string): Ask => {
      return (client, i) =>
        client.post('/api/session', { email: address, password: `not the password ${i}` });
    };
    await expectAlike('sign-in', 401, tryPassword(email), (client, i) =>
      tryPassword(`nobody${i}@works.example`)(client, i),
    );
  });

  it('when asking for a password reset', { timeout: 120_000 }, async () => {
    const { email } = await server.addPerson('Carl Checker');
    await expectAlike(
      ...(['reset', 202] as const),
      (client) => client.post('/api/password-resets', { email }),
      (client, i) => client.post('/api/password-resets', { email: `nobody${i}@works.example` }),
    );
  });

  it(
    'when taking up an invitation that has expired or never was',
    { timeout: 120_000 },
    async () => {
      const invite = { name: 'Ina', email: 'ina@works.example', administrator: false };
      const expired = await server.tokenFor(invite, async () => {
        const chief = await server.signIn({ email: 'ada.admin@works.example' });
        expect((await chief.post('/api/people', invite)).status).toBe(201);
      });
      expect(expired).toHaveLength(43);
      server.pass(DAY_MS);
      const take = (client: TestClient, token: string) =>
        client.post('/api/invitations/acceptance', { token, password: PASSWORD });
      await expectAlike(
        ...(['invitation', 422] as const),
        (client) => take(client, expired),
        (client, i) => take(client, String(i).padStart(43, 'A')),
      );
    },
  );

  /** Asks in turn and compares status, body, names of headers, and the means of the times taken. */
  async function expectAlike(what: string, status: number, known: Ask, none: Ask): Promise<void> {
    const client = await server.visit();
    const times = { known: 0, none: 0 };
    const shapes = new Set<string>();
    for (let i = 0; i < TRIES; i++) {
      // in changing order, so that neither always comes behind the other's mail and trail
      const order = i % 2 === 0 ? (['known', 'none'] as const) : (['none', 'known'] as const);
      for (const kind of order) {
        const startedAtMs = performance.now();
        const reply = await { known, none }[kind](client, i);
        times[kind] += (performance.now() - startedAtMs) / TRIES;
        expect(reply.status).toBe(status);
        shapes.add(shapeOf(reply));
      }
    }
    const differenceMs = Math.abs(times.known - times.none);
    const figures = Object.entries({ ...times, difference: differenceMs })
      .map(([name, ms]) => `${name} ${ms.toFixed(2)} ms`)
      .join(', ');
    process.stdout.write(`${what}, means: ${figures}; target below ${TARGET_MS} ms\n`);
    expect([...shapes]).toHaveLength(1);
    expect(differenceMs, figures).toBeLessThan(TARGET_MS * TOLERANCE);
    const apart = Math.max(times.known / times.none, times.none / times.known);
    expect(apart, figures).toBeLessThan(MOST_APART);
  }
});

function shapeOf({ status, headers, text, body }: Reply): string {
  const names = [...headers.keys()].sort().join();
  const { reference } = (body ?? {}) as { reference?: string };
  return [status, names, reference ? text.replace(reference, '') : text].join(' ');
}
