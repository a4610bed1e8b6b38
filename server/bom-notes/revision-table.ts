import type { BomNote, BomRevision } from '../../shared/report/bom-note.ts';
import { shortHash, signedText } from '../../shared/report/bom-note-text.ts';
import type { Cell, Column, TableSection } from '../documents/technical-document.ts';

interface RevisionColumn extends Column {
  readonly text: (revision: BomRevision) => string;
}

/** The sheet has room for the first digits of a hash; workbook and CSV carry all, and everybody's name. */
const COLUMNS: readonly RevisionColumn[] = [
  { ...both('Stage', 30, ({ reference }) => reference), strong: true },
  both('Rev', 18, ({ letter }) => letter),
  dataOnly('Title', ({ title }) => title),
  dataOnly('Quantity', ({ quantity }) => String(quantity)),
  both('State', 124, ({ state }) => state),
  dataOnly('Verdict', ({ verdict }) => verdict),
  both('Signed', 66, signedText),
  {
    ...both('SHA-256, first 12', 98, ({ hash }) => (hash === null ? 'none' : shortHash(hash))),
    data: false,
  },
  dataOnly('SHA-256', ({ hash }) => hash ?? 'none'),
  dataOnly('Designer', ({ designer }) => designer),
  dataOnly('Checker', ({ checker }) => checker ?? 'none'),
  dataOnly('Approver', ({ approver }) => approver ?? 'none'),
];

export function revisionTable({ revisions }: BomNote): TableSection {
  return {
    kind: 'table',
    heading: 'Revisions this note stands on',
    widthPx: 376,
    columns: COLUMNS,
    records: revisions.map((revision) =>
      COLUMNS.map(({ text }): Cell => ({
        text: text(revision),
        flagged: !revision.locked || revision.partDataChanged,
      })),
    ),
  };
}

function both(heading: string, widthPx: number, text: RevisionColumn['text']): RevisionColumn {
  return { heading, widthPx, data: true, text };
}

function dataOnly(heading: string, text: RevisionColumn['text']): RevisionColumn {
  return { heading, widthPx: null, data: true, text };
}
