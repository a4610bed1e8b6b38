import { In, type EntityManager } from 'typeorm';
import type { Part, PartUse } from '../../shared/contract/part.ts';
import { naturalOrder } from '../../shared/report/natural-order.ts';
import { revisionLetter } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { projectIdsOf } from '../projects/project-access.ts';
import { ProjectEntity } from '../projects/project-entity.ts';
import { revisionLines } from '../revisions/revision-line.ts';

const LINKS = `
  SELECT link."revision_id" AS "revisionId", used."number" AS "partRevision",
    stage."project_id" AS "projectId"
  FROM "part_revision" used
  JOIN "revision_part" link ON link."part_revision_id" = used."id"
  JOIN "revision" revision ON revision."id" = link."revision_id"
  JOIN "stage" stage ON stage."id" = revision."stage_id"
  WHERE used."part_id" = ?`;

/** Where a part is used by current revisions: named for own projects, counted over all. */
export async function partUses(
  manager: EntityManager,
  actor: Actor,
  partId: string,
): Promise<Pick<Part, 'uses' | 'usedIn'>> {
  const links = await manager.query<
    { revisionId: string; partRevision: number; projectId: string }[]
  >(LINKS, [partId]);
  const projectIds = [...new Set(links.map(({ projectId }) => projectId))];
  const projects = await manager.findBy(ProjectEntity, { id: In(projectIds) });
  const visible = new Set(await projectIdsOf(manager, actor, 'visible'));
  const lines = (await revisionLines(manager, projectIds)).filter(({ current }) => current);
  const using = lines.flatMap((line) => {
    const link = links.find(({ revisionId }) => revisionId === line.id);
    return link === undefined ? [] : [{ line, partRevision: link.partRevision }];
  });
  const uses = using
    .filter(({ line }) => visible.has(line.projectId))
    .map(({ line, partRevision }): PartUse => ({
      revisionId: line.id,
      projectCode: projects.find(({ id }) => id === line.projectId)?.code ?? '',
      reference: line.reference,
      letter: revisionLetter(line.number),
      title: line.title,
      state: line.state,
      partRevision,
    }))
    .sort(
      (a, b) =>
        naturalOrder(a.projectCode, b.projectCode) || naturalOrder(a.reference, b.reference),
    );
  const usingProjects = new Set(using.map(({ line }) => line.projectId));
  return { uses, usedIn: { stages: using.length, projects: usingProjects.size } };
}
