import type { Content, TableCell } from 'pdfmake/interfaces.js';
import { charactersPerLine, COLOURS, PAGE, points, SIZES } from './pdf-measures.ts';
import { paragraph } from './pdf-text.ts';
import type { TechnicalDocument, TitleBlock } from './technical-document.ts';

const PADDING_PX = 7;
const LINE_PX = 1;
/** Left edges of all fields of all rows; a field spans what lies between its own. */
const COLUMNS_PX = [226, 114, 56, 113, 56, 58, 57] as const;
const LABEL_LINE_PX = 11.2;
const VALUE_LINE_PX = 14.1;
const FOOT_PX = 34;

/** The foot of a sheet: title block of ISO 7200, and below it program, content and page. */
export function pdfFoot(document: TechnicalDocument, page: number, pages: number): Content {
  return {
    margin: [points(PAGE.marginPx), 0, points(PAGE.marginPx), 0],
    stack: [titleBlock(document, page, pages), footLine(document, page, pages)],
  };
}

/** Height to keep free for it: long titles and many names wrap, nothing is cut off. */
export function pdfFootHeightPx({ titleBlock: block }: TechnicalDocument): number {
  const first = tallest([
    [block.legalOwner, 226],
    [block.creator, 170],
    [block.checker, 169],
  ]);
  const second = tallest([
    [block.department, 226],
    [block.approver, 170],
  ]);
  const third = tallest([[block.title, 340]]) + tallest([[block.supplementaryTitle, 340]]);
  const rows = 3 * (LABEL_LINE_PX + 12) + (first + second + third) * VALUE_LINE_PX;
  return rows + VALUE_LINE_PX / 2 + FOOT_PX + 14;
}

function tallest(fields: readonly (readonly [string, number])[]): number {
  return Math.max(
    ...fields.map(([text, widthPx]) =>
      Math.ceil(
        Math.max(1, text.length) / charactersPerLine(widthPx - 2 * PADDING_PX, SIZES.blockTitle),
      ),
    ),
  );
}

function titleBlock(document: TechnicalDocument, page: number, pages: number): Content {
  const block = document.titleBlock;
  return {
    table: {
      widths: COLUMNS_PX.map((px) => points(px - 2 * PADDING_PX - LINE_PX)),
      body: [
        [
          ...field('Legal owner', block.legalOwner, 1, 226),
          ...field('Creator', block.creator, 2, 170),
          ...field('Checker', block.checker, 2, 169),
          ...field('Document type', block.documentType, 2, 115),
        ],
        [
          ...field('Responsible department', block.department, 1, 226),
          ...field('Approval person', block.approver, 2, 170),
          ...field('Document status', block.status, 2, 169, block.statusFlagged),
          ...field('Date of issue', block.dateOfIssue, 2, 115),
        ],
        [
          titleField(block),
          {},
          ...field('Identification number', document.identification, 2, 169),
          ...field('Rev', block.revision, 1, 56),
          ...field('Sheet', `${page} / ${pages}`, 1, 58),
          ...field('Lang.', block.language, 1, 57),
        ],
      ],
    },
    layout: {
      hLineWidth: () => points(LINE_PX),
      vLineWidth: () => points(LINE_PX),
      hLineColor: () => COLOURS.ink,
      vLineColor: () => COLOURS.ink,
      paddingLeft: () => points(PADDING_PX),
      paddingRight: () => points(PADDING_PX),
      paddingTop: () => points(5),
      paddingBottom: () => points(5.5),
    },
  };
}

function field(
  label: string,
  value: string,
  span: number,
  widthPx: number,
  flagged = false,
): TableCell[] {
  const cell: TableCell = {
    colSpan: span,
    stack: [
      labelOf(label),
      paragraph(value, {
        sizePx: SIZES.blockValue,
        strong: true,
        colour: flagged ? COLOURS.red : COLOURS.ink,
        widthPx: widthPx - 2 * PADDING_PX,
      }),
    ],
  };
  return [cell, ...Array.from({ length: span - 1 }, (): TableCell => ({}))];
}

function titleField({ title, supplementaryTitle }: TitleBlock): TableCell {
  const widthPx = 340 - 2 * PADDING_PX;
  return {
    colSpan: 2,
    stack: [
      labelOf('Title, supplementary title'),
      paragraph(title, { sizePx: SIZES.blockTitle, strong: true, widthPx }),
      paragraph(supplementaryTitle, { widthPx }),
    ],
  };
}

const labelOf = (label: string) =>
  paragraph(label, { sizePx: SIZES.blockLabel, colour: COLOURS.soft });

function footLine({ program, content }: TechnicalDocument, page: number, pages: number): Content {
  const style = { sizePx: SIZES.label, colour: COLOURS.soft } as const;
  const pageText = `A4, ${page} of ${pages}`;
  return {
    margin: [0, points(11), 0, 0],
    columns: [
      { ...paragraph(program, style), width: points(130) },
      { ...paragraph(content.short, { ...style, alignment: 'center' }), width: '*' },
      { ...paragraph(pageText, { ...style, alignment: 'right' }), width: points(130) },
    ],
  };
}
