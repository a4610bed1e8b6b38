import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../server/http/limits.ts';
import { done, type Hand, ProjectFloor } from '../server/project-floor.ts';
import { relayDriver } from '../shared/relay-stage.ts';
import type { Reply } from '../server/test-client.ts';
import { PASSWORD, TestServer } from '../server/test-server.ts';

const LIMITS = { ...SHIPPED_LIMITS, apiPerMinute: 1e6, signInFailures: 1e6 };

describe('overlapping requests', () => {
  let server: TestServer;
  let floor: ProjectFloor;
  beforeAll(async () => {
    server = await TestServer.start({ limits: { ...LIMITS, signInFailuresPerAddress: 1e6 } });
    await server.setUp();
    floor = await ProjectFloor.open(server);
  });
  afterAll(() => server.stop());

  const stages = async (): Promise<string[]> => {
    const path = `/api/projects/${floor.projectId}/stages?pageSize=500`;
    const { body } = await floor.designer.client.get(path);
    return body.stages.map((row: { reference: string }) => row.reference).sort();
  };

  it(
    'R-13: 500 mixed writes: every acknowledged one stands, no failed one does',
    { timeout: 180_000 },
    async () => {
      const create = (hand: Hand, reference: string, supplyV = { min: 21.6, max: 26.4 }) =>
        hand.client.post(`/api/projects/${floor.projectId}/stages`, {
          definition: relayDriver({ reference, supplyV }),
        });
      /** Five kinds in turn: good, twice the same designator, not permitted, foreign, not valid. */
      const kinds: ((i: number) => Promise<Reply>)[] = [
        (i) => create(floor.designer, `Q${1000 + i}`),
        (i) => create(floor.second, `Q${1000 + i - 1}`),
        (i) => create(floor.exporter, `Q${1000 + i}`),
        (i) => create(floor.outsider, `Q${1000 + i}`),
        (i) => create(floor.designer, `Q${1000 + i}`, { min: -1, max: 26.4 }),
      ];
      const requests = Array.from({ length: 500 }, (_, i) => ({ i, send: kinds[i % 5]! }));
      const acknowledged: string[] = [];
      const statuses = new Map<number, number>();
      const work = async (): Promise<void> => {
        for (let next = requests.shift(); next; next = requests.shift()) {
          const reply = await next.send(next.i);
          statuses.set(reply.status, (statuses.get(reply.status) ?? 0) + 1);
          if (reply.status === 201) acknowledged.push(reply.body.revision.definition.reference);
        }
      };
      await Promise.all(Array.from({ length: 25 }, work));
      expect(await stages()).toEqual([...acknowledged].sort());
      expect(acknowledged).toHaveLength(100);
      expect([201, 403, 404, 409, 422]).toEqual(expect.arrayContaining([...statuses.keys()]));
      const chief = floor.administrator.client;
      const { total } = (await chief.get('/api/audit?search=stage.created')).body;
      expect(total).toBe(100);
      expect((await chief.get('/api/audit/verification')).body.whole).toBe(true);
    },
  );

  it('R-12, S-21: of 50 parallel locks one wins, five times', { timeout: 180_000 }, async () => {
    for (let round = 0; round < 5; round++) {
      const checked = await floor.at('checked', { reference: `Q${round + 1}` });
      const { id } = checked.body as { id: string };
      const path = `/api/revisions/${id}/lock`;
      const { hash } = (await floor.approver.client.get(path)).body as { hash: string };
      const replies = await Promise.all(
        Array.from({ length: 50 }, () =>
          floor.approver.client.post(
            path,
            { password: PASSWORD, hash },
            { 'If-Match': checked.etag! },
          ),
        ),
      );
      const count = (...statuses: number[]): number =>
        replies.filter(({ status }) => statuses.includes(status)).length;
      expect([count(200), count(409, 412, 503)]).toEqual([1, 49]);
      const { body } = await floor.approver.client.get(`/api/revisions/${id}/verification`);
      expect(body).toMatchObject({ whole: true, differences: [] });
    }
  });

  it('R-11: of two who save the same stage the second gets the conflict and can go on', async () => {
    const draft = await floor.at('draft', { reference: 'Q50' });
    const { id, designators, parts } = draft.body as Record<'id' | 'designators' | 'parts', string>;
    const save = (hand: Hand, title: string, etag: string | null) =>
      hand.client.put(
        `/api/revisions/${id}`,
        { definition: relayDriver({ reference: 'Q50', title }), designators, parts },
        { 'If-Match': etag ?? '' },
      );
    const replies = await Promise.all([
      save(floor.designer, 'first', draft.etag),
      save(floor.second, 'second', draft.etag),
    ]);
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 412]);
    const winner = replies.find(({ status }) => status === 200)!;
    const current = await floor.designer.client.get(`/api/revisions/${id}`);
    expect(current.body.definition.title).toBe(winner.body.definition.title);
    expect(done(await save(floor.second, 'both', current.etag)).body.definition.title).toBe('both');
  });

  it(
    'R-11: 5 clients × 8 edits with retry: the final version counts every acknowledged one',
    { timeout: 120_000 },
    async () => {
      const draft = await floor.at('draft', { reference: 'Q51' });
      const { id, designators, parts } = draft.body as Record<
        'id' | 'designators' | 'parts',
        string
      >;
      const first = versionOf(draft.etag);
      let acknowledged = 0;
      const edit = async (client: number): Promise<void> => {
        for (let i = 0; i < 8;) {
          const { etag } = await floor.designer.client.get(`/api/revisions/${id}`);
          const definition = relayDriver({ reference: 'Q51', title: `client ${client} edit ${i}` });
          const { status } = await floor.designer.client.put(
            `/api/revisions/${id}`,
            { definition, designators, parts },
            { 'If-Match': etag! },
          );
          if (status === 200) {
            acknowledged += 1;
            i += 1;
          } else expect(status).toBe(412);
        }
      };
      await Promise.all([1, 2, 3, 4, 5].map(edit));
      const { etag } = await floor.designer.client.get(`/api/revisions/${id}`);
      expect(versionOf(etag) - first).toBe(acknowledged);
      expect(acknowledged).toBe(40);
    },
  );
});

function versionOf(etag: string | null): number {
  return Number(/-(\d+)"$/.exec(etag ?? '')?.[1]);
}
