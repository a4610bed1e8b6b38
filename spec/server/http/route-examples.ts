import { randomUUID } from 'node:crypto';
import type { Endpoint } from '../../../server/http/endpoint.ts';
import { Designators, PartLinks } from '../../../shared/contract/revision.ts';
import { done, projectFields, type ProjectFloor } from '../project-floor.ts';
import { relayDriver } from '../../shared/relay-stage.ts';
import type { Reply } from '../test-client.ts';
import { PASSWORD } from '../test-server.ts';

export const keyOf = ({ route }: Endpoint): string => `${route.method} ${route.path}`;

/** Ids that exist on one floor, for the parameters of a path. */
export type Ids = Readonly<Record<string, string>>;

const NO_ID = '00000000-0000-4000-8000-000000000000';
const text = 'Because of the bench.';
/** Every member of the schema, empty. */
export const allNull = ({ shape }: { readonly shape: object }): object =>
  Object.fromEntries(Object.keys(shape).map((name) => [name, null]));
const partFields = (partNumber: string): object => ({
  record: {
    ...{ kind: 'transistor', partNumber, confidence: 'high', polarity: 'npn' },
    sources: [{ of: 'all', source: 'Own measurement' }],
    limits: { vceoV: 40, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
  },
  comment: 'Entered from the data sheet.',
});

/** A well-formed body for each route that takes one. A route that is missing here fails the matrix. */
const BODIES: Record<string, () => unknown> = {
  'POST /api/session': () => ({ email: 'nobody@works.example', password: 'x' }),
  'POST /api/setup': () => ({
    ...{ code: 'X', workspace: 'W', name: 'N', email: 'n@works.example', password: PASSWORD },
  }),
  'PUT /api/account/password': () => ({ current: 'wrong', next: 'a quite different phrase' }),
  'POST /api/password-resets': () => ({ email: 'nobody@works.example' }),
  'POST /api/password-resets/redemption': () => ({ token: 'A'.repeat(43), password: PASSWORD }),
  'POST /api/invitations/acceptance': () => ({ token: 'A'.repeat(43), password: PASSWORD }),
  'POST /api/account/email-changes': () => ({ password: 'wrong', email: 'n@works.example' }),
  'POST /api/account/email-changes/confirmation': () => ({ token: 'A'.repeat(43) }),
  'POST /api/people': () => ({
    ...{ name: 'Ina', email: `${randomUUID()}@works.example`, administrator: false },
  }),
  'PATCH /api/people/:personId': () => ({ name: 'Renamed' }),
  'POST /api/projects': () => projectFields(randomUUID().slice(0, 8).toUpperCase()),
  'PUT /api/projects/:projectId': () => projectFields('CR-99'),
  'PUT /api/projects/:projectId/members': () => ({ members: [] }),
  'POST /api/projects/:projectId/stages': () => ({
    definition: relayDriver({ reference: `Q${1000 + Math.floor(performance.now() % 9000)}` }),
  }),
  'PUT /api/revisions/:revisionId': () => ({
    ...{ definition: relayDriver(), designators: allNull(Designators), parts: allNull(PartLinks) },
  }),
  'POST /api/revisions/:revisionId/return': () => ({ reason: text }),
  'POST /api/revisions/:revisionId/withdrawal': () => ({ reason: text }),
  'POST /api/revisions/:revisionId/lock': () => ({ password: 'wrong', hash: 'a'.repeat(64) }),
  'PUT /api/revisions/:revisionId/check': () => ({
    ...{ overdriveFactor: 5, method: 'hand', note: text, reason: '', justifications: {}, read: [] },
  }),
  'POST /api/revisions/:revisionId/findings': () => ({
    ...{ subject: { kind: 'criterion', id: 'forced-beta' }, title: 'Odd', text },
  }),
  'POST /api/parts': () => partFields(`OWN-${randomUUID().slice(0, 8)}`),
  'POST /api/parts/:partId/revisions': () => partFields('OWN-1'),
  'POST /api/part-revisions/:partRevisionId/verification': () => ({ document: 'Sheet', note: '' }),
  'POST /api/projects/:projectId/bom-notes': () => ({ revisionIds: [NO_ID] }),
  ...Object.fromEntries(
    ['answer', 'closure', 'reopening'].map((act) => [
      `POST /api/revisions/:revisionId/findings/:findingId/${act}`,
      () => ({ text }),
    ]),
  ),
};

const QUERIES: Record<string, string> = { 'GET /api/search': '?text=Q12' };

/** @throws {Error} for a route with a body and no example of it */
export function bodyFor(endpoint: Endpoint): unknown {
  if (endpoint.route.body === undefined) return undefined;
  return bodyOf(keyOf(endpoint));
}

/** @throws {Error} where there is none */
export function bodyOf(key: string): unknown {
  const make = BODIES[key];
  if (!make) throw new Error(`no example body for ${key}: add one to route-examples.ts`);
  return make();
}

/** The path with ids filled in, as far as the caller could want it; a name that is not among them gets an id nobody has. */
export function pathFor(endpoint: Endpoint, ids: Ids, caller = ''): string {
  const state = STATES[`${keyOf(endpoint)} ${caller}`] ?? STATES[keyOf(endpoint)];
  const own = state === undefined ? ids : { ...ids, revisionId: ids[`${state}Id`] ?? NO_ID };
  const filled = endpoint.route.path.replace(/:(\w+)/g, (_, name: string) => own[name] ?? NO_ID);
  return filled + (QUERIES[keyOf(endpoint)] ?? '');
}

/** The state in which a route's own rule decides, and not the revision's state; in check where none is named. */
const STATES: Record<string, 'draft' | 'checked'> = {
  'PUT /api/revisions/:revisionId': 'draft',
  'POST /api/revisions/:revisionId/return approver': 'checked',
  'POST /api/revisions/:revisionId/submission': 'draft',
  'POST /api/revisions/:revisionId/withdrawal': 'draft',
  'GET /api/revisions/:revisionId/lock': 'checked',
  'POST /api/revisions/:revisionId/lock': 'checked',
};

/** Ids of a project with a revision in each state, a finding, a part of the library and an issued note. */
export async function idsOf(floor: ProjectFloor): Promise<Ids> {
  const draft = await floor.at('draft', { reference: 'Q901' });
  const checked = await floor.at('checked', { reference: 'Q902' });
  const locked = await floor.at('locked', { reference: 'Q903' });
  const note = await floor.exporter.client.post(`/api/projects/${floor.projectId}/bom-notes`, {
    revisionIds: [idOf(locked)],
  });
  const part = await floor.designer.client.post('/api/parts', partFields(`P-${floor.projectId}`));
  const inCheck = await floor.at('in-check');
  const raised = await floor.act(floor.checker, inCheck, '/findings', {
    ...{ subject: { kind: 'criterion', id: 'forced-beta' }, title: 'Odd', text },
  });
  const { id, stageId, findings } = raised.body as {
    id: string;
    stageId: string;
    findings: { id: string }[];
  };
  return {
    ...{ projectId: floor.projectId, revisionId: id, stageId, findingId: findings[0]!.id },
    ...{ noteId: idOf(done(note)), partId: idOf(done(part)) },
    partRevisionId: (part.body as { latest: { id: string } }).latest.id,
    ...{ draftId: idOf(draft), checkedId: idOf(checked) },
    ...{ personId: floor.outsider.id, sessionId: NO_ID, format: 'csv' },
  };
}

function idOf(reply: Reply): string {
  return (reply.body as { id: string }).id;
}
