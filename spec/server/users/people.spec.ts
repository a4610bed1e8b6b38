import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { TestClient } from '../test-client.ts';
import { PASSWORD, type TestPerson, TestServer } from '../test-server.ts';

describe('people', () => {
  let server: TestServer;
  let admin: TestPerson;
  let person: TestPerson;
  let chief: TestClient;
  beforeEach(async () => {
    server = await TestServer.start();
    admin = await server.setUp();
    person = await server.addPerson('Dora Designer');
    chief = await server.signIn(admin);
  });
  afterEach(() => server.stop());

  const change = (id: string, body: object, etag: string | null) =>
    chief.patch(`/api/people/${id}`, body, etag === null ? {} : { 'If-Match': etag });

  it('are changed under the version that was read', async () => {
    const read = await chief.get(`/api/people/${person.id}`);
    expect(read.etag).toBe(`"${person.id}-1"`);
    const changed = await change(person.id, { name: 'Dora Drew' }, read.etag);
    expect(changed.body.name).toBe('Dora Drew');
    expect(changed.etag).toBe(`"${person.id}-2"`);
    const stale = await change(person.id, { name: 'Late' }, read.etag);
    expect([stale.status, stale.body.code]).toEqual([412, 'version-conflict']);
    expect((await chief.get(`/api/people/${person.id}`)).body.name).toBe('Dora Drew');
  });

  it.each([
    [null, 428],
    ['*', 428],
    ['W/"ID-1"', 412],
    ['"ID-2"', 412],
    ['"ID-1", "ID-2"', 412],
    ['ID-1', 412],
    ['"00000000-0000-4000-8000-000000000000-1"', 412],
    ['"ID--1"', 412],
  ])('R-10: with If-Match %s are refused with %i', async (etag, status) => {
    const reply = await change(person.id, { name: 'X' }, etag?.replaceAll('ID', person.id) ?? null);
    expect(reply.status).toBe(status);
  });

  it('R-11: lose no change when three change at once and retry', async () => {
    let accepted = 0;
    const edit = async (label: string): Promise<void> => {
      for (let i = 0; i < 4; i++) {
        for (;;) {
          const { etag } = await chief.get(`/api/people/${person.id}`);
          const reply = await change(person.id, { name: `${label}${i}` }, etag);
          if (reply.status === 200) break;
          expect(reply.status).toBe(412);
        }
        accepted += 1;
      }
    };
    await Promise.all(['a', 'b', 'c'].map(edit));
    const { etag } = await chief.get(`/api/people/${person.id}`);
    expect(etag).toBe(`"${person.id}-${1 + accepted}"`);
  });

  it('always keep one administrator', async () => {
    const { etag } = await chief.get(`/api/people/${admin.id}`);
    for (const body of [{ administrator: false }, { disabled: true }]) {
      const reply = await change(admin.id, body, etag);
      expect([reply.status, reply.body.code]).toEqual([409, 'conflict']);
    }
  });

  it('disabled keep nothing but their name, and come back as they were', async () => {
    const { etag } = await chief.get(`/api/people/${person.id}`);
    const off = await change(person.id, { disabled: true }, etag);
    expect(off.body.state).toBe('disabled');
    await expect(server.signIn(person)).rejects.toThrow('401');
    const names = (await chief.get('/api/colleagues')).body.people.map((p: TestPerson) => p.id);
    expect(names).toEqual([admin.id]);
    const on = await change(person.id, { disabled: false }, off.etag);
    expect(on.body.state).toBe('active');
    await server.signIn(person, PASSWORD);
  });

  it('S-07: that nobody knows are answered like nothing at all', async () => {
    const unknown = '00000000-0000-4000-8000-000000000000';
    const reply = await chief.get(`/api/people/${unknown}`);
    const nowhere = await chief.get('/api/nothing');
    expect({ ...reply.body, reference: '' }).toEqual({ ...nowhere.body, reference: '' });
  });

  it('S-19: come back with exactly the fields of the contract', async () => {
    const { body } = await chief.get('/api/people');
    expect(Object.keys(body.people[0]).sort()).toEqual([
      ...['administrator', 'createdAtMs', 'email', 'id', 'lastSignInAtMs', 'name', 'state'],
    ]);
  });
});
