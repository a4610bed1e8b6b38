import { evaluateStage } from '../../../../shared/checks/evaluate-stage.ts';
import {
  leastMargins,
  marginOverTemperature,
} from '../../../../shared/checks/margin-over-temperature.ts';
import { curvesAtCorner, saturationAtCorner } from '../../../../shared/checks/stage-curves.ts';
import type { PlotModel } from '../../charts/chart-model.ts';
import { chartTable } from '../../charts/chart-table.ts';
import { shownCorner } from '../shown-corner.ts';
import { relaySample } from '../testing/relay-sample.ts';
import { marginChart, marginCount } from './margin-chart.ts';
import { kneeChart, outputChart, outputWords } from './output-charts.ts';
import { gainOfStage, gainOverTemperatureOfStage, saturationOfStage } from './part-charts.ts';

const stage = relaySample();
const evaluation = evaluateStage(stage);
const at = (criterion: string) => {
  const curves = curvesAtCorner(stage, shownCorner(evaluation, criterion));
  if (curves === null) throw new Error('nothing to draw');
  return curves;
};
const saturation = (criterion: string) => {
  const found = saturationAtCorner(at(criterion));
  if (found === null) throw new Error('no rows');
  return found;
};
const labels = ({ series }: PlotModel) => series.map(({ label }) => label);
const marked = (chart: PlotModel) => chartTable(chart).marks.map(({ label }) => label);

describe('charts of a stage', () => {
  // At supply high, cold, weak pin: IB 2.71 mA, VCE 0.235 V, IC 24.0 mA, load 1440 Ω less 10 % at −20 °C.
  it('draw the output characteristics at the corner shown', () => {
    const chart = outputChart(at('overdrive-factor'), 'current');
    expect(labels(chart)).toEqual([
      '150\u00a0µA',
      '120\u00a0µA',
      '90\u00a0µA',
      '60\u00a0µA',
      '30\u00a0µA',
      'IB 2.71\u00a0mA',
      'load line, 1.09\u00a0kΩ',
    ]);
    expect(marked(chart)).toEqual(['0.235\u00a0V, 24.0\u00a0mA']);
    const line = chart.series.at(-1)!.points;
    expect(line[0]![1]).toBeCloseTo(0.0242, 4);
    expect(line[1]).toEqual([26.4, 0]);
  });

  it('hold the base voltage on request', () => {
    const names = labels(outputChart(at('overdrive-factor'), 'voltage'));
    expect(names.at(-2)).toMatch(/^VBE 0\.\d{3}\u00a0V$/);
    expect(names.slice(0, 5).every((name) => /^0\.\d{3}\u00a0V$/.test(name))).toBe(true);
  });

  it('lay limit and expected side by side at the foot of the curves', () => {
    const chart = kneeChart(at('overdrive-factor'), saturation('overdrive-factor'));
    expect(labels(chart!)).toEqual(['expected', 'limit, 2.50\u00a0Ω', 'load line, 1.09\u00a0kΩ']);
    expect(kneeChart(at('overdrive-factor'), null)).toBeNull();
    expect(outputWords(at('overdrive-factor')).join(' ')).toMatch(
      /RCE\(sat\) [\d.]+\u00a0Ω, limit line 2\.50\u00a0Ω\..*VA 75\u00a0V, a usual figure/,
    );
  });

  it('show the sheet’s VCE(sat) line with its slope, and the corner’s where it is another', () => {
    const cold = saturationOfStage(at('overdrive-factor'), saturation('overdrive-factor'), null);
    expect(cold.slopes?.[0]?.label).toBe('RCE(sat) 2.50\u00a0Ω');
    expect(labels(cold).some((label) => label.startsWith('limit, IC/IB 8.9'))).toBe(false);
    const hot = saturationOfStage(at('saturation-voltage'), saturation('saturation-voltage'), 0.3);
    expect(labels(hot).some((label) => /^limit, IC\/IB .*, \d+.*°C$/.test(label))).toBe(true);
    expect(hot.rules).toEqual([
      { axis: 'y', value: 0.3, label: 'limit 0.300\u00a0V', tone: 'limit' },
    ]);
  });

  it('show the gain with what the stage asks of it', () => {
    const chart = gainOfStage(at('overdrive-factor'))!;
    expect(labels(chart)).toContain('min, −20\u00a0°C');
    expect(marked(chart)).toEqual(['forced β 8.90', 'IC 24.2\u00a0mA']);
    const over = gainOverTemperatureOfStage(at('overdrive-factor'))!;
    expect(over.x).toMatchObject({ quantity: 'TJ', from: -20, to: 60, exact: true });
  });

  it('mark the worst of each margin over temperature, the least of all being the verdict’s', () => {
    const least = leastMargins(evaluation.criteria, 3);
    const ids = least.map(({ id }) => id);
    const chart = marginChart([...marginOverTemperature(stage, ids)], ids, 0.1);
    expect(labels(chart)).toEqual(['coil voltage', 'forced β', 'peak VCE']);
    expect(chart.points).toHaveLength(3);
    expect(chart.points?.[0]?.label).toBe('2.9\u00a0%');
    expect(chart.points?.[0]?.y).toBeCloseTo(least[0]?.margin ?? NaN, 9);
    expect(marginCount(3, 17)).toBe('three least of 17');
  });
});
