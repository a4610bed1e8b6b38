import {
  footOfCurve,
  outputCharacteristics,
  type CurvesAtCorner,
  type SaturationAtCorner,
} from '../../../../shared/checks/stage-curves.ts';
import type { BaseDrive } from '../../../../shared/physics/device-model.ts';
import { voltText } from '../../../../shared/report/schematic/part-words.ts';
import { formatQuantity } from '../../../../shared/units/engineering-notation.ts';
import {
  axis,
  series,
  type ChartPoint,
  type ChartSeries,
  type PlotModel,
} from '../../charts/chart-model.ts';

const figure = (value: number, unit: string) => formatQuantity(value, unit, { pad: true });

/** The hollow square of every chart: limit figures of the corner. */
export function operatingPoint({ limit }: CurvesAtCorner, turned = false): ChartPoint {
  const label = `${voltText(limit.vceV)}, ${figure(limit.icA, 'A')}`;
  const [x, y] = turned ? [limit.icA, limit.vceV] : [limit.vceV, limit.icA];
  return { x, y, label, shape: 'square' };
}

/** Current above the load line's upper end that the paper still shows. */
const ABOVE = 1.25;

/** Expected output characteristics with the load line and the operating point of a corner. */
export function outputChart(at: CurvesAtCorner, held: BaseDrive['kind']): PlotModel {
  const curves = outputCharacteristics(at, held);
  const end = curves[0]?.samples.at(-1)?.[0] ?? at.availableV;
  return {
    kind: 'plot',
    name: 'Output characteristics and load line',
    x: axis('VCE', 'V', [0, end], { finest: 0.01 }),
    y: axis('IC', 'A', [0, ABOVE * at.fullA]),
    series: [
      ...curves
        .filter(({ own }) => !own)
        .map(({ drive, samples }) => series(driveText(drive), samples))
        .reverse(),
      ...curves
        .filter(({ own }) => own)
        .map(({ drive, samples }) =>
          series(`${driveSymbol(drive, at.byInput)} ${driveText(drive)}`, samples, {
            dash: 'dashed',
          }),
        ),
      loadLine(at, [0, at.availableV]),
    ],
    points: [operatingPoint(at)],
  };
}

const driveText = (drive: BaseDrive) =>
  drive.kind === 'current' ? formatQuantity(drive.ibA, 'A') : voltText(drive.vbeV);

const driveSymbol = ({ kind }: BaseDrive, byInput: boolean) => {
  if (kind === 'voltage') return 'VBE';
  return byInput ? 'II' : 'IB';
};

function loadLine(at: CurvesAtCorner, [fromV, toV]: readonly [number, number]): ChartSeries {
  const { availableV, loadOhm } = at;
  const on = (vceV: number) => [vceV, (availableV - vceV) / loadOhm] as const;
  return series(`load line, ${formatQuantity(loadOhm, 'Ohm')}`, [on(fromV), on(toV)], { tone: 2 });
}

const KNEE_V = 0.4;
const KNEE_ROOM = 1.6;

/**
 * The foot of the output characteristics, where a saturated stage stands: expected curve, limit line and load line.
 *
 * @returns null where the corner is not saturated, or no VCE(sat) row is printed
 */
export function kneeChart(
  at: CurvesAtCorner,
  saturation: SaturationAtCorner | null,
): PlotModel | null {
  if (saturation === null || !at.limit.saturated) return null;
  const toV = Math.max(KNEE_V, KNEE_ROOM * at.limit.vceV);
  const toA = 1.5 * at.fullA;
  const limit = saturation.corner.map(([icA, vceV]) => [vceV, icA] as const);
  return {
    kind: 'plot',
    name: 'Foot of the output characteristics',
    x: axis('VCE', 'V', [0, toV], { exact: true }),
    y: axis('IC', 'A', [0, toA]),
    series: [
      series('expected', footOfCurve(at, toV)),
      series(`limit, ${figure(at.limit.rceSatOhm, 'Ohm')}`, limit, { tone: 3, dash: 'dashed' }),
      { ...loadLine(at, [0, toV]), labelled: null },
    ],
    points: [operatingPoint(at)],
  };
}

/** What the curves say at the load line, in words. */
export function outputWords(at: CurvesAtCorner): readonly string[] {
  const { expected, limit, roOhm, earlyV, earlyOrigin } = at;
  const usual = earlyOrigin === 'usual' ? ', a usual figure' : '';
  const slope = limit.saturated ? 'RCE(sat)' : 'reciprocal slope';
  const limitSlope =
    limit.saturated && limit.rceSatOhm > 0 ? `, limit line ${figure(limit.rceSatOhm, 'Ohm')}` : '';
  return [
    `Expected on this load line: VCE ${voltText(expected.vceV)}, IC ${figure(expected.icA, 'A')}, ${slope} ${figure(expected.slopeOhm, 'Ohm')}${limitSlope}.`,
    `ro = VA/IC = ${figure(roOhm, 'Ohm')} in the active region (VA ${formatQuantity(earlyV, 'V')}${usual}).`,
  ];
}
