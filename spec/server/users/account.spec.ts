import { createHash } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { OneTimeTokenEntity } from '../../../server/users/one-time-token-entity.ts';
import type { TestClient } from '../test-client.ts';
import { PASSWORD, type TestPerson, TestServer } from '../test-server.ts';

const MINUTE_MS = 60_000;
const NEXT = 'a quite different phrase';

describe('an account', () => {
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
  const askReset = () =>
    server.tokenFor(person, async (client) => {
      await client.post('/api/password-resets', { email: person.email });
    });
  const redeem = async (token: string, password = NEXT) =>
    (await server.visit()).post('/api/password-resets/redemption', { token, password });

  describe('password', () => {
    it('S-03: changes only with the current one, ends other sessions and mails a notice', async () => {
      const [here, there] = [await server.signIn(person), await server.signIn(person)];
      const wrong = await here.put('/api/account/password', { current: 'no', next: NEXT });
      expect([wrong.status, wrong.body.errors[0].pointer]).toEqual([422, '/current']);
      const change = await here.put('/api/account/password', { current: PASSWORD, next: NEXT });
      expect(change.status).toBe(204);
      expect([await who(here), await who(there)]).toEqual([person.id, null]);
      expect((await server.mails())[0]).toMatchObject({
        to: `${person.name} <${person.email}>`,
        subject: 'Your Sinkwell password has been changed',
      });
      await expect(server.signIn(person)).rejects.toThrow('401');
      await server.signIn(person, NEXT);
    });

    it('S-02: may not be made of the own name, the firm or common passwords', async () => {
      const client = await server.signIn(person);
      for (const next of [
        'dora.designer.dora',
        'test works test works',
        'passwordpassword1',
        'too short',
      ]) {
        const reply = await client.put('/api/account/password', { current: PASSWORD, next });
        expect([reply.status, reply.body.errors[0].pointer], next).toEqual([422, '/next']);
      }
    });

    it('S-06: cannot be guessed through a session left open', async () => {
      const client = await server.signIn(person);
      const statuses: number[] = [];
      for (let i = 0; i < 7; i++) {
        const wrong = { current: `guess ${i}`, next: NEXT };
        statuses.push((await client.put('/api/account/password', wrong)).status);
      }
      expect(statuses).toEqual([422, 422, 422, 422, 422, 429, 429]);
    });
  });

  describe('password reset', () => {
    it('S-08: works once, ends every session, and only the hash of its token is stored', async () => {
      const open = await server.signIn(person);
      const token = await askReset();
      expect(Buffer.from(token, 'base64url')).toHaveLength(32);
      const rows = await server.database.read((m) => m.find(OneTimeTokenEntity));
      expect(rows.map(({ hash }) => hash)).toEqual([
        createHash('sha256').update(token).digest('hex'),
      ]);
      expect((await redeem(token)).status).toBe(204);
      expect(await who(open)).toBeNull();
      await server.signIn(person, NEXT);
      const again = await redeem(token, 'yet another phrase here');
      expect([again.status, again.body.errors[0].pointer]).toEqual([422, '/token']);
    });

    it('S-08: lives ten minutes', async () => {
      const token = await askReset();
      server.pass(10 * MINUTE_MS);
      expect((await redeem(token)).status).toBe(422);
    });

    it('S-08: dies with any new password', async () => {
      const token = await askReset();
      const client = await server.signIn(person);
      await client.put('/api/account/password', { current: PASSWORD, next: NEXT });
      expect((await redeem(token, 'yet another phrase here')).status).toBe(422);
    });

    it('S-08: is not used up by a refused password', async () => {
      const token = await askReset();
      expect((await redeem(token, 'short')).body.errors[0].pointer).toBe('/password');
      expect((await redeem(token)).status).toBe(204);
    });

    it('S-08: links to the configured address whatever Host the request names', async () => {
      const { request } = await import('node:http');
      const client = await server.visit();
      const status = await new Promise<number | undefined>((resolve) => {
        const headers = {
          ...{ Host: 'evil.example', 'Content-Type': 'application/json' },
          'X-XSRF-TOKEN': client.cookies.get('XSRF-TOKEN')!,
          Cookie: [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; '),
        };
        const sent = request(`${server.url}/api/password-resets`, { method: 'POST', headers });
        sent.on('response', (reply) => {
          resolve(reply.statusCode);
        });
        sent.end(JSON.stringify({ email: person.email }));
      });
      expect(status).toBe(202);
      const [mail] = await server.mails();
      expect(mail!.text).toContain(`${server.config.origin}/reset-password#`);
      expect(mail!.text).not.toContain('evil');
    });

    it('S-48: can be asked for ten times an hour from one address', async () => {
      const client = await server.visit();
      const statuses: number[] = [];
      for (let i = 0; i < 11; i++) {
        statuses.push(
          (await client.post('/api/password-resets', { email: `n${i}@x.example` })).status,
        );
      }
      expect(statuses).toEqual([...Array.from({ length: 10 }, () => 202), 429]);
    });
  });

  describe('invitation', () => {
    const invite = { name: 'Ina Invited', email: 'ina@works.example', administrator: false };
    const ask = () =>
      server.tokenFor(invite, async () => {
        const chief = await server.signIn(admin);
        expect((await chief.post('/api/people', invite)).status).toBe(201);
      });
    const accept = async (token: string, password = NEXT) =>
      (await server.visit()).post('/api/invitations/acceptance', { token, password });

    it('S-09: lets a person in after setting a password, once', async () => {
      const token = await ask();
      await expect(server.signIn(invite, NEXT)).rejects.toThrow('401');
      expect((await accept(token)).status).toBe(204);
      expect(await who(await server.signIn(invite, NEXT))).not.toBeNull();
      expect((await accept(token, 'yet another phrase here')).status).toBe(422);
    });

    it('S-09: lives 24 hours', async () => {
      const token = await ask();
      server.pass(24 * 60 * MINUTE_MS);
      expect((await accept(token)).status).toBe(422);
    });

    it('S-09: can be sent again when it has expired, until it is taken up', async () => {
      await ask();
      server.pass(24 * 60 * MINUTE_MS);
      const chief = await server.signIn(admin);
      const people = (await chief.get('/api/people')).body.people as {
        id: string;
        email: string;
      }[];
      const { id } = people.find(({ email }) => email === invite.email)!;
      const again = async () => (await chief.post(`/api/people/${id}/invitation`)).status;
      const token = await server.tokenFor(invite, async () => {
        expect(await again()).toBe(202);
      });
      expect((await accept(token)).status).toBe(204);
      expect(await who(await server.signIn(invite, NEXT))).toBe(id);
      expect(await again()).toBe(409);
      const client = await server.signIn(person);
      expect((await client.post(`/api/people/${id}/invitation`)).status).toBe(403);
      const { lines } = (await chief.get('/api/audit?search=invited-again')).body;
      expect(lines).toMatchObject([{ summary: 'invited Ina Invited again', objectId: id }]);
    });

    it('is refused for an address that has an account, and to whoever is no administrator', async () => {
      const chief = await server.signIn(admin);
      const twice = await chief.post('/api/people', { ...invite, email: person.email });
      expect([twice.status, twice.body.errors[0].pointer]).toEqual([409, '/email']);
      const client = await server.signIn(person);
      expect((await client.post('/api/people', invite)).status).toBe(403);
    });

    it('S-50: leaves neither link nor address in log and trail details', async () => {
      const token = await ask();
      await accept(token);
      const chief = await server.signIn(admin);
      const trail = JSON.stringify((await chief.get('/api/audit')).body);
      for (const text of [server.log.join(''), trail]) {
        expect(text).not.toContain(token);
        expect(text).not.toContain(NEXT);
      }
    });
  });

  describe('e-mail address', () => {
    const wish = { password: PASSWORD, email: 'dora.new@works.example' };
    const tokens = async (): Promise<string[]> =>
      (await server.mails()).flatMap(
        ({ text }) => /confirm-email#([\w-]{43})/.exec(text)?.[1] ?? [],
      );
    const confirm = async (token: string) =>
      (await server.visit()).post('/api/account/email-changes/confirmation', { token });

    it('S-03: changes when both the old and the new address have confirmed', async () => {
      const client = await server.signIn(person);
      const wrong = await client.post('/api/account/email-changes', { ...wish, password: 'no' });
      expect([wrong.status, wrong.body.errors[0].pointer]).toEqual([422, '/password']);
      expect((await client.post('/api/account/email-changes', wish)).status).toBe(202);
      const [first, second] = await tokens();
      expect((await server.mails()).map(({ to }) => to).sort()).toEqual(
        [`${person.name} <${wish.email}>`, `${person.name} <${person.email}>`].sort(),
      );
      expect((await confirm(first!)).body).toEqual({ changed: false });
      expect((await confirm(first!)).status).toBe(422);
      expect((await confirm(second!)).body).toEqual({ changed: true });
      await server.signIn({ email: wish.email });
      await expect(server.signIn(person)).rejects.toThrow('401');
    });

    it('S-07: is answered alike, without any mail, when somebody else has it', async () => {
      const client = await server.signIn(person);
      const taken = { ...wish, email: admin.email };
      expect((await client.post('/api/account/email-changes', taken)).status).toBe(202);
      expect(await tokens()).toEqual([]);
    });

    it('dies with a new password', async () => {
      const client = await server.signIn(person);
      await client.post('/api/account/email-changes', wish);
      await client.put('/api/account/password', { current: PASSWORD, next: NEXT });
      for (const token of await tokens()) expect((await confirm(token)).status).toBe(422);
    });
  });
});
