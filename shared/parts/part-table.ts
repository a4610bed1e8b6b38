import { formatQuantity, type NotationOptions } from '../units/engineering-notation.ts';
import type { Confidence, Provenance } from './provenance.ts';

/** A number with the unit `formatQuantity` takes. */
export interface Figure {
  readonly value: number;
  readonly unit: string;
}

export type PartCell = string | Figure | null;

export interface PartColumn {
  readonly title: string;
  /** Unit of the figures below; null for words and ratios, and where it changes from row to row. */
  readonly unit: string | null;
}

export interface PartTableRow {
  /** One cell per column. */
  readonly cells: readonly PartCell[];
  readonly source: string | null;
  readonly confidence: Confidence;
  readonly note: string | null;
}

/** One group of data-sheet rows, ready to be rendered without knowing the fields. */
export interface PartTable {
  readonly id: string;
  readonly title: string;
  readonly columns: readonly PartColumn[];
  readonly rows: readonly PartTableRow[];
}

/** What a table says about rows that name no source and confidence of their own. */
export interface TableHead {
  readonly id: string;
  readonly title: string;
  readonly source: string | null;
  readonly confidence: Confidence;
}

/** A column and how to read it from a row. */
export interface ColumnOf<Row> extends PartColumn {
  readonly read: (row: Row) => number | string | Figure | null;
}

/** A column of figures in one unit, or of words (unit null). */
export function column<Row>(
  title: string,
  unit: string | null,
  read: ColumnOf<Row>['read'],
): ColumnOf<Row> {
  return { title, unit, read };
}

/**
 * A table of rows; columns that hold nothing are left out.
 *
 * @returns a list of one table, or none where there are no rows
 */
export function tableOf<Row extends Partial<Provenance>>(
  head: TableHead,
  rows: readonly Row[],
  columns: readonly ColumnOf<Row>[],
): PartTable[] {
  if (rows.length === 0) return [];
  const used = columns.filter(({ read }) => rows.some((row) => read(row) !== null));
  return [
    {
      id: head.id,
      title: head.title,
      columns: used.map(({ title, unit }) => ({ title, unit: unit === '1' ? null : unit })),
      rows: rows.map((row) => ({
        cells: used.map(({ read, unit }) => cellOf(read(row), unit)),
        source: row.source ?? head.source,
        confidence: row.confidence ?? head.confidence,
        note: row.note ?? null,
      })),
    },
  ];
}

function cellOf(value: number | string | Figure | null, unit: string | null): PartCell {
  return typeof value === 'number' ? { value, unit: unit ?? '1' } : value;
}

/** A single figure of a record, as a row of its own. */
export interface NamedFigure extends Partial<Provenance> {
  readonly name: string;
  readonly value: number | null;
  readonly unit: string;
}

/** A table of named figures, one a row; those not printed are left out. */
export function figuresTable(head: TableHead, figures: readonly NamedFigure[]): PartTable[] {
  return tableOf(
    head,
    figures.filter(({ value }) => value !== null),
    [
      column('Figure', null, ({ name }) => name),
      column('Value', null, ({ value, unit }) => (value === null ? null : { value, unit })),
    ],
  );
}

const PRINTED_DIGITS = 6;

/** A cell as text; figures as printed, without padding. */
export function cellText(cell: PartCell, options: NotationOptions = {}): string {
  if (cell === null) return '';
  return typeof cell === 'string'
    ? cell
    : formatQuantity(cell.value, cell.unit, { digits: PRINTED_DIGITS, ...options });
}

/** A fraction as a figure in percent. */
export const percent = (fraction: number | null): number | null =>
  fraction === null ? null : Number((fraction * 100).toPrecision(12));
