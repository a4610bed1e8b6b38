import type {
  ChartBand,
  ChartBin,
  ChartPoint,
  ChartRule,
  ChartSeries,
  ChartSlope,
} from './chart-model.ts';
import type { Scale } from './chart-scale.ts';
import { path, rectangle, round, type SceneShape } from './chart-scene.ts';
import {
  clipSegment,
  type LabelWish,
  type PixelBox,
  type PixelPoint,
  type Spot,
} from './place-labels.ts';

/** What a piece of a chart adds to it. */
export interface Piece {
  readonly shapes: readonly SceneShape[];
  /** Lines that labels keep clear of. */
  readonly lines: readonly (readonly PixelPoint[])[];
  readonly wishes: readonly LabelWish[];
}

/** The scales and the frame that every piece is drawn in. */
export interface PlotFrame {
  readonly x: Scale;
  readonly y: Scale;
  readonly plot: PixelBox;
}

const joinPieces = (pieces: readonly Piece[]): Piece => ({
  shapes: pieces.flatMap(({ shapes }) => shapes),
  lines: pieces.flatMap(({ lines }) => lines),
  wishes: pieces.flatMap(({ wishes }) => wishes),
});

/** Lines cut at the frame, so that none runs along it as if it were flat. */
export function curvesOf(all: readonly ChartSeries[], frame: PlotFrame): Piece {
  return joinPieces(all.map((series) => curveOf(series, frame)));
}

function curveOf(series: ChartSeries, { x, y, plot }: PlotFrame): Piece {
  const points = series.points.map(([at, value]) => ({ x: x.toPx(at), y: y.toPx(value) }));
  const lines = series.joined ? visibleRuns(points, plot) : [];
  const marked = series.marker === null ? [] : points.filter((point) => contains(plot, point));
  const look = `tone-${series.tone}`;
  const shapes: SceneShape[] = [];
  if (lines.length > 0) {
    shapes.push({ path: lines.map(path).join(''), className: `series ${look} ${series.dash}` });
  }
  if (marked.length > 0) {
    const draw = series.marker === 'cross' ? cross : circle;
    shapes.push({
      path: marked.map((point) => draw(point)).join(''),
      className: `marker ${look} ${series.marker ?? ''}`,
    });
  }
  const longest = [...lines, marked].reduce((a, b) => (spanPx(b) > spanPx(a) ? b : a), marked);
  const wish = {
    text: series.label,
    className: `label ${look}`,
    mono: false,
    spots: spotsAlong(series.labelled === 'start' ? [...longest].reverse() : longest),
  };
  const wanted = series.labelled !== null && longest.length > 0;
  return {
    shapes,
    lines: [...lines, ...marked.map((point) => boxLine(point, 4))],
    wishes: wanted ? [wish] : [],
  };
}

const contains = ({ left, right, top, bottom }: PixelBox, { x, y }: PixelPoint) =>
  x >= left - 0.5 && x <= right + 0.5 && y >= top - 0.5 && y <= bottom + 0.5;

const spanPx = (line: readonly PixelPoint[]) => {
  const [first, last] = [line[0], line[line.length - 1]];
  return first === undefined || last === undefined
    ? -1
    : Math.hypot(last.x - first.x, last.y - first.y);
};

/** The stretches of a line inside the frame. */
function visibleRuns(points: readonly PixelPoint[], plot: PixelBox): PixelPoint[][] {
  const runs: PixelPoint[][] = [];
  let open: PixelPoint[] | null = null;
  points.forEach((to, k) => {
    const from = points[k - 1];
    if (from === undefined) return;
    const whole = [from.x, from.y, to.x, to.y].every(Number.isFinite);
    const piece = whole ? clipSegment(from, to, plot) : null;
    if (piece === null) open = null;
    else if (open !== null && piece[0] === from) open.push(piece[1]);
    else runs.push((open = [...piece]));
    if (piece !== null && piece[1] !== to) open = null;
  });
  return runs;
}

const SHARES = [1, 0.9, 0.8, 0.7, 0.6, 0.5, 0.4, 0.3, 0.2, 0.1, 0];

/** Places for a name at a line, from its end backwards: above, below and beside it. */
function spotsAlong(line: readonly PixelPoint[]): Spot[] {
  const first = line[0];
  if (first === undefined) return [];
  return SHARES.flatMap((share) => {
    const at = pointAt(line, share);
    const anchor = share === 1 ? 'end' : share === 0 ? 'start' : 'middle';
    return [
      { x: at.x, y: at.y - 6, anchor },
      { x: at.x, y: at.y + 15, anchor },
      ...aroundSpots(at, 7),
    ];
  });
}

/** The point at a share of a line's way. */
function pointAt(line: readonly PixelPoint[], share: number): PixelPoint {
  const steps = line.slice(1).map((to, k) => {
    const from = line[k] ?? to;
    return { from, to, lengthPx: Math.hypot(to.x - from.x, to.y - from.y) };
  });
  let left = share * steps.reduce((sum, { lengthPx }) => sum + lengthPx, 0);
  for (const { from, to, lengthPx } of steps) {
    if (left <= lengthPx && lengthPx > 0) {
      const part = left / lengthPx;
      return { x: from.x + part * (to.x - from.x), y: from.y + part * (to.y - from.y) };
    }
    left -= lengthPx;
  }
  return line[line.length - 1] ?? { x: 0, y: 0 };
}

/** Places round a point, right ones first. */
function aroundSpots({ x, y }: PixelPoint, offPx: number): Spot[] {
  return [
    { x: x + offPx, y: y - offPx + 1, anchor: 'start' },
    { x: x + offPx, y: y + 4, anchor: 'start' },
    { x: x + offPx, y: y + offPx + 9, anchor: 'start' },
    { x: x - offPx, y: y - offPx + 1, anchor: 'end' },
    { x: x - offPx, y: y + 4, anchor: 'end' },
    { x: x - offPx, y: y + offPx + 9, anchor: 'end' },
  ];
}

const circle = ({ x, y }: PixelPoint, radius = 3.5) =>
  `M${round(x - radius)} ${round(y)}a${radius} ${radius} 0 1 0 ${2 * radius} 0a${radius} ${radius} 0 1 0 ${-2 * radius} 0Z`;

const cross = ({ x, y }: PixelPoint) => `M${round(x - 4)} ${round(y - 4)}l8 8m0 -8l-8 8`;

const around = ({ x, y }: PixelPoint, size: number): PixelBox => ({
  left: x - size,
  right: x + size,
  top: y - size,
  bottom: y + size,
});

/** The outline of a small square, for labels to keep clear of. */
function boxLine(point: PixelPoint, size: number): PixelPoint[] {
  const { left, right, top, bottom } = around(point, size);
  return [
    { x: left, y: top },
    { x: right, y: top },
    { x: right, y: bottom },
    { x: left, y: bottom },
    { x: left, y: top },
  ];
}

export function pointsOf(all: readonly ChartPoint[], { x, y, plot }: PlotFrame): Piece {
  return joinPieces(
    all.map(({ shape, label, ...at }) => {
      const point = { x: x.toPx(at.x), y: y.toPx(at.y) };
      if (!contains(plot, point)) return joinPieces([]);
      const spots = [...aroundSpots(point, 9), ...aroundSpots(point, 18)];
      const wish = { text: label, className: 'label mark', mono: false, spots };
      const pin = path([{ ...point, y: plot.bottom }, point]);
      const shapes =
        shape === 'square'
          ? [{ path: rectangle(around(point, 4)), className: 'square' }]
          : [
              { path: pin, className: 'pin' },
              { path: circle(point, 3), className: 'pin head' },
            ];
      return { shapes, lines: [boxLine(point, 5)], wishes: [wish] };
    }),
  );
}

export function rulesOf(all: readonly ChartRule[], { x, y, plot }: PlotFrame): Piece {
  return joinPieces(
    all.map(({ axis, value, label, tone }) => {
      const at = (axis === 'x' ? x : y).toPx(value);
      const line =
        axis === 'x'
          ? [
              { x: at, y: plot.top },
              { x: at, y: plot.bottom },
            ]
          : [
              { x: plot.left, y: at },
              { x: plot.right, y: at },
            ];
      if (!line.every((end) => contains(plot, end))) return joinPieces([]);
      const look = tone === 'limit' ? 'limit' : `tone-${tone}`;
      const wish = { text: label, className: `label ${look}`, mono: false };
      const spots = axis === 'x' ? upright(at, plot) : level(at, plot);
      return {
        shapes: [{ path: path(line), className: `rule ${look}` }],
        lines: [line],
        wishes: [{ ...wish, spots }],
      };
    }),
  );
}

/** Beside an upright line, from the top down. */
const upright = (at: number, { top, bottom }: PixelBox): Spot[] =>
  [0, 0.1, 0.2, 0.3, 0.5, 0.7].flatMap((share): Spot[] => {
    const y = top + 10 + share * (bottom - top);
    return [
      { x: at + 6, y, anchor: 'start' },
      { x: at - 6, y, anchor: 'end' },
    ];
  });

/** Above or below a level line, from its right end. */
const level = (at: number, { left, right }: PixelBox): Spot[] => [
  { x: right - 4, y: at - 5, anchor: 'end' },
  { x: left + 6, y: at - 5, anchor: 'start' },
  { x: (left + right) / 2, y: at - 5, anchor: 'middle' },
  { x: right - 4, y: at + 14, anchor: 'end' },
  { x: left + 6, y: at + 14, anchor: 'start' },
];

export function bandsOf(all: readonly ChartBand[], { x, y, plot }: PlotFrame): Piece {
  return joinPieces(
    all.map(({ axis, from, to, label, tone }) => {
      const [a, b] = axis === 'x' ? [x.toPx(from), x.toPx(to)] : [y.toPx(to), y.toPx(from)];
      const box =
        axis === 'x'
          ? { ...plot, left: Math.max(a, plot.left), right: Math.min(b, plot.right) }
          : { ...plot, top: Math.max(a, plot.top), bottom: Math.min(b, plot.bottom) };
      if (!(box.left <= box.right && box.top <= box.bottom)) return joinPieces([]);
      const wish = { text: label, className: `label band-${tone}`, mono: false };
      const spots = axis === 'x' ? overBand(box) : insideBand(box);
      return {
        shapes: [{ path: rectangle(box), className: `band ${tone}` }],
        lines: [],
        wishes: [{ ...wish, spots }],
      };
    }),
  );
}

const overBand = ({ left, right, top, bottom }: PixelBox): Spot[] =>
  [0, 0.1, 0.2, 0.35, 0.5, 0.65, 0.8].flatMap((share): Spot[] => {
    const y = top + 12 + share * (bottom - top);
    return [
      { x: (left + right) / 2, y, anchor: 'middle' },
      { x: right + 5, y, anchor: 'start' },
      { x: left - 5, y, anchor: 'end' },
    ];
  });

const insideBand = ({ left, right, bottom }: PixelBox): Spot[] => [
  { x: left + 6, y: bottom - 8, anchor: 'start' },
  { x: right - 6, y: bottom - 8, anchor: 'end' },
  { x: (left + right) / 2, y: bottom - 8, anchor: 'middle' },
];

export function slopesOf(all: readonly ChartSlope[], { x, y, plot }: PlotFrame): Piece {
  return joinPieces(
    all.map(({ from, to, label }) => {
      const [start, end] = [from, to].map(([at, value]) => ({ x: x.toPx(at), y: y.toPx(value) }));
      if (start === undefined || end === undefined) return joinPieces([]);
      if (!contains(plot, start) || !contains(plot, end)) return joinPieces([]);
      const line = [start, { x: end.x, y: start.y }, end];
      const spots: Spot[] = [
        ...aroundSpots({ x: end.x, y: (start.y + end.y) / 2 }, 6),
        { x: (start.x + end.x) / 2, y: start.y + 15, anchor: 'middle' },
        { x: end.x, y: start.y + 15, anchor: 'end' },
        { x: start.x, y: start.y + 15, anchor: 'start' },
      ];
      return {
        shapes: [{ path: path(line), className: 'slope' }],
        lines: [line],
        wishes: [{ text: label, className: 'label mark', mono: false, spots }],
      };
    }),
  );
}

export function binsOf(bins: readonly ChartBin[], { x, y, plot }: PlotFrame): Piece {
  const boxes = bins.map(({ from, to, value }) => ({
    left: x.toPx(from),
    right: Math.max(x.toPx(to) - 1, x.toPx(from) + 0.5),
    top: Math.max(y.toPx(value), plot.top),
    bottom: plot.bottom,
  }));
  const outline = boxes.flatMap(({ left, right, top, bottom }) => [
    { x: left, y: bottom },
    { x: left, y: top },
    { x: right, y: top },
    { x: right, y: bottom },
  ]);
  return {
    shapes: [{ path: boxes.map(rectangle).join(''), className: 'bins' }],
    lines: [outline],
    wishes: [],
  };
}
