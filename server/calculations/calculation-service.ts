import type { EntityManager } from 'typeorm';
import { calculationSheet } from '../../shared/report/calculation-sheet.ts';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import { PROGRAM } from '../bom-notes/bom-note-preview.ts';
import { noteSource } from '../bom-notes/note-source.ts';
import { writePdf } from '../documents/pdf.ts';
import type { FileAnswer } from '../http/file-answer.ts';
import type { Database } from '../persistence/database.ts';
import { openRevision } from '../revisions/revision-context.ts';
import { calculationDocument, type CalculationSource } from './calculation-document.ts';

/** Calculation sheets of revisions, handed out to the members of their project. */
export class CalculationService {
  constructor(private readonly database: Database) {}

  async file(act: Act<Actor>, revisionId: string): Promise<FileAnswer> {
    const { source, projectId } = await this.database.read((manager) =>
      calculationSource(manager, act.actor, revisionId),
    );
    const document = calculationDocument(source);
    const bytes = await writePdf(document);
    const file = { name: `${document.fileName}.pdf`, type: 'application/pdf', bytes };
    await this.database.transaction((manager) =>
      recordAudit(manager, act, {
        ...{ action: 'calculation.downloaded', objectKind: 'revision', objectId: revisionId },
        ...{ objectName: `${source.head.reference} ${source.head.letter}`, projectId },
        ...{ summary: `downloaded ${file.name}`, detail: { file: file.name } },
      }),
    );
    return file;
  }
}

async function calculationSource(
  manager: EntityManager,
  actor: Actor,
  revisionId: string,
): Promise<{ source: CalculationSource; projectId: string }> {
  const { access, revision } = await openRevision(manager, actor, revisionId);
  const { project } = access;
  const note = await noteSource(manager, actor, revisionId);
  const { definition, lock } = note;
  const { evaluation } = revision;
  const rbOhm = evaluation.baseResistorOhm;
  return {
    projectId: project.id,
    source: {
      head: {
        projectCode: project.code,
        projectTitle: project.title,
        legalOwner: project.legalOwner,
        department: project.department,
        reference: definition.reference,
        title: definition.title,
        letter: note.letter,
        stateWord: note.stateWord,
        designer: note.designer,
        checker: note.checker,
        lock,
        savedAtMs: revision.savedAtMs,
      },
      evaluation,
      sheet: rbOhm === null ? null : calculationSheet(definition, rbOhm),
      program: PROGRAM,
    },
  };
}
