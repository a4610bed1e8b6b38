import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditLineEntity } from '../../../server/audit/audit-line-entity.ts';
import { verifyChain } from '../../../server/audit/verify-chain.ts';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { loadLibrary } from '../../../server/seed/load-library.ts';
import { listParts, Part } from '../../../shared/contract/part.ts';
import { Revision } from '../../../shared/contract/revision.ts';
import { ProjectFloor, projectFields } from '../project-floor.ts';
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

const trail = () =>
  server.database.read((manager) => manager.find(AuditLineEntity, { order: { sequence: 'ASC' } }));

/** Does something and tells which actions it left in the trail. */
async function left(work: () => Promise<Reply>): Promise<[Reply, string[]]> {
  const before = (await trail()).length;
  const reply = await work();
  return [reply, (await trail()).slice(before).map(({ action }) => action)];
}

describe('the trail', () => {
  it('holds one line for each step of a review, by whoever took it', async () => {
    const { designer, checker, approver } = floor;
    let last = await floor.stage();
    const id = Revision.parse(last.body).id;
    const finding = () => Revision.parse(last.body).findings[0]?.id ?? '';
    const save = () => {
      const { designators, parts } = Revision.parse(last.body);
      return floor.act(
        designer,
        last,
        '',
        { definition: relayDriver(), designators, parts },
        'PUT',
      );
    };
    const raised = { subject: { kind: 'criterion', id: 'drive-current' }, title: 'x', text: '' };
    const steps: [string, string, () => Promise<Reply>][] = [
      ['revision.saved', designer.id, save],
      ['revision.submitted', designer.id, () => floor.act(designer, last, '/submission')],
      ['finding.raised', checker.id, () => floor.act(checker, last, '/findings', raised)],
      [
        'finding.answered',
        designer.id,
        () => floor.act(designer, last, `/findings/${finding()}/answer`, { text: 'a' }),
      ],
      [
        'finding.reopened',
        checker.id,
        () => floor.act(checker, last, `/findings/${finding()}/reopening`, { text: 'b' }),
      ],
      [
        'finding.closed',
        checker.id,
        () => floor.act(checker, last, `/findings/${finding()}/closure`, { text: 'c' }),
      ],
      ['check.saved', checker.id, () => floor.completeCheck(last)],
      ['revision.passed', checker.id, () => floor.act(checker, last, '/pass')],
      [
        'revision.sent-back',
        approver.id,
        () => floor.act(approver, last, '/return', { reason: 'r' }),
      ],
      ['revision.submitted', designer.id, () => floor.act(designer, last, '/submission')],
      ['revision.returned', checker.id, () => floor.act(checker, last, '/return', { reason: 's' })],
      ['revision.submitted', designer.id, () => floor.act(designer, last, '/submission')],
      ['check.saved', checker.id, () => floor.completeCheck(last)],
      ['revision.passed', checker.id, () => floor.act(checker, last, '/pass')],
      ['revision.locked', approver.id, () => floor.lock(last)],
      [
        'revision.started',
        designer.id,
        () => designer.client.post(`/api/stages/${Revision.parse(last.body).stageId}/revisions`),
      ],
      [
        'revision.withdrawn',
        designer.id,
        () => floor.act(designer, last, '/withdrawal', { reason: 't' }),
      ],
    ];
    for (const [action, whoId, step] of steps) {
      const [reply, actions] = await left(step);
      expect([action, reply.status < 300, actions]).toEqual([action, true, [action]]);
      expect((await trail()).at(-1)).toMatchObject({ whoId, projectId: floor.projectId });
      last = reply;
    }
    const locked = (await trail()).find(({ action }) => action === 'revision.locked');
    expect(locked).toMatchObject({ objectId: id, objectName: 'Q12 A', summary: 'locked Q12 A' });
    expect(locked?.detail['hash']).toMatch(/^[0-9a-f]{64}$/);
    expect(JSON.stringify(await trail())).not.toContain('plain-otter');
  });

  it('holds one line for each change of projects and parts', async () => {
    const { designer, checker } = floor;
    const [made, created] = await left(() =>
      designer.client.post('/api/projects', projectFields('TR-1')),
    );
    expect(created).toEqual(['project.created']);
    const url = `/api/projects/${(made.body as { id: string }).id}`;
    const [saved, changed] = await left(() =>
      designer.client.put(url, projectFields('TR-1', { title: 'Other' }), {
        'If-Match': made.etag ?? '',
      }),
    );
    expect(changed).toEqual(['project.changed']);
    expect((await trail()).at(-1)?.detail).toEqual({
      title: { old: 'Cold-room controller', new: 'Other' },
    });
    const members = { members: [{ personId: designer.id, roles: ['designer'] }] };
    const [, listed] = await left(() =>
      designer.client.put(`${url}/members`, members, { 'If-Match': saved.etag ?? '' }),
    );
    expect(listed).toEqual(['project.members-changed']);

    const { parts } = listParts.reply.parse(
      (await designer.client.get('/api/parts?search=2N3904')).body,
    );
    const part = await designer.client.get(`/api/parts/${parts[0]?.id ?? ''}`);
    const { id, latest } = Part.parse(part.body);
    const [revised, edits] = await left(() =>
      designer.client.post(
        `/api/parts/${id}/revisions`,
        { record: latest.record, comment: 'Read again.' },
        { 'If-Match': part.etag ?? '' },
      ),
    );
    expect(edits).toEqual(['part.revised']);
    const [, verified] = await left(() =>
      checker.client.post(
        `/api/part-revisions/${Part.parse(revised.body).latest.id}/verification`,
        {
          ...{ document: 'Sheet', note: '' },
        },
      ),
    );
    expect(verified).toEqual(['part.verified']);
    const record = { ...latest.record, partNumber: 'TRAIL-1' };
    const [, added] = await left(() =>
      designer.client.post('/api/parts', { record, comment: 'New.' }),
    );
    expect(added).toEqual(['part.created']);
  });

  it('holds nothing of what was refused', async () => {
    const draft = await floor.stage({ reference: 'Q50' });
    const refused = [
      () => floor.act(floor.checker, draft, '/submission'),
      () => floor.act(floor.designer, draft, '/pass'),
      () => floor.act(floor.designer, draft, '/withdrawal', {}),
      () =>
        floor.designer.client.post(`/api/projects/${floor.projectId}/stages`, {
          definition: relayDriver({ reference: 'Q50' }),
        }),
      () => floor.outsider.client.post('/api/parts', {}),
    ];
    for (const step of refused) {
      const [reply, actions] = await left(step);
      expect(reply.status).toBeGreaterThanOrEqual(400);
      expect(actions).toEqual([]);
    }
  });

  it('is whole in the end', async () => {
    expect(await server.database.read(verifyChain)).toMatchObject({ whole: true, faults: [] });
  });
});
