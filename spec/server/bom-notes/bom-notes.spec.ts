import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { BomNotePreview, IssuedBomNote } from '../../../shared/contract/bom-note.ts';
import { ProjectFloor, type Hand } from '../project-floor.ts';
import type { Reply } from '../test-client.ts';
import { TestServer } from '../test-server.ts';
import { readCsv } from '../documents/read-csv.ts';
import { readPdf, textOf } from '../documents/read-pdf.ts';

interface RevisionBody {
  readonly id: string;
  readonly stageId: string;
  readonly lock: { readonly hash: string } | null;
}

const body = (reply: Reply) => reply.body as RevisionBody;
const preview = (reply: Reply) => reply.body as BomNotePreview;

describe('BOM notes over HTTP', () => {
  let server: TestServer;
  let floor: ProjectFloor;
  let q1: RevisionBody;
  let q2: RevisionBody;
  let q3: RevisionBody;
  let notesPath: string;
  let previewPath: string;

  beforeAll(async () => {
    server = await TestServer.start();
    await server.setUp();
    floor = await ProjectFloor.open(server);
    q1 = body(await floor.at('locked', { reference: 'Q1' }));
    q2 = body(await floor.at('locked', { reference: 'Q2' }));
    q3 = body(await floor.at('in-check', { reference: 'Q3' }));
    notesPath = `/api/projects/${floor.projectId}/bom-notes`;
    previewPath = `/api/projects/${floor.projectId}/bom-note`;
  }, 120_000);

  afterAll(() => server.stop());

  const issue = (hand: Hand, ...revisions: RevisionBody[]) =>
    hand.client.post(notesPath, { revisionIds: revisions.map(({ id }) => id) });

  async function bytes(
    hand: Hand,
    path: string,
  ): Promise<{ status: number; file: Buffer; headers: Headers }> {
    const cookie = [...hand.client.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const response = await fetch(server.url + path, { headers: { Cookie: cookie } });
    const file = Buffer.from(await response.arrayBuffer());
    return { status: response.status, headers: response.headers, file };
  }

  describe('preview', () => {
    it('takes locked revisions and says why it leaves a stage out', async () => {
      const reply = await floor.exporter.client.get(previewPath);
      expect(reply.status).toBe(200);
      const { issue: may, note, stages } = preview(reply);
      expect(note).toMatchObject({ released: true, issue: null, contentHash: null });
      expect(note.revisions.map(({ reference, hash }) => [reference, hash])).toEqual([
        ['Q1', q1.lock?.hash],
        ['Q2', q2.lock?.hash],
      ]);
      expect(may).toEqual({ allowed: true, reason: null });
      expect(stages.map(({ reference, chosen, reason }) => [reference, chosen, reason])).toEqual([
        ['Q1', true, null],
        ['Q2', true, null],
        ['Q3', false, 'No revision of Q3 is locked; Q3 A is in state In check.'],
      ]);
      expect(note.titleBlock).toMatchObject({
        legalOwner: 'Test Works',
        creators: [floor.designer.name],
        checkers: [floor.checker.name],
        approvers: [floor.approver.name],
      });
    });

    it('with unlocked stages is not released and cannot be issued', async () => {
      const { note, issue: may } = preview(
        await floor.exporter.client.get(`${previewPath}?unlocked=true`),
      );
      expect(note).toMatchObject({ released: false, counts: { stages: 3, locked: 2 } });
      expect(note.revisions[2]).toMatchObject({ reference: 'Q3', state: 'In check', hash: null });
      expect(may).toEqual({
        allowed: false,
        reason: 'Not locked: Q3 A (In check). Leave them out, or wait for the lock.',
      });
    });

    it('leaves out what it is asked to', async () => {
      const reply = await floor.exporter.client.get(`${previewPath}?without=${q2.stageId}`);
      expect(preview(reply).note.revisions.map(({ reference }) => reference)).toEqual(['Q1']);
    });

    it('tells who is no exporter why the note cannot be issued', async () => {
      const { issue: may } = preview(await floor.designer.client.get(previewPath));
      expect(may).toEqual({
        allowed: false,
        reason: 'Only an exporter of the project can issue a note.',
      });
    });

    it.each([
      ['unlocked=perhaps', '/query/unlocked'],
      ['without=x', '/query/without'],
      ['other=1', '/query'],
    ])('refuses %s, naming it', async (query, pointer) => {
      const reply = await floor.exporter.client.get(`${previewPath}?${query}`);
      expect(reply.status).toBe(422);
      const { errors } = reply.body as { errors: { pointer: string }[] };
      expect(errors[0]?.pointer.startsWith(pointer)).toBe(true);
    });

    it('as PDF says NOT RELEASED where something is not locked', async () => {
      const { status, file } = await bytes(
        floor.designer,
        `${previewPath}/files/pdf?unlocked=true`,
      );
      expect(status).toBe(200);
      const text = (await readPdf(file)).map(textOf).join(' ');
      expect(text).toContain('NOT RELEASED, preview only');
      expect(text).toContain('Q3 A In check not signed none');
    });

    it('is hidden from an outsider, and asks who is signed out to sign in', async () => {
      expect((await floor.outsider.client.get(previewPath)).status).toBe(404);
      expect((await floor.outsider.client.get(`${previewPath}/files/pdf`)).status).toBe(404);
      expect((await (await server.visit()).get(previewPath)).status).toBe(401);
    });
  });

  describe('issue', () => {
    let issued: IssuedBomNote;

    beforeAll(async () => {
      const reply = await issue(floor.exporter, q1, q2);
      expect(reply.status, reply.text).toBe(201);
      issued = reply.body as IssuedBomNote;
    });

    it('numbers the note within its project and seals its content', () => {
      expect(issued.note.issue).toEqual({
        identification: 'CR-40-BOM-0001',
        number: 1,
        issuedBy: floor.exporter.name,
      });
      expect(issued.note.contentHash).toMatch(/^[0-9a-f]{64}$/);
      expect(issued).toMatchObject({ intact: true, download: { allowed: true, reason: null } });
    });

    it('is told in the audit trail, in the same words', async () => {
      const reply = await floor.exporter.client.get(
        `/api/projects/${floor.projectId}/activity?limit=200`,
      );
      const { lines } = reply.body as { lines: { action: string; who: string; summary: string }[] };
      expect(lines).toContainEqual(
        expect.objectContaining({
          action: 'bom-note.issued',
          who: floor.exporter.name,
          summary: 'issued CR-40-BOM-0001',
        }),
      );
    });

    it('is listed and read by every member, and by nobody else', async () => {
      const listed = await floor.designer.client.get(notesPath);
      expect((listed.body as { notes: object[] }).notes).toContainEqual(
        expect.objectContaining({
          id: issued.id,
          identification: 'CR-40-BOM-0001',
          contentHash: issued.note.contentHash,
          stages: 2,
        }),
      );
      const read = await floor.designer.client.get(`/api/bom-notes/${issued.id}`);
      expect(read.body).toEqual({
        ...issued,
        download: {
          allowed: false,
          reason: 'Only an exporter of the project can download an issued note.',
        },
      });
      expect((await floor.outsider.client.get(notesPath)).status).toBe(404);
      expect((await floor.outsider.client.get(`/api/bom-notes/${issued.id}`)).status).toBe(404);
    });

    it('is found by its number', async () => {
      const found = await floor.designer.client.get('/api/search?text=bom-0001');
      expect((found.body as { hits: object[] }).hits).toEqual([
        {
          kind: 'bom-note',
          link: `/p/${floor.projectId}/bom-note/${issued.id}`,
          title: 'CR-40-BOM-0001',
          detail: `issued 2026-01-12 by ${floor.exporter.name}`,
        },
      ]);
      const foreign = await floor.outsider.client.get('/api/search?text=bom-0001');
      expect((foreign.body as { hits: object[] }).hits).toEqual([]);
    });

    it('refuses what is not locked, naming it, and issues nothing', async () => {
      const before = (await floor.exporter.client.get(notesPath)).body as object;
      const reply = await issue(floor.exporter, q1, q3);
      expect(reply.status).toBe(409);
      expect((reply.body as { detail: string }).detail).toBe(
        'A note is issued of locked revisions only: Q3 A is in check.',
      );
      expect((await floor.exporter.client.get(notesPath)).body).toEqual(before);
    });

    it.each([
      ['designer', 403],
      ['checker', 403],
      ['approver', 403],
      ['administrator', 403],
      ['outsider', 404],
    ] as const)('refuses the %s', async (role, status) => {
      expect((await issue(floor[role], q1)).status).toBe(status);
    });

    it('refuses bad bodies, naming the field', async () => {
      const foreign = { id: '6f0d0b4e-3c1d-4c58-9a53-0e3a4d1f9b77' } as RevisionBody;
      const cases: [unknown, string][] = [
        [{ revisionIds: [q1.id, foreign.id] }, '/revisionIds/1'],
        [{ revisionIds: [q1.id, q1.id] }, '/revisionIds/1'],
        [{ revisionIds: [] }, '/revisionIds'],
        [{ revisionIds: ['Q1'] }, '/revisionIds/0'],
        [{}, '/revisionIds'],
        [{ revisionIds: [q1.id], number: 7 }, ''],
      ];
      for (const [sent, pointer] of cases) {
        const reply = await floor.exporter.client.post(notesPath, sent);
        expect(reply.status).toBe(422);
        const { errors } = reply.body as { errors: { pointer: string }[] };
        expect(errors[0]?.pointer.startsWith(pointer), JSON.stringify(errors)).toBe(true);
      }
    });

    it('gives every one of many at once a number of its own', async () => {
      const replies = await Promise.all(Array.from({ length: 8 }, () => issue(floor.exporter, q1)));
      const numbers = replies.map((reply) => (reply.body as IssuedBomNote).note.issue?.number ?? 0);
      expect(numbers.sort((a, b) => a - b)).toEqual([2, 3, 4, 5, 6, 7, 8, 9]);
    });

    it('is a file to save, the same bytes each time', async () => {
      for (const [format, type] of [
        ['pdf', 'application/pdf'],
        ['xlsx', 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet'],
        ['csv', 'text/csv; charset=utf-8'],
      ]) {
        const path = `/api/bom-notes/${issued.id}/files/${format}`;
        const first = await bytes(floor.exporter, path);
        expect(first.status).toBe(200);
        expect(first.headers.get('Content-Type')).toBe(type);
        expect(first.headers.get('Content-Disposition')).toBe(
          `attachment; filename=CR-40_BOM-0001_20260112.${format}`,
        );
        expect(first.headers.get('Content-Security-Policy')).toBe("sandbox; default-src 'none'");
        expect(first.headers.get('X-Content-Type-Options')).toBe('nosniff');
        server.pass(60_000);
        expect((await bytes(floor.exporter, path)).file.equals(first.file)).toBe(true);
      }
    });

    it('CSV and PDF carry number, hash and signed revisions', async () => {
      const csv = await bytes(floor.exporter, `/api/bom-notes/${issued.id}/files/csv`);
      const flat = readCsv(csv.file.toString('utf8')).map((record) => record.join('|'));
      expect(flat.some((row) => row.startsWith('Identification number|CR-40-BOM-0001|'))).toBe(
        true,
      );
      expect(
        flat.some((row) => row.startsWith(`Content|SHA-256 ${issued.note.contentHash!}|`)),
      ).toBe(true);
      expect(flat.some((row) => row.includes(`|${q1.lock!.hash}|`))).toBe(true);

      const pdf = await bytes(floor.exporter, `/api/bom-notes/${issued.id}/files/pdf`);
      const text = (await readPdf(pdf.file)).map(textOf).join(' ');
      expect(text).toContain('CR-40-BOM-0001');
      expect(text).not.toContain('NOT RELEASED');
    });

    it('CSV takes semicolon and decimal comma where asked, and refuses else', async () => {
      const path = `/api/bom-notes/${issued.id}/files/csv`;
      const { file } = await bytes(floor.exporter, `${path}?decimalMark=comma`);
      expect(file.toString('utf8')).toMatch(/^\ufeffLine;Qty;/);
      expect((await floor.exporter.client.get(`${path}?decimalMark=dot`)).status).toBe(422);
    });

    it.each([
      ['designer', 403],
      ['administrator', 403],
      ['outsider', 404],
    ] as const)('files are refused to the %s', async (role, status) => {
      const path = `/api/bom-notes/${issued.id}/files/pdf`;
      expect((await floor[role].client.get(path)).status).toBe(status);
    });

    it('answers 404 for a note that is none, 422 for a format that is none', async () => {
      const none = '/api/bom-notes/6f0d0b4e-3c1d-4c58-9a53-0e3a4d1f9b77';
      expect((await floor.exporter.client.get(none)).status).toBe(404);
      const path = `/api/bom-notes/${issued.id}/files/docx`;
      expect((await floor.exporter.client.get(path)).status).toBe(422);
    });

    it('cannot be changed or removed, whatever asks for it', async () => {
      for (const sql of [
        `UPDATE "bom_note" SET "note" = '{}'`,
        `DELETE FROM "bom_note"`,
        `INSERT OR REPLACE INTO "bom_note" SELECT "id", "project_id", "number", "issuer_id", 0, '{}' FROM "bom_note" LIMIT 1`,
      ]) {
        await expect(
          server.database.transaction((manager) => manager.query(sql)),
        ).rejects.toThrow();
      }
    });

    it('refuses a superseded revision', async () => {
      const draft = await floor.designer.client.post(`/api/stages/${q2.stageId}/revisions`);
      expect(draft.status).toBe(201);
      const after = preview(await floor.exporter.client.get(previewPath));
      expect(after.note.cautions[0]?.text).toBe('Q2 B (Draft) is under way and will replace Q2 A.');
      const sent = await floor.act(floor.designer, draft, '/submission');
      const read = await floor.completeCheck(sent);
      const checked = await floor.act(floor.checker, read, '/pass');
      expect((await floor.lock(checked)).status).toBe(200);

      const reply = await issue(floor.exporter, q1, q2);
      expect(reply.status).toBe(409);
      expect((reply.body as { detail: string }).detail).toContain('Q2 A is superseded');
    });

    it('shows and refuses a note whose content was changed behind the triggers', async () => {
      await server.database.transaction(async (manager) => {
        await manager.query(`DROP TRIGGER "bom_note_update"`);
        await manager.query(
          `UPDATE "bom_note" SET "note" = replace("note", 'Test Works', 'Best Works') WHERE "id" = ?`,
          [issued.id],
        );
      });
      const read = await floor.exporter.client.get(`/api/bom-notes/${issued.id}`);
      expect(read.body).toMatchObject({ intact: false });
      const file = await floor.exporter.client.get(`/api/bom-notes/${issued.id}/files/pdf`);
      expect(file.status).toBe(409);
    });

    it('leaves nothing behind where the audit line cannot be written', async () => {
      const count = () =>
        server.database.read(async (manager) => {
          const rows = await manager.query<{ n: number }[]>(`SELECT COUNT(*) AS n FROM "bom_note"`);
          return rows[0]?.n;
        });
      const before = await count();
      await server.database.transaction((manager) =>
        manager.query(
          `CREATE TRIGGER "no_audit" BEFORE INSERT ON "audit_line" BEGIN SELECT RAISE(ABORT, 'full'); END`,
        ),
      );
      expect((await issue(floor.exporter, q1)).status).toBe(500);
      expect(await count()).toBe(before);
    });
  });
});
