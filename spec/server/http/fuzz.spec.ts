import http from 'node:http';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { verifyChain } from '../../../server/audit/verify-chain.ts';
import type { Endpoint } from '../../../server/http/endpoint.ts';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { Problem } from '../../../shared/contract/problem.ts';
import { repeats, seed } from '../../long-run.ts';
import { done, ProjectFloor } from '../project-floor.ts';
import type { TestClient } from '../test-client.ts';
import { endpointsOf, TestServer } from '../test-server.ts';
import { bytesOf, type HostileRequest, hostileRequests } from './hostile-request.ts';
import { type Ids, idsOf, keyOf, pathFor } from './route-examples.ts';

const SEED = seed(20261201);
const ROUNDS = repeats(20, 200);
const REQUESTS_A_ROUND = 500;
const SLOWEST_MS = 5000;

/** Each with a share of the requests. Whoever has every role gets furthest: what a designer is refused by role, this one is refused by state. */
const CALLERS = { nobody: 1, designer: 2, 'all roles': 4, administrator: 2 } as const;
const MANY = Object.entries(CALLERS).flatMap(([name, share]) => Array<string>(share).fill(name));

const LIMITS = {
  ...{ ...SHIPPED_LIMITS, apiPerMinute: 1e6, linkMailsPerHour: 1e6, signInFailures: 1e6 },
  ...{ signInFailuresPerAddress: 1e6, signInFailuresInARow: 1e6 },
};

interface Answer {
  readonly status: number;
  readonly type: string;
  readonly text: string;
}

describe(`S-31, R-42: ${ROUNDS} × ${REQUESTS_A_ROUND} hostile requests, seed ${SEED}`, () => {
  const agent = new http.Agent({ keepAlive: true });
  const statuses = new Map<number, number>();
  const asked = new Map<string, number>();
  let server: TestServer;
  let endpoints: readonly Endpoint[];
  let arbitrary: fc.Arbitrary<HostileRequest>;

  beforeAll(async () => {
    server = await TestServer.start({ limits: LIMITS });
    await server.setUp();
    endpoints = endpointsOf(server.router);
    arbitrary = hostileRequests(endpoints, MANY);
  });
  afterAll(async () => {
    agent.destroy();
    await server.stop();
  });

  it.each(Array.from({ length: ROUNDS }, (_, round) => round))(
    'round %i: no 5xx, and problem details with every refusal',
    { timeout: 120_000 },
    async (round) => {
      const target = await Target.open(server, `FZ-${round}`);
      const property = fc.asyncProperty(arbitrary, async (request) => {
        const item = endpoints[request.endpoint]!;
        const startedAtMs = performance.now();
        const answer = await target.send(request, item, agent);
        const tookMs = performance.now() - startedAtMs;
        expect(tookMs).toBeLessThan(SLOWEST_MS);
        expectSound(answer);
        statuses.set(answer.status, (statuses.get(answer.status) ?? 0) + 1);
        const who = `${keyOf(item)} as ${request.caller}`;
        asked.set(who, (asked.get(who) ?? 0) + 1);
      });
      const parameters = { numRuns: REQUESTS_A_ROUND, endOnFailure: true };
      await fc.assert(property, { ...parameters, seed: SEED + round });
    },
  );

  it('asked every route as every caller, and got behind the schemas', () => {
    expect(asked.size).toBe(endpoints.length * Object.keys(CALLERS).length);
    const total = [...statuses.values()].reduce((sum, count) => sum + count);
    expect(total).toBe(ROUNDS * REQUESTS_A_ROUND);
    const succeeded = [...statuses].filter(([status]) => status < 300);
    expect(succeeded.reduce((sum, [, count]) => sum + count, 0)).toBeGreaterThan(total / 10);
    for (const status of [400, 401, 403, 404, 409, 412, 413, 415, 422, 428]) {
      expect(statuses.get(status), `answers of ${status}`).toBeGreaterThan(0);
    }
  });

  it('left the process, the database and the trail sound', async () => {
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
    expect(server.log.filter((line) => line.includes('"defect"'))).toEqual([]);
    expect(await server.database.read(verifyChain)).toMatchObject({ whole: true, faults: [] });
    const faults = await server.database.read((manager) => manager.query('PRAGMA integrity_check'));
    expect(faults).toEqual([{ integrity_check: 'ok' }]);
  });
});

function expectSound({ status, type, text }: Answer): void {
  expect(status, text).toBeLessThan(500);
  if (status < 400) return;
  expect(type).toBe('application/problem+json; charset=utf-8');
  const problem = Problem.parse(JSON.parse(text));
  expect(problem.status).toBe(status);
  expect(problem.reference).toMatch(/^[0-9a-f-]{36}$/);
}

/** A project with an object of each kind, and one signed-in browser for each caller. */
class Target {
  private constructor(
    private readonly floor: ProjectFloor,
    private readonly ids: Ids,
    private readonly clients: Map<string, TestClient>,
  ) {}

  static async open(server: TestServer, code: string): Promise<Target> {
    const floor = await ProjectFloor.open(server, code);
    const ids = await idsOf(floor);
    const project = await floor.designer.client.get(`/api/projects/${floor.projectId}`);
    const { members } = project.body as { members: { person: { id: string }; roles: string[] }[] };
    const listed = members.map(({ person, roles }) => ({ personId: person.id, roles }));
    const roles = ['designer', 'checker', 'approver', 'exporter'];
    done(
      await floor.designer.client.put(
        `/api/projects/${floor.projectId}/members`,
        { members: [...listed, { personId: floor.outsider.id, roles }] },
        { 'If-Match': project.etag ?? '' },
      ),
    );
    const clients = new Map([
      ['nobody', await server.visit()],
      ['designer', floor.designer.client],
      ['all roles', floor.outsider.client],
      ['administrator', floor.administrator.client],
    ]);
    return new Target(floor, { ...ids, personId: floor.exporter.id }, clients);
  }

  async send(request: HostileRequest, item: Endpoint, agent: http.Agent): Promise<Answer> {
    const { method } = item.route;
    const path = this.#pathOf(request, item);
    const tag = request.tag === 'current' ? await this.#currentTag(item) : request.tag;
    const client = this.clients.get(request.caller)!;
    const token = client.cookies.get('XSRF-TOKEN');
    const body = bytesOf(request.body, item);
    const headers = {
      ...(client.cookies.size > 0 && { Cookie: client.cookieHeader }),
      ...(token !== undefined && { 'X-XSRF-TOKEN': token }),
      ...(body !== null && { 'Content-Type': 'application/json', ...lengthOf(body, request) }),
      ...(tag !== '' && { 'If-Match': tag }),
      ...request.headers,
    };
    const answer = await send(this.floor.server.url, path, { agent, method, headers }, body);
    if (keyOf(item) === 'DELETE /api/session' && answer.status === 204)
      await this.#renew(request.caller);
    return answer;
  }

  #pathOf({ params, query }: HostileRequest, item: Endpoint): string {
    const given = Object.entries(params).filter(([, text]) => text !== null);
    const ids = { ...this.ids, ...(Object.fromEntries(given) as Record<string, string>) };
    const path = pathFor(item, ids).split('?')[0]!;
    return path + query;
  }

  async #currentTag({ route }: Endpoint): Promise<string> {
    if (route.guarded !== true) return '';
    const [object] = /^\/api\/[\w-]+\/[^/]+/.exec(pathFor({ route } as Endpoint, this.ids))!;
    const { etag } = await this.clients.get('administrator')!.get(object);
    return etag ?? '';
  }

  /** After a sign-out. */
  async #renew(caller: string): Promise<void> {
    const { server, designer, outsider, administrator } = this.floor;
    const person = { designer, 'all roles': outsider, administrator }[caller];
    this.clients.set(caller, person ? await server.signIn(person) : await server.visit());
  }
}

/** Node adds it to no body of a GET. */
function lengthOf(body: string, { headers }: HostileRequest): Record<string, string> {
  return 'Transfer-Encoding' in headers ? {} : { 'Content-Length': String(body.length) };
}

/** Below fetch, which would not send half of these headers and addresses. */
function send(
  url: string,
  path: string,
  options: http.RequestOptions,
  body: string | null,
): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const request = http.request(url, { ...options, path }, (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('error', reject);
      response.on('end', () => {
        resolve({
          status: response.statusCode ?? 0,
          type: response.headers['content-type'] ?? '',
          text: Buffer.concat(chunks).toString('utf8'),
        });
      });
    });
    request.on('error', reject);
    request.end(body === null ? undefined : Buffer.from(body, 'latin1'));
  });
}
