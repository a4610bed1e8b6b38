import { axisTitle, type Scale } from './chart-scale.ts';
import type { ChartAxis } from './chart-model.ts';
import type { Anchor, PixelBox, PixelPoint } from './place-labels.ts';

/** A stroke or an area, in pixels; its look comes from the class. */
export interface SceneShape {
  readonly path: string;
  readonly className: string;
}

export interface SceneText extends PixelPoint {
  readonly text: string;
  readonly anchor: Anchor;
  readonly className: string;
}

/** A chart laid out for one size: 1 unit is 1 CSS pixel. */
export interface ChartScene {
  readonly width: number;
  readonly height: number;
  /** Inside of the axes. */
  readonly plot: PixelBox;
  /** In drawing order. */
  readonly shapes: readonly SceneShape[];
  readonly texts: readonly SceneText[];
  /** Where the cursor stands at a row of the table, and what it meets there. */
  cursorAt(at: number): { readonly line: SceneShape; readonly dots: readonly PixelPoint[] };
  /** Place of a row along the axis that the cursor runs on. */
  stopPx(at: number): number;
  /** Whether the cursor runs down the rows instead of along x. */
  readonly upright: boolean;
}

export const path = (points: readonly PixelPoint[]): string =>
  points.map(({ x, y }, k) => `${k === 0 ? 'M' : 'L'}${round(x)} ${round(y)}`).join('');

export const round = (value: number) => Math.round(value * 100) / 100;

export const rectangle = ({ left, top, right, bottom }: PixelBox): string =>
  `M${round(left)} ${round(top)}H${round(right)}V${round(bottom)}H${round(left)}Z`;

/** Room of the tick letters and of the title below an x axis. */
export const TICK_TEXT_PX = 20;
export const AXIS_TITLE_PX = 20;

/** Letters below an x axis and, at its right end, its title. */
export function acrossTexts(axis: ChartAxis, x: Scale, plot: PixelBox, endPx: number): SceneText[] {
  const letters = x.ticks
    .filter(({ text }) => text !== '')
    .map(({ value, text }): SceneText => ({
      x: x.toPx(value),
      y: plot.bottom + TICK_TEXT_PX - 2,
      text,
      anchor: 'middle',
      className: 'tick',
    }));
  const y = plot.bottom + TICK_TEXT_PX + AXIS_TITLE_PX - 5;
  return [...letters, { x: endPx, y, text: axisTitle(axis), anchor: 'end', className: 'title' }];
}
