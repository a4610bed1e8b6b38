import { In, type EntityManager } from 'typeorm';
import type { SearchHit } from '../../shared/contract/search.ts';
import { utcDate } from '../../shared/report/bom-note-text.ts';
import { naturalOrder } from '../../shared/report/natural-order.ts';
import { revisionLetter, STATE_WORDS } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { issuedRow } from '../bom-notes/issued-note.ts';
import { BomNoteEntity } from '../bom-notes/bom-note-entity.ts';
import { partList } from '../parts/part-list.ts';
import { projectIdsOf } from '../projects/project-access.ts';
import { ProjectEntity } from '../projects/project-entity.ts';
import { revisionLines } from '../revisions/revision-line.ts';

const MOST_HITS = 20;

/** Projects, stages, parts and issued notes whose names contain the text; of what the person may see only. */
export async function findByText(
  manager: EntityManager,
  actor: Actor,
  text: string,
): Promise<SearchHit[]> {
  const wanted = text.toLowerCase();
  const projectIds = await projectIdsOf(manager, actor, 'visible');
  const projects = await manager.findBy(ProjectEntity, { id: In(projectIds) });
  const hits = [
    ...projectHits(projects, wanted),
    ...(await stageHits(manager, projects, wanted)),
    ...(await partHits(manager, wanted)),
    ...(await noteHits(manager, projects, wanted)),
  ];
  return hits.sort((a, b) => rank(a, wanted) - rank(b, wanted)).slice(0, MOST_HITS);
}

function projectHits(projects: readonly ProjectEntity[], wanted: string): SearchHit[] {
  return projects
    .filter(({ code, title }) => `${code} ${title}`.toLowerCase().includes(wanted))
    .sort((a, b) => naturalOrder(a.code, b.code))
    .map(({ code, id, title }) => ({
      kind: 'project',
      link: `/p/${id}`,
      title: code,
      detail: title,
    }));
}

async function stageHits(
  manager: EntityManager,
  projects: readonly ProjectEntity[],
  wanted: string,
): Promise<SearchHit[]> {
  const lines = await revisionLines(
    manager,
    projects.map(({ id }) => id),
  );
  return lines
    .filter(
      ({ current, reference, title, transistor }) =>
        current && `${reference} ${title} ${transistor}`.toLowerCase().includes(wanted),
    )
    .sort((a, b) => naturalOrder(a.reference, b.reference))
    .map(({ id, number, projectId, reference, stageId, state, title }) => {
      const code = projects.find((project) => project.id === projectId)?.code ?? '';
      return {
        kind: 'stage',
        link: `/p/${projectId}/s/${stageId}/r/${id}`,
        title: `${reference} ${title}`,
        detail: `${code}, revision ${revisionLetter(number)}, ${STATE_WORDS[state].toLowerCase()}`,
      };
    });
}

async function partHits(manager: EntityManager, wanted: string): Promise<SearchHit[]> {
  const { parts } = await partList(manager, {
    ...{ search: wanted, sort: 'partNumber', direction: 'asc', page: 1, pageSize: MOST_HITS },
  });
  return parts.map(({ id, partNumber, summary }) => ({
    kind: 'part',
    link: `/parts/${id}`,
    title: partNumber,
    detail: summary,
  }));
}

async function noteHits(
  manager: EntityManager,
  projects: readonly ProjectEntity[],
  wanted: string,
): Promise<SearchHit[]> {
  const projectId = In(projects.map(({ id }) => id));
  const order = { issuedAtMs: 'DESC' } as const;
  const notes = await manager.find(BomNoteEntity, { where: { projectId }, order });
  return notes
    .map((entity) => ({ ...issuedRow(entity), projectId: entity.projectId }))
    .filter(({ identification }) => identification.toLowerCase().includes(wanted))
    .map(({ id, identification, issuedAtMs, issuedBy, projectId: project }) => ({
      kind: 'bom-note',
      link: `/p/${project}/bom-note/${id}`,
      title: identification,
      detail: `issued ${utcDate(issuedAtMs)} by ${issuedBy}`,
    }));
}

/** What begins with the text comes first. */
function rank({ title }: SearchHit, wanted: string): number {
  const name = title.toLowerCase();
  if (name === wanted || name.startsWith(`${wanted} `)) return 0;
  return name.startsWith(wanted) ? 1 : 2;
}
