/** What an axis counts in, and how far. Values are plain SI. */
export interface ChartAxis {
  /** Symbol or word, such as `VCE` or `coil current`; the title adds the unit: "IC / mA". */
  readonly quantity: string;
  /** Unit name of `QUANTITY_UNITS`. `%` shows a ratio times 100; `1` is a bare number. */
  readonly unit: string;
  readonly scale: 'linear' | 'log';
  readonly from: number;
  readonly to: number;
  /** Whether the ends stay where they are; else a linear axis runs on to its next tick. */
  readonly exact: boolean;
  /** Smallest difference worth telling, SI; null: three digits of the largest value. */
  readonly finest: number | null;
}

/** 1 what the tool says, 2 touch and current, 3 information, 4 and 5 whatever comes beside them. */
export type ChartTone = 1 | 2 | 3 | 4 | 5;
export type ChartDash = 'solid' | 'dashed' | 'dotted';

/** A line over x, a row of printed points, or both. */
export interface ChartSeries {
  /** Stands at the line itself and heads its column; unique in its chart. */
  readonly label: string;
  /** x ascending; a y that is not finite breaks the line. */
  readonly points: readonly (readonly [x: number, y: number])[];
  readonly tone: ChartTone;
  readonly dash: ChartDash;
  /** Drawn at each point: rows of a data sheet. */
  readonly marker: 'circle' | 'cross' | null;
  /** Whether the points are joined; unjoined ones are read only where they stand. */
  readonly joined: boolean;
  /** Where along the line the label is first tried; null: it only heads the column. */
  readonly labelled: 'start' | 'end' | null;
}

/** A line right across: a limit in red, or another level in the tone given. */
export interface ChartRule {
  readonly axis: 'x' | 'y';
  readonly value: number;
  readonly label: string;
  readonly tone: ChartTone | 'limit';
}

/** A stretch of an axis with a meaning. */
export interface ChartBand {
  readonly axis: 'x' | 'y';
  readonly from: number;
  readonly to: number;
  readonly label: string;
  readonly tone: 'warn' | 'touch' | 'ok';
}

/** One point that is named: the hollow square of an operating point, or a pin up from the x axis. */
export interface ChartPoint {
  readonly x: number;
  readonly y: number;
  readonly label: string;
  readonly shape: 'square' | 'pin';
}

/** The triangle that shows a slope, named with its figure. */
export interface ChartSlope {
  readonly from: readonly [x: number, y: number];
  readonly to: readonly [x: number, y: number];
  readonly label: string;
}

export interface ChartBin {
  readonly from: number;
  readonly to: number;
  readonly value: number;
}

/** Curves or a histogram over two axes. */
export interface PlotModel {
  readonly kind: 'plot';
  /** Accessible name and head of the table; names an exported file. */
  readonly name: string;
  readonly x: ChartAxis;
  readonly y: ChartAxis;
  readonly series: readonly ChartSeries[];
  /** Histogram, ascending. */
  readonly bins?: readonly ChartBin[];
  readonly rules?: readonly ChartRule[];
  readonly bands?: readonly ChartBand[];
  readonly points?: readonly ChartPoint[];
  readonly slopes?: readonly ChartSlope[];
}

/** Horizontal bars from a common zero, one to each thing compared. */
export interface BarsModel {
  readonly kind: 'bars';
  readonly name: string;
  /** What the rows are, as head of their column: "input". */
  readonly of: string;
  readonly value: ChartAxis;
  readonly rows: readonly { readonly label: string; readonly value: number }[];
}

export type ChartModel = PlotModel | BarsModel;

/** A solid line of tone 1, unless said otherwise. */
export function series(
  label: string,
  points: ChartSeries['points'],
  look: Partial<Omit<ChartSeries, 'label' | 'points'>> = {},
): ChartSeries {
  return {
    label,
    points,
    tone: 1,
    dash: 'solid',
    marker: null,
    joined: true,
    labelled: 'end',
    ...look,
  };
}

/** A linear axis that runs on to its next tick, unless said otherwise. */
export function axis(
  quantity: string,
  unit: string,
  [from, to]: readonly [from: number, to: number],
  look: Partial<Pick<ChartAxis, 'scale' | 'exact' | 'finest'>> = {},
): ChartAxis {
  return { quantity, unit, from, to, scale: 'linear', exact: false, finest: null, ...look };
}
