import type { Content } from 'pdfmake/interfaces.js';
import { COLOURS, PAGE, points, SIZES } from './pdf-measures.ts';
import { paragraph } from './pdf-text.ts';
import type { TechnicalDocument } from './technical-document.ts';

/** The mark on its 24-unit grid: off, rising, flat, with the square at the knee. */
const MARK = `<svg xmlns="http://www.w3.org/2000/svg" viewBox="1 2 22 20" fill="none" stroke="${COLOURS.primary}" stroke-width="2"><path d="M2 19H6.95L11.1 9.6M15 7H22"/><rect x="10" y="4.5" width="5" height="5"/></svg>`;

const RIGHT_PX = 260;

/** The head of the first sheet: mark, what it is, what it is about, its number and date. */
export function pdfHead(document: TechnicalDocument): Content[] {
  const right = { alignment: 'right', widthPx: RIGHT_PX } as const;
  const middlePx = PAGE.contentPx - RIGHT_PX - 46;
  const head: Content = {
    columns: [
      { svg: MARK, width: points(34), margin: [0, points(5), 0, 0] },
      {
        width: points(middlePx),
        margin: [points(12), 0, 0, 0],
        stack: [
          paragraph(document.heading, { sizePx: SIZES.heading, strong: true }),
          paragraph(document.subject, {
            sizePx: SIZES.subject,
            colour: COLOURS.soft,
            widthPx: middlePx - 12,
          }),
        ],
      },
      {
        width: '*',
        margin: [0, points(1), 0, 0],
        stack: [
          paragraph(document.identification, { sizePx: SIZES.blockTitle, strong: true, ...right }),
          { ...paragraph(document.occasion, right), margin: [0, points(3), 0, 0] },
        ],
      },
    ],
  };
  return [head, rule(), facts(document)];
}

function rule(): Content {
  const line = { type: 'line', x1: 0, y1: 0, x2: points(PAGE.contentPx), y2: 0 } as const;
  return {
    canvas: [{ ...line, lineWidth: points(1.2), lineColor: COLOURS.ink }],
    margin: [0, points(12), 0, points(9)],
  };
}

function facts({ facts, stamp }: TechnicalDocument): Content {
  const widthPx = PAGE.contentPx / Math.max(1, facts.length);
  return {
    columns: facts.map(({ label, value, flagged }) => ({
      width: points(widthPx),
      stack: [
        paragraph(label, { sizePx: SIZES.label, colour: COLOURS.soft, widthPx }),
        {
          ...paragraph(value, {
            sizePx: SIZES.section,
            strong: true,
            colour: flagged && stamp !== null ? COLOURS.red : COLOURS.ink,
            widthPx,
          }),
          margin: [0, points(2), 0, 0],
        },
      ],
    })),
    margin: [0, 0, 0, points(4)],
  };
}

/** Above every sheet: what it is not, and from the second one on, what it belongs to. */
export function pdfRunningHead(document: TechnicalDocument, page: number): Content {
  const { stamp, heading, identification } = document;
  const warning = stamp === null ? '' : `${stamp}, preview only`;
  const belongs = page === 1 ? '' : `${heading} ${identification}`;
  return {
    margin: [points(PAGE.marginPx), points(21), points(PAGE.marginPx), 0],
    columns: [
      { width: '*', text: '' },
      {
        ...paragraph(warning, {
          sizePx: 14,
          strong: true,
          colour: COLOURS.red,
          alignment: 'center',
        }),
        width: points(280),
      },
      { ...paragraph(belongs, { colour: COLOURS.soft, alignment: 'right' }), width: '*' },
    ],
  };
}

const STAMP_LENGTH_PX = 885;

/** Outlined across the sheet from corner to corner, so that the text below stays readable. */
export function pdfStamp(stamp: string | null): Content {
  if (stamp === null) return [];
  const angle = -52;
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${PAGE.widthPx}" height="${PAGE.heightPx}" viewBox="0 0 ${PAGE.widthPx} ${PAGE.heightPx}"><text x="385" y="585" font-family="Roboto" font-weight="bold" font-size="122" text-anchor="middle" textLength="${STAMP_LENGTH_PX}" fill="none" stroke="${COLOURS.red}" stroke-opacity="0.6" stroke-width="1.2" transform="rotate(${angle} 385 548)">${escaped(stamp)}</text></svg>`;
  return { svg, width: points(PAGE.widthPx), absolutePosition: { x: 0, y: 0 } };
}

const ENTITIES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;' };
const escaped = (text: string) =>
  text.replace(/[&<>]/g, (character) => ENTITIES[character] ?? character);
