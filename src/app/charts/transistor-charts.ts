import type { GainOverCurrent, SheetSaturation } from '../../../shared/stage/part-curves.ts';
import { voltText } from '../../../shared/report/schematic/part-words.ts';
import { formatNumber, formatQuantity } from '../../../shared/units/engineering-notation.ts';
import {
  axis,
  series,
  type ChartBand,
  type ChartPoint,
  type ChartRule,
  type ChartSeries,
  type PlotModel,
} from './chart-model.ts';

/** What a stage adds to a chart of its part. */
export interface StageMarks {
  readonly series?: readonly ChartSeries[];
  readonly points?: readonly ChartPoint[];
  readonly rules?: readonly ChartRule[];
  readonly bands?: readonly ChartBand[];
}

const ROWS = { joined: false, labelled: null } as const;

const largest = (all: readonly ChartSeries[]) =>
  Math.max(0, ...all.flatMap(({ points }) => points.map(([, y]) => (Number.isFinite(y) ? y : 0))));

/** A series only where there is something to draw. */
const some = (each: ChartSeries): ChartSeries[] => (each.points.length > 0 ? [each] : []);

/** hFE over IC: what the sheet guarantees warm and cold, its rows, and what is expected. */
export function gainChart(
  gain: GainOverCurrent,
  span: readonly [number, number],
  coldDegC: number,
  marks: StageMarks = {},
): PlotModel {
  const curves = [
    series('min, 25 °C', gain.least),
    ...some(series('min, printed', gain.minima, { ...ROWS, marker: 'circle' })),
    series(`min, ${formatQuantity(coldDegC, '°C')}`, gain.leastCold, { dash: 'dashed' }),
    series('expected, 25 °C', gain.expected, { tone: 2, dash: 'dashed' }),
    ...some(series('typical, printed', gain.typical, { ...ROWS, tone: 2, marker: 'cross' })),
    // Beyond a printed maximum the line is a substitute, and says so.
    series(gain.maxima.length > 0 ? 'max' : 'max, three times min', gain.most, {
      tone: 3,
      dash: 'dotted',
    }),
    ...some(series('max, printed', gain.maxima, { ...ROWS, tone: 3, marker: 'cross' })),
    ...(marks.series ?? []),
  ];
  return {
    kind: 'plot',
    name: 'Gain over collector current',
    x: axis('IC', 'A', span, { scale: 'log' }),
    y: axis('hFE', '1', [0, 1.05 * largest(curves)]),
    series: curves,
    points: marks.points ?? [],
    rules: marks.rules ?? [],
    bands: marks.bands ?? [],
  };
}

/** Where along a piece the triangle of its slope stands. */
const TRIANGLE = [0.45, 0.85] as const;

/** VCE(sat) over IC: the line through the printed maxima, its slope RCE(sat) and its intercept V0. */
export function saturationChart(
  { sheet, beyond, maxima, typical, piece, testBeta }: SheetSaturation,
  marks: StageMarks = {},
): PlotModel {
  const { interceptV, slopeOhm, fromA, toA } = piece;
  const on = (icA: number) => [icA, interceptV + slopeOhm * icA] as const;
  const curves = [
    series(`limit, IC/IB ${formatNumber(testBeta)}, 25 °C`, sheet),
    ...some(
      series('limit beyond the rows', beyond.length > 1 ? beyond : [], {
        dash: 'dotted',
        labelled: null,
      }),
    ),
    ...some(series('max, printed', maxima, { ...ROWS, marker: 'circle' })),
    ...some(series('typical, printed', typical, { ...ROWS, tone: 2, marker: 'cross' })),
    ...some(
      series(`V0 ${voltText(interceptV)}`, fromA > 0 && interceptV > 0 ? [on(0), on(fromA)] : [], {
        tone: 5,
        dash: 'dotted',
        labelled: 'start',
      }),
    ),
    ...(marks.series ?? []),
  ];
  const width = toA - fromA;
  return {
    kind: 'plot',
    name: 'Saturation voltage over collector current',
    x: axis('IC', 'A', [0, Math.max(toA, ...sheet.map(([x]) => x), ...beyond.map(([x]) => x))]),
    y: axis('VCE(sat)', 'V', [0, 1.1 * largest(curves)]),
    series: curves,
    slopes: [
      {
        from: on(fromA + TRIANGLE[0] * width),
        to: on(fromA + TRIANGLE[1] * width),
        label: `RCE(sat) ${formatQuantity(slopeOhm, 'Ohm', { pad: true })}`,
      },
    ],
    points: marks.points ?? [],
    rules: marks.rules ?? [],
    bands: marks.bands ?? [],
  };
}
