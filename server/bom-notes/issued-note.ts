import type { EntityManager } from 'typeorm';
import type { IssuedBomNote, IssuedNoteRow } from '../../shared/contract/bom-note.ts';
import type { BomNote } from '../../shared/report/bom-note.ts';
import type { Actor } from '../audit/act.ts';
import { notFound } from '../http/api-error.ts';
import { accessProject, type ProjectAccess } from '../projects/project-access.ts';
import { hashed } from '../revisions/lock-document.ts';
import { BomNoteEntity } from './bom-note-entity.ts';

/** The note with its content hash: SHA-256 over the canonical JSON of everything else in it. */
export function sealed(note: BomNote): BomNote & { contentHash: string } {
  return { ...note, contentHash: hashed({ ...note, contentHash: null }).hash };
}

/** Whether content and content hash of an issued note still fit. */
export function isIntact(note: BomNote): boolean {
  return sealed(note).contentHash === note.contentHash;
}

/** An issued note and what the person asking is in its project. */
export interface OpenNote {
  readonly entity: BomNoteEntity;
  readonly access: ProjectAccess;
}

/**
 * Opens an issued note to a member of its project or to an administrator.
 *
 * @throws {ApiError} not-found, alike for a foreign note and for none
 */
export async function openNote(
  manager: EntityManager,
  actor: Actor,
  noteId: string,
): Promise<OpenNote> {
  const entity = await manager.findOneBy(BomNoteEntity, { id: noteId });
  if (entity === null) throw notFound();
  return { entity, access: await accessProject(manager, actor, entity.projectId) };
}

export function issuedReply({ entity, access }: OpenNote): IssuedBomNote {
  const { id, projectId, note } = entity;
  const allowed = access.roles.includes('exporter');
  const reason = allowed ? null : 'Only an exporter of the project can download an issued note.';
  return { id, projectId, note, intact: isIntact(note), download: { allowed, reason } };
}

export function issuedRow({ id, number, issuedAtMs, note }: BomNoteEntity): IssuedNoteRow {
  const { contentHash, counts, issue } = note;
  return {
    ...{ id, number, issuedAtMs },
    identification: issue?.identification ?? '',
    issuedBy: issue?.issuedBy ?? '',
    ...{ stages: counts.stages, lines: counts.lines, partsPerBoard: counts.partsPerBoard },
    contentHash: contentHash ?? '',
  };
}
