import path from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditLineEntity } from '../../../server/audit/audit-line-entity.ts';
import { SHIPPED_LIMITS } from '../../../server/http/limits.ts';
import { Project } from '../../../shared/contract/project.ts';
import { LockPreview, Revision, verifyRevision } from '../../../shared/contract/revision.ts';
import { done, ProjectFloor } from '../project-floor.ts';
import { relayDriver } from '../../shared/relay-stage.ts';
import type { Reply } from '../test-client.ts';
import { PASSWORD, TestServer } from '../test-server.ts';

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
const idOf = ({ body }: Reply) => Revision.parse(body).id;
const preview = async (revision: Reply) =>
  LockPreview.parse(
    (await floor.approver.client.get(`/api/revisions/${idOf(revision)}/lock`)).body,
  );
const verify = async (id: string) =>
  verifyRevision.reply.parse(
    (await floor.exporter.client.get(`/api/revisions/${id}/verification`)).body,
  );

describe('signing', () => {
  it('locks what was shown, with name, time, meaning and hash', async () => {
    server.pass(60_000);
    const checked = await floor.at('checked', reference());
    const shown = await preview(checked);
    expect(shown.recomputed).toBe(true);
    const locked = Revision.parse(done(await floor.lock(checked)).body);
    expect(locked.state).toBe('locked');
    expect(locked.lock).toEqual({
      approver: { id: floor.approver.id, name: floor.approver.name },
      signedAtMs: server.nowMs,
      meaning: `I have read the evidence for stage ${locked.definition.reference} revision A and release it for production.`,
      hash: shown.hash,
      intact: true,
    });
    expect(await verify(locked.id)).toEqual({
      whole: true,
      storedHash: shown.hash,
      recomputedHash: shown.hash,
      differences: [],
    });
  });

  it('asks for the own password', async () => {
    const checked = await floor.at('checked', reference());
    const wrong = await floor.lock(checked, floor.approver, 'not-my-password-at-all');
    expect(wrong.status).toBe(401);
    const { hash } = await preview(checked);
    const none = await floor.act(floor.approver, checked, '/lock', { hash });
    expect([none.status, none.body.errors[0].pointer]).toEqual([422, '/password']);
    const now = await floor.approver.client.get(`/api/revisions/${idOf(checked)}`);
    expect([now.body.state, now.etag]).toEqual(['checked', checked.etag]);
  });

  it('holds the stage’s port against its limit over all stages of the project', async () => {
    const { drive } = relayDriver();
    const own = await ProjectFloor.open(server, 'PORT-1');
    const on = (number: number, quantity: number) =>
      own.at('checked', {
        ...{ reference: `Q${number}`, quantity },
        drive: { ...drive, port: 'PB', portTotalA: 0.05 },
      });
    const first = await on(1, 5);
    const alone = Revision.parse(first.body).port!;
    // 3.6 V less at least 0.65 V over 589 Ω is 5 mA a pin; General practice derates 50 mA to 40 mA
    expect([alone.port, alone.pins, alone.criterion.status]).toEqual(['PB', 5, 'pass']);
    expect(alone.criterion.limit).toBeCloseTo(0.04, 12);
    const second = await on(2, 4);
    const together = Revision.parse(second.body).port!;
    expect([together.pins, together.criterion.status]).toEqual([9, 'fail']);
    const project = await own.designer.client.get(`/api/projects/${own.projectId}`);
    expect(Project.parse(project.body).ports).toEqual([together]);
    const refused = await own.lock(second);
    expect([refused.status, refused.body.code]).toEqual([409, 'conflict']);
    expect(refused.body.detail).toMatch(/^The stages on port PB draw 4\d\.\d\smA where 40\smA are/);
    const seen = await own.approver.client.get(`/api/revisions/${idOf(second)}`);
    expect(Revision.parse(seen.body).may.lock.reason).toBe(refused.body.detail);
    const back = done(await own.act(own.approver, second, '/return', { reason: 'Port PB.' }));
    done(await own.act(own.designer, back, '/withdrawal', { reason: 'Moves to PC.' }));
    const again = await own.approver.client.get(`/api/revisions/${idOf(first)}`);
    expect(Revision.parse(done(await own.lock(again)).body).state).toBe('locked');
    const [line] = await server.database.read((manager) =>
      manager.find(AuditLineEntity, { order: { sequence: 'DESC' }, take: 1 }),
    );
    expect(line).toMatchObject({ action: 'revision.locked', detail: { port: alone } });
  });

  it('refuses a hash that was not shown', async () => {
    const checked = await floor.at('checked', reference());
    const body = { password: PASSWORD, hash: '0'.repeat(64) };
    expect((await floor.act(floor.approver, checked, '/lock', body)).status).toBe(412);
  });

  it('needs a checked revision, an approver and the version read', async () => {
    const body = { password: PASSWORD, hash: '0'.repeat(64) };
    const inCheck = await floor.at('in-check', reference());
    expect((await floor.act(floor.approver, inCheck, '/lock', body)).status).toBe(409);
    const checked = await floor.at('checked', reference());
    for (const hand of [floor.designer, floor.checker, floor.exporter]) {
      expect((await floor.act(hand, checked, '/lock', body)).status).toBe(403);
    }
    expect((await floor.act(floor.outsider, checked, '/lock', body)).status).toBe(404);
    expect((await floor.act(floor.approver, inCheck, '/lock', body)).status).toBe(409);
    const url = `/api/revisions/${idOf(checked)}`;
    expect((await floor.approver.client.post(`${url}/lock`, body)).status).toBe(428);
    expect((await floor.outsider.client.get(`${url}/lock`)).status).toBe(404);
    expect((await floor.outsider.client.get(`${url}/verification`)).status).toBe(404);
    expect((await floor.exporter.client.get(`${url}/verification`)).status).toBe(409);
  });

  it('has one winner among 50 at the same time', async () => {
    const checked = await floor.at('checked', reference());
    const { hash } = await preview(checked);
    const all = await Promise.all(
      Array.from({ length: 50 }, () =>
        floor.act(floor.approver, checked, '/lock', { password: PASSWORD, hash }),
      ),
    );
    expect(all.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(all.filter(({ status }) => status === 409 || status === 412)).toHaveLength(49);
    const signatures = await server.database.read((manager) =>
      manager.query<unknown[]>(`SELECT 1 FROM signature WHERE revision_id = ?`, [idOf(checked)]),
    );
    expect(signatures).toHaveLength(1);
    expect((await verify(idOf(checked))).whole).toBe(true);
  });

  it('leaves nothing that any route could still change', async () => {
    const locked = done(await floor.lock(await floor.at('checked', reference())));
    const { definition, designators, parts } = Revision.parse(locked.body);
    const tries: [typeof floor.designer, string, unknown, string?][] = [
      [floor.designer, '', { definition, designators, parts }, 'PUT'],
      [floor.designer, '/submission', undefined],
      [floor.checker, '/pass', undefined],
      [floor.checker, '/return', { reason: 'x' }],
      [floor.approver, '/return', { reason: 'x' }],
      [floor.designer, '/withdrawal', { reason: 'x' }],
      [
        floor.checker,
        '/findings',
        { subject: { kind: 'criterion', id: 'drive-current' }, title: 'x', text: '' },
      ],
    ];
    for (const [hand, at, body, method] of tries) {
      const reply = await floor.act(hand, locked, at, body, method);
      expect([at, reply.status, reply.body.code]).toEqual([at, 409, 'revision-locked']);
    }
    expect((await floor.completeCheck(locked)).status).toBe(409);
  });
});

describe('the database itself', () => {
  const CHANGES = [
    `UPDATE revision SET title = 'x' WHERE id = $id`,
    `UPDATE revision SET state = 'draft' WHERE id = $id`,
    `DELETE FROM revision WHERE id = $id`,
    `UPDATE OR REPLACE revision SET version = version + 1 WHERE id = $id`,
    `INSERT OR REPLACE INTO revision SELECT * FROM revision WHERE id = $id`,
    `UPDATE signature SET hash = hash WHERE revision_id = $id`,
    `DELETE FROM signature WHERE revision_id = $id`,
    `INSERT OR REPLACE INTO signature SELECT * FROM signature WHERE revision_id = $id`,
    `UPDATE check_record SET note = 'x' WHERE revision_id = $id`,
    `DELETE FROM check_record WHERE revision_id = $id`,
    `INSERT INTO check_record SELECT revision_id, 2, checker_id, saved_at_ms, overdrive_factor, method, note, reason, justifications, read FROM check_record WHERE revision_id = $id`,
    `UPDATE finding SET state = 'open' WHERE revision_id = $id`,
    `DELETE FROM finding WHERE revision_id = $id`,
    `INSERT INTO finding VALUES ('new', $id, 9, 'criterion', 'x', 'x', 'open')`,
    `UPDATE finding_event SET text = 'x' WHERE finding_id IN (SELECT id FROM finding WHERE revision_id = $id)`,
    `DELETE FROM finding_event WHERE finding_id IN (SELECT id FROM finding WHERE revision_id = $id)`,
    `INSERT INTO finding_event SELECT finding_id, 99, at_ms, person_id, act, text FROM finding_event WHERE finding_id IN (SELECT id FROM finding WHERE revision_id = $id)`,
    `UPDATE revision_move SET reason = 'x' WHERE revision_id = $id`,
    `DELETE FROM revision_move WHERE revision_id = $id`,
    `INSERT INTO revision_move SELECT revision_id, 99, 'withdraw', person_id, at_ms, NULL FROM revision_move WHERE revision_id = $id AND sequence = 1`,
    `DELETE FROM revision_person WHERE revision_id = $id`,
    `UPDATE revision_person SET hand = 'author' WHERE revision_id = $id AND hand = 'checker'`,
    `UPDATE stage SET reference = 'Q99' WHERE id = (SELECT stage_id FROM revision WHERE id = $id)`,
    `DELETE FROM stage WHERE id = (SELECT stage_id FROM revision WHERE id = $id)`,
  ];
  let id: string;
  let raw: BetterSqlite3.Database;

  beforeAll(async () => {
    const inCheck = await floor.at('in-check', reference());
    const raised = done(
      await floor.act(floor.checker, inCheck, '/findings', {
        ...{ subject: { kind: 'criterion', id: 'drive-current' }, title: 'Twice?', text: '' },
      }),
    );
    const findingId = Revision.parse(raised.body).findings[0]?.id ?? '';
    const closed = done(
      await floor.act(floor.checker, raised, `/findings/${findingId}/closure`, { text: 'No.' }),
    );
    const read = done(await floor.completeCheck(closed));
    const checked = done(await floor.act(floor.checker, read, '/pass'));
    id = idOf(done(await floor.lock(checked)));
    raw = new BetterSqlite3(path.join(server.folder, 'sinkwell.sqlite'));
  });
  afterAll(() => {
    raw.close();
  });

  it.each(CHANGES)('refuses %s', (sql) => {
    expect(() => raw.prepare(sql).run({ id })).toThrow(
      /never changes|no longer open|append-only|locked|not a move|only draft|signed|exists already/,
    );
  });

  it('refuses a revision that begins locked, and a lock without a signature', () => {
    const columns = (raw.prepare(`PRAGMA table_info(revision)`).all() as { name: string }[]).map(
      ({ name }) => name,
    );
    const values = columns.map((name) =>
      name === 'id' ? `'new'` : name === 'number' ? '7' : `"${name}"`,
    );
    const insert = `INSERT INTO revision SELECT ${values.join(', ')} FROM revision WHERE id = $id`;
    expect(() => raw.prepare(insert).run({ id })).toThrow(/begins as the only draft/);
    const checked = raw.prepare(`SELECT id FROM revision WHERE state = 'checked'`).get() as {
      id: string;
    };
    expect(() =>
      raw.prepare(`UPDATE revision SET state = 'locked' WHERE id = $id`).run(checked),
    ).toThrow(/by a signature only/);
    expect(() =>
      raw.prepare(`UPDATE revision SET state = 'in-check' WHERE id = $id`).run(checked),
    ).toThrow(/not a move/);
    expect(() =>
      raw.prepare(`UPDATE revision SET definition = '{}' WHERE id = $id`).run(checked),
    ).toThrow(/frozen/);
  });
});

describe('verification', () => {
  /** Somebody with the file and the will to get round the triggers. */
  async function tamper(sql: string, id: string): Promise<void> {
    await server.database.transaction(async (manager) => {
      const triggers = await manager.query<{ name: string; sql: string }[]>(
        `SELECT name, sql FROM sqlite_master WHERE type = 'trigger' AND tbl_name IN ('revision', 'signature', 'check_record')`,
      );
      for (const { name } of triggers) await manager.query(`DROP TRIGGER "${name}"`);
      await manager.query(sql, [id]);
      for (const { sql: create } of triggers) await manager.query(create);
    });
  }

  it.each([
    [
      `UPDATE revision SET definition = json_set(definition, '$.baseResistor.valueOhm', 680) WHERE id = ?`,
      'definition.baseResistor.valueOhm: 620, now 680',
    ],
    [
      `UPDATE revision SET evaluation = json_set(evaluation, '$.verdict', 'pass') WHERE id = ?`,
      'evaluation.verdict: "marginal", now "pass"',
    ],
    [
      `UPDATE revision SET designators = json_set(designators, '$.load', 'K99') WHERE id = ?`,
      'designators.load:',
    ],
    [`UPDATE check_record SET note = 'Other' WHERE revision_id = ?`, 'check.note:'],
  ])('finds what %s changed', async (sql, expected) => {
    const id = idOf(done(await floor.lock(await floor.at('checked', reference()))));
    await tamper(sql, id);
    const found = await verify(id);
    expect(found.whole).toBe(false);
    expect(found.differences.some((line) => line.startsWith(expected))).toBe(true);
    expect(found.recomputedHash).not.toBe(found.storedHash);
    const read = await floor.exporter.client.get(`/api/revisions/${id}`);
    expect(Revision.parse(read.body).lock?.intact).toBe(false);
  });
});
