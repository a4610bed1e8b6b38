/**
 * The off state, ground shift, surge and dip once more by hand: every expected figure here is written out from the rules with
 * plain arithmetic, none of it through the engine's own functions. The junction stands at the ambient (a power rating without
 * end leaves no heating), so that no figure needs an iteration.
 */
import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import {
  HIGH_SIDE_FILE,
  highSideStage,
  RELAY_FILE,
  relayStage,
  TYPE_2N3904,
  TYPE_2N3906,
} from '../relay-stage.ts';

const HOT = 85;
/** kT/q at 85 °C, V. */
const VT_HOT = (1.380649e-23 * (HOT + 273.15)) / 1.602176634e-19;
const RB = [950, 1050];
const RBE = [20_900, 23_100];
const parallel = (a: number, b: number) => (a * b) / (a + b);
/** The largest over both ends of RB and RBE. */
const worst = (figure: (rb: number, rbe: number) => number) =>
  Math.max(...RB.flatMap((rb) => RBE.map((rbe) => figure(rb, rbe))));

const cool = (type: typeof TYPE_2N3904 | typeof TYPE_2N3906, more: object = {}) => ({
  ...type,
  limits: { ...type.limits, powerW: 1e5 },
  thermal: { rthJaKPerW: 1e-4 },
  ...more,
});
const ambientDegC = { min: 0, max: HOT };
const npn = (more: object = {}, part: object = {}) =>
  relayStage({ ambientDegC, transistor: cool(TYPE_2N3904, part), ...more });
const pnp = (more: object = {}, part: object = {}) =>
  highSideStage({ ambientDegC, transistor: cool(TYPE_2N3906, part), ...more });

function at(stage: StageInput, id: string) {
  const found = evaluateStage(stage).criteria.find((each) => each.id === id);
  if (found?.value == null) throw new Error(`no ${id}`);
  return { value: found.value, limit: found.limit, status: found.status };
}

/** 1 part in a million: the power rating is not quite without end. */
const near = (actual: number, expected: number) => {
  expect(Math.abs(actual / expected - 1), `${actual} for ${expected}`).toBeLessThan(1e-5);
};

const leakage = (...rows: [number, number][]) => ({
  leakage: rows.map(([tempDegC, currentA]) => ({ kind: 'icbo' as const, tempDegC, currentA })),
});

describe('leakage', () => {
  const baseV = (icbo: number) => worst((rb, rbe) => (0.1 / rb + icbo) * parallel(rb, rbe));

  it('of one row doubles every 10 K', () => {
    near(at(npn(), 'off-base-voltage').value, baseV(50e-9 * 2 ** 6));
  });

  it('between a cold and a hot row runs through both in the logarithm', () => {
    const stage = npn({}, leakage([25, 1e-8], [125, 1e-6]));
    near(at(stage, 'off-base-voltage').value, baseV(1e-8 * 100 ** 0.6));
  });

  it('beyond a hot row doubles every 10 K where the rows rise more slowly', () => {
    const stage = npn({}, leakage([25, 1e-8], [75, 1e-7]));
    near(at(stage, 'off-base-voltage').value, baseV(1e-7 * 2));
  });

  it('beyond a hot row keeps the part’s own interval where that is shorter (2N5551: 7.5 K)', () => {
    const stage = npn({ ambientDegC: { min: 0, max: HOT } }, leakage([0, 5e-8], [75, 5e-5]));
    const own = 75 / Math.log2(1000);
    near(at(stage, 'off-base-voltage').value, baseV(5e-5 * 2 ** (10 / own)));
  });

  it('is held below the coldest row', () => {
    const stage = npn({ ambientDegC: { min: 0, max: 10 } });
    near(at(stage, 'off-base-voltage').value, baseV(50e-9));
  });

  it('and a base voltage let through ICBO + I_row·exp[(VBE − VBE_row)/VT]', () => {
    const icbo = 50e-9 * 2 ** 6;
    const rowV = 0.65 - 0.002 * (HOT - 25);
    const through = 0.01 * Math.exp((baseV(icbo) - rowV) / VT_HOT);
    near(at(npn(), 'off-collector-current').value, icbo + through);
  });

  it('and the limit of the base voltage falls 2 mV/K', () => {
    expect(at(npn(), 'off-base-voltage').limit).toBeCloseTo(0.5 - 0.12, 6);
  });
});

describe('ground shift of an NPN', () => {
  const shifted = (groundShiftV: number) => npn({ drive: { ...RELAY_FILE.drive, groundShiftV } });

  it('adds to the low level in the off state', () => {
    const icbo = 50e-9 * 2 ** 6;
    const expected = worst((rb, rbe) => ((0.1 + 0.2) / rb + icbo) * parallel(rb, rbe));
    near(at(shifted(0.2), 'off-base-voltage').value, expected);
  });

  it('takes from the high level in the on state', () => {
    // Coldest: 0 °C; the load takes 26.4/(1440·0.9·(234.5 + 0)/254.5) with VCE = 0.
    const full = 26.4 / (1440 * 0.9 * (234.5 / 254.5));
    const vbe = 0.85 + (0.1 * Math.log(full / 0.01)) / Math.log(5) + 0.002 * 25;
    const base = (3 - 0.2 - vbe) / (75 + 1050) - vbe / 20_900;
    near(at(shifted(0.2), 'forced-beta').value, full / base);
  });

  it('reverses the base where the logic lies below the load’s return', () => {
    const expected = worst((rb, rbe) => rbe / (rb + rbe));
    near(at(shifted(-1), 'reverse-base-voltage').value, expected);
  });
});

describe('reset of an NPN', () => {
  const icbo = 50e-9 * 2 ** 6;
  const reset = (more: object) => ({
    drive: { ...RELAY_FILE.drive, reset: { kind: 'high-z', ...more } },
  });

  it('floating: (ICBO + leakage)·RBE', () => {
    near(at(npn(reset({ leakageA: 2e-6 })), 'reset-off').value, (icbo + 2e-6) * 23_100);
  });

  it('pulled up: rail max over all three resistors', () => {
    const stage = npn(reset({ kind: 'pull-up', pullUpOhm: 100_000 }));
    const expected = worst((rb, rbe) => (icbo + 3.6 / (100_000 + rb + rbe)) * rbe);
    near(at(stage, 'reset-off').value, expected);
    const rowV = 0.65 - 0.002 * (HOT - 25);
    // Never more than the saturated load takes, at most 26.4 V over the hot coil.
    const through = icbo + 0.01 * Math.exp((expected - rowV) / VT_HOT);
    const coil = 1440 * 0.9 * ((234.5 + HOT + 20) / 254.5);
    near(at(stage, 'reset-off-current').value, Math.min(through, 26.4 / coil));
  });

  it('with the base open: (1 + hFE max)·(ICBO + leakage)', () => {
    const stage = npn({ ...reset({}), shuntResistor: null });
    const gain = 3 * 40 * ((HOT + 273.15) / 298.15) ** 2.4;
    near(at(stage, 'reset-off').value, (1 + gain) * (icbo + 1e-6));
  });
});

describe('off state of a PNP', () => {
  const icbo = 50e-9 * 2 ** 6;
  const rb = [6460, 7140];

  it('on an open output hangs on RBE: (ICBO + leakage)·RBE', () => {
    near(at(pnp(), 'off-base-voltage').value, (icbo + 1e-6) * 23_100);
  });

  it('on an open output without RBE leaks (1 + hFE max)·(ICBO + leakage)', () => {
    const gain = 3 * 60 * ((HOT + 273.15) / 298.15) ** 2.4;
    const stage = pnp({ shuntResistor: null });
    near(at(stage, 'off-collector-current').value, (1 + gain) * (icbo + 1e-6));
  });

  const pushPull = (railV: { min: number; max: number }, unloadedDropV = 0) =>
    pnp({
      drive: {
        kind: 'push-pull',
        railV,
        high: { dropV: 0.6, currentA: 0.008, unloadedDropV },
        low: { levelV: 0.4, currentA: 0.008 },
        sourceLimitA: null,
        sinkLimitA: null,
      },
    });

  it.each([
    [0, 0.1],
    [0.3, 0.3],
  ])(
    'on a push-pull output with %d V unloaded drop counts %d V below the rail',
    (drop, counted) => {
      const stage = pushPull({ min: 26, max: 26.4 }, drop);
      const expected = Math.max(
        ...rb.flatMap((r) =>
          RBE.map((rbe) => ((26.4 - 26 + counted) / r + icbo) * parallel(r, rbe)),
        ),
      );
      near(at(stage, 'off-base-voltage').value, expected);
    },
  );

  it('is reversed by a rail above the lowest supply', () => {
    const expected = Math.max(...rb.flatMap((r) => RBE.map((rbe) => (10.4 * rbe) / (r + rbe))));
    near(at(pushPull({ min: 28, max: 32 }), 'reverse-base-voltage').value, expected);
  });
});

describe('a Darlington held off', () => {
  it('sees the low level over RB and RBE alone, and lets its collector leakage through', () => {
    const stage = npn(
      { topology: 'low-side-darlington' },
      {
        darlington: true,
        leakage: [{ kind: 'iceo', currentA: 1e-6, tempDegC: 25 }],
        baseEmitter: [{ icA: 0.01, minV: 1.2, maxV: 1.5 }],
      },
    );
    const baseV = worst((rb, rbe) => (0.1 * rbe) / (rb + rbe));
    near(at(stage, 'off-base-voltage').value, baseV);
    expect(at(stage, 'off-base-voltage').limit).toBeCloseTo(1 - 0.004 * 60, 6);
    const through = 0.01 * Math.exp((baseV - (1.2 - 0.004 * 60)) / (2 * VT_HOT));
    near(at(stage, 'off-collector-current').value, 1e-6 * 2 ** 6 + through);
  });
});

describe('surge and dip', () => {
  const supplyV = { ...RELAY_FILE.supplyV, surge: 33, dip: 14 };

  it('a surge adds the clamp’s drop and is held to VCEO itself', () => {
    expect(at(npn({ supplyV }), 'surge-voltage')).toEqual({
      value: 34,
      limit: 40,
      status: 'pass',
    });
  });

  it('a clamp across the transistor must not conduct in a surge', () => {
    const clamp = { kind: 'zener-across-transistor', zenerV: { min: 32, max: 36 } };
    expect(at(npn({ supplyV, clamp }), 'surge-voltage')).toEqual({
      value: 33,
      limit: 32,
      status: 'fail',
    });
    const tvs = { kind: 'tvs-across-transistor', zenerV: { min: 36, max: 39 }, standOffV: 33.3 };
    expect(at(npn({ supplyV, clamp: tvs }), 'surge-voltage')).toMatchObject({
      limit: 33.3,
      status: 'marginal',
    });
  });

  it('a dip is held to the holding voltage', () => {
    const load = { ...RELAY_FILE.load, holdV: 12 };
    expect(at(npn({ supplyV, load }), 'holding-voltage')).toEqual({
      value: 14,
      limit: 12,
      status: 'pass',
    });
  });
});

describe('storage and delay of a level translator', () => {
  const load = {
    kind: 'logic-input',
    pullUpOhm: 4700,
    tolerance: 0.05,
    ratingW: 0.1,
    count: 1,
    vilV: 0.8,
    vihV: 2,
    leakageA: 1e-6,
    lowCurrentA: 0,
    capacitanceF: 1e-10,
    wiringF: 2e-11,
    riseTimeLimitSec: null,
  };
  const stage = (more: object = {}) =>
    npn({
      topology: 'level-translator',
      supplyV: { min: 5, max: 5 },
      ambientDegC: { min: 25, max: 25 },
      baseResistor: { valueOhm: 10_000, tolerance: 0 },
      shuntResistor: null,
      clamp: null,
      load: { ...load, ...more },
    });

  it('is ts + RC·C·ln[(V2 − VOL)/(V2 − VIH)], stated', () => {
    // Strong pin, VBE min, RC high: IB1 largest, IC smallest; τs of the printed row with hFE min 100 at 10 mA.
    const full = 5 / 4935;
    const vbeMin = 0.65 + 0.0256926 * Math.log(full / 0.01);
    const on = (3.6 - vbeMin) / 10_000;
    const off = (vbeMin - 0.1) / (10_000 + 0.4 / 0.008);
    const tau = 2e-7 / Math.log((0.001 + 0.001) / (0.01 / 100 + 0.001));
    const gainMax = Math.exp(
      Math.log(210) + (Math.log(300 / 210) * Math.log(full / 0.001)) / Math.log(10),
    );
    const storage = tau * Math.log((on + off) / (full / gainMax + off));
    const rise = 4935 * 124e-12 * Math.log(5 / 3);
    const found = at(stage(), 'low-to-high-delay');
    near(found.value, storage + rise);
    expect(found).toMatchObject({ limit: null, status: 'stated' });
  });

  it('touches no verdict and is reported without a figure where the data are missing', () => {
    const bare = evaluateStage(stage({ capacitanceF: null }));
    const found = bare.criteria.find(({ id }) => id === 'low-to-high-delay');
    expect(found).toMatchObject({ value: null, status: 'stated' });
    expect(bare.verdict).toBe(evaluateStage(stage()).verdict);
  });
});

describe('findings beside the verdict', () => {
  const findings = (stage: StageInput) => evaluateStage(stage).findings.map(({ id }) => id);

  it('name a pull-up to a lower rail with the current it draws', () => {
    const stage = highSideStage({
      drive: { ...HIGH_SIDE_FILE.drive, railV: { min: 5, max: 5 }, railTracksSupply: false },
    });
    const text = evaluateStage(stage).findings.find(
      ({ id }) => id === 'pull-up-below-supply',
    )?.text;
    // (26.4 − 5 − 0.87)/(6800 + 47000)
    expect(text).toMatch(/38\d\s\u00b5A/);
  });

  it('name an NPN on an open output that its pull-up turns on in reset', () => {
    const drive = {
      ...RELAY_FILE.drive,
      kind: 'open-collector',
      high: null,
      pullUp: { valueOhm: 1000, tolerance: 0.05, ratingW: 0.1 },
      reset: { kind: 'high-z' },
    };
    expect(findings(relayStage({ drive }))).toContain('on-in-reset');
    expect(findings(relayStage({ drive: { ...drive, reset: null } }))).not.toContain('on-in-reset');
  });
});
