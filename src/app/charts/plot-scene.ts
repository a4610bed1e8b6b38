import type { PlotModel } from './chart-model.ts';
import { axisTitle, makeScale, type Scale } from './chart-scale.ts';
import {
  acrossTexts,
  AXIS_TITLE_PX,
  path,
  round,
  TICK_TEXT_PX,
  type ChartScene,
  type SceneShape,
  type SceneText,
} from './chart-scene.ts';
import { placeLabels, textWidthPx } from './place-labels.ts';
import {
  bandsOf,
  binsOf,
  curvesOf,
  pointsOf,
  rulesOf,
  slopesOf,
  type PlotFrame,
} from './plot-pieces.ts';

const TITLE_PX = 24;
const TICK_PX = 6;
const MINOR_TICK_PX = 3;
const EDGE_PX = 14;
/** Least distance of two lettered ticks. */
const UP_GAP_PX = 34;
const ACROSS_GAP_PX = 56;

/** Curves or a histogram, laid out. */
export function plotScene(model: PlotModel, width: number, height: number): ChartScene {
  const bottom = height - TICK_TEXT_PX - AXIS_TITLE_PX;
  const y = makeScale(model.y, bottom, TITLE_PX, UP_GAP_PX);
  const widest = Math.max(...y.ticks.map(({ text }) => textWidthPx(text, true)));
  const left = Math.ceil(widest) + TICK_PX + 4;
  const right = width - EDGE_PX;
  const x = makeScale(model.x, left, right, ACROSS_GAP_PX);
  const plot = { left, top: TITLE_PX, right, bottom };
  const frame: PlotFrame = { x, y, plot };
  const bands = bandsOf(model.bands ?? [], frame);
  const bins = binsOf(model.bins ?? [], frame);
  const rules = rulesOf(model.rules ?? [], frame);
  const curves = curvesOf(model.series, frame);
  const slopes = slopesOf(model.slopes ?? [], frame);
  const points = pointsOf(model.points ?? [], frame);
  const drawn = [bands, bins, rules, curves, slopes, points];
  // Who chooses a place first: what is marked, then limits, curves and stretches.
  const wishes = [points, slopes, rules, curves, bands].flatMap((piece) => piece.wishes);
  const labels = placeLabels(
    wishes,
    { left: left + 2, top: TITLE_PX - 8, right: width, bottom: bottom - 1 },
    drawn.flatMap(({ lines }) => lines),
  );
  return {
    width,
    height,
    plot,
    shapes: [...gridOf(frame), ...drawn.flatMap(({ shapes }) => shapes)],
    texts: [...upTexts(model, frame), ...acrossTexts(model.x, x, plot, right), ...labels],
    upright: false,
    stopPx: (at) => x.toPx(at),
    cursorAt: (at) => cursor(model, frame, at),
  };
}

function cursor(model: PlotModel, { x, y, plot }: PlotFrame, at: number) {
  const atPx = x.toPx(at);
  const line = path([
    { x: atPx, y: plot.top },
    { x: atPx, y: plot.bottom },
  ]);
  const dots = model.series.flatMap(({ points }) => {
    const met = points.find(([each]) => each === at);
    const dot = { x: atPx, y: met === undefined ? NaN : y.toPx(met[1]) };
    return dot.y >= plot.top && dot.y <= plot.bottom ? [dot] : [];
  });
  return { line: { path: line, className: 'cursor-line' }, dots };
}

function gridOf({ x, y, plot }: PlotFrame): SceneShape[] {
  const { left, right, top, bottom } = plot;
  const sizeOf = (text: string) => (text === '' ? MINOR_TICK_PX : TICK_PX);
  const across = x.ticks.map(
    ({ value, text }) => `M${round(x.toPx(value))} ${bottom}v${sizeOf(text)}`,
  );
  const up = y.ticks.map(({ value, text }) => `M${left} ${round(y.toPx(value))}h${-sizeOf(text)}`);
  const level = (value: number) => `M${left} ${round(y.toPx(value))}H${right}`;
  const lettered = y.ticks.filter(({ text }) => text !== '');
  const zero = y.from < 0 && y.to > 0 ? [{ path: level(0), className: 'zero' }] : [];
  return [
    { path: lettered.map(({ value }) => level(value)).join(''), className: 'hairline' },
    { path: [`M${left} ${top}V${bottom}H${right}`, ...across, ...up].join(''), className: 'axis' },
    ...zero,
  ];
}

function upTexts(model: PlotModel, { y, plot }: PlotFrame): SceneText[] {
  const letters = y.ticks
    .filter(({ text }) => text !== '')
    .map(({ value, text }: Scale['ticks'][number]): SceneText => ({
      x: plot.left - TICK_PX - 3,
      y: y.toPx(value) + 4,
      text,
      anchor: 'end',
      className: 'tick',
    }));
  return [
    ...letters,
    { x: 0, y: 11, text: axisTitle(model.y), anchor: 'start', className: 'title' },
  ];
}
