import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The shipped policies at version 1, as released: later versions come with later migrations. */
const COMMON =
  '"guaranteedOnly":true,"marginalBand":0.1,"gainExponent":2.4,"vbeTempcoVPerK":-0.002,"vbeMinV":0.55,' +
  '"rceTempcoPerK":0.004,"leakageDoublingK":10,"offBaseV":0.5,"offCurrentA":0.0001,"averagingHz":100,' +
  '"overdrivenRatio":5,"series":"E24","smallestOhm":10,"largestOhm":10000000,' +
  '"junctionDerating":0.8,"resistorDerating":0.5,"driveDerating":0.8';
const SHIPPED = [
  {
    id: '5d1f0c52-7a0e-4c43-9d0b-3f1f4b6c9a01',
    name: 'General practice',
    limits: `{"overdriveFactor":2,"forcedBeta":20,"voltageDerating":0.8,"currentDerating":0.8,"powerDerating":0.8,${COMMON}}`,
  },
  {
    id: '5d1f0c52-7a0e-4c43-9d0b-3f1f4b6c9a02',
    name: 'High reliability',
    limits: `{"overdriveFactor":3,"forcedBeta":10,"voltageDerating":0.75,"currentDerating":0.75,"powerDerating":0.6,${COMMON}}`,
  },
];

/** Policies, projects and who does what in them. A released policy never changes. */
export class CreateProjects1790000200000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      CREATE TABLE "policy" (
        "id"      text PRIMARY KEY NOT NULL,
        "name"    text NOT NULL,
        "version" integer NOT NULL CHECK ("version" >= 1),
        "limits"  text NOT NULL CHECK (json_valid("limits")),
        CONSTRAINT "policy_version" UNIQUE ("name", "version")
      ) STRICT`);
    await db.query(`
      CREATE TRIGGER "policy_insert" BEFORE INSERT ON "policy"
      WHEN EXISTS (SELECT 1 FROM "policy"
        WHERE "id" = NEW."id" OR ("name" = NEW."name" AND "version" = NEW."version"))
      BEGIN SELECT RAISE(ABORT, 'a released policy never changes'); END`);
    for (const event of ['UPDATE', 'DELETE']) {
      await db.query(`
        CREATE TRIGGER "policy_${event.toLowerCase()}" BEFORE ${event} ON "policy"
        BEGIN SELECT RAISE(ABORT, 'a released policy never changes'); END`);
    }
    for (const { id, name, limits } of SHIPPED) {
      await db.query(`INSERT INTO "policy" VALUES (?, ?, 1, ?)`, [id, name, limits]);
    }
    await db.query(`
      CREATE TABLE "project" (
        "id"                     text PRIMARY KEY NOT NULL,
        "code"                   text NOT NULL,
        "title"                  text NOT NULL,
        "supplementary_title"    text,
        "legal_owner"            text NOT NULL,
        "department"             text,
        "policy_id"              text NOT NULL,
        "unverified_blocks_lock" integer NOT NULL CHECK ("unverified_blocks_lock" IN (0, 1)),
        "manager_id"             text NOT NULL,
        "created_at_ms"          integer NOT NULL,
        "version"                integer NOT NULL,
        CONSTRAINT "project_code" UNIQUE ("code"),
        CONSTRAINT "project_policy" FOREIGN KEY ("policy_id") REFERENCES "policy" ("id"),
        CONSTRAINT "project_manager" FOREIGN KEY ("manager_id") REFERENCES "person" ("id")
      ) STRICT`);
    await db.query(`
      CREATE TABLE "membership" (
        "project_id" text NOT NULL,
        "person_id"  text NOT NULL,
        "roles"      text NOT NULL CHECK (json_valid("roles")),
        PRIMARY KEY ("project_id", "person_id"),
        CONSTRAINT "membership_of_project" FOREIGN KEY ("project_id") REFERENCES "project" ("id"),
        CONSTRAINT "membership_of_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id")
      ) STRICT`);
    await db.query(`CREATE INDEX "membership_by_person" ON "membership" ("person_id")`);
  }

  async down(db: QueryRunner): Promise<void> {
    for (const table of ['membership', 'project', 'policy'])
      await db.query(`DROP TABLE "${table}"`);
  }
}
