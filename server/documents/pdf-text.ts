import type { ContentText } from 'pdfmake/interfaces.js';
import { COLOURS, hasLongWord, points, SIZES } from './pdf-measures.ts';
import { printable } from './printable.ts';
import type { Run } from './technical-document.ts';

export interface TextStyle {
  readonly sizePx?: number;
  readonly strong?: boolean;
  readonly colour?: string;
  readonly alignment?: 'left' | 'center' | 'right';
  /** The column the text must keep to; wider words are broken within. */
  readonly widthPx?: number;
}

/** A paragraph of the sheet. Text goes in as data only, so nothing in it can be taken for layout. */
export function paragraph(text: string | readonly Run[], style: TextStyle = {}): ContentText {
  const { sizePx = SIZES.body, strong = false, colour = COLOURS.ink, widthPx } = style;
  const runs = typeof text === 'string' ? [{ text, flagged: false }] : text;
  const whole = runs.map((run) => run.text).join('');
  const breaks = widthPx !== undefined && hasLongWord(whole, widthPx, sizePx);
  return {
    text: runs.map((run) => ({
      text: printable(run.text),
      ...(run.flagged ? { color: COLOURS.red, bold: true } : {}),
      ...(run.level === 'sub' ? { sub: true } : {}),
      ...(run.level === 'sup' ? { sup: true } : {}),
    })),
    fontSize: points(sizePx),
    bold: strong,
    color: colour,
    alignment: style.alignment ?? 'left',
    wordBreak: breaks ? 'break-all' : 'normal',
  };
}
