import type { BarsModel } from './chart-model.ts';
import { makeScale } from './chart-scale.ts';
import { barFigure } from './chart-table.ts';
import {
  acrossTexts,
  AXIS_TITLE_PX,
  rectangle,
  round,
  TICK_TEXT_PX,
  type ChartScene,
  type SceneText,
} from './chart-scene.ts';
import { textWidthPx, type PixelBox } from './place-labels.ts';

const BAR_PX = 14;
/** Room beyond either end of a bar for its figure. */
const FIGURE_PX = 52;
const TOP_PX = 4;
const ACROSS_GAP_PX = 44;

/** Horizontal bars, laid out: names left of them, or above them where there is no room beside. */
export function barsScene(model: BarsModel, width: number, height: number): ChartScene {
  const names = Math.max(0, ...model.rows.map(({ label }) => textWidthPx(label, false)));
  const above = names + 2 * FIGURE_PX > width * 0.55;
  const left = FIGURE_PX + (above ? 0 : Math.ceil(names) + 8);
  const bottom = height - TICK_TEXT_PX - AXIS_TITLE_PX;
  const plot: PixelBox = { left, top: TOP_PX, right: width - FIGURE_PX, bottom };
  const x = makeScale(model.value, plot.left, plot.right, ACROSS_GAP_PX);
  const zeroPx = x.toPx(Math.min(Math.max(0, x.from), x.to));
  const rowPx = (plot.bottom - plot.top) / Math.max(1, model.rows.length);
  const top = (row: number) => plot.top + row * rowPx;
  const middle = (row: number) => top(row) + (above ? 0.68 : 0.5) * rowPx;
  const gridlines = x.ticks.map(({ value }) => `M${round(x.toPx(value))} ${plot.top}V${bottom}`);
  const bars = model.rows.map(({ value }, row) => {
    const end = x.toPx(value);
    const [from, to] = [Math.min(zeroPx, end), Math.max(zeroPx, end)];
    const half = Math.min(BAR_PX, rowPx * 0.5) / 2;
    const box = { left: from, right: to, top: middle(row) - half, bottom: middle(row) + half };
    return { path: rectangle(box), className: value < 0 ? 'bar negative' : 'bar' };
  });
  const letters = model.rows.flatMap(({ label, value }, row): SceneText[] => {
    const y = middle(row) + 4;
    const end = x.toPx(value);
    const text = barFigure(model, value);
    return [
      above
        ? { x: 0, y: y - 14, text: label, anchor: 'start', className: 'name' }
        : { x: left - FIGURE_PX, y, text: label, anchor: 'end', className: 'name' },
      value < 0
        ? { x: end - 5, y, text, anchor: 'end', className: 'figure' }
        : { x: end + 5, y, text, anchor: 'start', className: 'figure' },
    ];
  });
  return {
    width,
    height,
    plot,
    shapes: [
      { path: gridlines.join(''), className: 'hairline' },
      ...bars,
      { path: `M${round(zeroPx)} ${plot.top}V${bottom}`, className: 'zero' },
    ],
    texts: [...letters, ...acrossTexts(model.value, x, plot, width - 2)],
    upright: true,
    stopPx: (row) => top(row) + rowPx / 2,
    cursorAt: (row) => ({
      line: {
        path: rectangle({ left: 0, right: width, top: top(row), bottom: top(row) + rowPx }),
        className: 'cursor-row',
      },
      dots: [],
    }),
  };
}
