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
export function pdfTable({ columns, records }: TableSection, flags: boolean): Content {
  const shown = columns.flatMap((column, index): Shown[] =>
    column.widthPx === null ? [] : [{ column: { ...column, widthPx: column.widthPx }, index }],
  );
  return {
    table: {
      headerRows: 1,
      dontBreakRows: true,
      keepWithHeaderRows: 1,
      widths: shown.map(({ column }) => points(column.widthPx)),
      body: [
        shown.map(headerCell),
        ...records.map((cells) =>
          shown.map(({ column, index }) => bodyCell(column, cells[index] ?? { text: '' }, flags)),
        ),
      ],
    },
    layout: RULED,
  };
}

const RULED: CustomTableLayout = {
  hLineWidth: (line) => points(line === 0 ? 0 : line === 1 ? INK_LINE_PX : HAIRLINE_PX),
  hLineColor: (line) => (line === 1 ? COLOURS.ink : COLOURS.hairline),
  vLineWidth: () => 0,
  paddingLeft: (column) => points(column === 0 ? 0 : GAP_PX / 2),
  paddingRight: (column, node) =>
    points(column === (node.table.widths?.length ?? 0) - 1 ? 0 : GAP_PX / 2),
  paddingTop: () => points(ROW_PADDING_PX),
  paddingBottom: () => points(ROW_PADDING_PX),
};

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
