import type { EntityManager } from 'typeorm';
import type { PartStanding } from '../../shared/contract/revision.ts';

export interface RevisionPartStanding extends PartStanding {
  readonly revisionId: string;
  /** When the library's newest data were entered. */
  readonly changedAtMs: number;
}

const STANDING = `
  SELECT link."revision_id" AS "revisionId", link."role" AS "role", part."id" AS "partId",
    part."part_number" AS "partNumber", used."number" AS "revision",
    (SELECT MAX("number") FROM "part_revision" WHERE "part_id" = part."id") AS "latestRevision",
    (SELECT MAX("created_at_ms") FROM "part_revision" WHERE "part_id" = part."id") AS "changedAtMs",
    (SELECT COUNT(*) FROM "part_verification" WHERE "part_revision_id" = used."id") AS "verified"
  FROM "revision_part" link
  JOIN "part_revision" used ON used."id" = link."part_revision_id"
  JOIN "part" part ON part."id" = used."part_id"
  JOIN "revision" revision ON revision."id" = link."revision_id"
  JOIN "stage" stage ON stage."id" = revision."stage_id"`;

/** How the parts linked by all revisions of some projects stand in the library now. */
export function standingInProjects(
  manager: EntityManager,
  projectIds: readonly string[],
): Promise<RevisionPartStanding[]> {
  const places = projectIds.map(() => '?').join(', ');
  return ask(manager, `${STANDING} WHERE stage."project_id" IN (${places})`, projectIds);
}

/** How the parts linked by one revision stand in the library now. */
export function standingOfRevision(
  manager: EntityManager,
  revisionId: string,
): Promise<RevisionPartStanding[]> {
  return ask(manager, `${STANDING} WHERE link."revision_id" = ? ORDER BY link."role"`, [
    revisionId,
  ]);
}

async function ask(
  manager: EntityManager,
  sql: string,
  parameters: readonly string[],
): Promise<RevisionPartStanding[]> {
  type Row = Omit<RevisionPartStanding, 'verified'> & { verified: number };
  const rows = await manager.query<Row[]>(sql, [...parameters]);
  return rows.map((row) => ({ ...row, verified: row.verified > 0 }));
}

/** Whether the library has newer data than a revision was filled from. */
export function partDataChanged(standing: readonly PartStanding[]): boolean {
  return standing.some(({ revision, latestRevision }) => latestRevision > revision);
}

/**
 * Whether a stage rests on data nobody verified: a linked part revision without verification, or transistor
 * figures typed by hand. Load, output and clamp may be typed: they are the stage's own requirement then.
 */
export function isUnverified(topology: string, standing: readonly PartStanding[]): boolean {
  const needed =
    topology === 'two-transistor-high-side' ? ['transistor', 'preDriver'] : ['transistor'];
  const linked = standing.map(({ role }): string => role);
  return (
    needed.some((role) => !linked.includes(role)) || standing.some(({ verified }) => !verified)
  );
}
