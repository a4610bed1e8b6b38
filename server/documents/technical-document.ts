/**
 * A document as data, of no format: one description makes the PDF, the workbook and the CSV. Measures are
 * CSS pixels on an A4 sheet of 794 × 1123, with 680 between the margins.
 */
export interface TechnicalDocument {
  /** Large on the sheet, such as `BOM note`. */
  readonly heading: string;
  readonly subject: string;
  readonly identification: string;
  /** When and as what it was made: `Issued 2026-03-10, 14:52 Z`. */
  readonly occasion: string;
  /** Across every sheet, in the first row of every table; null on what is released. */
  readonly stamp: string | null;
  readonly facts: readonly Fact[];
  /** From top to bottom; what stands in one row stands side by side. */
  readonly rows: readonly (readonly Section[])[];
  readonly titleBlock: TitleBlock;
  /** Name and version of the program that made it. */
  readonly program: string;
  /** What vouches for the content: shortened for the foot of every sheet, and in full. */
  readonly content: { readonly short: string; readonly full: string };
  /** UTC, ms since 1970: the only time the files carry. */
  readonly atMs: number;
  /** Without ending. */
  readonly fileName: string;
}

export interface Fact {
  readonly label: string;
  readonly value: string;
  readonly flagged: boolean;
}

export type Section = TableSection | ListSection;

export interface TableSection {
  readonly kind: 'table';
  readonly heading: string;
  /** Whether the heading stands in the table’s own head and so on every sheet the table goes on to. */
  readonly headingInTable?: boolean;
  readonly widthPx: number;
  readonly columns: readonly Column[];
  readonly records: readonly (readonly Cell[])[];
}

export interface ListSection {
  readonly kind: 'list';
  readonly heading: string;
  readonly widthPx: number;
  readonly items: readonly { readonly text: string; readonly flagged: boolean }[];
}

/** `widthPx: null` keeps a column off the sheet, `data: false` off workbook and CSV. */
export interface Column {
  readonly heading: string;
  /** Unit of the numbers below; stands in the heading of workbook and CSV. */
  readonly unit?: string;
  readonly widthPx: number | null;
  readonly data: boolean;
  readonly right?: boolean;
  readonly strong?: boolean;
}

/** `number` is what workbook and CSV carry in place of the text; `runs` what the sheet does. */
export interface Cell {
  readonly text: string;
  readonly number?: number;
  readonly runs?: readonly Run[];
  readonly flagged?: boolean;
}

export interface Run {
  readonly text: string;
  readonly flagged: boolean;
  /** Below or above the line; on it where left out. */
  readonly level?: 'line' | 'sub' | 'sup';
}

/** The data fields of ISO 7200; sheet numbers are filled in by the sheet itself. */
export interface TitleBlock {
  readonly legalOwner: string;
  readonly department: string;
  readonly creator: string;
  readonly checker: string;
  readonly approver: string;
  readonly documentType: string;
  readonly status: string;
  readonly statusFlagged: boolean;
  readonly dateOfIssue: string;
  readonly title: string;
  readonly supplementaryTitle: string;
  readonly revision: string;
  readonly language: string;
}

/** The fields in reading order, for formats that have no sheet. */
export function titleBlockFields(document: TechnicalDocument): [string, string][] {
  const block = document.titleBlock;
  return [
    ['Legal owner', block.legalOwner],
    ['Responsible department', block.department],
    ['Title', block.title],
    ['Supplementary title', block.supplementaryTitle],
    ['Identification number', document.identification],
    ['Revision', block.revision],
    ['Document type', block.documentType],
    ['Document status', block.status],
    ['Date of issue', block.dateOfIssue],
    ['Creator', block.creator],
    ['Checker', block.checker],
    ['Approval person', block.approver],
    ['Language', block.language],
  ];
}
