import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { TestClient } from '../test-client.ts';
import { TestServer } from '../test-server.ts';

describe('input', () => {
  let server: TestServer;
  let admin: TestClient;
  beforeAll(async () => {
    server = await TestServer.start();
    admin = await server.signIn(await server.setUp());
  });
  afterAll(() => server.stop());

  const invite = { name: 'Ina Invited', email: 'ina@works.example', administrator: false };

  it('S-31: names every field at fault by a JSON pointer', async () => {
    const { status, body } = await admin.post('/api/people', { name: '', email: 'nobody' });
    expect(status).toBe(422);
    expect(body).toMatchObject({ code: 'invalid-input', status: 422 });
    expect(body.errors.map((e: { pointer: string }) => e.pointer)).toEqual([
      ...['/name', '/email', '/administrator'],
    ]);
  });

  it.each(['id', 'state', 'version', 'createdAtMs', 'passwordHash'])(
    'S-19: refuses %s, which is not for callers to set',
    async (key) => {
      const { status, body } = await admin.post('/api/people', { ...invite, [key]: 'x' });
      expect(status).toBe(422);
      expect(body.errors).toEqual([{ pointer: `/${key}`, message: 'is not known here' }]);
    },
  );

  it.each([
    ['{"name":NaN}', 400],
    ['{"name":', 400],
    ['"text"', 400],
    ['[]', 422],
    ['null', 400],
    ['{}', 422],
    ['{"name":-1,"email":{},"administrator":[]}', 422],
    [JSON.stringify({ ...invite, name: 'x'.repeat(81) }), 422],
    [JSON.stringify({ ...invite, name: 'two\nlines' }), 422],
    [JSON.stringify({ ...invite, email: 'a@x.test\r\nBcc:evil@x.test' }), 422],
    [JSON.stringify({ ...invite, email: 'g:evil@x.test;' }), 422],
    [JSON.stringify({ ...invite, email: 'a@x.test,b@x.test' }), 422],
  ])('S-31: answers %s with %i', async (text, status) => {
    const reply = await admin.post('/api/people', text);
    expect(reply.status).toBe(status);
    expect(reply.headers.get('content-type')).toContain('application/problem+json');
  });

  it('S-31: refuses a 10 MB body and one a byte too large', async () => {
    const body = await admin.post('/api/people', { ...invite, name: 'x'.repeat(10 * 2 ** 20) });
    expect([body.status, body.body.code]).toEqual([413, 'body-too-large']);
    const exact = JSON.stringify({ ...invite, name: '' });
    const fits = exact.replace('""', `"${'x'.repeat(256 * 1024 - exact.length)}"`);
    expect((await admin.post('/api/people', fits)).status).toBe(422);
    expect((await admin.post('/api/people', `${fits} `)).status).toBe(413);
  });

  it('S-31: refuses a document nested deeper than 20', async () => {
    const nested = (depth: number): string => `${'{"a":'.repeat(depth)}1${'}'.repeat(depth)}`;
    const deep = await admin.post('/api/people', nested(21));
    expect(deep.status).toBe(422);
    expect(deep.body.errors[0].message).toContain('20 levels');
    expect((await admin.post('/api/people', nested(20))).body.errors[0].pointer).not.toMatch(
      /a\/a/,
    );
    expect(
      (await admin.post('/api/people', '['.repeat(100_000) + ']'.repeat(100_000))).status,
    ).toBe(422);
  });

  it.each(['__proto__', 'constructor', 'prototype'])('S-33: refuses the key %s', async (key) => {
    const text = `{"name":"a","nested":{"${key}":{"polluted":true}}}`;
    expect((await admin.post('/api/people', text)).status).toBe(422);
    expect((await admin.get(`/api/audit?${key}=1`)).status).toBe(422);
    expect((await admin.get(`/api/audit?${key}[polluted]=1`)).status).toBe(422);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });

  it.each([
    ['{"name":"half \\ud83d of a pair"}', '/name'],
    ['{"name":"end\\u0000of text"}', '/name'],
    ['{"nested":{"\\udc00":1}}', '/nested/\udc00'],
  ])('S-31: refuses %s, which no database could give back', async (text, pointer) => {
    const { status, body } = await admin.post('/api/people', text);
    expect([status, body.errors[0].pointer]).toEqual([422, pointer]);
  });

  it('S-34: refuses a repeated and an unknown query key', async () => {
    const twice = await admin.get('/api/audit?limit=1&limit=2');
    expect([twice.status, twice.body.errors[0].pointer]).toEqual([422, '/query/limit']);
    expect((await admin.get('/api/audit?limit=0')).body.errors[0].pointer).toBe('/query/limit');
    expect((await admin.get('/api/audit?sort=1')).body.errors[0].pointer).toBe('/query/sort');
    expect((await admin.get('/api/people?x=1')).status).toBe(422);
  });

  it('S-32: takes what looks like SQL for text', async () => {
    for (const text of [`' OR 1=1 --`, `"; DROP TABLE person; --`, `%' UNION SELECT 1 --`]) {
      const { status, body } = await admin.get(`/api/audit?search=${encodeURIComponent(text)}`);
      expect([status, body.total]).toEqual([200, 0]);
    }
    expect((await admin.get('/api/people')).body.people).toHaveLength(1);
    expect((await admin.post('/api/people', { ...invite, email: { $ne: '' } })).status).toBe(422);
  });

  it('S-24: takes JSON only', async () => {
    const form = { 'Content-Type': 'application/x-www-form-urlencoded' };
    expect((await admin.post('/api/people', 'name=x', form)).status).toBe(415);
    const plain = { 'Content-Type': 'text/plain' };
    expect((await admin.post('/api/people', JSON.stringify(invite), plain)).status).toBe(415);
    const odd = { 'Content-Type': 'application/json; charset=utf-7' };
    expect((await admin.post('/api/people', JSON.stringify(invite), odd)).status).toBe(415);
    const packed = { 'Content-Encoding': 'zstd' };
    expect((await admin.post('/api/people', JSON.stringify(invite), packed)).status).toBe(415);
  });

  it('refuses a malformed id and address', async () => {
    const { status, body } = await admin.get('/api/people/not-an-id');
    expect([status, body.errors[0].pointer]).toEqual([422, '/params/personId']);
    expect((await admin.get('/api/people/%E0%A4%A')).status).toBe(400);
    expect((await admin.get('/api/nothing')).status).toBe(404);
    expect((await admin.get('/api/PEOPLE')).status).toBe(404);
  });

  it('S-35: hostile strings of 64 KiB are judged within 50 ms', async () => {
    const { Email, PersonName } = await import('../../../shared/contract/common-fields.ts');
    const { parseIfMatch } = await import('../../../server/http/versioned.ts');
    const { passwordFault } = await import('../../../server/users/password-rules.ts');
    passwordFault('warm the list up', []);
    const judges: ((text: string) => unknown)[] = [
      (text) => Email.safeParse(text),
      (text) => PersonName.safeParse(text),
      (text) => passwordFault(text, [text]),
      (text) => {
        try {
          return parseIfMatch(text);
        } catch {
          return null;
        }
      },
    ];
    for (const piece of ['a', '@', 'a@', 'a.', '-', '"-', ' ', '1', 'ab-1']) {
      const text = piece.repeat(65_536 / piece.length);
      for (const judge of judges) {
        const startedAtMs = performance.now();
        judge(text);
        expect(performance.now() - startedAtMs).toBeLessThan(50);
      }
    }
  });

  it('S-49: tells nothing of its inside in 200 provoked errors', async () => {
    const paths = [
      '/api/people',
      '/api/session',
      '/api/setup',
      '/api/password-resets',
      '/api/nothing',
    ];
    const bodies = [
      '{',
      '[]',
      '{"a":1}',
      '{"email":"a@b.example","password":"x"}',
      '"x"',
      '{"code":"',
    ];
    let provoked = 0;
    for (const method of ['POST', 'PUT', 'PATCH', 'DELETE', 'GET']) {
      for (const path of paths) {
        for (const body of bodies) {
          const sent = method === 'GET' ? undefined : body;
          const reply = await admin.send(method, `${path}?x='`, sent);
          if (reply.status < 400) continue;
          provoked += 1;
          expect(reply.status).toBeLessThan(500);
          expect(reply.body.reference).toMatch(/^[0-9a-f-]{36}$/);
          expect(reply.text).not.toMatch(
            /node_modules|\.ts|\.js|sqlite|SELECT|Error:|express|\/work|\d+\.\d+\.\d+/i,
          );
        }
      }
    }
    for (let i = 0; provoked < 200; i++, provoked++) {
      const reply = await admin.get(`/api/audit?before=${'9'.repeat(i + 1)}x`);
      expect([reply.status, reply.body.code]).toEqual([422, 'invalid-input']);
    }
  });
});
