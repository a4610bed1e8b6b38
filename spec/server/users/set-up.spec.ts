import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { TestServer } from '../test-server.ts';

describe('first-run set-up', () => {
  let server: TestServer;
  beforeEach(async () => {
    server = await TestServer.start();
  });
  afterEach(() => server.stop());

  const form = (code: string) => ({
    ...{ code, workspace: 'Test Works', name: 'Ada Admin', email: 'ada@works.example' },
    password: 'plain-otter-walks-north',
  });

  it('S-09: starts without any account and makes the first administrator by the printed code', async () => {
    const client = await server.visit();
    expect((await client.get('/api/session')).body).toMatchObject({
      setupNeeded: true,
      person: null,
    });
    const code = server.services.setup.issueCode();
    expect(code).toMatch(/^([0-9A-F]{5}-){5}[0-9A-F]{5}$/);
    const done = await client.post('/api/setup', form(code.toLowerCase()));
    expect(done.body).toMatchObject({ setupNeeded: false, workspace: 'Test Works' });
    expect(done.body.person).toMatchObject({ name: 'Ada Admin', administrator: true });
    expect((await client.get('/api/people')).status).toBe(200);
  });

  it('S-09: works once', async () => {
    const code = server.services.setup.issueCode();
    await (await server.visit()).post('/api/setup', form(code));
    const again = await (await server.visit()).post('/api/setup', form(code));
    expect([again.status, again.body.code]).toEqual([409, 'conflict']);
  });

  it('S-09: refuses a wrong code, a code when none was issued, and a weak password', async () => {
    const client = await server.visit();
    expect((await client.post('/api/setup', form('AAAAA-BBBBB'))).status).toBe(403);
    const code = server.services.setup.issueCode();
    expect((await client.post('/api/setup', form('AAAAA-BBBBB'))).status).toBe(403);
    const weak = await client.post('/api/setup', { ...form(code), password: 'Test Works 2026' });
    expect([weak.status, weak.body.errors[0].pointer]).toEqual([422, '/password']);
    expect((await client.get('/api/session')).body.setupNeeded).toBe(true);
  });

  it('R-12: has one winner among many at once', async () => {
    const code = server.services.setup.issueCode();
    const visitors = await Promise.all(Array.from({ length: 8 }, () => server.visit()));
    const replies = await Promise.all(
      visitors.map((client, i) =>
        client.post('/api/setup', { ...form(code), email: `a${i}@x.example` }),
      ),
    );
    expect(replies.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(replies.filter(({ status }) => status === 409)).toHaveLength(7);
  });
});
