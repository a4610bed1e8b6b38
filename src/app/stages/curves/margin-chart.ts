import { criterionInSentence } from '../../../../shared/checks/criterion-in-sentence.ts';
import type { MarginsAtTemperature } from '../../../../shared/checks/margin-over-temperature.ts';
import { axis, series, type ChartPoint, type PlotModel } from '../../charts/chart-model.ts';
import { marginText } from '../../ui/fixed-figure.ts';

const LOOKS = [
  { tone: 1, dash: 'solid' },
  { tone: 2, dash: 'dashed' },
  { tone: 3, dash: 'dotted' },
] as const;

/** More than this is out of danger: the paper is for what is near. */
const LARGEST_SHOWN = 1;

/** Margins over ambient temperature with the marginal band and the worst point of each curve. */
export function marginChart(
  points: readonly MarginsAtTemperature[],
  ids: readonly string[],
  marginalBand: number,
): PlotModel {
  const curves = ids.map((id, k) =>
    series(
      criterionInSentence(id),
      points.map(({ ambientDegC, margins }) => [ambientDegC, margins[id] ?? NaN]),
      LOOKS[k % LOOKS.length],
    ),
  );
  const all = curves.flatMap(({ points: each }) => each.map(([, margin]) => margin));
  const shown = all.filter((margin) => Number.isFinite(margin));
  const lowest = Math.min(0, ...shown);
  const highest = Math.min(LARGEST_SHOWN, Math.max(2 * marginalBand, ...shown));
  const degrees = points.map(({ ambientDegC }) => ambientDegC);
  return {
    kind: 'plot',
    name: 'Margin over ambient temperature',
    x: axis('TA', '°C', [Math.min(...degrees), Math.max(...degrees)], { exact: true }),
    y: axis('margin', '%', [lowest, highest]),
    series: curves,
    bands: [
      {
        axis: 'y',
        from: 0,
        to: marginalBand,
        label: `marginal, under ${marginText(marginalBand).replace('.0', '')}`,
        tone: 'warn',
      },
    ],
    points: curves.flatMap(({ points: each }): ChartPoint[] => {
      const worst = each.reduce<readonly [number, number] | null>(
        (least, point) => (point[1] < (least?.[1] ?? Infinity) ? point : least),
        null,
      );
      return worst === null
        ? []
        : [{ x: worst[0], y: worst[1], label: marginText(worst[1]), shape: 'square' }];
    }),
  };
}

/** What the chart shows, for its head: "three least of 21". */
export function marginCount(shown: number, all: number): string {
  const words = ['no', 'one', 'two', 'three'];
  return `${words[shown] ?? shown} least of ${all}`;
}
