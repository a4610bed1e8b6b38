import type { EntityManager } from 'typeorm';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { AuditLineEntity } from '../../../server/audit/audit-line-entity.ts';
import { verifyChain } from '../../../server/audit/verify-chain.ts';
import type { Endpoint } from '../../../server/http/endpoint.ts';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { contentsOf } from '../contents.ts';
import { keyOf } from '../http/route-examples.ts';
import { ProjectFloor } from '../project-floor.ts';
import type { Reply } from '../test-client.ts';
import { endpointsOf, PASSWORD, TestServer } from '../test-server.ts';
import { type Call, CHANGING_CALLS } from './changing-calls.ts';

const LIMITS = { ...SHIPPED_LIMITS, apiPerMinute: 1e6, linkMailsPerHour: 1e6 };
const SET_UP = 'POST /api/setup';

/** Where a transaction can break: before its line is in the trail, behind it, and when all of it is to be stored. */
const FAULTS = ['append', 'appended', 'commit'] as const;
type Fault = (typeof FAULTS)[number];

/** What is no change of the work itself: who is signed in, mail under way, and the trail. */
const ASIDE = ['session', 'outgoing_mail', 'audit_line', 'audit_head', 'fault'];

describe('R-30: a call that changes something or hands a file out', () => {
  let server: TestServer;
  let floor: ProjectFloor;
  beforeAll(async () => {
    server = await TestServer.start({ limits: LIMITS });
    await server.setUp();
    floor = await ProjectFloor.open(server);
    await plantFaults(server);
  }, 60_000);
  afterAll(() => server.stop());

  it('stands in the table for every such route of the router', () => {
    const changing = endpointsOf(server.router).filter(changes).map(keyOf).sort();
    expect(changing.length).toBeGreaterThan(30);
    expect([...Object.keys(CHANGING_CALLS), SET_UP].sort()).toEqual(changing);
  });

  it.each(Object.keys(CHANGING_CALLS))('%s', async (key) => {
    await expectTraced(server, key, await CHANGING_CALLS[key]!(floor));
  });

  it('leaves the trail whole in the end', async () => {
    expect(await server.database.read(verifyChain)).toMatchObject({ whole: true, faults: [] });
  });

  it(SET_UP, async () => {
    const fresh = await TestServer.start({ limits: LIMITS });
    await plantFaults(fresh);
    const body = {
      ...{ code: fresh.services.setup.issueCode(), workspace: 'Test Works', name: 'Ada Admin' },
      ...{ email: 'ada@works.example', password: PASSWORD },
    };
    const client = await fresh.visit();
    await expectTraced(fresh, SET_UP, {
      ...{ client, path: '/api/setup', body, action: 'workspace.set-up' },
    });
    await fresh.stop();
  });
});

describe('R-30: what is found', () => {
  let server: TestServer;
  beforeAll(async () => {
    server = await TestServer.start();
    await server.setUp();
  });
  afterAll(() => server.stop());

  it('is a change without a line in its transaction', async () => {
    const name = (to: string) => (manager: EntityManager) =>
      manager.query('UPDATE workspace SET name = ?', [to]);
    const [, transactions] = await watched(server, () => server.database.transaction(name('A')));
    expect(transactions).toEqual([{ changed: true, lines: 0 }]);
  });
});

/** Three times it fails and nothing is left of it; then the same call succeeds and leaves its line. */
async function expectTraced(server: TestServer, key: string, call: Call): Promise<void> {
  const [method] = key.split(' ') as [string];
  expect(`${method} ${call.path}`).toMatch(patternOf(key));
  const send = (): Promise<Reply> =>
    call.client.send(method, call.path, call.body, call.etag ? { 'If-Match': call.etag } : {});
  await server.mails(); // nothing under way
  for (const fault of FAULTS) {
    const before = await state(server);
    await setFault(server, fault);
    const reply = await send();
    await setFault(server, null);
    expect([fault, reply.status, reply.body.code]).toEqual([fault, 500, 'internal']);
    expect(await state(server), fault).toBe(before);
  }
  const linesBefore = await lines(server);
  const [reply, transactions] = await watched(server, send);
  expect(reply.status, reply.text).toBeLessThan(300);
  const left = (await lines(server)).slice(linesBefore.length);
  expect(left.map(({ action }) => action)).toContain(call.action);
  const requests = new Set(left.map(({ requestId }) => requestId));
  expect(requests.size, 'one request').toBe(1);
  expect(left.every(({ atMs, who }) => atMs === server.nowMs && who !== '')).toBe(true);
  for (const { changed, lines } of transactions) {
    if (changed) expect(lines, 'lines in the transaction of the change').toBeGreaterThan(0);
  }
}

function changes({ route }: Endpoint): boolean {
  return route.method !== 'GET' || (route as { file?: boolean }).file === true;
}

function patternOf(key: string): RegExp {
  return new RegExp(`^${key.replace(/:\w+/g, '[\\w-]+')}$`);
}

function lines(server: TestServer): Promise<AuditLineEntity[]> {
  return server.database.read((manager) =>
    manager.find(AuditLineEntity, { order: { sequence: 'ASC' } }),
  );
}

/** Everything stored, mail and trail as well, and who is signed in; not when a session was last used. */
function state(server: TestServer): Promise<string> {
  return server.database.read(async (manager) => {
    const sessions: unknown = await manager.query(
      `SELECT id_hash, person_id FROM session ORDER BY id_hash`,
    );
    return JSON.stringify([await contentsOf(manager, ['session', 'fault']), sessions]);
  });
}

/** For each transaction of the work that ended well, whether it changed anything, and its lines in the trail. */
async function watched<T>(
  server: TestServer,
  work: () => Promise<T>,
): Promise<[T, { changed: boolean; lines: number }[]]> {
  const seen: { changed: boolean; lines: number }[] = [];
  const { database } = server;
  const plain = database.transaction.bind(database);
  const spy = vi
    .spyOn(database, 'transaction')
    .mockImplementation((inner: (manager: EntityManager) => Promise<unknown>) =>
      plain(async (manager) => {
        const [before, linesBefore] = [
          await contentsOf(manager, ASIDE),
          await manager.count(AuditLineEntity),
        ];
        const result = await inner(manager);
        const changed = (await contentsOf(manager, ASIDE)) !== before;
        seen.push({ changed, lines: (await manager.count(AuditLineEntity)) - linesBefore });
        return result;
      }),
    );
  try {
    return [await work(), seen];
  } finally {
    spy.mockRestore();
  }
}

/** Triggers that break a transaction while the one row of `fault` says where; the last by a key that holds at commit only. */
function plantFaults(server: TestServer): Promise<void> {
  const when = (fault: Fault): string => `WHEN (SELECT at FROM fault) = '${fault}'`;
  return server.database.transaction(async (manager) => {
    for (const statement of [
      `CREATE TABLE fault (at text, nowhere integer REFERENCES fault (rowid_of) DEFERRABLE INITIALLY DEFERRED, rowid_of integer UNIQUE)`,
      `INSERT INTO fault VALUES (NULL, NULL, NULL)`,
      `CREATE TRIGGER fault_append BEFORE INSERT ON audit_line ${when('append')}
       BEGIN SELECT RAISE(ABORT, 'planted fault'); END`,
      `CREATE TRIGGER fault_appended AFTER UPDATE ON audit_head ${when('appended')}
       BEGIN SELECT RAISE(ABORT, 'planted fault'); END`,
      `CREATE TRIGGER fault_commit AFTER INSERT ON audit_line ${when('commit')}
       BEGIN UPDATE fault SET nowhere = 1; END`,
    ]) {
      await manager.query(statement);
    }
  });
}

async function setFault(server: TestServer, at: Fault | null): Promise<void> {
  await server.database.transaction((manager) => manager.query('UPDATE fault SET at = ?', [at]));
}
