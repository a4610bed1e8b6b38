/** Everything on the sheet is laid out in CSS pixels of an A4 page at 96 dpi; the PDF counts in points. */
export const points = (px: number): number => px * 0.75;

export const PAGE = { widthPx: 794, heightPx: 1123, marginPx: 57, contentPx: 680 } as const;

/** Printed colours: the light scheme of the application, on white. */
export const COLOURS = {
  ink: '#1E2420',
  soft: '#4A524C',
  hairline: '#C9CBC3',
  red: '#A6261D',
  primary: '#1F5C52',
} as const;

/** Of type, px. */
export const SIZES = {
  heading: 24,
  subject: 13,
  section: 13,
  body: 11.5,
  label: 10.5,
  blockLabel: 9.5,
  blockValue: 12,
  blockTitle: 15,
} as const;

/** Widest a character of the body font gets on average, as a fraction of its size. */
const AVERAGE_WIDTH = 0.6;

/** About how many characters stand on a line; errs on the small side. */
export function charactersPerLine(widthPx: number, sizePx: number): number {
  return Math.max(1, Math.floor(widthPx / (sizePx * AVERAGE_WIDTH)));
}

/** Whether a word of the text is wider than its column: it has to be broken within. */
export function hasLongWord(text: string, widthPx: number, sizePx: number): boolean {
  const fits = charactersPerLine(widthPx, sizePx);
  return text.split(/[\s,-]+/).some((word) => word.length > fits);
}
