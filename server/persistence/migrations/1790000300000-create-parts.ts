import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The part library. A part revision and its verification are written once and never changed. */
export class CreateParts1790000300000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      CREATE TABLE "part" (
        "id"          text PRIMARY KEY NOT NULL,
        "kind"        text NOT NULL
          CHECK ("kind" IN ('transistor', 'load', 'logic-output', 'diode')),
        "part_number" text NOT NULL,
        CONSTRAINT "part_number_of_kind" UNIQUE ("kind", "part_number")
      ) STRICT`);
    await db.query(`
      CREATE TABLE "part_revision" (
        "id"            text PRIMARY KEY NOT NULL,
        "part_id"       text NOT NULL,
        "number"        integer NOT NULL CHECK ("number" >= 1),
        "record"        text NOT NULL CHECK (json_valid("record")),
        "summary"       text NOT NULL,
        "search"        text NOT NULL,
        "comment"       text NOT NULL,
        "author_id"     text,
        "created_at_ms" integer NOT NULL,
        CONSTRAINT "part_revision_number" UNIQUE ("part_id", "number"),
        CONSTRAINT "part_revision_of_part" FOREIGN KEY ("part_id") REFERENCES "part" ("id"),
        CONSTRAINT "part_revision_author" FOREIGN KEY ("author_id") REFERENCES "person" ("id")
      ) STRICT`);
    await db.query(`
      CREATE TABLE "part_verification" (
        "part_revision_id" text PRIMARY KEY NOT NULL,
        "person_id"        text NOT NULL,
        "document"         text NOT NULL,
        "note"             text NOT NULL,
        "at_ms"            integer NOT NULL,
        CONSTRAINT "part_verification_of_revision" FOREIGN KEY ("part_revision_id") REFERENCES "part_revision" ("id"),
        CONSTRAINT "part_verification_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
      ) STRICT`);
    await writeOnce(db, 'part', '"kind" = NEW."kind" AND "part_number" = NEW."part_number"');
    await writeOnce(db, 'part_revision', '"part_id" = NEW."part_id" AND "number" = NEW."number"');
    await writeOnce(db, 'part_verification', '"part_revision_id" = NEW."part_revision_id"', null);
  }

  async down(db: QueryRunner): Promise<void> {
    for (const table of ['part_verification', 'part_revision', 'part']) {
      await db.query(`DROP TABLE "${table}"`);
    }
  }
}

/** REPLACE removes the old row without a DELETE trigger: the INSERT trigger stops it first. */
async function writeOnce(
  db: QueryRunner,
  table: string,
  same: string,
  id: string | null = '"id" = NEW."id"',
): Promise<void> {
  const exists = [id, same].filter((part) => part !== null).join(' OR ');
  await db.query(`
    CREATE TRIGGER "${table}_insert" BEFORE INSERT ON "${table}"
    WHEN EXISTS (SELECT 1 FROM "${table}" WHERE ${exists})
    BEGIN SELECT RAISE(ABORT, 'part data is written once'); END`);
  for (const event of ['UPDATE', 'DELETE']) {
    await db.query(`
      CREATE TRIGGER "${table}_${event.toLowerCase()}" BEFORE ${event} ON "${table}"
      BEGIN SELECT RAISE(ABORT, 'part data is written once'); END`);
  }
}
