import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * What a revision may become and what may still change stands in the database as well as in the services, so
 * that no code and no hand gets round it.
 */
export class GuardRevisions1790000500000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await guardStage(db);
    await guardRevision(db);
    await guardSignature(db);
    await guardChildren(db);
    await guardKeys(db);
  }

  async down(db: QueryRunner): Promise<void> {
    const triggers = await db.manager.query<{ name: string }[]>(`
      SELECT "name" FROM "sqlite_master" WHERE "type" = 'trigger'
        AND "tbl_name" IN ('stage', 'revision', 'signature', ${CHILDREN.map((name) => `'${name}'`).join(', ')})`);
    for (const { name } of triggers) await db.query(`DROP TRIGGER "${name}"`);
  }
}

const CHILDREN = [
  'revision_person',
  'revision_part',
  'revision_move',
  'check_record',
  'finding',
  'finding_event',
];

const FROZEN = ['definition', 'evaluation', 'designators', 'part_snapshot', 'policy_id'];

async function guardRevision(db: QueryRunner): Promise<void> {
  const refuse = (name: string, event: string, when: string, message: string) =>
    db.query(`
      CREATE TRIGGER "${name}" BEFORE ${event} ON "revision" WHEN ${when}
      BEGIN SELECT RAISE(ABORT, '${message}'); END`);

  await refuse(
    'revision_insert',
    'INSERT',
    // REPLACE removes the old row without a DELETE trigger: stop it here
    `NEW."state" <> 'draft' OR EXISTS (SELECT 1 FROM "revision" WHERE "id" = NEW."id"
       OR ("stage_id" = NEW."stage_id"
         AND ("number" = NEW."number" OR "state" IN ('draft', 'in-check', 'checked'))))`,
    'a revision begins as the only draft of its stage',
  );
  for (const event of ['UPDATE', 'DELETE']) {
    await refuse(
      `revision_final_${event.toLowerCase()}`,
      event,
      `OLD."state" IN ('locked', 'withdrawn')`,
      'a locked or withdrawn revision never changes',
    );
  }
  await refuse(
    'revision_move_table',
    'UPDATE',
    `NEW."state" <> OLD."state" AND OLD."state" || ' ' || NEW."state" NOT IN (
       'draft in-check', 'in-check checked', 'in-check draft', 'checked draft', 'checked locked',
       'draft withdrawn', 'in-check withdrawn', 'checked withdrawn')`,
    'not a move of the review table',
  );
  await refuse(
    'revision_frozen',
    'UPDATE',
    `OLD."state" <> 'draft' AND NEW."state" <> 'draft'
       AND (${FROZEN.map((column) => `NEW."${column}" IS NOT OLD."${column}"`).join(' OR ')})`,
    'a submitted definition is frozen',
  );
  await refuse(
    'revision_identity',
    'UPDATE',
    `NEW."id" <> OLD."id" OR NEW."stage_id" <> OLD."stage_id" OR NEW."number" <> OLD."number"`,
    'a revision keeps its stage and number',
  );
  await refuse(
    'revision_unsigned',
    'UPDATE',
    `NEW."state" = 'locked'
       AND NOT EXISTS (SELECT 1 FROM "signature" WHERE "revision_id" = OLD."id")`,
    'a revision is locked by a signature only',
  );
}

async function guardStage(db: QueryRunner): Promise<void> {
  for (const event of ['UPDATE', 'DELETE']) {
    await db.query(`
      CREATE TRIGGER "stage_locked_${event.toLowerCase()}" BEFORE ${event} ON "stage"
      WHEN EXISTS (SELECT 1 FROM "revision" WHERE "stage_id" = OLD."id" AND "state" = 'locked')
      BEGIN SELECT RAISE(ABORT, 'the stage has a locked revision'); END`);
  }
  await db.query(`
    CREATE TRIGGER "stage_insert" BEFORE INSERT ON "stage"
    WHEN EXISTS (SELECT 1 FROM "stage" WHERE "id" = NEW."id"
      OR ("project_id" = NEW."project_id" AND "reference" = NEW."reference"))
    BEGIN SELECT RAISE(ABORT, 'the reference is taken'); END`);
}

async function guardSignature(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TRIGGER "signature_insert" BEFORE INSERT ON "signature"
    WHEN COALESCE((SELECT "state" FROM "revision" WHERE "id" = NEW."revision_id"), '') <> 'checked'
      OR EXISTS (SELECT 1 FROM "signature" WHERE "revision_id" = NEW."revision_id")
    BEGIN SELECT RAISE(ABORT, 'only a checked revision is signed, once'); END`);
  for (const event of ['UPDATE', 'DELETE']) {
    await db.query(`
      CREATE TRIGGER "signature_${event.toLowerCase()}" BEFORE ${event} ON "signature"
      BEGIN SELECT RAISE(ABORT, 'a signature never changes'); END`);
  }
}

/** Rows below a revision stand still once it is locked or withdrawn; part links once it is submitted. */
async function guardChildren(db: QueryRunner): Promise<void> {
  const still: Record<string, (row: string) => string> = {
    revision_person: byRevision,
    revision_move: byRevision,
    check_record: byRevision,
    finding: byRevision,
    finding_event: (row) =>
      `(SELECT "state" FROM "revision" WHERE "id" =
        (SELECT "revision_id" FROM "finding" WHERE "id" = ${row}."finding_id"))`,
  };
  for (const [table, stateOf] of Object.entries(still)) {
    await guardRows(db, table, (row) => `${stateOf(row)} IN ('locked', 'withdrawn')`);
  }
  await guardRows(db, 'revision_part', (row) => `${byRevision(row)} <> 'draft'`);
  for (const table of ['revision_move', 'finding_event']) {
    for (const event of ['UPDATE', 'DELETE']) {
      await db.query(`
        CREATE TRIGGER "${table}_history_${event.toLowerCase()}" BEFORE ${event} ON "${table}"
        BEGIN SELECT RAISE(ABORT, 'history is append-only'); END`);
    }
  }
}

/** REPLACE must not put another row in the place of one that stands still. */
async function guardKeys(db: QueryRunner): Promise<void> {
  const keys = {
    finding: ['id'],
    finding_event: ['finding_id', 'sequence'],
    revision_move: ['revision_id', 'sequence'],
  };
  for (const [table, columns] of Object.entries(keys)) {
    const same = columns.map((column) => `"${column}" = NEW."${column}"`).join(' AND ');
    await db.query(`
      CREATE TRIGGER "${table}_once" BEFORE INSERT ON "${table}"
      WHEN EXISTS (SELECT 1 FROM "${table}" WHERE ${same})
      BEGIN SELECT RAISE(ABORT, 'the row exists already'); END`);
  }
  await db.query(`
    CREATE TRIGGER "finding_identity" BEFORE UPDATE ON "finding"
    WHEN NEW."id" <> OLD."id"
    BEGIN SELECT RAISE(ABORT, 'a finding keeps its id'); END`);
}

const byRevision = (row: string) =>
  `(SELECT "state" FROM "revision" WHERE "id" = ${row}."revision_id")`;

async function guardRows(
  db: QueryRunner,
  table: string,
  still: (row: string) => string,
): Promise<void> {
  const rows = { INSERT: ['NEW'], UPDATE: ['OLD', 'NEW'], DELETE: ['OLD'] };
  for (const [event, touched] of Object.entries(rows)) {
    await db.query(`
      CREATE TRIGGER "${table}_still_${event.toLowerCase()}" BEFORE ${event} ON "${table}"
      WHEN ${touched.map(still).join(' OR ')}
      BEGIN SELECT RAISE(ABORT, 'the revision is no longer open to this change'); END`);
  }
}
