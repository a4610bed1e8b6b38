import type { CriterionId } from '../../../../shared/checks/criteria.ts';
import type { Criterion } from '../../../../shared/checks/evaluation.ts';
import type { SampleSpread } from '../../../../shared/statistics/monte-carlo.ts';
import type { Sensitivity, SensitivityInput } from '../../../../shared/statistics/sensitivity.ts';
import type { SpreadFigure } from '../../../../shared/statistics/spread-figures.ts';
import { formatQuantity } from '../../../../shared/units/engineering-notation.ts';
import { axis, type BarsModel, type ChartRule, type PlotModel } from '../../charts/chart-model.ts';

/** How a figure is called, and the criterion that holds its limit and its worst corner. */
interface FigureWords {
  readonly short: string;
  readonly name: string;
  readonly unit: '1' | 'V' | 'A' | 'W' | '°C';
  readonly criterion: CriterionId;
}

export const FIGURE_WORDS: Readonly<Record<SpreadFigure, FigureWords>> = {
  overdriveFactor: {
    short: 'ODF',
    name: 'overdrive factor',
    unit: '1',
    criterion: 'overdrive-factor',
  },
  vceSatV: { short: 'VCE(sat)', name: 'VCE(sat)', unit: 'V', criterion: 'saturation-voltage' },
  icA: { short: 'IC', name: 'collector current', unit: 'A', criterion: 'collector-current' },
  powerW: { short: 'P', name: 'dissipation', unit: 'W', criterion: 'dissipation' },
  tjDegC: {
    short: 'TJ',
    name: 'junction temperature',
    unit: '°C',
    criterion: 'junction-temperature',
  },
};

const INPUT_WORDS: Readonly<Record<SensitivityInput, string>> = {
  supply: 'Supply',
  rail: 'Logic rail',
  source: 'Output resistance',
  'base-resistor': 'RB',
  'shunt-resistor': 'RBE',
  'pull-up': 'Pull-up',
  load: 'Load resistance',
  'forward-voltage': 'LED voltage',
  gain: 'Gain hFE',
  vbe: 'VBE',
  'vce-sat': 'VCE(sat)',
  'internal-resistors': 'Internal resistors',
  'pre-gain': 'Pre-driver gain',
  'pre-base-resistor': 'Pre-driver RB',
  'thermal-resistance': 'RthJA',
  ambient: 'Ambient, absolute',
};

export const PERCENTILE_WORDS = ['0.135\u00a0%', '50\u00a0%', '99.865\u00a0%'] as const;

/** A mark further off than this many widths of the distribution would squeeze it: it is said in words instead. */
const FAR = 1.5;

/** A line of the chart, or what stands in words where it lies too far off. */
interface Mark {
  readonly value: number;
  readonly label: string;
  readonly tone: ChartRule['tone'];
}

/** The distribution of one figure over the samples, and what lies off the paper; null where nothing spreads. */
export function spreadChart(
  spread: SampleSpread,
  figure: SpreadFigure,
  criterion: Criterion | undefined,
): { readonly chart: PlotModel; readonly beyond: readonly string[] } | null {
  const histogram = spread.histograms[figure];
  if (histogram === null) return null;
  const { name, unit } = FIGURE_WORDS[figure];
  const { from, classWidth, counts } = histogram;
  const to = from + classWidth * counts.length;
  const near = (value: number) =>
    value > from - FAR * (to - from) && value < to + FAR * (to - from);
  const marks = marksOf(criterion, unit);
  const shown = marks.filter(({ value }) => near(value));
  const bins = counts.map((count, k) => ({
    from: from + k * classWidth,
    to: from + (k + 1) * classWidth,
    value: count / spread.samples,
  }));
  const highest = Math.max(...bins.map(({ value }) => value));
  const least = Math.min(from, ...shown.map(({ value }) => value));
  const chart: PlotModel = {
    kind: 'plot',
    name: `Spread of the ${name}`,
    x: axis(name, unit, [
      unit === '°C' || least > 0.5 * to ? least : Math.min(0, least),
      Math.max(to, ...shown.map(({ value }) => value)),
    ]),
    y: axis('share', '%', [0, highest]),
    series: [],
    bins,
    rules: shown.map(({ value, label, tone }) => ({ axis: 'x', value, label, tone })),
    points: spread.percentiles[figure].flatMap((x, k) =>
      x === null
        ? []
        : [
            {
              x,
              y: highest * (k === 1 ? 1.04 : 0.2),
              label: PERCENTILE_WORDS[k] ?? '',
              shape: 'pin',
            },
          ],
    ),
  };
  return { chart, beyond: marks.filter(({ value }) => !near(value)).map(({ label }) => label) };
}

function marksOf(criterion: Criterion | undefined, unit: string): Mark[] {
  if (criterion === undefined) return [];
  const { limit, value } = criterion;
  const text = (figure: number) => formatQuantity(figure, unit, { digits: 3 });
  return [
    ...(limit === null
      ? []
      : [{ value: limit, label: `limit ${text(limit)}`, tone: 'limit' as const }]),
    ...(value === null ? [] : [{ value, label: `worst corner ${text(value)}`, tone: 2 as const }]),
  ];
}

const MOST_BARS = 8;
/** A bar below this share of the longest would not be seen. */
const LEAST_BAR = 0.003;

/** What a figure answers to, strongest first; in per cent of the figure, temperatures in K. Null where unknown. */
export function sensitivityChart(
  { nominal, rows }: Sensitivity,
  figure: SpreadFigure,
): BarsModel | null {
  const { short, unit } = FIGURE_WORDS[figure];
  const whole = nominal[figure];
  const inKelvin = unit === '°C';
  const bars = rows
    .flatMap(({ input, change }) => {
      const by = change[figure];
      const per = inKelvin ? 1 : whole;
      return by === null || per === null || per === 0
        ? []
        : [{ label: INPUT_WORDS[input], value: by / per }];
    })
    .sort((a, b) => Math.abs(b.value) - Math.abs(a.value))
    .filter(
      ({ value }, _, [longest]) => Math.abs(value) >= LEAST_BAR * Math.abs(longest?.value ?? 0),
    )
    .slice(0, MOST_BARS);
  if (bars.length === 0) return null;
  const values = bars.map(({ value }) => value);
  return {
    kind: 'bars',
    name: `What ${short} answers to`,
    of: 'input',
    value: axis(`change of ${short} at +1\u00a0%`, inKelvin ? 'K' : '%', [
      Math.min(0, ...values),
      Math.max(0, ...values),
    ]),
    rows: bars,
  };
}
