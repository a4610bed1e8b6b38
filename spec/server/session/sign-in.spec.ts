import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { PASSWORD, TestServer } from '../test-server.ts';

describe('sign-in', () => {
  let server: TestServer;
  beforeEach(async () => {
    server = await TestServer.start();
  });
  afterEach(() => server.stop());

  it('lets a person in with the right password and tells who it is', async () => {
    await server.setUp();
    const person = await server.addPerson('Dora Designer');
    const client = await server.visit();
    const reply = await client.post('/api/session', { email: person.email, password: PASSWORD });
    expect(reply.status).toBe(200);
    expect(reply.body.person).toEqual({ ...person, administrator: false });
    expect((await client.get('/api/session')).body.person.id).toBe(person.id);
  });

  it('refuses a wrong password', async () => {
    const person = await server.addPerson('Dora Designer');
    const client = await server.visit();
    const reply = await client.post('/api/session', { email: person.email, password: 'no' });
    expect(reply.status).toBe(401);
    expect(reply.body.code).toBe('wrong-credentials');
    expect(reply.headers.get('content-type')).toContain('application/problem+json');
  });

  it('ends on the server, not only in the browser', async () => {
    const person = await server.addPerson('Dora Designer');
    const client = await server.signIn(person);
    const kept = new Map(client.cookies);
    expect((await client.delete('/api/session')).status).toBe(204);
    kept.forEach((value, name) => client.cookies.set(name, value));
    expect((await client.get('/api/session')).body.person).toBeNull();
  });
});
