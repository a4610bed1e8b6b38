import type { MigrationInterface, QueryRunner } from 'typeorm';

/** People, their sessions and one-time links, the workspace's name, and the mail that waits to be sent. */
export class CreatePeople1790000100000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      CREATE TABLE "workspace" (
        "id"   integer PRIMARY KEY NOT NULL CHECK ("id" = 1),
        "name" text NOT NULL
      ) STRICT`);
    await db.query(`
      CREATE TABLE "person" (
        "id"                 text PRIMARY KEY NOT NULL,
        "name"               text NOT NULL,
        "email"              text NOT NULL,
        "administrator"      integer NOT NULL CHECK ("administrator" IN (0, 1)),
        "state"              text NOT NULL CHECK ("state" IN ('invited', 'active', 'disabled')),
        "password_hash"      text,
        "password_version"   integer NOT NULL,
        "failed_sign_ins"    integer NOT NULL,
        "created_at_ms"      integer NOT NULL,
        "last_sign_in_at_ms" integer,
        "version"            integer NOT NULL,
        CONSTRAINT "person_email" UNIQUE ("email")
      ) STRICT`);
    await db.query(`
      CREATE TABLE "session" (
        "id_hash"          text PRIMARY KEY NOT NULL,
        "public_id"        text NOT NULL,
        "person_id"        text,
        "data"             text NOT NULL CHECK (json_valid("data")),
        "agent"            text NOT NULL,
        "started_at_ms"    integer NOT NULL,
        "last_seen_at_ms"  integer NOT NULL,
        CONSTRAINT "session_public_id" UNIQUE ("public_id"),
        CONSTRAINT "session_of_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
      ) STRICT`);
    await db.query(`CREATE INDEX "session_by_person" ON "session" ("person_id")`);
    await db.query(`CREATE INDEX "session_by_last_seen" ON "session" ("last_seen_at_ms")`);
    await createLinksAndMail(db);
  }

  async down(db: QueryRunner): Promise<void> {
    for (const table of ['outgoing_mail', 'one_time_token', 'session', 'person', 'workspace']) {
      await db.query(`DROP TABLE "${table}"`);
    }
  }
}

async function createLinksAndMail(db: QueryRunner): Promise<void> {
  await db.query(`
      CREATE TABLE "one_time_token" (
        "hash"             text PRIMARY KEY NOT NULL,
        "kind"             text NOT NULL
          CHECK ("kind" IN ('password-reset', 'invitation', 'email-change')),
        "person_id"        text NOT NULL,
        "password_version" integer NOT NULL,
        "expires_at_ms"    integer NOT NULL,
        "detail"           text NOT NULL CHECK (json_valid("detail")),
        CONSTRAINT "one_time_token_of_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
      ) STRICT`);
  await db.query(`CREATE INDEX "one_time_token_by_person" ON "one_time_token" ("person_id")`);
  await db.query(`
      CREATE TABLE "outgoing_mail" (
        "id"                 text PRIMARY KEY NOT NULL,
        "to_name"            text NOT NULL,
        "to_address"         text NOT NULL,
        "subject"            text NOT NULL,
        "text"               text NOT NULL,
        "created_at_ms"      integer NOT NULL,
        "attempts"           integer NOT NULL,
        "next_attempt_at_ms" integer,
        "sent_at_ms"         integer
      ) STRICT`);
  await db.query(
    `CREATE INDEX "outgoing_mail_by_next_attempt" ON "outgoing_mail" ("next_attempt_at_ms")`,
  );
}
