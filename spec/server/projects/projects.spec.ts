import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { listPolicies, listProjects, readProject } from '../../../shared/contract/project.ts';
import { HIGH, ProjectFloor, projectFields } from '../project-floor.ts';
import { TestServer } from '../test-server.ts';

let server: TestServer;
let floor: ProjectFloor;

beforeAll(async () => {
  server = await TestServer.start({ limits: { ...SHIPPED_LIMITS, apiPerMinute: 100_000 } });
  await server.setUp();
  floor = await ProjectFloor.open(server);
});
afterAll(() => server.stop());

const path = () => `/api/projects/${floor.projectId}`;
const absent = '/api/projects/00000000-0000-4000-8000-000000000000';

describe('a project', () => {
  it('belongs to whoever created it, as designer and manager', async () => {
    const reply = await floor.outsider.client.post('/api/projects', projectFields('OWN-1'));
    expect(reply.status).toBe(201);
    expect(reply.body).toMatchObject({
      code: 'OWN-1',
      ownRoles: ['designer'],
      mayManage: true,
      policy: { name: 'General practice', version: 1 },
    });
    expect(reply.etag).toBe(`"${reply.body.id}-1"`);
  });

  it('is listed for its members and for administrators only', async () => {
    const codes = async (client: typeof floor.outsider.client) =>
      listProjects.reply
        .parse((await client.get('/api/projects')).body)
        .projects.map(({ code }) => code);
    expect(await codes(floor.exporter.client)).toEqual(['CR-40']);
    expect(await codes(floor.outsider.client)).not.toContain('CR-40');
    expect(await codes(floor.administrator.client)).toContain('CR-40');
  });

  it('answers a stranger exactly as if it did not exist', async () => {
    const foreign = await floor.outsider.client.get(path());
    const none = await floor.outsider.client.get(absent);
    expect(foreign.status).toBe(404);
    const known = foreign.body as Record<string, unknown>;
    expect(none.body).toEqual({ ...known, reference: expect.any(String) as string });
  });

  it('gives an administrator management and no role', async () => {
    const reply = await floor.administrator.client.get(path());
    expect(reply.body).toMatchObject({ ownRoles: [], mayManage: true });
  });

  it.each([
    [{ code: 'cr 40' }, '/code'],
    [{ code: 'CR-40' }, '/code'],
    [{ title: '' }, '/title'],
    [{ policyId: '00000000-0000-4000-8000-000000000000' }, '/policyId'],
    [{ policyId: 7 }, '/policyId'],
    [{ state: 'locked' }, ''],
  ])('refuses %o and names the field', async (change, pointer) => {
    const reply = await floor.designer.client.post('/api/projects', projectFields('NEW-1', change));
    expect(reply.status).toBe(422);
    expect(reply.body.errors[0].pointer).toBe(pointer === '' ? '/state' : pointer);
  });

  it('is changed by its manager or an administrator, not by another member', async () => {
    const before = await floor.designer.client.get(path());
    const ifMatch = { 'If-Match': before.etag ?? '' };
    const body = projectFields('CR-40', { title: 'Renamed' });
    expect((await floor.second.client.put(path(), body, ifMatch)).status).toBe(403);
    expect((await floor.outsider.client.put(path(), body, ifMatch)).status).toBe(404);
    const saved = await floor.designer.client.put(path(), body, ifMatch);
    expect(saved.body.title).toBe('Renamed');
    const second = await floor.administrator.client.put(path(), body, {
      'If-Match': saved.etag ?? '',
    });
    expect(second.status).toBe(200);
  });

  it('takes no change without the version read, and none upon a stale one', async () => {
    const before = await floor.designer.client.get(path());
    const body = projectFields('CR-40');
    expect((await floor.designer.client.put(path(), body)).status).toBe(428);
    const ifMatch = { 'If-Match': before.etag ?? '' };
    const both = await Promise.all([
      floor.designer.client.put(path(), body, ifMatch),
      floor.administrator.client.put(path(), { ...body, title: 'Other' }, ifMatch),
    ]);
    expect(both.map(({ status }) => status).sort()).toEqual([200, 412]);
  });
});

describe('members of a project', () => {
  const put = async (members: unknown, client = floor.designer.client) => {
    const { etag } = await client.get(path());
    return client.put(`${path()}/members`, { members }, { 'If-Match': etag ?? '' });
  };

  it.each([
    [[{ personId: '00000000-0000-4000-8000-000000000000', roles: ['checker'] }]],
    [[{ personId: 'nobody', roles: ['checker'] }]],
  ])('must be people with an account: %o', async (members) => {
    const reply = await put(members);
    expect(reply.status).toBe(422);
    expect(reply.body.errors[0].pointer).toBe('/members/0/personId');
  });

  it('must have roles there are, and appear once', async () => {
    const { id } = floor.checker;
    expect((await put([{ personId: id, roles: [] }])).status).toBe(422);
    expect((await put([{ personId: id, roles: ['owner'] }])).status).toBe(422);
    const twice = { personId: id, roles: ['checker'] };
    expect((await put([twice, twice])).body.errors[0].pointer).toBe('/members/1/personId');
  });

  it('lose sight of the project when taken off the list', async () => {
    const { members } = readProject.reply.parse((await floor.designer.client.get(path())).body);
    const asMembers = members.map(({ person, roles }) => ({ personId: person.id, roles }));
    const without = asMembers.filter(({ personId }) => personId !== floor.exporter.id);
    expect((await put(without)).status).toBe(200);
    expect((await floor.exporter.client.get(path())).status).toBe(404);
    expect((await put(asMembers)).status).toBe(200);
    expect((await floor.exporter.client.get(path())).status).toBe(200);
  });

  it('cannot be changed by a member who does not manage', async () => {
    expect((await put([], floor.checker.client)).status).toBe(403);
  });
});

describe('the policy of a project', () => {
  it('is one of the shipped ones', async () => {
    const { body } = await floor.checker.client.get('/api/policies');
    expect(listPolicies.reply.parse(body).policies.map(({ name }) => name)).toEqual([
      'General practice',
      'High reliability',
    ]);
  });

  it('judges drafts anew when it changes and leaves submitted revisions alone', async () => {
    const other = await ProjectFloor.open(server, 'POL-1');
    const draft = await other.stage({ reference: 'Q1' });
    const frozen = await other.at('in-check', { reference: 'Q2' });
    const project = await other.designer.client.get(`/api/projects/${other.projectId}`);
    const body = projectFields('POL-1', { policyId: HIGH });
    const ifMatch = { 'If-Match': project.etag ?? '' };
    const saved = await other.designer.client.put(
      `/api/projects/${other.projectId}`,
      body,
      ifMatch,
    );
    expect(saved.body.policy.name).toBe('High reliability');
    const read = async (id: string) => other.designer.client.get(`/api/revisions/${id}`);
    const after = await read(draft.body.id);
    expect(after.body.definition.policy.overdriveFactor).toBe(3);
    expect(limitOf(after.body, 'overdrive-factor')).toBe(3);
    expect(after.etag).not.toBe(draft.etag);
    const still = await read(frozen.body.id);
    expect(limitOf(still.body, 'overdrive-factor')).toBe(2);
    expect(still.etag).toBe(frozen.etag);
    const returned = await other.act(other.checker, still, '/return', { reason: 'New policy.' });
    expect(limitOf(returned.body, 'overdrive-factor')).toBe(3);
  });
});

describe('activity of a project', () => {
  it('tells its members what happened, newest first, and without details', async () => {
    const reply = await floor.exporter.client.get(`${path()}/activity?limit=3`);
    expect(reply.body.lines).toHaveLength(3);
    expect(reply.body.lines[0].sequence).toBeGreaterThan(reply.body.lines[1].sequence);
    expect(reply.body.lines[0]).not.toHaveProperty('detail');
    expect((await floor.outsider.client.get(`${path()}/activity`)).status).toBe(404);
  });
});

function limitOf(body: { evaluation: { criteria: { id: string; limit: number }[] } }, id: string) {
  return body.evaluation.criteria.find((criterion) => criterion.id === id)?.limit;
}
