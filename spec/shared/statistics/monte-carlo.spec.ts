import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import {
  runMonteCarlo,
  type SampleRequest,
  SampleRun,
  type SampleSpread,
  spreadOf,
} from '../../../shared/statistics/monte-carlo.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { RELAY_FILE, relayStage, TYPE_2N3904 } from '../relay-stage.ts';

function spread(input: StageInput, samples = 200_000, seed = 7): SampleSpread {
  const found = runMonteCarlo(input, { samples, seed });
  if (found === null) throw new Error('cancelled');
  return found;
}

/** The relay stage with nothing left to chance: one supply, ambient and rail, exact resistors, an ideal output. */
const EXACT = {
  ...RELAY_FILE,
  supplyV: { min: 24, max: 24 },
  ambientDegC: { min: 25, max: 25 },
  drive: {
    ...RELAY_FILE.drive,
    railV: { min: 3.3, max: 3.3 },
    high: { dropV: 0, currentA: 0.008 },
  },
  load: { kind: 'resistor', resistanceOhm: 1000, tolerance: 0 },
  baseResistor: { valueOhm: 1000, tolerance: 0, ratingW: 0.1 },
  shuntResistor: null,
  clamp: { kind: 'none' },
} as const;

/** hFE between 100 and 300 at every current, everything else printed without spread. */
const SPREADING_GAIN = {
  ...TYPE_2N3904,
  thermal: { rthJaKPerW: 1e-9 },
  limits: { ...TYPE_2N3904.limits, powerW: 1e5 },
  gain: [
    { icA: 1e-4, vceV: 1, min: 100, max: 300 },
    { icA: 0.2, vceV: 1, min: 100, max: 300 },
  ],
  saturation: [{ icA: 0.2, ibA: 0.02, typV: 0.1, maxV: 0.1 }],
  baseEmitter: [{ icA: 0.05, ibA: 0.005, typV: 0.8, maxV: 0.8 }],
};

describe('samples', () => {
  const request: SampleRequest = { samples: 20_500, seed: 42 };

  it('are the same for the same seed, and others for another', () => {
    const once = spread(relayStage(), 5000, 3);
    expect(spread(relayStage(), 5000, 3)).toEqual(once);
    expect(spread(relayStage(), 5000, 4).percentiles).not.toEqual(once.percentiles);
  });

  it.each([2, 3, 7, 64])('are the same shared out to %i workers', (workers) => {
    const shares = Array.from({ length: workers }, (_, index) => {
      const run = new SampleRun(relayStage(), request, index, workers);
      while (run.step());
      return run.share();
    });
    expect(shares.reduce((sum, share) => sum + share.samples, 0)).toBe(request.samples);
    expect(spreadOf(request, shares)).toEqual(runMonteCarlo(relayStage(), request));
  });

  it('tell how far they are and stop when asked to', () => {
    const told: number[] = [];
    const stopped = runMonteCarlo(relayStage(), request, (samples) => {
      told.push(samples);
      return samples < 3000;
    });
    expect(stopped).toBeNull();
    expect(told).toEqual([1024, 2048, 3072]);
  });

  it('leave a resistor where it was drawn when another part of the stage is changed', () => {
    const one = spread(relayStage({ ...EXACT, load: { ...EXACT.load, tolerance: 0.1 } }), 5000);
    const changed = { ...EXACT, load: { ...EXACT.load, tolerance: 0.1 }, shuntResistor: null };
    const other = spread(
      relayStage({ ...changed, baseResistor: { valueOhm: 900, tolerance: 0.01, ratingW: 0.1 } }),
      5000,
    );
    for (const k of [0, 1, 2] as const) {
      // What is left of a difference is the VCE(sat) of another base current.
      const ratio = (other.percentiles.icA[k] ?? NaN) / (one.percentiles.icA[k] ?? NaN);
      expect(Math.abs(ratio - 1)).toBeLessThan(5e-4);
    }
  });
});

describe('a stage with nothing left to chance', () => {
  it('gives one value for each figure, by hand: IB = (3.3 − 0.8) V/1 kΩ, IC = (24 V − VCE)/1 kΩ', () => {
    const part = {
      ...SPREADING_GAIN,
      gain: SPREADING_GAIN.gain.map((row) => ({ ...row, min: 150, max: 150 })),
      baseEmitter: [{ icA: 0.024, ibA: 0.0024, typV: 0.8, maxV: 0.8 }],
    };
    const found = spread(relayStage({ ...EXACT, transistor: part }), 3000);
    for (const k of [0, 1, 2] as const) {
      const vceSatV = found.percentiles.vceSatV[k] ?? NaN;
      expect(found.percentiles.overdriveFactor[k]).toBeCloseTo((150 * 0.0025) / 0.024, 5);
      expect(found.percentiles.icA[k]).toBeCloseTo((24 - vceSatV) / 1000, 9);
      expect(found.percentiles.powerW[k]).toBeCloseTo(
        (vceSatV * (24 - vceSatV)) / 1000 + 0.8 * 0.0025,
        6,
      );
    }
    expect(found.histograms.overdriveFactor).toBeNull();
  });
});

describe('yield', () => {
  it('is the share of a uniform supply below a limit it alone decides', () => {
    const { gain, ...rest } = TYPE_2N3904;
    const input = relayStage({
      ...EXACT,
      supplyV: { min: 20, max: 30 },
      transistor: { ...rest, gain, limits: { ...TYPE_2N3904.limits, vceoV: 27 / 0.8 } },
      policy: { name: 'General practice', forcedBeta: 1000, guaranteedOnly: false },
    });
    const found = spread(input);
    expect(Object.keys(found.missed)).toEqual(['off-collector-voltage']);
    expect(found.missed['off-collector-voltage']).toBeCloseTo(1 - (found.yield ?? NaN), 12);
    expect(found.yield).toBeCloseTo(0.7, 2);
  });

  // 1 σ of a normal distribution cut at 3 σ: (0.15866 − 0.00135)/0.9973 lie below −1 σ (NIST/SEMATECH e-Handbook, 1.3.6.7.1).
  it('of an overdrive limit at −1 σ of a log-normal hFE is 0.8423', () => {
    const sigma = Math.log(3) / 6;
    const middle = (Math.sqrt(100 * 300) * 0.0025) / 0.024;
    const input = relayStage({
      ...EXACT,
      transistor: {
        ...SPREADING_GAIN,
        baseEmitter: [{ icA: 0.024, ibA: 0.0024, typV: 0.8, maxV: 0.8 }],
      },
      policy: {
        name: 'General practice',
        guaranteedOnly: false,
        overdriveFactor: middle * Math.exp(-sigma),
      },
    });
    const found = spread(input, 400_000);
    expect(found.yield).toBeCloseTo(0.8423, 2);
    expect(Math.abs((found.yield ?? NaN) - 0.8423)).toBeLessThan(0.0024);
    const [low, median, high] = found.percentiles.overdriveFactor.map((each) => each ?? NaN);
    expect(median).toBeCloseTo(middle, 1);
    // ±3 σ stand at 100 and 300: nothing lies beyond.
    expect(low).toBeGreaterThan(100 * (0.0025 / 0.024));
    expect(high).toBeLessThan(300 * (0.0025 / 0.024));
    expect(((low ?? NaN) * (high ?? NaN)) / (middle * middle)).toBeCloseTo(1, 1);
  });

  it('is 1 for a stage that passes everywhere by far, 0 for one that fails everywhere', () => {
    const wide = { name: 'General practice', guaranteedOnly: false, overdriveFactor: 1 };
    expect(spread(relayStage({ policy: wide }), 3000).yield).toBe(1);
    expect(spread(relayStage({ clamp: { kind: 'none' } }), 3000).yield).toBe(0);
  });

  it('asks nothing of a criterion that has no limit or no value, nor of the tested range', () => {
    const input = relayStage({
      transistor: { ...TYPE_2N3904, leakage: [], limits: { ...TYPE_2N3904.limits, vceoV: null } },
      drive: { ...RELAY_FILE.drive, high: { dropV: 0.6, currentA: 1e-4 }, sourceLimitA: null },
      policy: { name: 'General practice', guaranteedOnly: false },
    });
    const open = evaluateStage(input).criteria.filter(({ status }) => status === 'open');
    expect(open.map(({ id }) => id)).toContain('off-collector-current');
    expect(spread(input, 3000).missed).not.toHaveProperty('tested-range');
    expect(spread(input, 3000).missed).not.toHaveProperty('off-collector-current');
  });
});

describe('what cannot be computed', () => {
  it('is null: everything without base resistor, single figures without their rows', () => {
    const nothing = spread(
      relayStage({ baseResistor: { valueOhm: null, tolerance: 0.05, ratingW: null } }),
      2000,
    );
    expect(nothing.yield).toBeNull();
    expect(nothing.percentiles.icA).toEqual([null, null, null]);
    const bare = spread(
      relayStage({ transistor: { ...TYPE_2N3904, gain: [], saturation: [] } }),
      2000,
    );
    expect(bare.percentiles.overdriveFactor).toEqual([null, null, null]);
    expect(bare.percentiles.tjDegC).toEqual([null, null, null]);
    expect(bare.percentiles.icA[1]).toBeGreaterThan(0);
  });
});

// A separate calculation of the same rules, vectorised in numpy: spec/shared/statistics/relay-spread.py, 4 million samples.
describe('the relay driver with 1 kΩ', () => {
  const NUMPY = {
    overdriveFactor: [9.127, 22.69, 54.4],
    vceSatV: [0.08549, 0.14661, 0.21756],
    icA: [0.011796, 0.015371, 0.020255],
    powerW: [0.0030206, 0.0041284, 0.0054629],
    tjDegC: [-19.029, 20.825, 60.683],
  };

  it('spreads as the separate calculation says', { timeout: 60_000 }, () => {
    const found = spread(relayStage(), 1_000_000);
    expect(found.yield).toBeCloseTo(0.99955, 3);
    for (const [name, wanted] of Object.entries(NUMPY)) {
      const given = found.percentiles[name as keyof typeof NUMPY];
      wanted.forEach((value, k) => {
        const room = name === 'tjDegC' ? 0.3 : Math.abs(value) * 0.005;
        expect(Math.abs((given[k] ?? NaN) - value), `${name} ${k}`).toBeLessThan(room);
      });
    }
  });
});
