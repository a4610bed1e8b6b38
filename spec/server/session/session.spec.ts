import Sqlite from 'better-sqlite3';
import path from 'node:path';
import session from 'express-session';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { TestClient } from '../test-client.ts';
import { type TestPerson, TestServer } from '../test-server.ts';

const MINUTE_MS = 60_000;

describe('a session', () => {
  let server: TestServer;
  let admin: TestPerson;
  let person: TestPerson;
  beforeEach(async () => {
    server = await TestServer.start();
    admin = await server.setUp();
    person = await server.addPerson('Dora Designer');
  });
  afterEach(() => server.stop());

  const who = async (client: TestClient): Promise<string | null> =>
    (await client.get('/api/session')).body.person?.id ?? null;
  const withCookie = (value: string): TestClient => {
    const client = server.stranger();
    client.cookies.set('sid', value);
    return client;
  };

  it('S-11: lives in a cookie scripts cannot read, of 192 random bits', async () => {
    const client = await server.visit();
    const reply = await client.post('/api/session', {
      email: person.email,
      password: server.password,
    });
    const cookie = reply.headers.getSetCookie().find((line) => line.startsWith('sid='))!;
    expect(cookie).toMatch(/^sid=s%3A[\w-]{32}\.[^;]+; Path=\/; HttpOnly; SameSite=Lax$/);
  });

  it('S-12: gets a new id at sign-in and at a new password; the old ones open nothing', async () => {
    const client = await server.visit();
    const before = client.cookies.get('sid')!;
    await client.post('/api/session', { email: person.email, password: server.password });
    const during = client.cookies.get('sid')!;
    expect(during).not.toBe(before);
    expect(await who(withCookie(before))).toBeNull();
    const change = { current: server.password, next: 'a quite different phrase' };
    expect((await client.put('/api/account/password', change)).status).toBe(204);
    expect(client.cookies.get('sid')).not.toBe(during);
    expect(await who(withCookie(during))).toBeNull();
    expect(await who(client)).toBe(person.id);
  });

  it('S-13: ends 30 min after the last request', async () => {
    const client = await server.signIn(person);
    server.pass(29 * MINUTE_MS);
    expect(await who(client)).toBe(person.id);
    server.pass(29 * MINUTE_MS);
    expect(await who(client)).toBe(person.id);
    server.pass(30 * MINUTE_MS);
    expect(await who(client)).toBeNull();
  });

  it('S-13: ends 12 h after its start, however busy', async () => {
    const client = await server.signIn(person);
    for (let i = 0; i < 35; i++) {
      server.pass(20 * MINUTE_MS);
      expect(await who(client)).toBe(person.id);
    }
    server.pass(20 * MINUTE_MS);
    expect(await who(client)).toBeNull();
  });

  it('S-14: ends on the server at sign-out', async () => {
    const client = await server.signIn(person);
    const kept = client.cookies.get('sid')!;
    expect((await client.delete('/api/session')).status).toBe(204);
    expect(await who(withCookie(kept))).toBeNull();
  });

  it('S-14: ends when the account is disabled or loses rights', async () => {
    const chief = await server.signIn(admin);
    const client = await server.signIn(person);
    const { etag } = await chief.get(`/api/people/${person.id}`);
    const match = { 'If-Match': etag! };
    expect((await chief.patch(`/api/people/${person.id}`, { disabled: true }, match)).status).toBe(
      200,
    );
    expect(await who(client)).toBeNull();
    expect((await client.get('/api/colleagues')).status).toBe(401);
  });

  it('S-14: is listed to its owner, who can end each but nobody else’s', async () => {
    const [here, there] = [await server.signIn(person), await server.signIn(person)];
    const stranger = await server.signIn(admin);
    const { sessions } = (await here.get('/api/account/sessions')).body;
    expect(sessions).toHaveLength(2);
    const other = sessions.find((one: { current: boolean }) => !one.current);
    expect(other).toMatchObject({ current: false, startedAtMs: server.nowMs, agent: 'node' });
    expect((await stranger.delete(`/api/account/sessions/${other.id}`)).status).toBe(404);
    expect((await here.delete(`/api/account/sessions/${other.id}`)).status).toBe(204);
    expect(await who(there)).toBeNull();
    expect(await who(here)).toBe(person.id);
  });

  it('S-14: is ended by an administrator, all of a person at once', async () => {
    const clients = [await server.signIn(person), await server.signIn(person)];
    const chief = await server.signIn(admin);
    expect((await chief.delete(`/api/people/${person.id}/sessions`)).status).toBe(204);
    for (const client of clients) expect(await who(client)).toBeNull();
    expect(await who(chief)).toBe(admin.id);
  });

  it('S-14: once ended does not come back by a request that was under way', async () => {
    const client = await server.signIn(person);
    const sid = decodeURIComponent(client.cookies.get('sid')!).slice(2).split('.')[0]!;
    const store = server.services.sessions;
    const data = await new Promise<session.SessionData>((resolve) => {
      store.get(sid, (_, found) => {
        resolve(found!);
      });
    });
    const request = { sessionID: sid, sessionStore: store } as never;
    const loaded = store.createSession(request, data);
    await new Promise((resolve) => {
      store.destroy(sid, resolve);
    });
    await new Promise((resolve) => {
      store.set(sid, loaded, resolve);
    });
    expect(await who(client)).toBeNull();
  });

  it('S-16: stands in the database under a hash of its id', async () => {
    const client = await server.signIn(person);
    const sid = decodeURIComponent(client.cookies.get('sid')!).slice(2).split('.')[0]!;
    const raw = new Sqlite(path.join(server.folder, 'sinkwell.sqlite'), { readonly: true });
    const rows = raw.prepare('SELECT * FROM session').all();
    raw.close();
    expect(JSON.stringify(rows)).not.toContain(sid);
    expect(JSON.stringify(rows)).toContain(person.id);
    expect(server.services.sessions).not.toBeInstanceOf(session.MemoryStore);
  });

  it('is swept from the database some time after it has ended', async () => {
    await server.signIn(person);
    server.pass(31 * MINUTE_MS);
    await server.services.sessions.sweep();
    const raw = new Sqlite(path.join(server.folder, 'sinkwell.sqlite'), { readonly: true });
    expect(raw.prepare('SELECT count(*) FROM session').pluck().get()).toBe(0);
    raw.close();
  });

  it('S-16: is not opened by a cookie signed with another secret', async () => {
    const client = await server.signIn(person);
    const [id] = client.cookies.get('sid')!.split('.');
    expect(await who(withCookie(`${id!}.${'A'.repeat(43)}`))).toBeNull();
  });
});
