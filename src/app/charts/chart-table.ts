import type { BarsModel, ChartAxis, ChartModel, ChartSeries, PlotModel } from './chart-model.ts';
import { axisFigure, figureUnit } from './chart-scale.ts';

export interface ChartColumn {
  /** Symbols in it get their subscripts. */
  readonly label: string;
  /** Unit of every figure below; '' where the figures carry theirs or there is none. */
  readonly unit: string;
}

/** One stop of the cursor: what the read-out says there and what stands in its row. */
export interface ChartRow {
  /** Value on the x axis; for bars the number of the row. */
  readonly at: number;
  readonly cells: readonly string[];
}

/** A named point, level or stretch. */
export interface ChartMark {
  readonly label: string;
  readonly x: string;
  readonly y: string;
}

/** A chart as figures. The read-out shows rows of this table, so both always say the same. */
export interface ChartTable {
  readonly columns: readonly ChartColumn[];
  readonly rows: readonly ChartRow[];
  readonly marks: readonly ChartMark[];
}

export function chartTable(model: ChartModel): ChartTable {
  if (model.kind === 'bars') return barsTable(model);
  return model.bins === undefined ? curvesTable(model) : histogramTable(model);
}

function barsTable(model: BarsModel): ChartTable {
  const { rows, value, of } = model;
  return {
    columns: [{ label: of, unit: '' }, columnOf(value)],
    rows: rows.map((row, at) => ({ at, cells: [row.label, barFigure(model, row.value)] })),
    marks: [],
  };
}

/** The figure at a bar, with its sign where bars go both ways. */
export function barFigure({ value: axis }: BarsModel, value: number): string {
  const figure = axisFigure(axis, value);
  return axis.from < 0 && value > 0 ? `+${figure}` : figure;
}

function histogramTable(model: PlotModel): ChartTable {
  const { x, y, bins = [] } = model;
  return {
    columns: [columnOf(x), columnOf(y)],
    rows: bins.map(({ from, to, value }) => ({
      at: (from + to) / 2,
      cells: [`${axisFigure(x, from)} … ${axisFigure(x, to)}`, axisFigure(y, value)],
    })),
    marks: marksOf(model),
  };
}

function curvesTable(model: PlotModel): ChartTable {
  const { x, y, series } = model;
  return {
    columns: [columnOf(x), ...series.map(({ label }) => ({ label, unit: figureUnit(y) }))],
    rows: stopsOf(model).map((at) => ({
      at,
      cells: [axisFigure(x, at), ...series.map((each) => axisFigure(y, valueAt(each, at, model)))],
    })),
    marks: marksOf(model),
  };
}

const columnOf = (axis: ChartAxis): ChartColumn => ({
  label: axis.quantity,
  unit: figureUnit(axis),
});

/** Every x at which a curve was computed or a row is printed, inside the axis. */
function stopsOf({ series, x }: PlotModel): number[] {
  const all = series.flatMap(({ points }) => points.map(([at]) => at));
  const inside = all.filter((at) => at >= x.from && at <= x.to).sort((a, b) => a - b);
  const close = (x.to - x.from) * 1e-9;
  return inside.filter((at, k) => k === 0 || at - (inside[k - 1] ?? 0) > close);
}

/** Value of a curve at x: between two samples on the straight piece that is drawn; null beside it. */
export function valueAt(series: ChartSeries, x: number, model: PlotModel): number | null {
  const { points } = series;
  const next = points.findIndex(([at]) => at >= x);
  const end = points[next];
  if (end === undefined) return null;
  if (end[0] === x) return Number.isFinite(end[1]) ? end[1] : null;
  const start = points[next - 1];
  if (start === undefined || !series.joined) return null;
  const over = forward(model.x);
  const share = (over(x) - over(start[0])) / (over(end[0]) - over(start[0]));
  const up = forward(model.y);
  const drawn = up(start[1]) + share * (up(end[1]) - up(start[1]));
  const value = model.y.scale === 'log' ? Math.exp(drawn) : drawn;
  return Number.isFinite(value) ? value : null;
}

const forward = (axis: ChartAxis) => (axis.scale === 'log' ? Math.log : (value: number) => value);

function marksOf({ points = [], rules = [], bands = [], slopes = [], x, y }: PlotModel) {
  const figure = (axis: ChartAxis, value: number) => {
    const unit = figureUnit(axis);
    return axisFigure(axis, value) + (unit === '' ? '' : `\u00a0${unit}`);
  };
  const none = '–';
  const across = (axis: 'x' | 'y', label: string, text: (axis: ChartAxis) => string): ChartMark =>
    axis === 'x' ? { label, x: text(x), y: none } : { label, x: none, y: text(y) };
  return [
    ...points.map(({ label, ...at }) => ({ label, x: figure(x, at.x), y: figure(y, at.y) })),
    ...slopes.map(({ label, from, to }) => ({
      label,
      x: `${figure(x, from[0])} … ${figure(x, to[0])}`,
      y: `${figure(y, from[1])} … ${figure(y, to[1])}`,
    })),
    ...rules.map(({ axis, value, label }) => across(axis, label, (of) => figure(of, value))),
    ...bands.map(({ axis, from, to, label }) =>
      across(axis, label, (of) => `${figure(of, from)} … ${figure(of, to)}`),
    ),
  ];
}
