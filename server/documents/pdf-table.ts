import type { Content, CustomTableLayout, TableCell } from 'pdfmake/interfaces.js';
import { COLOURS, points, SIZES } from './pdf-measures.ts';
import { paragraph } from './pdf-text.ts';
import type { Cell, Column, TableSection } from './technical-document.ts';

const GAP_PX = 10;
const INK_LINE_PX = 1.2;
const HAIRLINE_PX = 0.75;
const ROW_PADDING_PX = 5.3;

interface Shown {
  readonly column: Column & { readonly widthPx: number };
  readonly index: number;
}

/** A table with its header repeated on every sheet; no row is torn apart. `flags`: whether red is used at all. */
export function pdfTable(section: TableSection, flags: boolean): Content {
  const { columns, records } = section;
  const shown = columns.flatMap((column, index): Shown[] =>
    column.widthPx === null ? [] : [{ column: { ...column, widthPx: column.widthPx }, index }],
  );
  return {
    table: {
      headerRows: headRows(section),
      dontBreakRows: true,
      keepWithHeaderRows: 1,
      widths: shown.map(({ column }) => points(column.widthPx)),
      body: [
        ...(section.headingInTable === true ? [titleRow(section.heading, shown.length)] : []),
        shown.map(headerCell),
        ...records.map((cells) =>
          shown.map(({ column, index }) => bodyCell(column, cells[index] ?? { text: '' }, flags)),
        ),
      ],
    },
    layout: ruled(headRows(section)),
  };
}

const headRows = ({ headingInTable }: TableSection) => (headingInTable === true ? 2 : 1);

function titleRow(heading: string, columns: number): TableCell[] {
  const cell: TableCell = {
    ...paragraph(heading, { sizePx: SIZES.section, strong: true }),
    colSpan: columns,
  };
  return [cell, ...Array.from({ length: columns - 1 }, (): TableCell => ({}))];
}

/** An ink line below the head, hairlines between the rows. */
const ruled = (headRows: number): CustomTableLayout => ({
  hLineWidth: (line) => points(line < headRows ? 0 : line === headRows ? INK_LINE_PX : HAIRLINE_PX),
  hLineColor: (line) => (line === headRows ? COLOURS.ink : COLOURS.hairline),
  vLineWidth: () => 0,
  paddingLeft: (column) => points(column === 0 ? 0 : GAP_PX / 2),
  paddingRight: (column, node) =>
    points(column === (node.table.widths?.length ?? 0) - 1 ? 0 : GAP_PX / 2),
  paddingTop: () => points(ROW_PADDING_PX),
  paddingBottom: () => points(ROW_PADDING_PX),
});

function headerCell({ column }: Shown): TableCell {
  return {
    ...paragraph(column.heading, {
      sizePx: SIZES.label,
      strong: true,
      colour: COLOURS.soft,
      alignment: column.right === true ? 'right' : 'left',
    }),
    verticalAlignment: 'bottom',
  };
}

function bodyCell(column: Shown['column'], cell: Cell, flags: boolean): TableCell {
  const runs = cell.runs?.map((run) => ({ ...run, flagged: run.flagged && flags }));
  return paragraph(runs ?? cell.text, {
    strong: column.strong === true,
    colour: flags && cell.flagged === true ? COLOURS.red : COLOURS.ink,
    alignment: column.right === true ? 'right' : 'left',
    widthPx: column.widthPx,
  });
}
