import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { runMonteCarlo } from '../../../shared/statistics/monte-carlo.ts';
import { Drawing } from '../../../shared/statistics/quantities.ts';
import { sampledStage } from '../../../shared/statistics/sampled-stage.ts';
import { sensitivityOf } from '../../../shared/statistics/sensitivity.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { HIGH_SIDE_FILE, RELAY_FILE } from '../relay-stage.ts';

const LOADS = {
  coil: RELAY_FILE.load,
  resistor: { kind: 'resistor', resistanceOhm: 1440, tolerance: 0.1 },
  'led-string': {
    kind: 'led-string',
    count: 3,
    forwardV: { min: 1.8, max: 2.4 },
    resistanceOhm: 1000,
    tolerance: 0.05,
    maximumA: 0.03,
    minimumA: 0.01,
  },
  lamp: { kind: 'lamp', nominalV: 24, currentA: 0.02, coldRatio: 12 },
};

const PRE_BIASED = {
  r1Ohm: 4700,
  r2Ohm: 1e4,
  input: { onV: 2.5, onOutputA: 0.02, offV: 0.3, currentA: 1e-3, testV: 5, gi: 50, maximumV: 20 },
};

/** A stage of every topology, and of every load on the plain one. */
const STAGES: Record<string, unknown> = {
  ...Object.fromEntries(
    Object.entries(LOADS).map(([kind, load]) => [`low-side-npn, ${kind}`, { ...RELAY_FILE, load }]),
  ),
  'low-side-npn, switching': { ...RELAY_FILE, frequencyHz: 1000, duty: 0.5 },
  'high-side-pnp': HIGH_SIDE_FILE,
  'two-transistor-high-side': {
    ...RELAY_FILE,
    topology: 'two-transistor-high-side',
    transistor: HIGH_SIDE_FILE.transistor,
    baseResistor: { valueOhm: 6200, tolerance: 0.05, ratingW: 0.5 },
    preDriver: {
      transistor: RELAY_FILE.transistor,
      baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
      shuntResistor: null,
    },
  },
  'low-side-darlington': {
    ...RELAY_FILE,
    topology: 'low-side-darlington',
    transistor: { ...RELAY_FILE.transistor, darlington: true },
  },
  'low-side-pre-biased': {
    ...RELAY_FILE,
    topology: 'low-side-pre-biased',
    transistor: { ...RELAY_FILE.transistor, internal: PRE_BIASED },
  },
  'low-side-pre-biased by its gain': {
    ...RELAY_FILE,
    topology: 'low-side-pre-biased',
    transistor: { ...RELAY_FILE.transistor, internal: { ...PRE_BIASED, input: null } },
  },
  'level-translator': {
    ...RELAY_FILE,
    topology: 'level-translator',
    supplyV: { min: 4.5, max: 5.5 },
    load: {
      kind: 'logic-input',
      pullUpOhm: 4700,
      tolerance: 0.05,
      ratingW: 0.1,
      count: 2,
      vilV: 0.8,
      vihV: 2,
      leakageA: 1e-6,
      lowCurrentA: 4e-4,
      capacitanceF: 1e-11,
      wiringF: 1e-11,
      riseTimeLimitSec: 1e-6,
    },
  },
};

describe.each(Object.entries(STAGES))('%s', (_, document) => {
  const input = StageInput.parse(document);
  const { criteria, nominal } = evaluateStage(input);

  it('gives each sample the figures it has by itself, whatever was judged before', () => {
    const { draws } = drawn(input);
    const reused = sampledStage(input, criteria);
    reused.take(draws);
    for (let k = 0; k < 200; k++) {
      const met = reused.judge(draws, k);
      const fresh = sampledStage(input, criteria);
      fresh.take(draws);
      expect(fresh.judge(draws, k)).toBe(met);
      for (const figure of ['overdrive', 'vceV', 'icA', 'powerW', 'tjDegC'] as const) {
        expect(reused.point[figure]).toBe(fresh.point[figure]);
      }
    }
  });

  it('spreads around the nominal figures and answers to its inputs, without a NaN', () => {
    const found = runMonteCarlo(input, { samples: 3000, seed: 9 });
    const text = JSON.stringify([found, sensitivityOf(input)]);
    expect(JSON.parse(text)).toEqual([found, sensitivityOf(input)]);
    expect(found?.yield).toBeGreaterThanOrEqual(0);
    const [low, middle, high] = found?.percentiles.icA ?? [];
    expect(low).toBeLessThanOrEqual(middle ?? NaN);
    expect(high).toBeGreaterThanOrEqual(middle ?? NaN);
    expect(Math.abs((middle ?? NaN) / (nominal.icA ?? NaN) - 1)).toBeLessThan(0.15);
  });
});

function drawn(input: StageInput): Drawing {
  const drawing = new Drawing(input, 3, 200);
  drawing.fill(0);
  return drawing;
}
