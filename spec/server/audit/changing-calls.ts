import { randomUUID } from 'node:crypto';
import { bodyOf } from '../http/route-examples.ts';
import { done, type Hand, projectFields, type ProjectFloor } from '../project-floor.ts';
import { relayDriver } from '../../shared/relay-stage.ts';
import type { Reply, TestClient } from '../test-client.ts';
import { PASSWORD } from '../test-server.ts';

/** A call that will succeed, once: everything it needs is there. */
export interface Call {
  readonly client: TestClient;
  readonly path: string;
  readonly body?: unknown;
  readonly etag?: string | null;
  /** What it leaves in the trail. */
  readonly action: string;
}

const NEXT = 'a quite different phrase';
const text = 'Because of the bench.';

/**
 * For each route that changes something or hands a file out, a call that does it. A route that is missing here
 * fails the suite.
 */
export const CHANGING_CALLS: Readonly<Record<string, (floor: ProjectFloor) => Promise<Call>>> = {
  'POST /api/session': async ({ server, outsider }) => ({
    ...{ client: await server.visit(), path: '/api/session', action: 'session.started' },
    body: { email: outsider.email, password: PASSWORD },
  }),
  'DELETE /api/session': async ({ server, outsider }) => ({
    ...{ client: await server.signIn(outsider), path: '/api/session', action: 'session.ended' },
  }),
  'PUT /api/account/password': async (floor) => ({
    ...{ client: (await newcomer(floor)).client, path: '/api/account/password' },
    ...{ body: { current: PASSWORD, next: NEXT }, action: 'person.password-changed' },
  }),
  'DELETE /api/account/sessions/:sessionId': async (floor) => {
    const { client, email } = await newcomer(floor);
    await floor.server.signIn({ email });
    const { sessions } = (await client.get('/api/account/sessions')).body as {
      sessions: { id: string; current: boolean }[];
    };
    const other = sessions.find(({ current }) => !current)!;
    return { client, path: `/api/account/sessions/${other.id}`, action: 'session.ended' };
  },
  'POST /api/account/email-changes': async (floor) => ({
    ...{ client: (await newcomer(floor)).client, path: '/api/account/email-changes' },
    body: { password: PASSWORD, email: `${randomUUID()}@works.example` },
    action: 'person.email-change-asked',
  }),
  'POST /api/account/email-changes/confirmation': async (floor) => {
    const { client } = await newcomer(floor);
    const email = `${randomUUID()}@works.example`;
    done(await client.post('/api/account/email-changes', { password: PASSWORD, email }));
    const token = await tokenMailedTo(floor, email);
    const path = '/api/account/email-changes/confirmation';
    return { client, path, body: { token }, action: 'person.email-change-confirmed' };
  },
  'POST /api/password-resets': async ({ server, outsider }) => ({
    ...{ client: await server.visit(), path: '/api/password-resets' },
    ...{ body: { email: outsider.email }, action: 'person.reset-asked' },
  }),
  'POST /api/password-resets/redemption': async (floor) => {
    const { email } = await newcomer(floor);
    const client = await floor.server.visit();
    done(await client.post('/api/password-resets', { email }));
    const body = { token: await tokenMailedTo(floor, email), password: NEXT };
    const path = '/api/password-resets/redemption';
    return { client, path, body, action: 'person.password-reset' };
  },
  'POST /api/invitations/acceptance': async (floor) => {
    const { email } = (await invited(floor)).body as { email: string };
    const body = { token: await tokenMailedTo(floor, email), password: NEXT };
    const client = await floor.server.visit();
    return { client, path: '/api/invitations/acceptance', body, action: 'person.joined' };
  },
  'POST /api/people': ({ administrator }) =>
    Promise.resolve({
      ...{ client: administrator.client, path: '/api/people', action: 'person.invited' },
      body: { name: 'Ina', email: `${randomUUID()}@works.example`, administrator: false },
    }),
  'POST /api/people/:personId/invitation': async (floor) => ({
    client: floor.administrator.client,
    path: `/api/people/${idOf(await invited(floor))}/invitation`,
    action: 'person.invited-again',
  }),
  'PATCH /api/people/:personId': async (floor) => {
    const person = await invited(floor);
    return {
      ...{ client: floor.administrator.client, path: `/api/people/${idOf(person)}` },
      ...{ etag: person.etag, body: { disabled: true }, action: 'person.changed' },
    };
  },
  'DELETE /api/people/:personId/sessions': async (floor) => ({
    client: floor.administrator.client,
    path: `/api/people/${(await newcomer(floor)).id}/sessions`,
    action: 'session.ended',
  }),
  'POST /api/projects': ({ designer }) =>
    Promise.resolve({
      ...{ client: designer.client, path: '/api/projects', action: 'project.created' },
      body: projectFields(code()),
    }),
  'PUT /api/projects/:projectId': async (floor) => {
    const { body, etag } = await project(floor);
    const fields = projectFields(body.code, { title: 'Cold store' });
    const action = 'project.changed';
    return { client: floor.designer.client, path: pathOf(body), body: fields, etag, action };
  },
  'PUT /api/projects/:projectId/members': async (floor) => {
    const { body, etag } = await project(floor);
    const member = (hand: Hand, role: string) => ({ personId: hand.id, roles: [role] });
    const members = [member(floor.designer, 'designer'), member(floor.checker, 'checker')];
    return {
      ...{ client: floor.designer.client, path: `${pathOf(body)}/members`, etag },
      ...{ body: { members }, action: 'project.members-changed' },
    };
  },
  'POST /api/projects/:projectId/stages': ({ designer, projectId }) =>
    Promise.resolve({
      ...{ client: designer.client, path: `/api/projects/${projectId}/stages` },
      ...{ body: { definition: relayDriver(reference()) }, action: 'stage.created' },
    }),
  'PUT /api/revisions/:revisionId': async (floor) => {
    const draft = await floor.at('draft', reference());
    const { definition, designators, parts } = draft.body as {
      definition: object;
      designators: object;
      parts: object;
    };
    const body = { definition: { ...definition, title: 'Other title' }, designators, parts };
    return onRevision(floor.designer, draft, '', 'revision.saved', body);
  },
  'POST /api/stages/:stageId/revisions': async (floor) => {
    const { body } = await floor.at('locked', reference());
    const path = `/api/stages/${(body as { stageId: string }).stageId}/revisions`;
    return { client: floor.designer.client, path, action: 'revision.started' };
  },
  'POST /api/revisions/:revisionId/submission': async (floor) => {
    const draft = await floor.at('draft', reference());
    return onRevision(floor.designer, draft, '/submission', 'revision.submitted');
  },
  'POST /api/revisions/:revisionId/pass': async (floor) => {
    const read = await floor.completeCheck(await floor.at('in-check', reference()));
    return onRevision(floor.checker, read, '/pass', 'revision.passed');
  },
  'POST /api/revisions/:revisionId/return': async (floor) => {
    const inCheck = await floor.at('in-check', reference());
    const body = { reason: text };
    return onRevision(floor.checker, inCheck, '/return', 'revision.returned', body);
  },
  'POST /api/revisions/:revisionId/withdrawal': async (floor) => {
    const draft = await floor.at('draft', reference());
    const body = { reason: text };
    return onRevision(floor.designer, draft, '/withdrawal', 'revision.withdrawn', body);
  },
  'POST /api/revisions/:revisionId/lock': async (floor) => {
    const checked = await floor.at('checked', reference());
    const { client } = floor.approver;
    const preview = await client.get(`/api/revisions/${idOf(checked)}/lock`);
    const { hash } = preview.body as { hash: string };
    const body = { password: PASSWORD, hash };
    return onRevision(floor.approver, checked, '/lock', 'revision.locked', body);
  },
  'PUT /api/revisions/:revisionId/check': async (floor) => {
    const inCheck = await floor.at('in-check', reference());
    const body = bodyOf('PUT /api/revisions/:revisionId/check');
    return onRevision(floor.checker, inCheck, '/check', 'check.saved', body);
  },
  'POST /api/revisions/:revisionId/findings': async (floor) => {
    const inCheck = await floor.at('in-check', reference());
    const body = bodyOf('POST /api/revisions/:revisionId/findings');
    return onRevision(floor.checker, inCheck, '/findings', 'finding.raised', body);
  },
  'POST /api/revisions/:revisionId/findings/:findingId/answer': async (floor) => {
    const [raised, path] = await finding(floor);
    return onRevision(floor.designer, raised, `${path}/answer`, 'finding.answered', { text });
  },
  'POST /api/revisions/:revisionId/findings/:findingId/closure': async (floor) => {
    const [raised, path] = await finding(floor);
    return onRevision(floor.checker, raised, `${path}/closure`, 'finding.closed', { text });
  },
  'POST /api/revisions/:revisionId/findings/:findingId/reopening': async (floor) => {
    const [raised, path] = await finding(floor);
    const closed = done(await floor.act(floor.checker, raised, `${path}/closure`, { text }));
    return onRevision(floor.checker, closed, `${path}/reopening`, 'finding.reopened', { text });
  },
  'POST /api/parts': ({ designer }) =>
    Promise.resolve({
      ...{ client: designer.client, path: '/api/parts', action: 'part.created' },
      body: bodyOf('POST /api/parts'),
    }),
  'POST /api/parts/:partId/revisions': async (floor) => {
    const { body, etag } = await part(floor);
    const { id, latest } = body as { id: string; latest: { record: object } };
    return {
      ...{ client: floor.designer.client, path: `/api/parts/${id}/revisions`, etag },
      ...{ body: { record: latest.record, comment: text }, action: 'part.revised' },
    };
  },
  'POST /api/part-revisions/:partRevisionId/verification': async (floor) => {
    const { latest } = (await part(floor)).body as { latest: { id: string } };
    return {
      client: floor.checker.client,
      path: `/api/part-revisions/${latest.id}/verification`,
      ...{ body: { document: 'Sheet', note: '' }, action: 'part.verified' },
    };
  },
  'POST /api/projects/:projectId/bom-notes': async (floor) => ({
    client: floor.exporter.client,
    path: `/api/projects/${floor.projectId}/bom-notes`,
    body: { revisionIds: [idOf(await floor.at('locked', reference()))] },
    action: 'bom-note.issued',
  }),
  'GET /api/projects/:projectId/bom-note/files/:format': async (floor) => {
    await floor.at('locked', reference());
    const path = `/api/projects/${floor.projectId}/bom-note/files/csv`;
    return { client: floor.exporter.client, path, action: 'bom-note.downloaded' };
  },
  'GET /api/revisions/:revisionId/calculation/files/pdf': async (floor) => {
    const id = idOf(await floor.at('locked', reference()));
    const path = `/api/revisions/${id}/calculation/files/pdf`;
    return { client: floor.checker.client, path, action: 'calculation.downloaded' };
  },
  'GET /api/bom-notes/:noteId/files/:format': async (floor) => {
    const revisionIds = [idOf(await floor.at('locked', reference()))];
    const { client } = floor.exporter;
    const note = await client.post(`/api/projects/${floor.projectId}/bom-notes`, { revisionIds });
    const path = `/api/bom-notes/${idOf(done(note))}/files/csv`;
    return { client, path, action: 'bom-note.downloaded' };
  },
};

let made = 0;

function reference(): { reference: string } {
  made += 1;
  return { reference: `Q${made}` };
}

function code(): string {
  made += 1;
  return `P-${made}`;
}

function idOf(reply: Reply): string {
  return (reply.body as { id: string }).id;
}

function pathOf({ id }: { readonly id: string }): string {
  return `/api/projects/${id}`;
}

function onRevision(
  { client }: Hand,
  revision: Reply,
  path: string,
  action: string,
  body?: unknown,
): Call {
  const { etag } = done(revision);
  return { client, path: `/api/revisions/${idOf(revision)}${path}`, etag, action, body };
}

async function project({ designer }: ProjectFloor): Promise<Reply> {
  return done(await designer.client.post('/api/projects', projectFields(code())));
}

async function part({ designer }: ProjectFloor): Promise<Reply> {
  return done(await designer.client.post('/api/parts', bodyOf('POST /api/parts')));
}

/** A revision in check with one finding, and the finding's path. */
async function finding(floor: ProjectFloor): Promise<[Reply, string]> {
  const inCheck = await floor.at('in-check', reference());
  const body = bodyOf('POST /api/revisions/:revisionId/findings');
  const raised = done(await floor.act(floor.checker, inCheck, '/findings', body));
  const { findings } = raised.body as { findings: { id: string }[] };
  return [raised, `/findings/${findings[0]!.id}`];
}

async function invited({ administrator }: ProjectFloor): Promise<Reply> {
  const body = { name: 'Ina', email: `${randomUUID()}@works.example`, administrator: false };
  return done(await administrator.client.post('/api/people', body));
}

/** Somebody whose account may be spoilt. */
async function newcomer({ server }: ProjectFloor): Promise<Hand> {
  const person = await server.addPerson(`New ${(made += 1)}`);
  return { ...person, client: await server.signIn(person) };
}

async function tokenMailedTo({ server }: ProjectFloor, email: string): Promise<string> {
  const mail = (await server.mails()).find(({ to }) => to.includes(`<${email}>`));
  return /#([\w-]{43})/.exec(mail?.text ?? '')![1]!;
}
