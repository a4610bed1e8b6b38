import type { StageFile } from '../../shared/stage/stage-input.ts';
import type { Reply, TestClient } from './test-client.ts';
import { PASSWORD, type TestPerson, type TestServer } from './test-server.ts';
import { relayDriver } from '../shared/relay-stage.ts';

export const GENERAL = '5d1f0c52-7a0e-4c43-9d0b-3f1f4b6c9a01';
export const HIGH = '5d1f0c52-7a0e-4c43-9d0b-3f1f4b6c9a02';

/** Somebody with an account and a browser that is signed in. */
export interface Hand extends TestPerson {
  readonly client: TestClient;
}

export const projectFields = (code: string, changes: object = {}) => ({
  code,
  title: 'Cold-room controller',
  supplementaryTitle: null,
  legalOwner: 'Test Works',
  department: null,
  policyId: GENERAL,
  unverifiedBlocksLock: false,
  ...changes,
});

/** A project with one person for each role, a second one for designer and checker, and an outsider. */
export class ProjectFloor {
  private constructor(
    readonly server: TestServer,
    readonly projectId: string,
    readonly administrator: Hand,
    readonly designer: Hand,
    readonly second: Hand,
    readonly checker: Hand,
    readonly approver: Hand,
    readonly exporter: Hand,
    readonly outsider: Hand,
  ) {}

  static async open(
    server: TestServer,
    code = 'CR-40',
    changes: object = {},
  ): Promise<ProjectFloor> {
    const hand = async (person: TestPerson): Promise<Hand> => ({
      ...person,
      client: await server.signIn(person),
    });
    const named = async (name: string) => hand(await server.addPerson(`${name} ${code}`));
    const administrator = await hand(
      await server.addPerson(`Root ${code}`, { administrator: true }),
    );
    const designer = await named('Dora');
    const second = await named('Dirk');
    const checker = await named('Cleo');
    const approver = await named('Arno');
    const exporter = await named('Edda');
    const outsider = await named('Otto');
    const made = await designer.client.post('/api/projects', projectFields(code, changes));
    const { id } = made.body as { id: string };
    await designer.client.put(
      `/api/projects/${id}/members`,
      {
        members: [
          { personId: designer.id, roles: ['designer'] },
          { personId: second.id, roles: ['designer', 'checker'] },
          { personId: checker.id, roles: ['checker'] },
          { personId: approver.id, roles: ['approver'] },
          { personId: exporter.id, roles: ['exporter'] },
        ],
      },
      { 'If-Match': made.etag ?? '' },
    );
    return new ProjectFloor(
      server,
      id,
      administrator,
      designer,
      second,
      checker,
      approver,
      exporter,
      outsider,
    );
  }

  /** Creates a stage as the designer. */
  async stage(changes: Partial<StageFile> = {}, client = this.designer.client): Promise<Reply> {
    const reply = await client.post(`/api/projects/${this.projectId}/stages`, {
      definition: relayDriver(changes),
    });
    if (reply.status !== 201) throw new Error(`stage answered ${reply.status}: ${reply.text}`);
    return { ...reply, body: (reply.body as { revision: unknown }).revision };
  }

  /** Sends to a revision with the ETag given. */
  act(hand: Hand, revision: Reply, path: string, body?: unknown, method = 'POST'): Promise<Reply> {
    const { id } = revision.body as { id: string };
    return hand.client.send(method, `/api/revisions/${id}${path}`, body, {
      'If-Match': revision.etag ?? '',
    });
  }

  /** A complete check of a revision that is in check. */
  completeCheck(revision: Reply, hand = this.checker): Promise<Reply> {
    const { criteria } = (
      revision.body as {
        evaluation: { criteria: { id: string; value: number | null; status: string }[] };
      }
    ).evaluation;
    const asked = criteria.filter(({ status }) => status === 'marginal' || status === 'open');
    const own = criteria.find(({ id }) => id === 'overdrive-factor')?.value ?? null;
    return this.act(
      hand,
      revision,
      '/check',
      {
        overdriveFactor: own === null ? null : own * 0.98,
        method: 'hand',
        note: 'Gain read from the printed table, cold factor by hand.',
        reason: '',
        justifications: Object.fromEntries(
          asked.map(({ id }) => [id, 'Measured on the bench and found enough.']),
        ),
        read: criteria.map(({ id }) => id),
      },
      'PUT',
    );
  }

  /** A stage brought as far as asked, each step by the person it belongs to. */
  async at(
    state: 'draft' | 'in-check' | 'checked' | 'locked' | 'withdrawn',
    changes: Partial<StageFile> = {},
  ): Promise<Reply> {
    const draft = await this.stage(changes);
    if (state === 'draft') return draft;
    if (state === 'withdrawn') {
      return done(await this.act(this.designer, draft, '/withdrawal', { reason: 'Not needed.' }));
    }
    const inCheck = done(await this.act(this.designer, draft, '/submission'));
    if (state === 'in-check') return inCheck;
    const read = done(await this.completeCheck(inCheck));
    const checked = done(await this.act(this.checker, read, '/pass'));
    return state === 'checked' ? checked : done(await this.lock(checked));
  }

  /** Signs as the approver, with the hash the preview shows. */
  async lock(revision: Reply, hand = this.approver, password?: string): Promise<Reply> {
    const { id } = revision.body as { id: string };
    const preview = await hand.client.get(`/api/revisions/${id}/lock`);
    const { hash } = preview.body as { hash: string };
    return this.act(hand, revision, '/lock', { password: password ?? PASSWORD, hash });
  }
}

/** The reply, or an error that tells why the step before was refused. */
export function done(reply: Reply): Reply {
  if (reply.status >= 300) throw new Error(`${reply.status}: ${reply.text}`);
  return reply;
}
