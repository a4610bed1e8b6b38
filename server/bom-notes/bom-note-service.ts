import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type {
  BomNotePreview,
  IssuedBomNote,
  IssuedNoteRow,
} from '../../shared/contract/bom-note.ts';
import { buildBomNote } from '../../shared/report/bom-note-build.ts';
import { type NoteSource, sourceName } from '../../shared/report/bom-note-source.ts';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { ApiError } from '../http/api-error.ts';
import type { FileAnswer } from '../http/file-answer.ts';
import type { Database } from '../persistence/database.ts';
import { accessProject, requireRole } from '../projects/project-access.ts';
import { revisionLines } from '../revisions/revision-line.ts';
import { BomNoteEntity } from './bom-note-entity.ts';
import { bomNoteFile, type FileWish } from './bom-note-file.ts';
import { noteSources, previewNote, PROGRAM } from './bom-note-preview.ts';
import { expectLocked } from './expect-locked.ts';
import { isIntact, issuedReply, issuedRow, openNote, sealed } from './issued-note.ts';
import type { NoteChoice } from './note-choice.ts';

/** BOM notes of a project: previewed by its members, issued and downloaded by its exporters. */
export class BomNoteService {
  constructor(private readonly database: Database) {}

  preview(act: Act<Actor>, projectId: string, choice: NoteChoice): Promise<BomNotePreview> {
    return this.database.read((manager) => previewNote(manager, act, projectId, choice));
  }

  async previewFile(
    act: Act<Actor>,
    projectId: string,
    choice: NoteChoice,
    wish: FileWish,
  ): Promise<FileAnswer> {
    const { note } = await this.preview(act, projectId, choice);
    const file = await bomNoteFile(note, wish);
    const objectName = `${note.titleBlock.projectCode} BOM note preview`;
    await this.#auditDownload(act, { objectId: projectId, objectName, projectId }, file);
    return file;
  }

  list(actor: Actor, projectId: string): Promise<IssuedNoteRow[]> {
    return this.database.read(async (manager) => {
      await accessProject(manager, actor, projectId);
      const order = { number: 'DESC' } as const;
      const notes = await manager.find(BomNoteEntity, { where: { projectId }, order });
      return notes.map(issuedRow);
    });
  }

  /** Issues a note of just these revisions, or nothing: what is refused is named. */
  async issue(
    act: Act<Actor>,
    projectId: string,
    revisionIds: readonly string[],
  ): Promise<IssuedBomNote> {
    const sources = await this.database.read(async (manager) => {
      await expectIssuable(manager, act.actor, projectId, revisionIds);
      return noteSources(manager, act.actor, revisionIds);
    });
    expectWhole(sources);
    return this.database.transaction(async (manager) => {
      const access = await expectIssuable(manager, act.actor, projectId, revisionIds);
      const number = await nextNumber(manager, projectId);
      const issue = { number, issuedBy: act.actor.name };
      const occasion = { atMs: act.atMs, issue, program: PROGRAM };
      const note = sealed(buildBomNote(access.project, sources, occasion));
      const entity = manager.create(BomNoteEntity, {
        ...{ id: randomUUID(), projectId, number, note },
        ...{ issuerId: act.actor.id, issuedAtMs: act.atMs },
      });
      await manager.insert(BomNoteEntity, entity);
      const objectName = note.issue?.identification ?? '';
      await recordAudit(manager, act, {
        ...{ action: 'bom-note.issued', objectKind: 'bom-note', objectId: entity.id },
        ...{ objectName, projectId, summary: `issued ${objectName}` },
        detail: { contentHash: note.contentHash, revisions: sources.map(sourceName) },
      });
      return issuedReply({ entity, access });
    });
  }

  read(actor: Actor, noteId: string): Promise<IssuedBomNote> {
    return this.database.read(async (manager) =>
      issuedReply(await openNote(manager, actor, noteId)),
    );
  }

  async file(act: Act<Actor>, noteId: string, wish: FileWish): Promise<FileAnswer> {
    const { note, projectId } = await this.database.read(async (manager) => {
      const { access, entity } = await openNote(manager, act.actor, noteId);
      requireRole(access, 'exporter');
      return entity;
    });
    const objectName = note.issue?.identification ?? '';
    if (!isIntact(note)) {
      throw new ApiError('conflict', `${objectName} no longer fits its content hash.`);
    }
    const file = await bomNoteFile(note, wish);
    await this.#auditDownload(act, { objectId: noteId, objectName, projectId }, file);
    return file;
  }

  #auditDownload(
    act: Act<Actor>,
    object: { objectId: string; objectName: string; projectId: string },
    { name }: FileAnswer,
  ): Promise<void> {
    return this.database.transaction((manager) =>
      recordAudit(manager, act, {
        ...{ action: 'bom-note.downloaded', objectKind: 'bom-note', ...object },
        ...{ summary: `downloaded ${name}`, detail: { file: name } },
      }),
    );
  }
}

async function expectIssuable(
  manager: EntityManager,
  actor: Actor,
  projectId: string,
  revisionIds: readonly string[],
) {
  const access = await accessProject(manager, actor, projectId);
  requireRole(access, 'exporter');
  expectLocked(await revisionLines(manager, [projectId]), revisionIds);
  return access;
}

/** @throws {ApiError} conflict where the hash of a lock no longer fits */
function expectWhole(sources: readonly NoteSource[]): void {
  const broken = sources.filter(({ lock }) => lock === null);
  if (broken.length === 0) return;
  throw new ApiError(
    'conflict',
    `Changed since the lock: ${broken.map(sourceName).join(', ')}. Verify before anything is issued.`,
  );
}

async function nextNumber(manager: EntityManager, projectId: string): Promise<number> {
  return 1 + ((await manager.maximum(BomNoteEntity, 'number', { projectId })) ?? 0);
}
