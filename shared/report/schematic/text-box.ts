import type { Box, DrawingText, Run, TextRole } from './drawing.ts';

/** Size and face of each role; the page and the PDF set texts by the same table. */
export const TEXT_STYLE: Readonly<
  Record<TextRole, { readonly size: number; readonly bold: boolean; readonly mono: boolean }>
> = {
  designator: { size: 14, bold: true, mono: false },
  value: { size: 12, bold: false, mono: true },
  terminal: { size: 12, bold: false, mono: true },
  voltage: { size: 12, bold: false, mono: true },
  current: { size: 12, bold: false, mono: true },
  'corner-title': { size: 12, bold: true, mono: false },
  'corner-label': { size: 12, bold: false, mono: false },
  'corner-value': { size: 12, bold: false, mono: true },
};

/** Subscripts: .74 em, lowered by .28 em. */
export const SUBSCRIPT_SCALE = 0.74;
export const SUBSCRIPT_DROP = 0.28;

const MONO_ADVANCE = 0.62;
const SANS_ADVANCE = 0.57;
const SPACE_ADVANCE = 0.3;

/** About how wide a line is, on the safe side for the shipped fonts. */
export function textWidth(runs: readonly Run[], role: TextRole): number {
  const { size, mono } = TEXT_STYLE[role];
  const advance = mono ? MONO_ADVANCE : SANS_ADVANCE;
  return runs.reduce((sum, { text, sub }) => {
    const spaces = text.split(/[ \u00a0]/).length - 1;
    const letters = text.length - spaces;
    const scale = sub === true ? SUBSCRIPT_SCALE : 1;
    return sum + size * scale * (letters * advance + spaces * SPACE_ADVANCE);
  }, 0);
}

/** The area a text takes. */
export function textBox(text: DrawingText): Box {
  const { size } = TEXT_STYLE[text.role];
  const width = textWidth(text.runs, text.role);
  const shift = { start: 0, middle: width / 2, end: width }[text.anchor];
  const drop = text.runs.some(({ sub }) => sub) ? SUBSCRIPT_DROP : 0.08;
  return {
    x: text.at.x - shift,
    y: text.at.y - size * 0.76,
    width,
    height: size * (0.76 + drop),
  };
}
