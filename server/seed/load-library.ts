import { readFile } from 'node:fs/promises';
import * as z from 'zod';
import { PartRecord } from '../../shared/parts/part-record.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { PartEntity } from '../parts/part-entity.ts';
import { insertPart, insertPartRevision } from '../parts/part-write.ts';
import type { Database } from '../persistence/database.ts';

/** The data files stay in the source tree, seen from the sources as well as from dist/node/server/seed. */
const FOLDER = import.meta.url.endsWith('.ts') ? './library/' : '../../../../server/seed/library/';
const FILES = ['transistors', 'loads', 'logic-outputs', 'diodes'];
const COMMENT = 'Shipped with Sinkwell; read it against the data sheet before you rely on it.';

/** Adds the shipped parts a library does not have yet, each unverified. Parts it has stay as they are. */
export async function loadLibrary(database: Database, atMs: number): Promise<number> {
  const records = await readRecords();
  return database.transaction(async (manager) => {
    const added: string[] = [];
    for (const record of records) {
      const { kind, partNumber } = record;
      if (await manager.existsBy(PartEntity, { kind, partNumber })) continue;
      const origin = { authorId: null, comment: COMMENT, atMs };
      await insertPartRevision(manager, await insertPart(manager, record), 1, record, origin);
      added.push(partNumber);
    }
    if (added.length > 0) {
      const act = { actor: null, requestId: 'start', atMs };
      await recordAudit(manager, act, {
        action: 'library.loaded',
        ...{ objectKind: 'library', objectId: 'shipped', objectName: 'part library' },
        projectId: null,
        summary: `added ${added.length} shipped parts to the library`,
        detail: { added },
      });
    }
    return added.length;
  });
}

async function readRecords(): Promise<PartRecord[]> {
  const lists = await Promise.all(
    FILES.map(async (name) => {
      const text = await readFile(new URL(`${FOLDER}${name}.json`, import.meta.url), 'utf8');
      return z.array(PartRecord).parse(JSON.parse(text));
    }),
  );
  return lists.flat();
}
