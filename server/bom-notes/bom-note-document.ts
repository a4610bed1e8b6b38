import type { BomNote } from '../../shared/report/bom-note.ts';
import {
  contentText,
  NOT_ISSUED,
  noteFacts,
  peopleText,
} from '../../shared/report/bom-note-facts.ts';
import { NOTHING, occasionText, statusText, utcDate } from '../../shared/report/bom-note-text.ts';
import type { TechnicalDocument, TitleBlock } from '../documents/technical-document.ts';
import { lineTable } from './line-table.ts';
import { revisionTable } from './revision-table.ts';

/** A BOM note laid out for the document builder; follows from the note alone. */
export function bomNoteDocument(note: BomNote): TechnicalDocument {
  const { titleBlock, issue, released } = note;
  return {
    heading: titleBlock.documentType,
    subject: `${titleBlock.title}: driver stages and their parts`,
    identification: issue?.identification ?? NOT_ISSUED,
    occasion: occasionText(note) + (issue === null ? '' : ` by ${issue.issuedBy}`),
    stamp: released ? null : 'NOT RELEASED',
    facts: noteFacts(note),
    rows: [
      [lineTable(note)],
      [
        revisionTable(note),
        { kind: 'list', heading: 'Cautions', widthPx: 280, items: note.cautions },
      ],
    ],
    titleBlock: block(note),
    program: note.program,
    content: contentText(note),
    atMs: note.atMs,
    fileName: fileName(note),
  };
}

function block(note: BomNote): TitleBlock {
  const { titleBlock, issue, released, atMs } = note;
  return {
    legalOwner: titleBlock.legalOwner,
    department: titleBlock.department ?? NOTHING,
    creator: peopleText(titleBlock.creators),
    checker: peopleText(titleBlock.checkers),
    approver: peopleText(titleBlock.approvers),
    documentType: titleBlock.documentType,
    status: statusText(note),
    statusFlagged: !released,
    dateOfIssue: issue === null ? 'none' : utcDate(atMs),
    title: titleBlock.title,
    supplementaryTitle: titleBlock.supplementaryTitle ?? NOTHING,
    // a note is never revised: the next one has the next number
    revision: issue === null ? NOTHING : 'A',
    language: titleBlock.language,
  };
}

/** `CR-40_BOM-0007_20260310`, `CR-40_BOM-preview_20260310` */
function fileName({ titleBlock, issue, atMs }: BomNote): string {
  const number = issue === null ? 'preview' : String(issue.number).padStart(4, '0');
  return `${titleBlock.projectCode}_BOM-${number}_${utcDate(atMs).replaceAll('-', '')}`;
}
