import type { Drawing, DrawingArrow, DrawingElement, DrawingText, PartKey } from './drawing.ts';
import { STROKE_WIDTH, type Stroke } from './symbol.ts';
import { SYMBOLS } from './symbols.ts';
import { SUBSCRIPT_DROP, SUBSCRIPT_SCALE, TEXT_STYLE } from './text-box.ts';

/** Colours and fonts of a picture that stands alone. */
export interface SchematicPalette {
  readonly ink: string;
  readonly quiet: string;
  readonly voltage: string;
  readonly current: string;
  readonly selected: string;
  readonly sansFont: string;
  readonly monoFont: string;
}

const ARROW_TURN: Readonly<Record<DrawingArrow['points'], number>> = {
  right: 0,
  down: 90,
  left: 180,
  up: 270,
};
/** Head of a current arrow, pointing right. */
export const ARROW_PATH = 'M5 0L-4 -4.2V4.2Z';
export const DOT_RADIUS = 3;

/**
 * The drawing as a complete SVG document, for the PDF and for download.
 *
 * @param selected part to mark, if any
 */
export function schematicSvg(
  drawing: Drawing,
  palette: SchematicPalette,
  selected: PartKey | null = null,
): string {
  const { width, height } = drawing;
  const part = drawing.parts.find(({ key }) => key === selected);
  const mark =
    part === undefined
      ? ''
      : `<rect x="${part.box.x}" y="${part.box.y}" width="${part.box.width}" height="${part.box.height}" rx="6" fill="${palette.selected}" stroke="${palette.current}" stroke-width="1.5"/>`;
  const body = drawing.elements.map((element) => elementSvg(element, palette)).join('');
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}">` +
    `<title>${escaped(drawing.name)}</title>${mark}${body}</svg>`
  );
}

function elementSvg(element: DrawingElement, palette: SchematicPalette): string {
  switch (element.kind) {
    case 'symbol': {
      const shape = SYMBOLS[element.symbol];
      const strokes = shape.strokes.map((stroke) => strokeSvg(stroke, palette)).join('');
      const letters = (shape.letterings ?? [])
        .map(
          ({ text, at }) =>
            `<text x="${at.x}" y="${at.y}" font-size="12" font-family="${palette.monoFont}" fill="${palette.quiet}">${escaped(text)}</text>`,
        )
        .join('');
      const turn = element.turn === 0 ? '' : ` rotate(${element.turn})`;
      return `<g transform="translate(${element.at.x} ${element.at.y})${turn}">${strokes}${letters}</g>`;
    }
    case 'wire': {
      const path = element.points.map(({ x, y }) => `${x} ${y}`).join('L');
      return strokeSvg({ path: `M${path}`, weight: 'line' }, palette);
    }
    case 'dot':
      return `<circle cx="${element.at.x}" cy="${element.at.y}" r="${DOT_RADIUS}" fill="${palette.ink}"/>`;
    case 'arrow':
      return `<path d="${ARROW_PATH}" transform="translate(${element.at.x} ${element.at.y}) rotate(${ARROW_TURN[element.points]})" fill="${palette.current}"/>`;
    case 'text':
      return textSvg(element, palette);
  }
}

function strokeSvg({ path, weight, filled, dashed }: Stroke, { ink }: SchematicPalette): string {
  const dash = dashed === true ? ' stroke-dasharray="3 4"' : '';
  const fill = filled === true ? ink : 'none';
  return `<path d="${path}" fill="${fill}" stroke="${ink}" stroke-width="${STROKE_WIDTH[weight]}"${dash}/>`;
}

function textSvg(text: DrawingText, palette: SchematicPalette): string {
  const { size, bold, mono } = TEXT_STYLE[text.role];
  const colour = {
    designator: palette.ink,
    value: palette.ink,
    terminal: palette.quiet,
    voltage: palette.voltage,
    current: palette.current,
    'corner-title': palette.ink,
    'corner-label': palette.quiet,
    'corner-value': palette.ink,
  }[text.role];
  let lowered = 0;
  const spans = text.runs
    .map((run) => {
      const wanted = run.sub === true ? size * SUBSCRIPT_DROP : 0;
      const dy = wanted - lowered;
      lowered = wanted;
      const scale = run.sub === true ? size * SUBSCRIPT_SCALE : size;
      return `<tspan dy="${dy}" font-size="${scale}">${escaped(run.text)}</tspan>`;
    })
    .join('');
  const weight = bold ? ' font-weight="bold"' : '';
  return `<text x="${text.at.x}" y="${text.at.y}" text-anchor="${text.anchor}" font-family="${mono ? palette.monoFont : palette.sansFont}"${weight} fill="${colour}">${spans}</text>`;
}

const escaped = (text: string) =>
  text.replace(
    /[&<>"]/g,
    (letter) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[letter] ?? '',
  );
