import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Issued BOM notes: they can only be added, one number after the other. */
export class CreateBomNotes1790000600000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      CREATE TABLE "bom_note" (
        "id"           text PRIMARY KEY NOT NULL,
        "project_id"   text NOT NULL,
        "number"       integer NOT NULL CHECK ("number" > 0),
        "issuer_id"    text NOT NULL,
        "issued_at_ms" integer NOT NULL,
        "note"         text NOT NULL CHECK (json_valid("note")),
        CONSTRAINT "bom_note_number" UNIQUE ("project_id", "number"),
        CONSTRAINT "bom_note_of_project" FOREIGN KEY ("project_id") REFERENCES "project" ("id"),
        CONSTRAINT "bom_note_issuer" FOREIGN KEY ("issuer_id") REFERENCES "person" ("id")
      ) STRICT`);
    await db.query(`
      CREATE TRIGGER "bom_note_insert" BEFORE INSERT ON "bom_note"
      WHEN NEW."number" <> 1 + COALESCE(
          (SELECT MAX("number") FROM "bom_note" WHERE "project_id" = NEW."project_id"), 0)
        OR EXISTS (SELECT 1 FROM "bom_note" WHERE "id" = NEW."id")
      BEGIN SELECT RAISE(ABORT, 'notes are numbered one after the other'); END`);
    for (const event of ['UPDATE', 'DELETE']) {
      await db.query(`
        CREATE TRIGGER "bom_note_${event.toLowerCase()}" BEFORE ${event} ON "bom_note"
        BEGIN SELECT RAISE(ABORT, 'an issued note never changes'); END`);
    }
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query(`DROP TABLE "bom_note"`); // its triggers go with it
  }
}
