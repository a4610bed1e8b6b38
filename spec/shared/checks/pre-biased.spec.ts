import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import { RELAY_FILE, relayStage } from '../relay-stage.ts';

type Changes = Parameters<typeof relayStage>[0];

/** A 4.7 kΩ / 10 kΩ part with VI(on) 2.5 V at 20 mA, VI(off) 0.3 V, as such data sheets print it. */
const transistor = {
  partNumber: '4k7/10k',
  polarity: 'npn',
  limits: { vceoV: 50, veboV: 7, icA: 0.1, powerW: 0.25, tjMaxDegC: 150 },
  thermal: { rthJaKPerW: 500 },
  gain: [{ icA: 0.01, vceV: 5, min: 50 }],
  saturation: [{ icA: 0.01, ibA: 0.0005, maxV: 0.1 }],
  baseEmitter: [],
  leakage: [
    { kind: 'icbo', currentA: 1e-7, tempDegC: 25 },
    { kind: 'iceo', currentA: 1e-6, tempDegC: 25 },
  ],
  internal: {
    r1Ohm: 4700,
    r2Ohm: 10_000,
    input: { onV: 2.5, onOutputA: 0.02, offV: 0.3, maximumV: 20 },
  },
};

function judged(changes: Changes = {}, part: object = transistor) {
  const evaluation = evaluateStage(
    relayStage({
      topology: 'low-side-pre-biased',
      supplyV: { min: 11.4, max: 12.6 },
      load: { kind: 'resistor', resistanceOhm: 1000, tolerance: 0.05 },
      clamp: null,
      shuntResistor: null,
      baseResistor: { valueOhm: 10, tolerance: 0.05, ratingW: 0.1 },
      drive: { ...RELAY_FILE.drive, low: { levelV: 0.2, currentA: 0.008 } },
      transistor: part,
      ...changes,
    }),
  );
  return {
    evaluation,
    criterion: (id: string) => evaluation.criteria.find((each) => each.id === id),
  };
}

describe('pre-biased part with a printed VI(on)', () => {
  it('is judged by its input voltage, not by overdrive or forced β', () => {
    const { criterion } = judged();
    expect(criterion('overdrive-factor')).toBeUndefined();
    expect(criterion('forced-beta')).toBeUndefined();
    expect(criterion('input-on')?.relation).toBe('>=');
  });

  it('states its input current as base current, for which such sheets print no limit', () => {
    // Strong output 3.6 V behind 9.5 Ω and the smallest R1, 4700 · 0.7.
    const { criterion } = judged();
    expect(criterion('base-current')).toMatchObject({ limit: null, status: 'stated' });
    expect(criterion('base-current')?.value).toBeCloseTo((3.6 - 0.55) / (9.5 + 3290), 9);
  });

  it('does without a resistor before it, and then judges none', () => {
    const bare = judged({ baseResistor: { valueOhm: 0, tolerance: 0 } });
    const small = judged();
    expect(bare.criterion('rb-dissipation')).toBeUndefined();
    for (const id of ['input-on', 'input-voltage', 'drive-current', 'dissipation']) {
      const [without, withTen] = [bare.criterion(id)?.value ?? NaN, small.criterion(id)?.value];
      expect(Math.abs(without / (withTen ?? NaN) - 1), id).toBeLessThan(0.01);
    }
    expect(bare.criterion('input-voltage')?.value).toBe(3.6);
    expect(() => relayStage({ baseResistor: { valueOhm: 0, tolerance: 0 } })).toThrow(
      /only a pre-biased part/,
    );
  });

  it('adds R1 and R2/R1 to the corners', () => {
    expect(judged().evaluation.corners).toBe(512 * 4);
    expect(judged().criterion('input-on')?.corner).toMatchObject({ r1: '-', ratio: '-' });
  });

  it('loses V_I across the output and RB with the input current of the smallest R1', () => {
    const seriesOhm = 75 + 10.5;
    const r1Ohm = 4700 * 0.7;
    const inputV = (3 * r1Ohm + 0.55 * seriesOhm) / (r1Ohm + seriesOhm);
    expect(judged().criterion('input-on')?.value).toBeCloseTo(inputV, 9);
  });

  it('asks for more in the cold: 0.75·a + (VI(on) − 0.75·a)·(298/T)^2.4 + a·2 mV/K', () => {
    const a = 1 + 1 / ((10_000 / 4700) * 0.8);
    const cold = 0.75 * a + (2.5 - 0.75 * a) * (298.15 / 253.15) ** 2.4 + a * 0.002 * 45;
    expect(judged().criterion('input-on')?.limit).toBeCloseTo(cold, 9);
  });

  it('takes the larger input current where the sheet tests one', () => {
    const input = { ...transistor.internal.input, currentA: 1.8e-3, testV: 5 };
    const part = { ...transistor, internal: { ...transistor.internal, input } };
    const inputV = 3 / (1 + (75 + 10.5) * (1.8e-3 / 5));
    expect(judged({}, part).criterion('input-on')?.value).toBeCloseTo(inputV, 9);
  });

  it('is open above the tested output current', () => {
    const input = { ...transistor.internal.input, onOutputA: 0.005, onV: 1.2, gi: 50 };
    const part = { ...transistor, internal: { ...transistor.internal, input } };
    expect(judged({}, part).criterion('input-on')?.status).toBe('open');
  });

  it('fails an output that cannot reach VI(on)', () => {
    const drive = { ...RELAY_FILE.drive, railV: { min: 2.7, max: 3.6 } };
    expect(judged({ drive }).criterion('input-on')?.status).toBe('fail');
  });

  it('cuts off from 0.55 V at a hundredth of its rating, whatever VBE row it prints', () => {
    const rows = [{ kind: 'on', icA: 0.01, ibA: 0.001, minV: 0.2, typV: null, maxV: 0.8 }];
    const printed = judged({}, { ...transistor, baseEmitter: rows });
    expect(printed.criterion('off-collector-current')?.value).toBe(
      judged().criterion('off-collector-current')?.value,
    );
  });

  it('holds the low level to VI(off) and the input to its maximum', () => {
    expect(judged().criterion('input-off')).toMatchObject({ value: 0.2, limit: 0.3 });
    const drive = { ...RELAY_FILE.drive, low: { levelV: 0.4, currentA: 0.008 } };
    expect(judged({ drive }).criterion('input-off')?.status).toBe('fail');
    expect(judged().criterion('input-voltage')).toMatchObject({ limit: 20, status: 'pass' });
  });

  it('is passed by an outer RB small enough', () => {
    const input = relayStage({
      topology: 'low-side-pre-biased',
      supplyV: { min: 11.4, max: 12.6 },
      load: { kind: 'resistor', resistanceOhm: 1500, tolerance: 0.05 },
      clamp: null,
      ambientDegC: { min: 10, max: 50 },
      transistor,
    });
    const sizing = sizeStage(input);
    expect(sizing.rbMinOhm).toBe(10);
    expect(sizing.setBy.max).toBe('input-on');
  });
});

describe('pre-biased part with gain figures only', () => {
  const internal = { r1Ohm: 4700, r2Ohm: 10_000, r1Tolerance: 0, ratioTolerance: 0 };
  const part = {
    ...transistor,
    baseEmitter: [{ icA: 0.01, minV: 0.6, maxV: 0.8 }],
    internal,
  };

  it('takes what R2 draws at the test off the input current, R1 and R2 as RB and RBE', () => {
    const found = judged({ ambientDegC: { min: 25, max: 25 } }, part).criterion('overdrive-factor');
    const inside = 0.01 / (0.01 / 50 - 0.55 / 10_000);
    const full = 12.6 / 950;
    const vbe = 0.8 + 0.0256926 * Math.log(full / 0.01);
    const ib = (3 - vbe) / (75 + 10.5 + 4700) - vbe / 10_000;
    // One row, no typical curve, 13 mA above 10 mA: the gain falls with 1/IC.
    expect(found?.value).toBeCloseTo((inside * (0.01 / full) * ib) / full, 4);
  });

  it('turns V_I·I_I into heat, R1 and R2 included, and holds V_I to its maximum', () => {
    const maximumV = 20;
    const found = judged(
      { ambientDegC: { min: 25, max: 25 } },
      {
        ...part,
        // No warming to speak of.
        limits: { ...part.limits, powerW: 1e5 },
        thermal: { rthJaKPerW: 1e-9 },
        internal: { ...internal, input: { maximumV } },
      },
    );
    // Strong output, RB − 5 %: the smallest VBE, 0.6 V held above its row, lets most current in.
    const inA = (3.6 - 0.6) / (9.5 + 4700);
    expect(found.criterion('drive-current')?.value).toBeCloseTo(inA, 9);
    // Largest input voltage with the largest VBE.
    const full = 12.6 / 950;
    const vbe = 0.8 + 0.0256926 * Math.log(full / 0.01);
    const lessA = (3.6 - vbe) / (10.5 + 4700);
    const input = found.criterion('input-voltage');
    expect(input?.limit).toBe(maximumV);
    expect(input?.value).toBeGreaterThan(0.6 + inA * 4700);
    expect(input?.value).toBeCloseTo(vbe + ((3.6 - vbe) / (9.5 + 4700)) * 4700, 4);
    // VCE(sat) ≤ 0.12 V at the most, and V_I·I_I.
    const powerW = found.criterion('dissipation')?.value ?? NaN;
    expect(powerW).toBeGreaterThan((vbe + lessA * 4700) * lessA);
    expect(powerW).toBeLessThan(0.15 * full + 3.6 * inA);
  });

  it('is open without VBE rows', () => {
    const bare = { ...part, baseEmitter: [] };
    expect(judged({}, bare).criterion('overdrive-factor')?.status).toBe('open');
  });
});
