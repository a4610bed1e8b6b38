import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Stages, their revisions and everything the review writes. */
export class CreateStages1790000400000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await createStage(db);
    await createRevision(db);
    await createHands(db);
    await createMoves(db);
    await createFindings(db);
    await createSignature(db);
  }

  async down(db: QueryRunner): Promise<void> {
    const children = ['signature', 'finding_event', 'finding', 'check_record'];
    const people = ['revision_part', 'revision_move', 'revision_person'];
    for (const table of [...children, ...people, 'revision', 'stage']) {
      await db.query(`DROP TABLE "${table}"`);
    }
  }
}

async function createStage(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TABLE "stage" (
      "id"            text PRIMARY KEY NOT NULL,
      "project_id"    text NOT NULL,
      "reference"     text NOT NULL,
      "created_at_ms" integer NOT NULL,
      CONSTRAINT "stage_reference" UNIQUE ("project_id", "reference"),
      CONSTRAINT "stage_of_project" FOREIGN KEY ("project_id") REFERENCES "project" ("id")
    ) STRICT`);
}

async function createRevision(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TABLE "revision" (
      "id"                text PRIMARY KEY NOT NULL,
      "stage_id"          text NOT NULL,
      "number"            integer NOT NULL CHECK ("number" >= 0),
      "state"             text NOT NULL
        CHECK ("state" IN ('draft', 'in-check', 'checked', 'locked', 'withdrawn')),
      "definition"        text NOT NULL CHECK (json_valid("definition")),
      "evaluation"        text NOT NULL CHECK (json_valid("evaluation")),
      "designators"       text NOT NULL CHECK (json_valid("designators")),
      "part_snapshot"     text CHECK ("part_snapshot" IS NULL OR json_valid("part_snapshot")),
      "policy_id"         text NOT NULL,
      "designer_id"       text NOT NULL,
      "previous_id"       text,
      "created_at_ms"     integer NOT NULL,
      "saved_at_ms"       integer NOT NULL,
      "title"             text NOT NULL,
      "quantity"          integer NOT NULL,
      "topology"          text NOT NULL,
      "load_kind"         text NOT NULL,
      "load_text"         text NOT NULL,
      "transistor"        text NOT NULL,
      "base_resistor_ohm" real,
      "overdrive_factor"  real,
      "vce_sat_v"         real,
      "power_w"           real,
      "verdict"           text NOT NULL CHECK ("verdict" IN ('pass', 'marginal', 'open', 'fail')),
      "least_criterion"   text,
      "least_margin"      real,
      "port"              text,
      "port_current_a"    real,
      "port_limit_a"      real,
      "version"           integer NOT NULL,
      CONSTRAINT "revision_number" UNIQUE ("stage_id", "number"),
      CONSTRAINT "revision_of_stage" FOREIGN KEY ("stage_id") REFERENCES "stage" ("id"),
      CONSTRAINT "revision_policy" FOREIGN KEY ("policy_id") REFERENCES "policy" ("id"),
      CONSTRAINT "revision_designer" FOREIGN KEY ("designer_id") REFERENCES "person" ("id"),
      CONSTRAINT "revision_previous" FOREIGN KEY ("previous_id") REFERENCES "revision" ("id")
    ) STRICT`);
  await db.query(`CREATE INDEX "revision_by_state" ON "revision" ("state")`);
}

/** Who had a hand in a revision, and which library data it was filled from. */
async function createHands(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TABLE "revision_person" (
      "revision_id" text NOT NULL,
      "person_id"   text NOT NULL,
      "hand"        text NOT NULL CHECK ("hand" IN ('author', 'checker')),
      PRIMARY KEY ("revision_id", "person_id", "hand"),
      CONSTRAINT "revision_person_of_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
      CONSTRAINT "revision_person_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
    ) STRICT`);
  await db.query(`
    CREATE TABLE "revision_part" (
      "revision_id"      text NOT NULL,
      "role"             text NOT NULL
        CHECK ("role" IN ('transistor', 'preDriver', 'load', 'drive', 'clamp')),
      "part_revision_id" text NOT NULL,
      "choice"           text NOT NULL CHECK (json_valid("choice")),
      PRIMARY KEY ("revision_id", "role"),
      CONSTRAINT "revision_part_of_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
      CONSTRAINT "revision_part_part" FOREIGN KEY ("part_revision_id") REFERENCES "part_revision" ("id")
    ) STRICT`);
  await db.query(`CREATE INDEX "revision_part_by_part" ON "revision_part" ("part_revision_id")`);
}

async function createMoves(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TABLE "revision_move" (
      "revision_id" text NOT NULL,
      "sequence"    integer NOT NULL,
      "move"        text NOT NULL
        CHECK ("move" IN ('submit', 'pass', 'return', 'send-back', 'lock', 'withdraw')),
      "person_id"   text NOT NULL,
      "at_ms"       integer NOT NULL,
      "reason"      text,
      PRIMARY KEY ("revision_id", "sequence"),
      CONSTRAINT "revision_move_of_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
      CONSTRAINT "revision_move_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
    ) STRICT`);
  await db.query(`
    CREATE TABLE "check_record" (
      "revision_id"      text NOT NULL,
      "round"            integer NOT NULL CHECK ("round" >= 1),
      "checker_id"       text NOT NULL,
      "saved_at_ms"      integer NOT NULL,
      "overdrive_factor" real CHECK ("overdrive_factor" > 0),
      "method"           text CHECK ("method" IN ('hand', 'bench')),
      "note"             text NOT NULL,
      "reason"           text NOT NULL,
      "justifications"   text NOT NULL CHECK (json_valid("justifications")),
      "read"             text NOT NULL CHECK (json_valid("read")),
      PRIMARY KEY ("revision_id", "round"),
      CONSTRAINT "check_record_of_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
      CONSTRAINT "check_record_checker" FOREIGN KEY ("checker_id") REFERENCES "person" ("id")
    ) STRICT`);
}

async function createFindings(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TABLE "finding" (
      "id"           text PRIMARY KEY NOT NULL,
      "revision_id"  text NOT NULL,
      "number"       integer NOT NULL CHECK ("number" >= 1),
      "subject_kind" text NOT NULL CHECK ("subject_kind" IN ('criterion', 'field')),
      "subject_id"   text NOT NULL,
      "title"        text NOT NULL,
      "state"        text NOT NULL CHECK ("state" IN ('open', 'answered', 'closed')),
      CONSTRAINT "finding_number" UNIQUE ("revision_id", "number"),
      CONSTRAINT "finding_of_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id")
    ) STRICT`);
  await db.query(`
    CREATE TABLE "finding_event" (
      "finding_id" text NOT NULL,
      "sequence"   integer NOT NULL,
      "at_ms"      integer NOT NULL,
      "person_id"  text NOT NULL,
      "act"        text NOT NULL CHECK ("act" IN ('raised', 'answered', 'closed', 'reopened')),
      "text"       text NOT NULL,
      PRIMARY KEY ("finding_id", "sequence"),
      CONSTRAINT "finding_event_of_finding" FOREIGN KEY ("finding_id") REFERENCES "finding" ("id"),
      CONSTRAINT "finding_event_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
    ) STRICT`);
}

async function createSignature(db: QueryRunner): Promise<void> {
  await db.query(`
    CREATE TABLE "signature" (
      "revision_id"   text PRIMARY KEY NOT NULL,
      "approver_id"   text NOT NULL,
      "approver_name" text NOT NULL,
      "signed_at_ms"  integer NOT NULL,
      "meaning"       text NOT NULL,
      "hash"          text NOT NULL CHECK (length("hash") = 64),
      "document"      text NOT NULL CHECK (json_valid("document")),
      CONSTRAINT "signature_of_revision" FOREIGN KEY ("revision_id") REFERENCES "revision" ("id"),
      CONSTRAINT "signature_approver" FOREIGN KEY ("approver_id") REFERENCES "person" ("id")
    ) STRICT`);
}
