import type { EntityManager } from 'typeorm';
import type { BomNotePreview, NoteStage } from '../../shared/contract/bom-note.ts';
import { ENGINE_VERSION } from '../../shared/checks/evaluation.ts';
import { buildBomNote } from '../../shared/report/bom-note-build.ts';
import type { BomNote } from '../../shared/report/bom-note.ts';
import type { NoteSource } from '../../shared/report/bom-note-source.ts';
import type { Act, Actor } from '../audit/act.ts';
import { accessProject, type ProjectAccess } from '../projects/project-access.ts';
import { revisionLines } from '../revisions/revision-line.ts';
import { type NoteChoice, noteStages } from './note-choice.ts';
import { noteSource } from './note-source.ts';

/** Printed at the foot of every document. */
export const PROGRAM = `Sinkwell, engine ${ENGINE_VERSION}`;

/** What a note of the chosen revisions would say now, and whether it could be issued. */
export async function previewNote(
  manager: EntityManager,
  { actor, atMs }: Act<Actor>,
  projectId: string,
  choice: NoteChoice,
): Promise<BomNotePreview> {
  const access = await accessProject(manager, actor, projectId);
  const stages = noteStages(await revisionLines(manager, [projectId]), choice);
  const sources = await noteSources(manager, actor, chosenIds(stages));
  const note = buildBomNote(access.project, sources, { atMs, issue: null, program: PROGRAM });
  const reason = reasonAgainstIssue(access, note);
  return { note, stages, issue: { allowed: reason === null, reason } };
}

/** One after the other: they share one connection. */
export async function noteSources(
  manager: EntityManager,
  actor: Actor,
  revisionIds: readonly string[],
): Promise<NoteSource[]> {
  const sources: NoteSource[] = [];
  for (const id of revisionIds) sources.push(await noteSource(manager, actor, id));
  return sources;
}

function chosenIds(stages: readonly NoteStage[]): string[] {
  return stages.flatMap(({ chosen, revisionId }) =>
    chosen && revisionId !== null ? [revisionId] : [],
  );
}

function reasonAgainstIssue({ roles }: ProjectAccess, note: BomNote): string | null {
  if (!roles.includes('exporter')) return 'Only an exporter of the project can issue a note.';
  if (note.revisions.length === 0) return 'No stage is chosen that has a locked revision.';
  const open = note.revisions.filter(({ locked }) => !locked);
  if (open.length === 0) return null;
  const names = open.map(({ reference, letter, state }) => `${reference} ${letter} (${state})`);
  return `Not locked: ${names.join(', ')}. Leave them out, or wait for the lock.`;
}
