import {
  stageTemperatures,
  type CurvesAtCorner,
  type SaturationAtCorner,
} from '../../../../shared/checks/stage-curves.ts';
import { gainOverCurrent, gainOverTemperature } from '../../../../shared/stage/part-curves.ts';
import { voltText } from '../../../../shared/report/schematic/part-words.ts';
import { formatNumber, formatQuantity } from '../../../../shared/units/engineering-notation.ts';
import { axis, series, type ChartRule, type PlotModel } from '../../charts/chart-model.ts';
import { gainChart, saturationChart } from '../../charts/transistor-charts.ts';
import { operatingPoint } from './output-charts.ts';

/** VCE(sat) over IC: the part's own line, and beside it the corner's limit and what is expected there. */
export function saturationOfStage(
  at: CurvesAtCorner,
  saturation: SaturationAtCorner,
  budgetV: number | null,
): PlotModel {
  const degrees = formatQuantity(at.limit.tjDegC, '°C');
  const beta = formatNumber(at.forcedBeta);
  const budget: ChartRule[] =
    budgetV === null
      ? []
      : [
          {
            axis: 'y',
            value: budgetV,
            label: `limit ${voltText(budgetV)}`,
            tone: 'limit',
          },
        ];
  const corner = series(`limit, IC/IB ${beta}, ${degrees}`, saturation.corner, {
    tone: 3,
    dash: 'dashed',
  });
  return saturationChart(saturation, {
    series: [
      // In the cold and at the tested drive the corner's line is the sheet's own.
      ...(saturation.cornerDiffers ? [corner] : []),
      series(`expected, IC/IB ${beta}, ${degrees}`, saturation.expected, {
        tone: 2,
        dash: 'dashed',
      }),
    ],
    rules: budget,
    points: at.limit.vceV > 0 ? [operatingPoint(at, true)] : [],
  });
}

/** What the stage asks of the gain, drawn across. */
function demand(at: CurvesAtCorner): ChartRule[] {
  return at.byInput || !Number.isFinite(at.forcedBeta)
    ? []
    : [
        {
          axis: 'y',
          value: at.forcedBeta,
          label: `forced β ${formatNumber(at.forcedBeta, { pad: true })}`,
          tone: 2,
        },
      ];
}

/** Decades of current below the load current, and how far above it the gain is drawn. */
const BELOW = 1e-2;
const ABOVE = 5;

/** @returns null where the part prints no gain row at 25 °C */
export function gainOfStage(at: CurvesAtCorner): PlotModel | null {
  const { gain } = at.part;
  if (gain === null) return null;
  const { transistor, ambientDegC } = at.input;
  const rows = transistor.gain.map(({ icA }) => icA);
  const span = [
    Math.min(BELOW * at.fullA, ...rows),
    Math.max(transistor.limits.icA ?? ABOVE * at.fullA, at.fullA, ...rows),
  ] as const;
  return gainChart(
    gainOverCurrent(gain, transistor, span, ambientDegC.min),
    span,
    ambientDegC.min,
    {
      rules: [
        ...demand(at),
        { axis: 'x', value: at.fullA, label: `IC ${formatQuantity(at.fullA, 'A')}`, tone: 2 },
      ],
    },
  );
}

/** hFE over the junction temperature at the load current. */
export function gainOverTemperatureOfStage(at: CurvesAtCorner): PlotModel | null {
  const { gain } = at.part;
  if (gain === null) return null;
  const span = stageTemperatures(at);
  const curves = gainOverTemperature(gain, at.input.transistor, at.fullA, span);
  const top = Math.max(...curves.most.map(([, hfe]) => hfe));
  return {
    kind: 'plot',
    name: `Gain over junction temperature at ${formatQuantity(at.fullA, 'A')}`,
    x: axis('TJ', '°C', span, { exact: true }),
    y: axis('hFE', '1', [0, 1.05 * top]),
    series: [
      series('min', curves.least),
      series('expected', curves.expected, { tone: 2, dash: 'dashed' }),
      series('max', curves.most, { tone: 3, dash: 'dotted' }),
    ],
    rules: demand(at),
  };
}
