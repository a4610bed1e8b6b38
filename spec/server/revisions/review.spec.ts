import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { Revision } from '../../../shared/contract/revision.ts';
import { done, type Hand, ProjectFloor } from '../project-floor.ts';
import { relayDriver } from '../../shared/relay-stage.ts';
import type { Reply } from '../test-client.ts';
import { TestServer } from '../test-server.ts';

let server: TestServer;
let floor: ProjectFloor;
let next = 1;

beforeAll(async () => {
  const limits = { ...SHIPPED_LIMITS, apiPerMinute: 100_000, signInFailures: 1000 };
  server = await TestServer.start({ limits: { ...limits, signInFailuresPerAddress: 1000 } });
  await server.setUp();
  floor = await ProjectFloor.open(server);
});
afterAll(() => server.stop());

const reference = () => ({ reference: `Q${next++}` });
const again = (hand: Hand, { body }: Reply) =>
  hand.client.get(`/api/revisions/${(body as { id: string }).id}`);

async function giveRoles(hand: Hand, roles: string[]): Promise<void> {
  const url = `/api/projects/${floor.projectId}`;
  const project = await floor.administrator.client.get(url);
  const members = (
    project.body as { members: { person: { id: string }; roles: string[] }[] }
  ).members.map(({ person, roles: had }) => ({
    personId: person.id,
    roles: person.id === hand.id ? roles : had,
  }));
  const ifMatch = { 'If-Match': project.etag ?? '' };
  done(await floor.administrator.client.put(`${url}/members`, { members }, ifMatch));
}

describe('submission', () => {
  it('freezes the definition under the submitter’s name', async () => {
    server.pass(60_000);
    const reply = await floor.at('in-check', reference());
    const revision = Revision.parse(reply.body);
    expect(revision).toMatchObject({
      state: 'in-check',
      submittedAtMs: server.nowMs,
      submittedBy: { id: floor.designer.id },
      check: null,
      returned: null,
    });
    const { designators, parts } = revision;
    const { reference: own } = revision.definition;
    const body = { definition: relayDriver({ reference: own }), designators, parts };
    expect((await floor.act(floor.designer, reply, '', body, 'PUT')).status).toBe(409);
  });

  it('happens once when asked for twice at the same time', async () => {
    const draft = await floor.at('draft', reference());
    const both = await Promise.all([
      floor.act(floor.designer, draft, '/submission'),
      floor.act(floor.second, draft, '/submission'),
    ]);
    expect(both.filter(({ status }) => status === 200)).toHaveLength(1);
  });

  it('is the designers’ own, with the version read', async () => {
    const draft = await floor.at('draft', reference());
    for (const hand of [floor.checker, floor.approver, floor.exporter, floor.administrator]) {
      expect((await floor.act(hand, draft, '/submission')).status).toBe(403);
    }
    expect((await floor.act(floor.outsider, draft, '/submission')).status).toBe(404);
    const url = `/api/revisions/${draft.body.id}/submission`;
    expect((await floor.designer.client.post(url)).status).toBe(428);
  });
});

describe('a check', () => {
  it('shows the difference and what is missing', async () => {
    const inCheck = await floor.at('in-check', reference());
    const half = await floor.act(
      floor.checker,
      inCheck,
      '/check',
      {
        ...{ overdriveFactor: 5.2, method: null, note: '', reason: '' },
        ...{ justifications: {}, read: ['overdrive-factor'] },
      },
      'PUT',
    );
    const { check, evaluation } = Revision.parse(half.body);
    expect(check?.difference).toBeCloseTo((5.2 - 5.7309) / 5.7309, 4);
    expect(check?.missing).toEqual([
      'Say how it was found: by hand or on the bench.',
      'Note how the figure was got.',
      'Give a reason for the difference of -9.3 %.',
      'Justify load voltage, which is marginal.',
      'Justify load overvoltage, which is marginal.',
      `Read all ${evaluation.criteria.length} criteria; 1 are read so far.`,
    ]);
    const passed = await floor.act(floor.checker, half, '/pass');
    expect(passed.status).toBe(409);
    expect(passed.body.detail).toContain('Give a reason');
  });

  it('passes when complete', async () => {
    const inCheck = await floor.at('in-check', reference());
    const read = done(await floor.completeCheck(inCheck));
    expect(Revision.parse(read.body)).toMatchObject({
      check: { missing: [], checker: { id: floor.checker.id } },
      may: { pass: { allowed: true } },
    });
    const passed = Revision.parse(done(await floor.act(floor.checker, read, '/pass')).body);
    expect(passed).toMatchObject({ state: 'checked', checkedBy: { id: floor.checker.id } });
  });

  it('cannot pass a failing criterion, whatever is written', async () => {
    const failing = { baseResistor: { valueOhm: 1000, tolerance: 0.05, ratingW: 0.1 } };
    const inCheck = await floor.at('in-check', { ...reference(), ...failing });
    const read = done(await floor.completeCheck(inCheck));
    const passed = await floor.act(floor.checker, read, '/pass');
    expect([passed.status, passed.body.detail]).toEqual([
      409,
      'The criterion forced beta fails: return the revision.',
    ]);
  });

  it('is passed in the name of whoever recorded it', async () => {
    const inCheck = await floor.at('in-check', reference());
    const read = done(await floor.completeCheck(inCheck));
    const passed = await floor.act(floor.second, read, '/pass');
    expect([passed.status, passed.body.detail]).toEqual([
      409,
      'Another person saved this check last: save it in your own name.',
    ]);
  });

  it.each([
    [{ overdriveFactor: 0 }, '/overdriveFactor'],
    [{ overdriveFactor: 'five' }, '/overdriveFactor'],
    [{ method: 'guess' }, '/method'],
    [{ read: ['no-such-criterion'] }, '/read/0'],
    [{ justifications: { 'no-such-criterion': 'x' } }, '/justifications/no-such-criterion'],
    [{ difference: 0 }, '/difference'],
  ])('refuses %o and names the field', async (change, pointer) => {
    const inCheck = await floor.at('in-check', reference());
    const body = {
      ...{ overdriveFactor: 5.7, method: 'hand', note: 'n', reason: '' },
      ...{ justifications: {}, read: [], ...change },
    };
    const reply = await floor.act(floor.checker, inCheck, '/check', body, 'PUT');
    expect([reply.status, reply.body.errors?.[0].pointer]).toEqual([422, pointer]);
    expect((await again(floor.checker, inCheck)).body.check).toBeNull();
  });

  it('of a new submission begins anew', async () => {
    const inCheck = await floor.at('in-check', reference());
    const read = done(await floor.completeCheck(inCheck));
    const returned = done(
      await floor.act(floor.checker, read, '/return', { reason: 'Once more.' }),
    );
    expect(Revision.parse(returned.body)).toMatchObject({
      state: 'draft',
      returned: { by: { id: floor.checker.id }, reason: 'Once more.' },
      submittedBy: null,
    });
    const second = done(await floor.act(floor.designer, returned, '/submission'));
    expect(Revision.parse(second.body)).toMatchObject({ check: null, returned: null });
  });
});

describe('findings', () => {
  const finding = {
    subject: { kind: 'criterion', id: 'drive-current' },
    title: 'Counted twice?',
    text: 'See port PB.',
  };

  it('are numbered, answered, kept open and closed, with their history', async () => {
    const inCheck = await floor.at('in-check', reference());
    const raised = done(await floor.act(floor.checker, inCheck, '/findings', finding));
    const id = Revision.parse(raised.body).findings[0]?.id ?? '';
    const complete = done(await floor.completeCheck(raised));
    const passed = await floor.act(floor.checker, complete, '/pass');
    expect([passed.status, passed.body.detail]).toEqual([409, 'Close finding 1.']);
    const path = (act: string) => `/findings/${id}/${act}`;
    const answered = done(
      await floor.act(floor.designer, complete, path('answer'), { text: 'Once only.' }),
    );
    const reopened = done(
      await floor.act(floor.checker, answered, path('reopening'), { text: 'Show it.' }),
    );
    const second = done(
      await floor.act(floor.designer, reopened, path('answer'), { text: 'Shown.' }),
    );
    const closed = done(await floor.act(floor.checker, second, path('closure'), { text: '' }));
    const { findings } = Revision.parse(closed.body);
    expect(findings[0]).toMatchObject({ number: 1, state: 'closed' });
    expect(findings[0]?.history.map(({ act, by }) => `${act} ${by.id}`)).toEqual([
      `raised ${floor.checker.id}`,
      `answered ${floor.designer.id}`,
      `reopened ${floor.checker.id}`,
      `answered ${floor.designer.id}`,
      `closed ${floor.checker.id}`,
    ]);
    expect((await floor.act(floor.checker, closed, '/pass')).status).toBe(200);
  });

  it('go back with the draft and can be closed there', async () => {
    const inCheck = await floor.at('in-check', reference());
    const raised = done(await floor.act(floor.checker, inCheck, '/findings', finding));
    const id = Revision.parse(raised.body).findings[0]?.id ?? '';
    const returned = done(await floor.act(floor.checker, raised, '/return', { reason: 'See it.' }));
    const answered = done(
      await floor.act(floor.designer, returned, `/findings/${id}/answer`, { text: 'Done.' }),
    );
    const closed = await floor.act(floor.checker, answered, `/findings/${id}/closure`, {
      text: 'Seen.',
    });
    expect(Revision.parse(done(closed).body).findings[0]?.state).toBe('closed');
  });

  it.each([
    [{ subject: { kind: 'criterion', id: 'beauty' } }, '/subject/id'],
    [{ subject: { kind: 'field', id: 'load.colour' } }, '/subject/id'],
    [{ subject: { kind: 'field', id: '__proto__' } }, '/subject/id'],
    [{ title: '' }, '/title'],
  ])('refuse %o', async (change, pointer) => {
    const inCheck = await floor.at('in-check', reference());
    const reply = await floor.act(floor.checker, inCheck, '/findings', { ...finding, ...change });
    expect([reply.status, reply.body.errors[0].pointer]).toEqual([422, pointer]);
  });

  it('belong to their revision and to their people', async () => {
    const inCheck = await floor.at('in-check', reference());
    const other = await floor.at('in-check', reference());
    const raised = done(await floor.act(floor.checker, inCheck, '/findings', finding));
    const id = Revision.parse(raised.body).findings[0]?.id ?? '';
    const body = { text: 'x' };
    expect((await floor.act(floor.designer, raised, '/findings', finding)).status).toBe(403);
    expect((await floor.act(floor.checker, raised, `/findings/${id}/answer`, body)).status).toBe(
      403,
    );
    expect((await floor.act(floor.designer, raised, `/findings/${id}/closure`, body)).status).toBe(
      403,
    );
    expect((await floor.act(floor.checker, other, `/findings/${id}/closure`, body)).status).toBe(
      404,
    );
    expect((await floor.act(floor.outsider, raised, '/findings', finding)).status).toBe(404);
    const stale = await floor.act(floor.checker, inCheck, '/findings', finding);
    expect(stale.status).toBe(412);
  });
});

describe('separation of duties', () => {
  it('keeps an author from checking, whatever roles he is given', async () => {
    const inCheck = await floor.at('in-check', reference());
    await giveRoles(floor.designer, ['designer', 'checker', 'approver']);
    const fresh = await again(floor.designer, inCheck);
    expect((await floor.completeCheck(fresh, floor.designer)).status).toBe(403);
    expect((await floor.act(floor.designer, fresh, '/pass')).status).toBe(403);
    expect((await floor.act(floor.designer, fresh, '/return', { reason: 'x' })).status).toBe(403);
    const { may } = Revision.parse(fresh.body);
    expect(may.check.reason).toContain('You worked on this revision');
    await giveRoles(floor.designer, ['designer']);
  });

  it('keeps an author from locking', async () => {
    const checked = await floor.at('checked', reference());
    await giveRoles(floor.designer, ['designer', 'approver']);
    expect((await floor.lock(checked, floor.designer)).status).toBe(403);
    await giveRoles(floor.designer, ['designer']);
  });

  it('keeps the checker from locking, also after the role of checker is taken away', async () => {
    const checked = await floor.at('checked', reference());
    await giveRoles(floor.checker, ['approver']);
    const refused = await floor.lock(checked, floor.checker);
    expect([refused.status, refused.body.detail]).toEqual([
      403,
      'You checked this revision; another person locks it.',
    ]);
    await giveRoles(floor.checker, ['checker']);
  });

  it('keeps a second author from checking, who saved the draft once', async () => {
    const draft = await floor.at('draft', reference());
    const { definition, designators, parts } = Revision.parse(draft.body);
    const body = { definition, designators, parts };
    const saved = done(await floor.act(floor.second, draft, '', body, 'PUT'));
    const inCheck = done(await floor.act(floor.designer, saved, '/submission'));
    expect((await floor.completeCheck(inCheck, floor.second)).status).toBe(403);
  });

  it('keeps whoever submitted from checking', async () => {
    const draft = await floor.at('draft', reference());
    const inCheck = done(await floor.act(floor.second, draft, '/submission'));
    expect((await floor.completeCheck(inCheck, floor.second)).status).toBe(403);
  });

  it('keeps who once checked a returned revision from editing it', async () => {
    const inCheck = await floor.at('in-check', reference());
    const returned = done(await floor.act(floor.second, inCheck, '/return', { reason: 'Redo.' }));
    const { definition, designators, parts } = Revision.parse(returned.body);
    const body = { definition, designators, parts };
    expect((await floor.act(floor.second, returned, '', body, 'PUT')).status).toBe(403);
    expect((await floor.act(floor.second, returned, '/submission')).status).toBe(403);
  });

  it('holds through a reopened revision: who checked the first round may not lock the second', async () => {
    const inCheck = await floor.at('in-check', reference());
    const returned = done(await floor.act(floor.second, inCheck, '/return', { reason: 'Redo.' }));
    const again_ = done(await floor.act(floor.designer, returned, '/submission'));
    const read = done(await floor.completeCheck(again_));
    const checked = done(await floor.act(floor.checker, read, '/pass'));
    await giveRoles(floor.second, ['approver']);
    expect((await floor.lock(checked, floor.second)).status).toBe(403);
    await giveRoles(floor.second, ['designer', 'checker']);
  });

  it('gives an administrator no say in any revision', async () => {
    const checked = await floor.at('checked', reference());
    expect((await floor.lock(checked, floor.administrator)).status).toBe(403);
    const { may } = Revision.parse((await again(floor.administrator, checked)).body);
    expect(Object.values(may).filter(({ allowed }) => allowed)).toEqual([]);
  });

  it('logs a refusal with person, route and rule', async () => {
    const inCheck = await floor.at('in-check', reference());
    await floor.act(floor.exporter, inCheck, '/pass');
    const line = server.log.findLast((text) => text.includes('pass-role'));
    expect(line).toContain(floor.exporter.id);
    expect(line).toContain('/pass');
  });

  it('lets an approver send back, with a reason', async () => {
    const checked = await floor.at('checked', reference());
    expect((await floor.act(floor.approver, checked, '/return', {})).status).toBe(422);
    const back = done(
      await floor.act(floor.approver, checked, '/return', { reason: 'Evidence is thin.' }),
    );
    expect(Revision.parse(back.body)).toMatchObject({
      state: 'draft',
      checkedBy: null,
      returned: { by: { id: floor.approver.id } },
    });
  });
});

describe('withdrawal', () => {
  it('ends a revision for good', async () => {
    const withdrawn = await floor.at('withdrawn', reference());
    expect(Revision.parse(withdrawn.body)).toMatchObject({
      state: 'withdrawn',
      withdrawn: { by: { id: floor.designer.id }, reason: 'Not needed.' },
    });
    expect((await floor.act(floor.designer, withdrawn, '/submission')).status).toBe(409);
    const twice = await floor.act(floor.designer, withdrawn, '/withdrawal', { reason: 'x' });
    expect(twice.status).toBe(409);
  });

  it('is open to designers, up to the lock', async () => {
    const checked = await floor.at('checked', reference());
    const body = { reason: 'Cancelled.' };
    expect((await floor.act(floor.checker, checked, '/withdrawal', body)).status).toBe(403);
    expect((await floor.act(floor.outsider, checked, '/withdrawal', body)).status).toBe(404);
    expect((await floor.act(floor.designer, checked, '/withdrawal', {})).status).toBe(422);
    expect((await floor.act(floor.designer, checked, '/withdrawal', body)).status).toBe(200);
    const locked = await floor.at('locked', reference());
    const late = await floor.act(floor.designer, locked, '/withdrawal', body);
    expect([late.status, late.body.code]).toEqual([409, 'revision-locked']);
  });
});
