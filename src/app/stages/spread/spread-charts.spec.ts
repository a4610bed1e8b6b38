import { evaluateStage } from '../../../../shared/checks/evaluate-stage.ts';
import { runMonteCarlo } from '../../../../shared/statistics/monte-carlo.ts';
import { StageInput } from '../../../../shared/stage/stage-input.ts';
import { sensitivityOf } from '../../../../shared/statistics/sensitivity.ts';
import { sensitivityChart, spreadChart } from './spread-charts.ts';

/** A pilot relay on 2N3904 by onsemi 2N3903/D, Rev. 9. */
const stage = StageInput.parse({
  format: 'sinkwell-stage/1',
  reference: 'Q12',
  title: 'Pilot relay',
  topology: 'low-side-npn',
  supplyV: { min: 21.6, max: 26.4 },
  ambientDegC: { min: -20, max: 60 },
  drive: {
    kind: 'push-pull',
    railV: { min: 3, max: 3.6 },
    high: { dropV: 0.6, currentA: 0.008 },
    low: { levelV: 0.4, currentA: 0.008, unloadedV: 0.1 },
    sourceLimitA: 0.02,
    sinkLimitA: 0.02,
  },
  load: { kind: 'resistor', resistanceOhm: 1440, tolerance: 0.1 },
  baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: 0.1 },
  transistor: {
    partNumber: '2N3904',
    polarity: 'npn',
    limits: { vceoV: 40, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
    thermal: { rthJaKPerW: 200 },
    gain: [
      { icA: 0.01, vceV: 1, min: 100, max: 300 },
      { icA: 0.05, vceV: 1, min: 60 },
    ],
    saturation: [
      { icA: 0.01, ibA: 0.001, maxV: 0.2 },
      { icA: 0.05, ibA: 0.005, maxV: 0.3 },
    ],
    baseEmitter: [
      { icA: 0.01, ibA: 0.001, minV: 0.65, maxV: 0.85 },
      { icA: 0.05, ibA: 0.005, maxV: 0.95 },
    ],
  },
  policy: { name: 'General practice' },
});
const { criteria } = evaluateStage(stage);
const criterion = (id: string) => criteria.find((each) => each.id === id);

describe('the spread of a figure', () => {
  const spread = runMonteCarlo(stage, { samples: 20_000, seed: 1 });
  if (spread === null) throw new Error('cancelled');

  it('holds every sample, the limit, the worst corner and the percentiles', () => {
    const drawn = spreadChart(spread, 'overdriveFactor', criterion('overdrive-factor'));
    const bins = drawn?.chart.bins ?? [];
    expect(bins.reduce((sum, { value }) => sum + value, 0)).toBeCloseTo(1, 9);
    expect(drawn?.chart.rules?.map(({ label }) => label)).toEqual([
      'limit 2',
      `worst corner ${(criterion('overdrive-factor')?.value ?? NaN).toPrecision(3)}`,
    ]);
    expect(drawn?.chart.points?.map(({ x }) => x)).toEqual(spread.percentiles.overdriveFactor);
    expect(drawn?.chart.x.from).toBe(0);
    expect(drawn?.beyond).toEqual([]);
  });

  it('says a far limit in words instead of squeezing the bars', () => {
    const drawn = spreadChart(spread, 'icA', criterion('collector-current'));
    expect(drawn?.beyond).toEqual(['limit 160\u00a0mA']);
    expect(drawn?.chart.x.to).toBeLessThan(0.05);
  });

  it('is not drawn where nothing spreads', () => {
    const histograms = { ...spread.histograms, vceSatV: null };
    expect(spreadChart({ ...spread, histograms }, 'vceSatV', undefined)).toBeNull();
  });
});

describe('sensitivity bars', () => {
  it('show the strongest inputs first, in per cent of the figure', () => {
    const bars = sensitivityChart(sensitivityOf(stage), 'overdriveFactor');
    const sizes = bars?.rows.map(({ value }) => Math.abs(value)) ?? [];
    expect(sizes).toEqual([...sizes].sort((a, b) => b - a));
    expect(bars?.rows.find(({ label }) => label === 'Gain hFE')?.value).toBeCloseTo(0.01, 6);
  });
});
