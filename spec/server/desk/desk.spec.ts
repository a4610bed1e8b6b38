import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { Desk, type DeskItem } from '../../../shared/contract/desk.ts';
import { Revision } from '../../../shared/contract/revision.ts';
import { search } from '../../../shared/contract/search.ts';
import { done, type Hand, ProjectFloor } from '../project-floor.ts';
import { TestServer } from '../test-server.ts';

let server: TestServer;
let floor: ProjectFloor;

beforeAll(async () => {
  server = await TestServer.start({ limits: { ...SHIPPED_LIMITS, apiPerMinute: 100_000 } });
  await server.setUp();
  floor = await ProjectFloor.open(server);
});
afterAll(() => server.stop());

const deskOf = async ({ client }: Hand) => Desk.parse((await client.get('/api/desk')).body);
const group = (desk: Desk, kind: string): DeskItem[] =>
  desk.groups.find((each) => each.kind === kind)?.items ?? [];
const names = (items: DeskItem[]) => items.map(({ letter, reference }) => `${reference} ${letter}`);

describe('my desk', () => {
  it('hands a revision from one desk to the next', async () => {
    const draft = await floor.stage({ reference: 'Q1' });
    expect(names(group(await deskOf(floor.designer), 'own-drafts'))).toEqual(['Q1 A']);
    expect(names(group(await deskOf(floor.second), 'own-drafts'))).toEqual([]);

    const inCheck = done(await floor.act(floor.designer, draft, '/submission'));
    const designer = await deskOf(floor.designer);
    expect(group(designer, 'own-drafts')).toEqual([]);
    expect(names(designer.waitingForOthers)).toEqual(['Q1 A']);
    const [toCheck] = group(await deskOf(floor.checker), 'to-check');
    expect(toCheck).toMatchObject({
      ...{ reference: 'Q1', state: 'in-check', verdict: 'marginal', note: null },
      ...{ from: floor.designer.name, sinceMs: server.nowMs, projectCode: 'CR-40' },
      least: { criterionId: 'load-voltage' },
    });

    server.pass(10 * 60_000);
    const read = done(await floor.completeCheck(inCheck));
    expect(group(await deskOf(floor.checker), 'to-check')[0]?.note).toMatch(/^Begun, \d+ criteria/);
    const checked = done(await floor.act(floor.checker, read, '/pass'));
    expect(group(await deskOf(floor.checker), 'to-check')).toEqual([]);
    const [toApprove] = group(await deskOf(floor.approver), 'to-approve');
    expect(toApprove).toMatchObject({ reference: 'Q1', from: floor.checker.name });

    done(await floor.lock(checked));
    expect(group(await deskOf(floor.approver), 'to-approve')).toEqual([]);
    expect((await deskOf(floor.designer)).waitingForOthers).toEqual([]);
  });

  it('shows a checker the own month', async () => {
    expect((await deskOf(floor.checker)).month).toMatchObject({
      checksDone: 1,
      returned: 0,
      largestDifference: expect.closeTo(0.02, 6) as number,
      medianHoursToCheck: expect.closeTo(1 / 6, 6) as number,
    });
    expect((await deskOf(floor.designer)).month).toEqual({
      ...{ checksDone: 0, returned: 0, largestDifference: null, medianHoursToCheck: null },
    });
  });

  it('brings findings to the designer and the answers to the checker', async () => {
    const inCheck = await floor.at('in-check', { reference: 'Q2' });
    const raised = done(
      await floor.act(floor.checker, inCheck, '/findings', {
        ...{ subject: { kind: 'criterion', id: 'drive-current' }, title: 'Twice?', text: '' },
      }),
    );
    const [toAnswer] = group(await deskOf(floor.designer), 'findings-to-answer');
    expect(toAnswer?.note).toBe('Finding 1 on drive current: Twice?');
    expect(toAnswer?.from).toBe(floor.checker.name);
    expect(group(await deskOf(floor.second), 'findings-to-answer')).toEqual([]);
    const id = Revision.parse(raised.body).findings[0]?.id ?? '';
    done(await floor.act(floor.designer, raised, `/findings/${id}/answer`, { text: 'Once.' }));
    expect(group(await deskOf(floor.designer), 'findings-to-answer')).toEqual([]);
    expect(names(group(await deskOf(floor.checker), 'findings-to-close'))).toEqual(['Q2 A']);
  });

  it('counts what waits', async () => {
    for (const hand of [floor.designer, floor.checker, floor.approver, floor.outsider]) {
      const waiting = (await deskOf(hand)).groups.flatMap(({ items }) => items).length;
      expect((await hand.client.get('/api/desk/count')).body).toEqual({ waiting });
    }
  });

  it('of a stranger is empty', async () => {
    const desk = await deskOf(floor.outsider);
    expect(desk.groups.flatMap(({ items }) => items)).toEqual([]);
    expect(desk.activity).toEqual([]);
  });
});

describe('search', () => {
  const find = async ({ client }: Hand, text: string) =>
    search.reply.parse((await client.get(`/api/search?text=${encodeURIComponent(text)}`)).body)
      .hits;

  it('finds stages by reference and title, the exact one first', async () => {
    await floor.stage({ reference: 'Q12', title: 'Door relay' });
    expect((await find(floor.exporter, 'q1')).map(({ title }) => title)).toEqual([
      'Q1 Brine agitator contactor pilot relay',
      'Q12 Door relay',
    ]);
    const [hit] = await find(floor.exporter, 'door');
    expect(hit).toMatchObject({ kind: 'stage', detail: 'CR-40, revision A, draft' });
    expect(hit?.link).toMatch(/^\/p\/[\w-]{36}\/s\/[\w-]{36}\/r\/[\w-]{36}$/);
  });

  it('finds projects', async () => {
    expect((await find(floor.exporter, 'cr-40'))[0]).toEqual({
      kind: 'project',
      link: `/p/${floor.projectId}`,
      title: 'CR-40',
      detail: 'Cold-room controller',
    });
  });

  it('shows a stranger nothing of it', async () => {
    expect(await find(floor.outsider, 'cr-40')).toEqual([]);
    expect(await find(floor.outsider, 'q1')).toEqual([]);
  });

  it.each(['', '?text=', `?text=${'x'.repeat(101)}`, '?text=a&text=b'])('refuses %s', async (q) => {
    expect((await floor.exporter.client.get(`/api/search${q}`)).status).toBe(422);
  });
});
