import type { BomNote } from '../../shared/report/bom-note.ts';
import {
  dataText,
  NOTHING,
  occasionText,
  stagesText,
  statusText,
  utcDate,
} from '../../shared/report/bom-note-text.ts';
import type { Fact, TechnicalDocument, TitleBlock } from '../documents/technical-document.ts';
import { lineTable } from './line-table.ts';
import { revisionTable } from './revision-table.ts';

const NOT_ISSUED = 'not issued';
const MOST_NAMES = 3;

/** A BOM note laid out for the document builder; follows from the note alone. */
export function bomNoteDocument(note: BomNote): TechnicalDocument {
  const { titleBlock, issue, released } = note;
  return {
    heading: titleBlock.documentType,
    subject: `${titleBlock.title}: driver stages and their parts`,
    identification: issue?.identification ?? NOT_ISSUED,
    occasion: occasionText(note) + (issue === null ? '' : ` by ${issue.issuedBy}`),
    stamp: released ? null : 'NOT RELEASED',
    facts: facts(note),
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

function facts(note: BomNote): Fact[] {
  const { counts } = note;
  const data = dataText(note);
  return [
    { label: 'Stages', value: stagesText(note), flagged: counts.locked < counts.stages },
    { label: 'Lines', value: `${counts.lines}, merged over stages`, flagged: false },
    { label: 'Parts per board', value: String(counts.partsPerBoard), flagged: false },
    { ...data, flagged: counts.partsChanged > 0 },
  ];
}

function block(note: BomNote): TitleBlock {
  const { titleBlock, issue, released, atMs } = note;
  return {
    legalOwner: titleBlock.legalOwner,
    department: titleBlock.department ?? NOTHING,
    creator: people(titleBlock.creators),
    checker: people(titleBlock.checkers),
    approver: people(titleBlock.approvers),
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

/** Many names would burst the block; the revisions carry all of them. */
function people(names: readonly string[]): string {
  if (names.length === 0) return 'none';
  if (names.length <= MOST_NAMES) return names.join(', ');
  const shown = names.slice(0, MOST_NAMES - 1);
  return `${shown.join(', ')} and ${names.length - shown.length} more`;
}

function contentText({ contentHash, released }: BomNote): TechnicalDocument['content'] {
  if (contentHash === null) {
    const text = `No content hash: ${released ? NOT_ISSUED : 'not released'}`;
    return { short: text, full: text };
  }
  const first = (contentHash.slice(0, 16).match(/.{4}/g) ?? []).join(' ');
  return { short: `Content SHA-256 ${first}`, full: `SHA-256 ${contentHash}` };
}

/** `CR-40_BOM-0007_20260310`, `CR-40_BOM-preview_20260310` */
function fileName({ titleBlock, issue, atMs }: BomNote): string {
  const number = issue === null ? 'preview' : String(issue.number).padStart(4, '0');
  return `${titleBlock.projectCode}_BOM-${number}_${utcDate(atMs).replaceAll('-', '')}`;
}
