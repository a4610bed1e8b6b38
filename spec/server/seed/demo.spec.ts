import { IsNull, Not } from 'typeorm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { prepareDatabase } from '../../../server/seed/prepare-database.ts';
import { DEMO_ACCOUNTS, DEMO_PEOPLE } from '../../../server/seed/demo-accounts.ts';
import { passwordFault } from '../../../server/users/password-rules.ts';
import { AuditLineEntity } from '../../../server/audit/audit-line-entity.ts';
import { verifyChain } from '../../../server/audit/verify-chain.ts';
import { Desk } from '../../../shared/contract/desk.ts';
import { listProjects } from '../../../shared/contract/project.ts';
import { Revision } from '../../../shared/contract/revision.ts';
import { listStages, type StageRow } from '../../../shared/contract/stage.ts';
import { TOPOLOGIES } from '../../../shared/stage/stage-input.ts';
import { TestServer } from '../test-server.ts';
import type { TestClient } from '../test-client.ts';

let server: TestServer;
const told: string[] = [];

beforeAll(async () => {
  server = await TestServer.start({ demo: true });
  await prepareDatabase(server.services, (line) => told.push(line));
}, 120_000);
afterAll(() => server.stop());

const enter = (who: keyof typeof DEMO_PEOPLE) =>
  server.signIn(DEMO_PEOPLE[who], DEMO_PEOPLE[who].password);

async function allRows(client: TestClient): Promise<StageRow[]> {
  const { projects } = listProjects.reply.parse((await client.get('/api/projects')).body);
  const rows: StageRow[] = [];
  for (const { id } of projects) {
    for (const query of ['', '?state=superseded']) {
      const reply = await client.get(`/api/projects/${id}/stages${query}`);
      rows.push(...listStages.reply.parse(reply.body).stages);
    }
  }
  return rows;
}

describe('the demo', () => {
  it('shows at least 14 stages in 2 projects, over all states and verdicts', async () => {
    const client = await enter('administrator');
    expect((await client.get('/api/projects')).body.projects).toHaveLength(2);
    const rows = await allRows(client);
    expect(new Set(rows.map(({ stageId }) => stageId)).size).toBeGreaterThanOrEqual(14);
    expect(new Set(rows.map(({ state }) => state))).toEqual(
      new Set(['draft', 'in-check', 'checked', 'locked', 'superseded', 'withdrawn']),
    );
    expect(new Set(rows.map(({ verdict }) => verdict))).toEqual(
      new Set(['pass', 'marginal', 'open', 'fail']),
    );
    expect(new Set(rows.map(({ topology }) => topology))).toEqual(new Set(TOPOLOGIES));
    expect(new Set(rows.map(({ loadKind }) => loadKind))).toEqual(
      new Set(['coil', 'resistor', 'led-string', 'lamp', 'logic-input']),
    );
    expect(rows.filter(({ partDataChanged }) => partDataChanged)).toHaveLength(1);
  });

  it('holds Q12 with a 2N3904 and 620 Ω as a draft, only its coil voltage marginal', async () => {
    const client = await enter('designer');
    const row = (await allRows(client)).find(({ reference }) => reference === 'Q12');
    expect(row).toMatchObject({ state: 'draft', transistor: '2N3904', baseResistorOhm: 620 });
    const { body } = await client.get(`/api/revisions/${row?.revisionId ?? ''}`);
    const { criteria } = Revision.parse(body).evaluation;
    const notPassing = criteria.filter(({ status }) => status !== 'pass' && status !== 'stated');
    expect(notPassing.map(({ id, status }) => `${id} ${status}`)).toEqual([
      'load-voltage marginal',
    ]);
  });

  it('has every locked revision whole, signed with the right people', async () => {
    const client = await enter('exporter');
    const locked = (await allRows(client)).filter(({ state }) =>
      ['locked', 'superseded'].includes(state),
    );
    expect(locked.length).toBeGreaterThanOrEqual(6);
    for (const { revisionId } of locked) {
      const verified = await client.get(`/api/revisions/${revisionId}/verification`);
      expect(verified.body).toMatchObject({ whole: true, differences: [] });
    }
  });

  it('gives everybody something that waits', async () => {
    const kinds = async (who: keyof typeof DEMO_PEOPLE) => {
      const desk = Desk.parse((await (await enter(who)).get('/api/desk')).body);
      return desk.groups.filter(({ items }) => items.length > 0).map(({ kind }) => kind);
    };
    expect(await kinds('designer')).toEqual([
      'findings-to-answer',
      'part-data-changed',
      'own-drafts',
    ]);
    expect(await kinds('checker')).toEqual(['to-check', 'findings-to-close', 'part-data-changed']);
    expect(await kinds('approver')).toEqual(['to-approve']);
  });

  it('has an issued note that search finds', async () => {
    const client = await enter('exporter');
    const { body } = await client.get('/api/search?text=CR-40-BOM');
    expect(body.hits).toMatchObject([{ kind: 'bom-note', title: 'CR-40-BOM-0001' }]);
  });

  it('keeps its history in order and its chain whole', async () => {
    const chain = await server.database.read(verifyChain);
    expect(chain).toMatchObject({ whole: true, faults: [] });
    const lines = await server.database.read((manager) =>
      manager.find(AuditLineEntity, {
        where: { projectId: Not(IsNull()) },
        order: { sequence: 'ASC' },
      }),
    );
    const times = lines.map(({ atMs }) => atMs);
    expect(times).toEqual([...times].sort((a, b) => a - b));
    expect(Math.max(...times)).toBeLessThan(server.nowMs);
  });

  it('is printed and listed with its accounts', async () => {
    const session = await (await server.visit()).get('/api/session');
    expect(session.body).toMatchObject({ demo: true, setupNeeded: false });
    expect(session.body.demoAccounts).toEqual(DEMO_ACCOUNTS);
    for (const { email, password } of DEMO_ACCOUNTS) {
      expect(told.join('\n')).toContain(`${email}  ${password}`);
    }
  });

  it('has passwords its own rules accept', () => {
    for (const { email, name, password } of Object.values(DEMO_PEOPLE)) {
      expect(passwordFault(password, [name, email])).toBeNull();
    }
  });

  it('changes nothing when started again', async () => {
    const before = await server.database.read(verifyChain);
    await prepareDatabase(server.services, () => undefined);
    expect(await server.database.read(verifyChain)).toEqual(before);
  });
});

describe('a server without the demo', () => {
  it('has the library and nobody', async () => {
    const other = await TestServer.start({ demo: false });
    await prepareDatabase(other.services, () => undefined);
    const session = await (await other.visit()).get('/api/session');
    expect(session.body).toMatchObject({ demo: false, setupNeeded: true, demoAccounts: [] });
    await other.stop();
  });
});
