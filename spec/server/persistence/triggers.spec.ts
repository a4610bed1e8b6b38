import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, it } from 'vitest';
import { openWriter } from '../../../server/persistence/connection.ts';

/** A rebuilt table loses its triggers silently: every one that guards a record is named here. */
const TRIGGERS = [
  'audit_head_delete',
  'audit_head_update',
  'audit_line_delete',
  'audit_line_update',
];

it('R-31: has every trigger that guards the records', async () => {
  const folder = await mkdtemp(path.join(tmpdir(), 'sinkwell-'));
  const writer = await openWriter(path.join(folder, 'test.sqlite'));
  const rows: { name: string }[] = await writer.query(
    `SELECT name FROM sqlite_schema WHERE type = 'trigger'`,
  );
  expect(rows.map(({ name }) => name)).toEqual(expect.arrayContaining(TRIGGERS));
  await writer.destroy();
  await rm(folder, { recursive: true, force: true });
});
