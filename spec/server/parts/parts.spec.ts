import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { loadLibrary } from '../../../server/seed/load-library.ts';
import { listParts, listRecords, Part, type PartRow } from '../../../shared/contract/part.ts';
import { Problem } from '../../../shared/contract/problem.ts';
import { Revision } from '../../../shared/contract/revision.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { done, ProjectFloor } from '../project-floor.ts';
import { relayDriver } from '../../shared/relay-stage.ts';
import type { Reply } from '../test-client.ts';
import { TestServer } from '../test-server.ts';

let server: TestServer;
let floor: ProjectFloor;

beforeAll(async () => {
  server = await TestServer.start({ limits: { ...SHIPPED_LIMITS, apiPerMinute: 100_000 } });
  await server.setUp();
  await loadLibrary(server.database, server.nowMs);
  floor = await ProjectFloor.open(server);
});
afterAll(() => server.stop());

const list = async (query = '') =>
  listParts.reply.parse((await floor.exporter.client.get(`/api/parts${query}`)).body);

async function row(partNumber: string): Promise<PartRow> {
  const { parts } = await list(`?search=${encodeURIComponent(partNumber)}`);
  const found = parts.find((part) => part.partNumber === partNumber);
  if (found === undefined) throw new Error(`no ${partNumber}`);
  return found;
}

const read = async (partNumber: string) => {
  const { id } = await row(partNumber);
  return floor.designer.client.get(`/api/parts/${id}`);
};

const revise = (part: Reply, client = floor.designer.client, change = {}) => {
  const { id, latest } = Part.parse(part.body);
  return client.post(
    `/api/parts/${id}/revisions`,
    { record: { ...latest.record, ...change }, comment: 'Gain row at 10 mA by the new issue.' },
    { 'If-Match': part.etag ?? '' },
  );
};

describe('the shipped library', () => {
  it('holds transistors, loads, logic outputs and diodes, all unverified', async () => {
    const { parts, total } = await list('?pageSize=500');
    expect(parts).toHaveLength(total);
    expect(new Set(parts.map(({ kind }) => kind))).toEqual(
      new Set(['transistor', 'load', 'logic-output', 'diode']),
    );
    expect(parts.filter(({ verified }) => verified)).toEqual([]);
  });

  it('is loaded once', async () => {
    const before = (await list()).total;
    expect(await loadLibrary(server.database, server.nowMs)).toBe(0);
    expect((await list()).total).toBe(before);
  });

  it('filters by kind and text, sorts and pages', async () => {
    const { parts, matching, total } = await list('?kind=transistor&search=2n39&sort=partNumber');
    expect(parts.map(({ partNumber }) => partNumber)).toEqual(['2N3904', '2N3906']);
    expect(matching).toBe(2);
    expect(total).toBeGreaterThan(50);
    const down = await list('?kind=transistor&search=2n39&direction=desc&pageSize=1');
    expect(down.parts.map(({ partNumber }) => partNumber)).toEqual(['2N3906']);
    expect((await list('?verified=yes')).matching).toBe(0);
    expect((await floor.designer.client.get('/api/parts?sort=record')).status).toBe(422);
  });

  it('shows a part with its rows as printed', async () => {
    const part = Part.parse((await read('2N3904')).body);
    expect(part).toMatchObject({ kind: 'transistor', latest: { number: 1, author: null } });
    // onsemi 2N3903/D, Rev. 9: hFE 100 to 300 at 10 mA, 1 V
    expect(part.latest.record).toMatchObject({
      gain: expect.arrayContaining([
        expect.objectContaining({ icA: 0.01, vceV: 1, min: 100, max: 300 }),
      ]) as unknown,
    });
    expect(part.may).toEqual({
      revise: { allowed: true, reason: null },
      verify: { allowed: false, reason: expect.stringContaining('Only a checker') as string },
    });
    const { latest } = part;
    const one = await floor.exporter.client.get(`/api/part-revisions/${latest.id}`);
    expect(one.body.record).toEqual(latest.record);
  });

  it('gives the latest data of all parts of a kind at once', async () => {
    const records = async () => {
      const { body } = await floor.exporter.client.get('/api/part-records?kind=transistor');
      return listRecords.reply.parse(body).parts;
    };
    const before = await records();
    expect(before.length).toBe((await list('?kind=transistor')).matching);
    expect(before.every(({ record }) => record.kind === 'transistor')).toBe(true);
    const part = await read('2N5551');
    done(await revise(part));
    const [old, now] = [before, await records()].map((parts) =>
      parts.find(({ record }) => record.partNumber === '2N5551'),
    );
    expect(old?.partRevisionId).toBe(Part.parse(part.body).latest.id);
    expect(now?.partRevisionId).not.toBe(old?.partRevisionId);
    expect(now).toMatchObject({ partId: old?.partId, verified: false });
    expect((await floor.exporter.client.get('/api/part-records')).status).toBe(422);
  });

  it('answers 404 for what it does not have', async () => {
    const absent = '00000000-0000-4000-8000-000000000000';
    expect((await floor.designer.client.get(`/api/parts/${absent}`)).status).toBe(404);
    expect((await floor.designer.client.get(`/api/part-revisions/${absent}`)).status).toBe(404);
    const verification = await floor.checker.client.post(
      `/api/part-revisions/${absent}/verification`,
      { document: 'Sheet', note: '' },
    );
    expect(verification.status).toBe(404);
  });
});

describe('keeping the library', () => {
  const own = (partNumber: string) => ({
    record: {
      kind: 'transistor',
      partNumber,
      confidence: 'high',
      polarity: 'npn',
      sources: [{ of: 'all', source: 'Own measurement' }],
      limits: { vceoV: 40, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
    },
    comment: 'Entered from the data sheet.',
  });

  it('adds a part for designers and administrators, unverified', async () => {
    const made = await floor.designer.client.post('/api/parts', own('OWN-1'));
    expect(made.status).toBe(201);
    expect(made.body.latest).toMatchObject({ number: 1, author: { id: floor.designer.id } });
    expect(made.body.latest.verification).toBeNull();
    expect((await floor.administrator.client.post('/api/parts', own('OWN-2'))).status).toBe(201);
    for (const hand of [floor.checker, floor.exporter, floor.outsider]) {
      expect((await hand.client.post('/api/parts', own('OWN-3'))).status).toBe(403);
    }
  });

  it('takes each number of a kind once', async () => {
    const both = await Promise.all([
      floor.designer.client.post('/api/parts', own('OWN-4')),
      floor.second.client.post('/api/parts', own('OWN-4')),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 422]);
    const refused = both.find(({ status }) => status === 422);
    expect(refused?.body.errors[0].pointer).toBe('/record/partNumber');
  });

  it.each([
    [{ kind: 'valve' }, '/record/kind'],
    [{ limits: { icA: -1, tjMaxDegC: 150 } }, '/record/limits/icA'],
    [{ limits: { icA: 1 } }, '/record/limits/tjMaxDegC'],
    [{ gain: [{ icA: '10 mA', min: 100 }] }, '/record/gain/0/icA'],
    [{ beta: 100 }, '/record/beta'],
  ])('refuses a record with %o and names the field', async (change, pointer) => {
    const { record, comment } = own('OWN-5');
    const body = { record: { ...record, ...change }, comment };
    const reply = await floor.designer.client.post('/api/parts', body);
    expect(reply.status).toBe(422);
    expect(Problem.parse(reply.body).errors?.map((error) => error.pointer)).toContain(pointer);
  });

  it('makes a revision of an edit and keeps the older data', async () => {
    const before = await read('2N4401');
    const after = done(await revise(before, floor.designer.client, { description: 'Edited' }));
    const part = Part.parse(after.body);
    expect(part.revisions.map(({ number }) => number)).toEqual([2, 1]);
    expect(part.latest.record.description).toBe('Edited');
    const { latest } = Part.parse(before.body);
    const old = await floor.designer.client.get(`/api/part-revisions/${latest.id}`);
    expect(old.body.record).toEqual(latest.record);
  });

  it('refuses a stale edit, one without a version, and another part number', async () => {
    const part = await read('2N4403');
    const both = await Promise.all([revise(part), revise(part, floor.second.client)]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 412]);
    const { id, latest } = Part.parse(part.body);
    const body = { record: latest.record, comment: 'x' };
    const url = `/api/parts/${id}/revisions`;
    expect((await floor.designer.client.post(url, body)).status).toBe(428);
    const now = await read('2N4403');
    const renamed = await revise(now, floor.designer.client, { partNumber: '2N4402' });
    expect(renamed.body.errors[0].pointer).toBe('/record/partNumber');
    expect((await revise(now, floor.checker.client)).status).toBe(403);
  });
});

describe('verifying part data', () => {
  const verify = (hand: typeof floor.checker, partRevisionId: string, body = {}) =>
    hand.client.post(`/api/part-revisions/${partRevisionId}/verification`, {
      ...{ document: 'onsemi 2N3906/D, Rev. 4', note: 'All rows read.' },
      ...body,
    });

  it('is done once, by a checker or administrator who did not enter them', async () => {
    const edited = done(await revise(await read('2N3906'), floor.second.client));
    const { latest } = Part.parse(edited.body);
    expect((await verify(floor.designer, latest.id)).status).toBe(403);
    expect((await verify(floor.outsider, latest.id)).status).toBe(403);
    const own = await verify(floor.second, latest.id);
    expect([own.status, own.body.detail]).toEqual([
      403,
      'You entered these data; another person verifies them.',
    ]);
    expect((await verify(floor.checker, latest.id, { document: '' })).status).toBe(422);
    const both = await Promise.all([
      verify(floor.checker, latest.id),
      verify(floor.administrator, latest.id),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual([201, 409]);
    expect((await row('2N3906')).verified).toBe(true);
  });

  it('does not reach the next revision', async () => {
    done(await revise(await read('2N3906')));
    expect((await row('2N3906')).verified).toBe(false);
  });
});

describe('a stage filled from the library', () => {
  const figuresOf = (part: Part): TransistorData => {
    const { record } = part.latest;
    const derived = record.kind === 'transistor' ? deriveTransistor(record) : null;
    if (derived?.ok !== true) throw new Error(`no figures of ${record.partNumber}`);
    return derived.data;
  };
  const linked = async (reference: string, part: Part, transistor = figuresOf(part)) =>
    done(
      await floor.designer.client.post(`/api/projects/${floor.projectId}/stages`, {
        definition: relayDriver({ reference, transistor }),
        parts: { transistor: { partRevisionId: part.latest.id, choice: { group: '' } } },
      }),
    );

  it('says how its parts stand now', async () => {
    const part = Part.parse((await read('2N3904')).body);
    const made = await linked('Q1', part);
    expect(made.body.revision.partStanding).toEqual([
      {
        role: 'transistor',
        partId: part.id,
        partNumber: '2N3904',
        revision: 1,
        latestRevision: 1,
        verified: false,
      },
    ]);
    const after = Part.parse((await read('2N3904')).body);
    expect(after.usedIn).toEqual({ stages: 1, projects: 1 });
    expect(after.uses).toMatchObject([{ projectCode: 'CR-40', reference: 'Q1', letter: 'A' }]);
    const stranger = await floor.outsider.client.get(`/api/parts/${part.id}`);
    expect(stranger.body.uses).toEqual([]);
    expect(stranger.body.usedIn.stages).toBe(1);
  });

  it('is flagged when the data change, and unflagged by nothing but new data of its own', async () => {
    done(await revise(await read('2N3904')));
    const { body } = await floor.exporter.client.get(`/api/projects/${floor.projectId}/stages`);
    expect(body.stages[0]).toMatchObject({ reference: 'Q1', partDataChanged: true });
  });

  it.each([
    ['00000000-0000-4000-8000-000000000000', '/parts/transistor/partRevisionId'],
    ['2N3904', '/parts/transistor/partRevisionId'],
  ])('must name a part revision there is: %s', async (partRevisionId, pointer) => {
    const reply = await floor.designer.client.post(`/api/projects/${floor.projectId}/stages`, {
      definition: relayDriver({ reference: 'Q2' }),
      parts: { transistor: { partRevisionId, choice: {} } },
    });
    expect([reply.status, reply.body.errors[0].pointer]).toEqual([422, pointer]);
  });

  it('must name a part of the right kind', async () => {
    const diode = (await list('?kind=diode')).parts[0];
    const reply = await floor.designer.client.post(`/api/projects/${floor.projectId}/stages`, {
      definition: relayDriver({ reference: 'Q2' }),
      parts: { transistor: { partRevisionId: diode?.latestRevisionId, choice: {} } },
    });
    expect(reply.body.errors[0].pointer).toBe('/parts/transistor/partRevisionId');
  });

  it('cannot be locked on unverified data where the project asks for verified ones', async () => {
    const strict = await ProjectFloor.open(server, 'STRICT', { unverifiedBlocksLock: true });
    const checked = await strict.at('checked', { reference: 'Q1' });
    const asApprover = await strict.approver.client.get(`/api/revisions/${checked.body.id}`);
    expect(Revision.parse(asApprover.body).may.lock).toEqual({
      allowed: false,
      reason: 'The project locks verified part data only; not verified: 2N3904.',
    });
    expect((await strict.lock(checked)).status).toBe(409);
  });

  it('loses the link, and with it the verification, when a figure was edited by hand', async () => {
    const part = Part.parse((await read('2N3904')).body);
    const figures = figuresOf(part);
    const edited = { ...figures, limits: { ...figures.limits, vceoV: 60 } };
    const made = await linked('Q4', part, edited);
    expect(made.body.revision.parts.transistor).toBeNull();
    expect(made.body.revision.partStanding).toEqual([]);
  });

  it('freezes the data it was filled from at submission', async () => {
    const part = Part.parse((await read('2N3904')).body);
    const made = await linked('Q3', part);
    const draft = { ...made, body: made.body.revision as unknown };
    const inCheck = done(await floor.act(floor.designer, draft, '/submission'));
    const rows = await server.database.read((manager) =>
      manager.query<{ part_snapshot: string }[]>(
        `SELECT part_snapshot FROM revision WHERE id = ?`,
        [inCheck.body.id],
      ),
    );
    const [snapshot] = JSON.parse(rows[0]?.part_snapshot ?? '[]') as Record<string, unknown>[];
    expect(snapshot).toMatchObject({
      role: 'transistor',
      partRevisionId: part.latest.id,
      partNumber: '2N3904',
      record: part.latest.record,
    });
  });
});
