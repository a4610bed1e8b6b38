import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { nominalFigures } from '../../../shared/checks/corner-figures.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import type { Load } from '../../../shared/stage/load.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { SampleRun } from '../../../shared/statistics/monte-carlo.ts';
import { highSideStage, relayStage, RELAY_FILE, TYPE_2N3904 } from '../relay-stage.ts';

const SEED = 20261201;
const runs = (numRuns: number) => ({ seed: SEED, numRuns });

/** The limit figures of a stage by criterion. */
function limitFigures(input: StageInput): (id: string) => number {
  const { criteria } = evaluateStage(input);
  return (id) => criteria.find((each) => each.id === id)?.value ?? NaN;
}

/** Room for the last digits where a drawn point falls on a corner itself. */
const DIGITS = 1 + 1e-9;

const withRb = (valueOhm: number) => ({ ...RELAY_FILE.baseResistor, valueOhm });

/** A Darlington of small size at a fitting load. */
const DARLINGTON = {
  topology: 'low-side-darlington',
  drive: { ...RELAY_FILE.drive, railV: { min: 4.75, max: 5.25 } },
  baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 2200 },
  transistor: {
    ...TYPE_2N3904,
    darlington: true,
    limits: { ...TYPE_2N3904.limits, icA: 0.5, powerW: 2 },
    thermal: { rthJaKPerW: 62.5 },
    gain: [
      { icA: 0.01, vceV: 5, min: 5000 },
      { icA: 0.3, vceV: 5, min: 10_000 },
    ],
    saturation: [{ icA: 0.1, ibA: 1e-4, maxV: 1.5 }],
    baseEmitter: [{ icA: 0.1, ibA: 1e-4, minV: 1.2, maxV: 2 }],
  },
};

/** Base resistors that keep the relay stage saturated at every corner. */
const saturatingOhm = fc.double({ min: 250, max: 2500, noNaN: true });

describe('limit figures', { timeout: 120_000 }, () => {
  it('lose overdrive and gain forced β with a larger RB', () => {
    fc.assert(
      fc.property(saturatingOhm, fc.double({ min: 1.01, max: 2, noNaN: true }), (rb, more) => {
        const small = limitFigures(relayStage({ baseResistor: withRb(rb) }));
        const large = limitFigures(relayStage({ baseResistor: withRb(rb * more) }));
        expect(large('overdrive-factor')).toBeLessThan(small('overdrive-factor'));
        expect(large('forced-beta')).toBeGreaterThan(small('forced-beta'));
        expect(large('drive-current')).toBeLessThan(small('drive-current'));
        expect(large('release-time')).toBe(small('release-time'));
      }),
      runs(40),
    );
  });

  it('rise in collector current and peak voltage with the supply', () => {
    fc.assert(
      fc.property(fc.double({ min: 15, max: 30, noNaN: true }), (max) => {
        const low = limitFigures(relayStage({ supplyV: { min: 12, max } }));
        const high = limitFigures(relayStage({ supplyV: { min: 12, max: max + 1 } }));
        for (const id of ['collector-current', 'peak-collector-voltage', 'forced-beta']) {
          expect(high(id), id).toBeGreaterThan(low(id));
        }
      }),
      runs(40),
    );
  });

  it('get worse, never better, with a wider ambient', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 20, noNaN: true }),
        fc.double({ min: 25, max: 100, noNaN: true }),
        fc.double({ min: 1, max: 20, noNaN: true }),
        (min, max, wider) => {
          const narrow = limitFigures(relayStage({ ambientDegC: { min, max } }));
          const wide = limitFigures(
            relayStage({ ambientDegC: { min: min - wider, max: max + wider } }),
          );
          expect(wide('overdrive-factor')).toBeLessThan(narrow('overdrive-factor'));
          for (const id of ['junction-temperature', 'off-base-voltage', 'saturation-voltage']) {
            expect(wide(id), id).toBeGreaterThan(narrow(id));
          }
        },
      ),
      runs(40),
    );
  });

  it('do not change when every impedance grows and every current shrinks by the same factor', () => {
    const scaled = (k: number) =>
      relayStage({
        drive: {
          ...RELAY_FILE.drive,
          high: { dropV: 0.6, currentA: 0.008 / k },
          low: { levelV: 0.4, currentA: 0.008 / k, unloadedV: 0.1 },
          sourceLimitA: 0.02 / k,
          sinkLimitA: 0.02 / k,
        },
        load: { ...RELAY_FILE.load, resistanceOhm: 1440 * k, inductanceH: 4 * k },
        baseResistor: { valueOhm: 1000 * k, tolerance: 0.05, ratingW: 0.1 / k },
        shuntResistor: { valueOhm: 22000 * k, tolerance: 0.05, ratingW: 0.1 / k },
        clamp: { ...RELAY_FILE.clamp, currentRatingA: 0.2 / k },
        transistor: {
          ...TYPE_2N3904,
          limits: { ...TYPE_2N3904.limits, icA: 0.2 / k, powerW: 0.625 / k },
          thermal: { rthJaKPerW: 200 * k },
          gain: TYPE_2N3904.gain.map((row) => ({ ...row, icA: row.icA / k })),
          saturation: TYPE_2N3904.saturation.map((row) => ({
            ...row,
            icA: row.icA / k,
            ibA: row.ibA / k,
          })),
          baseEmitter: TYPE_2N3904.baseEmitter.map((row) => ({
            ...row,
            icA: row.icA / k,
            ibA: row.ibA / k,
          })),
          leakage: [{ kind: 'icex', currentA: 5e-8 / k }],
        },
      });
    const plain = evaluateStage(scaled(1));
    fc.assert(
      fc.property(fc.double({ min: 0.2, max: 8, noNaN: true }), (k) => {
        const other = evaluateStage(scaled(k));
        for (const { id, value: before, unit } of plain.criteria) {
          if (unit === 'A' || unit === 'W') continue;
          const after = other.criteria.find((each) => each.id === id)?.value ?? NaN;
          expect(after, id).toBeCloseTo(before ?? NaN, 6);
        }
      }),
      runs(30),
    );
  });

  it('enclose 10 000 points drawn inside the tolerance box of an always-saturated stage', () => {
    const stage = relayStage({ baseResistor: withRb(620) });
    const limit = limitFigures(stage);
    const share = fc.double({ min: -1, max: 1, noNaN: true });
    const end = (middle: number, spread: number, at: number) => middle * (1 + spread * at);
    fc.assert(
      fc.property(fc.array(share, { minLength: 6, maxLength: 6 }), (at) => {
        const [vs = 0, ta = 0, rail = 0, rb = 0, rbe = 0, coil = 0] = at;
        const supply = 24 + 2.4 * vs;
        const ambient = 20 + 40 * ta;
        const logic = 3.3 + 0.3 * rail;
        const figures = nominalFigures({
          ...stage,
          supplyV: { ...stage.supplyV, min: supply, max: supply },
          ambientDegC: { min: ambient, max: ambient },
          drive: { ...stage.drive, railV: { min: logic, max: logic } },
          load: { ...stage.load, resistanceOhm: end(1440, 0.1, coil), tolerance: 0 } as Load,
          baseResistor: { ...withRb(end(620, 0.05, rb)), tolerance: 0 },
          shuntResistor: { valueOhm: end(22000, 0.05, rbe), tolerance: 0, ratingW: 0.1 },
        });
        expect(figures.overdriveFactor * DIGITS).toBeGreaterThanOrEqual(limit('overdrive-factor'));
        expect(figures.forcedBeta).toBeLessThanOrEqual(limit('forced-beta') * DIGITS);
        expect(figures.icA).toBeLessThanOrEqual(limit('collector-current') * DIGITS);
        expect(figures.driveA).toBeLessThanOrEqual(limit('drive-current') * DIGITS);
        expect(figures.vceV).toBeLessThanOrEqual(limit('saturation-voltage') * DIGITS);
        expect(figures.tjDegC).toBeLessThanOrEqual(limit('junction-temperature') * DIGITS);
      }),
      runs(10_000),
    );
  });

  it('enclose 10 000 drawn specimens: gain, VBE and VCE(sat) too, expected figures throughout', () => {
    const resistor = { kind: 'resistor', resistanceOhm: 1500, tolerance: 0.05 };
    const stages = [
      relayStage({ baseResistor: withRb(620) }),
      relayStage({ baseResistor: withRb(620), load: resistor, clamp: null }),
      highSideStage(),
      relayStage({ ...DARLINGTON, load: { ...resistor, resistanceOhm: 120 }, clamp: null }),
    ];
    for (const stage of stages) {
      const limit = limitFigures(stage);
      expect(limit('overdrive-factor')).toBeGreaterThan(1);
      const run = new SampleRun(stage, { samples: 10_000, seed: SEED });
      while (run.step());
      const { samples, figures } = run.share();
      expect(samples).toBe(10_000);
      const { overdriveFactor, icA, vceSatV, powerW, tjDegC } = figures;
      expect(Math.min(...overdriveFactor)).toBeGreaterThanOrEqual(limit('overdrive-factor'));
      expect(Math.max(...icA)).toBeLessThanOrEqual(limit('collector-current'));
      expect(Math.max(...vceSatV)).toBeLessThanOrEqual(limit('saturation-voltage'));
      expect(Math.max(...powerW)).toBeLessThanOrEqual(limit('dissipation'));
      expect(Math.max(...tjDegC)).toBeLessThanOrEqual(limit('junction-temperature'));
    }
  });
});

describe('sizing', { timeout: 120_000 }, () => {
  it('recommends what then passes: size, then check, over drawn stages', () => {
    let sized = 0;
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 36, noNaN: true }),
        fc.double({ min: 0.002, max: 0.06, noNaN: true }),
        fc.double({ min: 2.5, max: 12, noNaN: true }),
        fc.double({ min: 0.004, max: 0.03, noNaN: true }),
        fc.boolean(),
        (supply, loadA, rail, pinA, guaranteedOnly) => {
          const input = relayStage({
            supplyV: { min: supply * 0.95, max: supply * 1.05 },
            load: { kind: 'resistor', resistanceOhm: supply / loadA, tolerance: 0.05 },
            clamp: null,
            drive: {
              ...RELAY_FILE.drive,
              railV: { min: rail * 0.95, max: rail * 1.05 },
              high: { dropV: 0.6, currentA: pinA / 2 },
              sourceLimitA: pinA,
            },
            baseResistor: withRb(1000),
            policy: { name: 'General practice', guaranteedOnly },
          });
          const { recommendedOhm, candidates, rbMinOhm, rbMaxOhm } = sizeStage(input);
          if (recommendedOhm === null) return;
          sized++;
          expect(recommendedOhm).toBeGreaterThanOrEqual(rbMinOhm ?? Infinity);
          expect(recommendedOhm).toBeLessThanOrEqual(rbMaxOhm ?? 0);
          const chosen = candidates.find(({ valueOhm }) => valueOhm === recommendedOhm);
          const { criteria } = evaluateStage({ ...input, baseResistor: withRb(recommendedOhm) });
          const deciding = ['overdrive-factor', 'forced-beta', 'drive-current', 'rb-dissipation'];
          for (const { id, status, margin } of criteria) {
            if (!deciding.includes(id)) continue;
            expect(['pass', 'marginal'], id).toContain(status);
            expect(margin ?? NaN, id).toBeGreaterThanOrEqual((chosen?.margin ?? NaN) - 1e-9);
          }
        },
      ),
      runs(80),
    );
    expect(sized).toBeGreaterThan(20);
  });
});
