import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The audit trail: lines can only be added, and the head beside them shows when the last one is gone. */
export class CreateAudit1790000000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      CREATE TABLE "audit_line" (
        "sequence"    integer PRIMARY KEY NOT NULL,
        "at_ms"       integer NOT NULL,
        "who_id"      text,
        "who"         text,
        "action"      text NOT NULL,
        "object_kind" text NOT NULL,
        "object_id"   text NOT NULL,
        "object_name" text NOT NULL,
        "project_id"  text,
        "summary"     text NOT NULL,
        "detail"      text NOT NULL CHECK (json_valid("detail")),
        "request_id"  text NOT NULL,
        "hash"        text NOT NULL CHECK (length("hash") = 64)
      ) STRICT`);
    await db.query(
      `CREATE INDEX "audit_line_of_project" ON "audit_line" ("project_id", "sequence")`,
    );
    await db.query(`CREATE INDEX "audit_line_of_object" ON "audit_line" ("object_id", "sequence")`);
    for (const event of ['UPDATE', 'DELETE']) {
      await db.query(`
        CREATE TRIGGER "audit_line_${event.toLowerCase()}" BEFORE ${event} ON "audit_line"
        BEGIN SELECT RAISE(ABORT, 'the audit trail is append-only'); END`);
    }
    await db.query(`
      CREATE TABLE "audit_head" (
        "id"       integer PRIMARY KEY NOT NULL CHECK ("id" = 1),
        "sequence" integer NOT NULL,
        "hash"     text NOT NULL CHECK (length("hash") = 64)
      ) STRICT`);
    await db.query(`INSERT INTO "audit_head" VALUES (1, 0, '${'0'.repeat(64)}')`);
    await db.query(`
      CREATE TRIGGER "audit_head_update" BEFORE UPDATE ON "audit_head"
      WHEN NEW."sequence" <> OLD."sequence" + 1
      BEGIN SELECT RAISE(ABORT, 'the audit head only moves on'); END`);
    await db.query(`
      CREATE TRIGGER "audit_head_delete" BEFORE DELETE ON "audit_head"
      BEGIN SELECT RAISE(ABORT, 'the audit trail is append-only'); END`);
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query(`DROP TABLE "audit_head"`);
    await db.query(`DROP TABLE "audit_line"`);
  }
}
