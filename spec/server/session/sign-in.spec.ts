import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { PersonEntity } from '../../../server/users/person-entity.ts';
import { PASSWORD, TestServer } from '../test-server.ts';

describe('sign-in', () => {
  let server: TestServer;
  beforeEach(async () => {
    const limits = { ...SHIPPED_LIMITS, apiPerMinute: 10_000, signInFailuresInARow: 8 };
    server = await TestServer.start({ limits, trustProxy: 1 });
    await server.setUp();
  });
  afterEach(() => server.stop());

  const attempt = async (email: string, password: string, ip = '198.51.100.1') => {
    const client = await server.visit();
    return client.post('/api/session', { email, password }, { 'X-Forwarded-For': ip });
  };

  it('lets a person in with the right password and tells who it is', async () => {
    const person = await server.addPerson('Dora Designer');
    const client = await server.visit();
    const reply = await client.post('/api/session', {
      email: ' Dora.Designer@WORKS.example ',
      password: PASSWORD,
    });
    expect(reply.status).toBe(200);
    expect(reply.body.person).toEqual({ ...person, administrator: false });
    expect(reply.body).toMatchObject({ setupNeeded: false, workspace: 'Test Works', demo: false });
    expect((await client.get('/api/session')).body.person.id).toBe(person.id);
  });

  it('S-07: answers alike for a wrong password, an unknown and a disabled account', async () => {
    const person = await server.addPerson('Dora Designer');
    const gone = await server.addPerson('Gone Person', { state: 'disabled' });
    const invited = await server.addPerson('New Person', { state: 'invited', passwordHash: null });
    const replies = [
      await attempt(person.email, 'not the password at all'),
      await attempt('nobody@works.example', PASSWORD),
      await attempt(gone.email, PASSWORD),
      await attempt(invited.email, PASSWORD),
    ];
    const alike = replies.map(({ status, headers, body }) => {
      const names = [...headers.keys()].sort();
      return { status, names, body: { ...body, reference: '' } };
    });
    expect(alike[0]).toMatchObject({ status: 401, body: { code: 'wrong-credentials' } });
    for (const other of alike) expect(other).toEqual(alike[0]);
  });

  it('S-06: makes one account and address wait after 5 misses, doubling, and no other', async () => {
    const person = await server.addPerson('Dora Designer');
    const other = await server.addPerson('Carl Checker');
    for (let i = 0; i < 5; i++)
      expect((await attempt(person.email, `wrong ${i}`)).status).toBe(401);
    const blocked = await attempt(person.email, PASSWORD);
    expect([blocked.status, blocked.body.code]).toEqual([429, 'too-many-requests']);
    expect(Number(blocked.headers.get('retry-after'))).toBeGreaterThan(25);
    expect((await attempt(other.email, PASSWORD)).status).toBe(200);
    expect((await attempt(person.email, PASSWORD, '203.0.113.9')).status).toBe(200);
    for (let i = 0; i < 5; i++) await attempt('nobody@works.example', 'x');
    expect((await attempt('nobody@works.example', 'x')).status).toBe(429);
  });

  it('S-06: many tries at once gain nothing', async () => {
    const person = await server.addPerson('Dora Designer');
    const replies = await Promise.all(
      Array.from({ length: 20 }, (_, i) => attempt(person.email, `wrong ${i}`)),
    );
    expect(replies.filter(({ status }) => status === 401)).toHaveLength(5);
    expect(replies.filter(({ status }) => status === 429)).toHaveLength(15);
  });

  it('S-06: allows an address 50 misses over all accounts', async () => {
    for (let i = 0; i < 50; i++) {
      expect((await attempt(`nobody${i}@works.example`, 'x')).status).toBe(401);
    }
    expect((await attempt('nobody50@works.example', 'x')).status).toBe(429);
    expect((await attempt('nobody50@works.example', 'x', '203.0.113.9')).status).toBe(401);
  });

  it('S-06: after too many misses from anywhere only a reset helps, and a running session stays', async () => {
    const person = await server.addPerson('Dora Designer');
    const running = await server.signIn(person);
    for (let i = 0; i < 8; i++) await attempt(person.email, 'wrong', `203.0.113.${i}`);
    expect((await attempt(person.email, PASSWORD, '192.0.2.1')).status).toBe(401);
    expect((await running.get('/api/session')).body.person.id).toBe(person.id);
    const again = 'a quite different phrase';
    const token = await server.tokenFor(person, async (client) => {
      await client.post('/api/password-resets', { email: person.email });
    });
    const visitor = await server.visit();
    await visitor.post('/api/password-resets/redemption', { token, password: again });
    expect((await attempt(person.email, again, '192.0.2.2')).status).toBe(200);
  });

  it('S-47: does not believe X-Forwarded-For without a declared proxy', async () => {
    const plain = await TestServer.start({ limits: { ...SHIPPED_LIMITS, signInFailures: 2 } });
    const client = await plain.visit();
    const statuses: number[] = [];
    for (let i = 0; i < 4; i++) {
      const credentials = { email: 'nobody@works.example', password: 'x' };
      const spoof = { 'X-Forwarded-For': `203.0.113.${i}` };
      statuses.push((await client.post('/api/session', credentials, spoof)).status);
    }
    expect(statuses).toEqual([401, 401, 429, 429]);
    await plain.stop();
  });

  it('S-47: counts an IPv6 site of /56 as one', async () => {
    const statuses: number[] = [];
    for (let i = 0; i < 6; i++) {
      statuses.push((await attempt('nobody@works.example', 'x', `2001:db8:1:2${i}::1`)).status);
    }
    expect(statuses).toEqual([401, 401, 401, 401, 401, 429]);
    expect((await attempt('nobody@works.example', 'x', '2001:db8:1:300::1')).status).toBe(401);
  });

  it('S-05: makes the stored hash anew when the cost has risen', async () => {
    const person = await server.addPerson('Dora Designer', {
      passwordHash: await new (
        await import('../../../server/session/password-hash.ts')
      ).PasswordHash({ logN: 5, blockSize: 8, parallel: 1 }).hash(PASSWORD),
    });
    const stored = () =>
      server.database.read(
        async (m) => (await m.findOneByOrFail(PersonEntity, person)).passwordHash,
      );
    expect(await stored()).toMatch(/^scrypt\$5\$8\$1\$/);
    await server.signIn(person);
    expect(await stored()).toMatch(/^scrypt\$4\$8\$1\$/);
    await server.signIn(person);
  });

  it('S-22, S-50: logs and records success and failure without secrets', async () => {
    const person = await server.addPerson('Dora Designer');
    await server.signIn(person);
    await attempt(person.email, 'a-wrong-secret-value');
    const admin = await server.signIn({ email: 'ada.admin@works.example' });
    const { lines } = (await admin.get('/api/audit')).body;
    expect(lines.map((line: { action: string }) => line.action)).toEqual([
      ...['session.started', 'session.refused', 'session.started'],
    ]);
    const log = server.log.join('');
    expect(log).toContain('"problem":"wrong-credentials"');
    expect(log).not.toContain('a-wrong-secret-value');
    expect(log).not.toContain(PASSWORD);
    for (const [, value] of admin.cookies) expect(log).not.toContain(value);
  });
});
