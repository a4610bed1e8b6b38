import { In, type EntityManager, type FindOptionsSelect } from 'typeorm';
import type { RevisionState } from '../../shared/review/revision-state.ts';
import { RevisionEntity } from './revision-entity.ts';
import type { RowFigures } from './row-figures.ts';

/** A revision without its documents, as lists need it. */
export interface RevisionLine extends RowFigures {
  readonly id: string;
  readonly stageId: string;
  readonly projectId: string;
  readonly reference: string;
  readonly number: number;
  readonly state: RevisionState;
  readonly designerId: string;
  readonly savedAtMs: number;
  /** Whether it speaks for its stage: the newest that is not withdrawn, else the newest. */
  readonly current: boolean;
}

const COLUMNS = {
  id: true,
  stageId: true,
  number: true,
  state: true,
  designerId: true,
  savedAtMs: true,
  title: true,
  quantity: true,
  topology: true,
  loadKind: true,
  loadText: true,
  transistor: true,
  baseResistorOhm: true,
  overdriveFactor: true,
  vceSatV: true,
  powerW: true,
  verdict: true,
  leastCriterion: true,
  leastMargin: true,
  port: true,
  portCurrentA: true,
  portLimitA: true,
  stage: { projectId: true, reference: true },
} as const satisfies FindOptionsSelect<RevisionEntity>;

/** All revisions of some projects, oldest first, with superseded and current derived. */
export async function revisionLines(
  manager: EntityManager,
  projectIds: readonly string[],
): Promise<RevisionLine[]> {
  return toLines(
    await manager.find(RevisionEntity, {
      select: COLUMNS,
      relations: { stage: true },
      where: { stage: { projectId: In([...projectIds]) } },
      order: { number: 'ASC' },
    }),
  );
}

/** All revisions of one stage, oldest first. */
export async function linesOfStage(
  manager: EntityManager,
  stageId: string,
): Promise<RevisionLine[]> {
  return toLines(
    await manager.find(RevisionEntity, {
      select: COLUMNS,
      relations: { stage: true },
      where: { stageId },
      order: { number: 'ASC' },
    }),
  );
}

/** All revisions, oldest first, of a project's stages that stand or once stood on a port. */
export async function linesOfPort(
  manager: EntityManager,
  projectId: string,
  port: string,
): Promise<RevisionLine[]> {
  const ever = await manager.find(RevisionEntity, {
    select: { stageId: true },
    where: { port, stage: { projectId } },
  });
  const rows = await manager.find(RevisionEntity, {
    select: COLUMNS,
    relations: { stage: true },
    where: { stageId: In(ever.map(({ stageId }) => stageId)) },
    order: { number: 'ASC' },
  });
  return toLines(rows);
}

function toLines(rows: readonly RevisionEntity[]): RevisionLine[] {
  const current = new Map<string, RevisionEntity>();
  const locked = new Map<string, number>();
  for (const row of rows) {
    const before = current.get(row.stageId);
    if (row.state !== 'withdrawn' || before === undefined || before.state === 'withdrawn') {
      current.set(row.stageId, row);
    }
    if (row.state === 'locked') locked.set(row.stageId, row.number);
  }
  return rows.map(({ stage, ...row }) => ({
    ...row,
    projectId: stage?.projectId ?? '',
    reference: stage?.reference ?? '',
    state:
      row.state === 'locked' && row.number < (locked.get(row.stageId) ?? 0)
        ? 'superseded'
        : row.state,
    current: current.get(row.stageId)?.id === row.id,
  }));
}
