import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Access } from '../../../server/http/access.ts';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import type { Endpoint } from '../../../server/http/endpoint.ts';
import { endpointOf } from '../../../server/http/mount.ts';
import { contentsOf } from '../contents.ts';
import { type Hand, ProjectFloor } from '../project-floor.ts';
import type { Reply, TestClient } from '../test-client.ts';
import { endpointsOf, type Layer, TestServer } from '../test-server.ts';
import { bodyFor, type Ids, idsOf, keyOf, pathFor } from './route-examples.ts';

const ROLES = ['designer', 'checker', 'approver', 'exporter'] as const;
const CALLERS = ['visitor', 'outsider', ...ROLES, 'administrator'] as const;
type Caller = (typeof CALLERS)[number];

/** A well-formed tag no version has: whoever may change the object gets 412, and nothing changes. */
const STALE = { 'If-Match': '"00000000-0000-4000-8000-000000000000-999"' };
const LIMITS = { ...SHIPPED_LIMITS, apiPerMinute: 1e6, signInFailuresPerAddress: 1e6 };

describe('the role × route matrix', () => {
  let server: TestServer;
  let floor: ProjectFloor;
  let ids: Ids;
  let foreignIds: Ids;
  let endpoints: Endpoint[];

  beforeAll(async () => {
    server = await TestServer.start({ limits: { ...LIMITS, linkMailsPerHour: 1e6 } });
    await server.setUp();
    floor = await ProjectFloor.open(server);
    ids = await idsOf(floor);
    foreignIds = await idsOf(await ProjectFloor.open(server, 'VX-12'));
    endpoints = endpointsOf(server.router);
  }, 60_000);
  afterAll(() => server.stop());

  const call = (
    client: TestClient,
    endpoint: Endpoint,
    target: Ids,
    headers: Record<string, string> = staleTag(endpoint),
    caller = '',
  ): Promise<Reply> =>
    client.send(
      endpoint.route.method,
      pathFor(endpoint, target, caller),
      bodyFor(endpoint),
      headers,
    );
  const hand = (caller: Exclude<Caller, 'visitor'>): Hand => floor[caller];
  const clientOf = async (caller: Caller): Promise<TestClient> =>
    caller === 'visitor' ? server.visit() : hand(caller).client;
  /** Without signing out, which ends the caller's own session; last, what makes the caller a designer. */
  const tested = (): Endpoint[] => {
    const create = endpoints.filter((e) => keyOf(e) === 'POST /api/projects');
    const end = ['DELETE /api/session', 'POST /api/projects'];
    return [...endpoints.filter((e) => !end.includes(keyOf(e))), ...create];
  };

  it('S-17: every route of the router has a declared rule', () => {
    const layers = server.router.stack as Layer[];
    expect(layers.length).toBeGreaterThan(30);
    for (const { route } of layers) {
      expect(route, 'nothing but routes in the API router').toBeDefined();
      for (const { handle } of route!.stack) expect(endpointOf(handle), route!.path).toBeDefined();
    }
    expect(new Set(endpoints.map(keyOf)).size).toBe(endpoints.length);
  });

  it('S-17: a route put into the router by hand is found', async () => {
    const { Router } = await import('express');
    const router = Router().get('/api/loose', (_request, response) => response.end());
    const [layer] = router.stack as Layer[];
    expect(endpointOf(layer!.route!.stack[0]!.handle)).toBeUndefined();
  });

  it('has a well-formed example for every route', () => {
    for (const endpoint of endpoints) {
      const parsed = endpoint.route.body?.safeParse(bodyFor(endpoint));
      expect(parsed?.error?.issues, keyOf(endpoint)).toBeUndefined();
    }
  });

  it.each(CALLERS)('S-18: gives the %s what the rules say, in the own project', async (caller) => {
    const client = await clientOf(caller);
    for (const endpoint of tested()) {
      const expected = expectation(endpoint.access, caller);
      // refused callers send the tag that would do, so that only the rule stands between them and the change
      const headers = expected === 'allowed' ? staleTag(endpoint) : await currentTag(endpoint);
      const reply = await call(client, endpoint, ids, headers, caller);
      const name = `${keyOf(endpoint)} → ${reply.status} ${reply.text.slice(0, 200)}`;
      if (expected === 'allowed') {
        expect(barred(endpoint.access), name).not.toContain(refusal(reply));
      } else {
        expect(refusal(reply), name).toBe(expected);
      }
    }
  });

  it('S-18: shows nothing of a foreign project, answered like nothing at all', async () => {
    const { client } = floor.designer;
    for (const endpoint of tested()) {
      if (typeof endpoint.access === 'string' || 'anyProject' in endpoint.access) continue;
      const foreign = await call(client, endpoint, foreignIds);
      const absent = await call(client, endpoint, { format: 'csv' });
      expect(foreign.status, keyOf(endpoint)).toBe(404);
      expect({ ...foreign.body, reference: '' }).toEqual({ ...absent.body, reference: '' });
    }
  });

  it('S-18: takes no object of another project in place of the own', async () => {
    const { client } = floor.checker;
    const mixed = { ...ids, findingId: foreignIds['findingId']! };
    for (const endpoint of endpoints.filter(({ route }) => route.path.includes(':findingId'))) {
      const current = await floor.checker.client.get(`/api/revisions/${ids['revisionId']!}`);
      const reply = await call(client, endpoint, mixed, { 'If-Match': current.etag ?? '' });
      expect([403, 404], keyOf(endpoint)).toContain(reply.status);
    }
  });

  it('S-22: logs who was refused what, by which rule', async () => {
    await floor.exporter.client.get('/api/people');
    const line = server.log.at(-2)!;
    expect(JSON.parse(line)).toMatchObject({
      ...{ event: 'refused', problem: 'not-permitted', rule: 'administrator' },
      ...{ personId: floor.exporter.id, route: 'GET /api/people' },
    });
  });

  it('R-10: every change of a mutable resource needs the version that was read', async () => {
    const own = ['/api/session', '/api/account/'];
    const unguarded = endpoints.filter(
      ({ route }) =>
        ['PUT', 'PATCH', 'DELETE'].includes(route.method) &&
        route.guarded !== true &&
        !own.some((start) => route.path.startsWith(start)),
    );
    expect(unguarded.map(keyOf)).toEqual(['DELETE /api/people/:personId/sessions']);
    const chief = floor.administrator.client;
    for (const endpoint of endpoints.filter(({ route }) => route.guarded === true)) {
      const client = typeof endpoint.access === 'string' ? chief : roleClient(endpoint.access);
      for (const [header, status] of [
        ['', 428],
        ['*', 428],
        [`W/${STALE['If-Match']}`, 412],
        ['"nonsense"', 412],
        [STALE['If-Match'], 412],
      ] as const) {
        const reply = await call(client, endpoint, ids, { 'If-Match': header });
        expect(reply.status, `${keyOf(endpoint)} ${header}`).toBe(status);
      }
    }
  });

  it('S-26: reading changes nothing, but that a download leaves its line in the trail', async () => {
    const reads = endpoints.filter(
      ({ route }) => route.method === 'GET' && (route as { file?: true }).file !== true,
    );
    // the sessions' last use is noted
    const contents = () => server.database.read((manager) => contentsOf(manager, ['session']));
    const before = await contents();
    for (const { client } of [floor.administrator, floor.designer]) {
      for (const endpoint of reads) {
        await call(client, endpoint, ids);
        await client.send('HEAD', pathFor(endpoint, ids));
      }
    }
    expect(await contents()).toBe(before);
  });

  it('S-31, S-33: publishes the same schemas as an OpenAPI document', async () => {
    const { body } = await floor.outsider.client.get('/api/openapi.json');
    expect(body.openapi).toBe('3.1.0');
    for (const { route } of endpoints) {
      if (route.path === '/api/openapi.json') continue;
      const operation =
        body.paths[route.path.replace(/:(\w+)/g, '{$1}')]?.[route.method.toLowerCase()];
      expect(operation, route.path).toMatchObject({ summary: route.summary });
      const empty = route.reply === null && (route as { file?: true }).file !== true;
      expect(operation.responses).toHaveProperty(String(route.status ?? (empty ? 204 : 200)));
    }
  });

  async function currentTag(endpoint: Endpoint): Promise<Record<string, string>> {
    const { route } = endpoint;
    if (route.guarded !== true) return {};
    const [object] = /^\/api\/[\w-]+\/[\w-]+/.exec(pathFor(endpoint, ids))!;
    const { client } = route.path.includes(':personId') ? floor.administrator : floor.designer;
    const { etag } = await client.get(object);
    expect(etag, route.path).not.toBeNull();
    return { 'If-Match': etag! };
  }

  function roleClient(access: Exclude<Access, string>): TestClient {
    if ('anyProject' in access) return floor[access.anyProject[0]!].client;
    const { project } = access;
    if (project === 'member' || project === 'manager') return floor.designer.client;
    return floor[project[0]!].client;
  }
});

function staleTag({ route }: Endpoint): Record<string, string> {
  return route.guarded === true ? STALE : {};
}

/** What the declared rule promises a caller: a status of refusal, or a way in. */
function expectation(access: Access, caller: Caller): 'allowed' | 401 | 403 | 404 {
  if (access === 'public' || access === 'administrator-or-local') return 'allowed';
  if (caller === 'visitor') return 401;
  if (access === 'signed-in') return 'allowed';
  if (access === 'administrator') return caller === 'administrator' ? 'allowed' : 403;
  if ('anyProject' in access) {
    const allowed = ['administrator', ...access.anyProject] as readonly string[];
    return allowed.includes(caller) ? 'allowed' : 403;
  }
  if (caller === 'outsider') return 404;
  const { project } = access;
  if (project === 'member') return 'allowed';
  if (project === 'manager')
    return ['designer', 'administrator'].includes(caller) ? 'allowed' : 403;
  return (project as readonly string[]).includes(caller) ? 'allowed' : 403;
}

/** What no answer to an allowed caller may be. Where one's own objects are meant, the example is nobody's. */
function barred(access: Access): number[] {
  const ownObjects = access === 'signed-in' || access === 'public';
  return ownObjects ? [401, 403, 500] : [401, 403, 404, 500];
}

/** The status as far as access goes: a wrong set-up code, own session or password is another matter. */
function refusal(reply: Reply): number {
  const { code, detail } = (reply.body ?? {}) as { code?: string; detail?: string };
  if (code === 'wrong-credentials' || (detail ?? '').includes('code is not the one')) return 0;
  return reply.status;
}
