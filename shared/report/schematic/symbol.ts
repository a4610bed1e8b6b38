import type { Box, Point } from './drawing.ts';

/** Weight of a stroke: 1.5 for lines, 2.5 for rails, 3 for a base bar. */
export type Weight = 'line' | 'rail' | 'bar';
export const STROKE_WIDTH: Readonly<Record<Weight, number>> = { line: 1.5, rail: 2.5, bar: 3 };

/** One stroke or filled shape of a symbol; `path` is SVG path data around the symbol's own origin. */
export interface Stroke {
  readonly path: string;
  readonly weight: Weight;
  readonly filled?: boolean;
  readonly dashed?: boolean;
}

/** Small lettering inside a symbol. */
export interface Lettering {
  readonly text: string;
  readonly at: Point;
}

/** A symbol in the manner of IEC 60617. Its terminals lie on the grid. */
export interface SymbolShape {
  readonly strokes: readonly Stroke[];
  readonly letterings?: readonly Lettering[];
  readonly terminals: Readonly<Record<string, Point>>;
  /** What no text may touch. */
  readonly box: Box;
}

export const at = (x: number, y: number): Point => ({ x, y });

export const line = (path: string): Stroke => ({ path, weight: 'line' });
export const filled = (path: string): Stroke => ({ path, weight: 'line', filled: true });

/** A circle as path data. */
export const circle = (x: number, y: number, radius: number): string =>
  `M${x - radius} ${y}a${radius} ${radius} 0 1 0 ${2 * radius} 0a${radius} ${radius} 0 1 0 ${-2 * radius} 0Z`;

/** A box as path data. */
export const rectangle = (x: number, y: number, width: number, height: number): string =>
  `M${x} ${y}h${width}v${height}h${-width}Z`;
