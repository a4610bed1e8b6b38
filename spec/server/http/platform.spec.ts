import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { Health } from '../../../server/http/health.ts';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { createLogger } from '../../../server/http/request-log.ts';
import { TestServer } from '../test-server.ts';

describe('platform', () => {
  let server: TestServer;
  beforeEach(async () => {
    server = await TestServer.start({ limits: { ...SHIPPED_LIMITS, apiPerMinute: 20 } });
  });
  afterEach(() => server.stop());

  it('S-48: allows so many requests a minute by person, says so, and never counts health', async () => {
    const client = await server.signIn(await server.addPerson('Dora Designer'));
    const other = await server.signIn(await server.addPerson('Carl Checker'));
    const first = await client.get('/api/session');
    expect(first.headers.get('ratelimit')).toMatch(/r=\d+; t=\d+/);
    const statuses: number[] = [];
    for (let i = 0; i < 20; i++) statuses.push((await client.get('/api/session')).status);
    expect(statuses.filter((status) => status === 429)).toHaveLength(1);
    const refused = await client.get('/api/colleagues');
    expect([refused.status, refused.body.code]).toEqual([429, 'too-many-requests']);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await other.get('/api/session')).status).toBe(200);
    for (let i = 0; i < 40; i++) expect((await client.get('/livez')).status).toBe(200);
  });

  it('R-22: lives within 5 ms without the database, and tells strangers one word', async () => {
    const client = server.stranger();
    const live = await client.get('/livez');
    expect([live.status, live.text]).toEqual([200, '{"status":"live"}']);
    const ready = await client.get('/readyz');
    expect([ready.status, ready.text]).toEqual([200, '{"status":"ready"}']);
    server.services.health.stopping = true;
    const stopping = await client.get('/readyz');
    expect([stopping.status, stopping.text]).toEqual([503, '{"status":"not-ready"}']);
    expect((await client.get('/livez')).status).toBe(200);
  });

  it('R-22: is not ready while the disk is nearly full, writes pile up or the database is unreadable', async () => {
    const { database, folder } = server;
    const free = (bytes: number) =>
      new Health(database, folder, () => Promise.resolve(bytes)).fault();
    expect(await free(501 * 2 ** 20)).toBeNull();
    expect(await free(499 * 2 ** 20)).toBe('disk nearly full');
    expect(await new Health(database, '/nowhere').fault()).toContain('ENOENT');
    const piled = { pendingWrites: 201 };
    expect(await new Health(piled as never, folder).fault()).toBe('writes pile up');
    const broken = { pendingWrites: 0, read: () => Promise.reject(new Error('no database')) };
    expect(await new Health(broken as never, folder).fault()).toBe('no database');
  });

  it('S-39: escapes what would forge a log line, and shortens what callers send', async () => {
    const client = server.stranger();
    await client.get(`/api/${'x'.repeat(3000)}`);
    await client.get('/api/%0a%7b%22level%22%3a60%7d');
    for (const line of server.log) {
      expect(line.trim().split('\n')).toHaveLength(1);
      expect(line.length).toBeLessThan(1500);
      expect((JSON.parse(line) as { level: number }).level).toBeLessThan(60);
    }
  });

  it('S-50: hides passwords, tokens and cookies wherever they turn up in a log entry', () => {
    const lines: string[] = [];
    const logger = createLogger('info', { write: (line) => lines.push(line) });
    const secret = 'planted-secret-value';
    logger.info({ password: secret, token: secret, code: secret, body: { password: secret } });
    logger.info({ req: { headers: { cookie: secret, 'x-xsrf-token': secret } } });
    expect(lines.join('')).not.toContain(secret);
    expect(lines.join('')).toContain('[redacted]');
  });

  it('S-49: answers a defect of ours with a reference and nothing else, and logs it whole', async () => {
    const client = await server.signIn(await server.addPerson('Dora Designer'));
    server.services.people.colleagues = () => Promise.reject(new Error('SELECT gone wrong'));
    const { status, body, text } = await client.get('/api/colleagues');
    expect([status, body.code]).toEqual([500, 'internal']);
    expect(text).not.toContain('SELECT');
    const logged = server.log.find((line) => line.includes('SELECT gone wrong'))!;
    expect(logged).toContain(body.reference);
    expect(logged).toContain('platform.spec.ts');
  });
});
