import { describe, expect, it } from 'vitest';
import { figuresAtCorner } from '../../../shared/checks/corner-figures.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import { highSideStage, RELAY_FILE, relayStage, TYPE_2N3904 } from '../relay-stage.ts';

type Changes = Parameters<typeof relayStage>[0];

function judged(changes: Changes, stage = relayStage) {
  const evaluation = evaluateStage(stage({ clamp: null, ...changes }));
  return {
    evaluation,
    criterion: (id: string) => evaluation.criteria.find((each) => each.id === id),
    findings: evaluation.findings.map(({ id }) => id),
  };
}

describe('LED string', () => {
  const load = {
    kind: 'led-string',
    count: 3,
    forwardV: { min: 1.8, max: 2.4 },
    resistanceOhm: 1000,
    tolerance: 0.05,
    maximumA: 0.03,
    minimumA: 0.01,
  };

  it('adds the forward voltage to the corners', () => {
    const { evaluation } = judged({ load });
    expect(evaluation.corners).toBe(2048);
    expect(evaluation.criteria[0]?.corner).toHaveProperty('vf');
  });

  it('draws most with low, warm LEDs and least with high, cold ones; no credits', () => {
    const { criterion } = judged({ load });
    const warm = 1.8 - 0.002 * (60 - 25);
    const cold = 2.4 + 0.002 * (25 + 20);
    expect(criterion('load-current')).toMatchObject({ limit: 0.024, status: 'marginal' });
    expect(criterion('load-current')?.value).toBeCloseTo((26.4 - 3 * warm) / 950, 9);
    const least = criterion('load-current-low')?.value ?? NaN;
    expect(least).toBeLessThan((21.6 - 3 * cold) / 1050);
    expect(least).toBeGreaterThan((21.6 - 3 * cold - 0.3) / 1050);
  });

  it('states the least current where the LEDs ask for none', () => {
    const found = judged({ load: { ...load, minimumA: null } }).criterion('load-current-low');
    expect(found).toMatchObject({ limit: null, margin: null, status: 'stated' });
    expect(found?.value).toBe(judged({ load }).criterion('load-current-low')?.value);
  });

  it('fails where the string takes the whole supply', () => {
    const { evaluation, findings } = judged({ load: { ...load, count: 9 } });
    expect(evaluation.verdict).toBe('fail');
    expect(findings).toContain('leds-take-the-supply');
  });

  it('may leak no more than the policy lets an LED glow, on either side', () => {
    expect(judged({ load }).criterion('off-collector-current')?.limit).toBe(1e-4);
    expect(judged({ load }, highSideStage).criterion('load-current')?.value).toBeGreaterThan(0.02);
  });
});

describe('filament lamp', () => {
  const load = { kind: 'lamp', nominalV: 24, currentA: 0.02, coldRatio: 12 };

  it('has no tolerance and draws its steady current with the 0.55th power of the supply', () => {
    const { evaluation, criterion } = judged({ load });
    expect(evaluation.corners).toBe(512);
    expect(criterion('collector-current')?.value).toBeCloseTo(0.02 * (26.4 / 24) ** 0.55, 9);
  });

  it('limits the inrush by cold filament or by gain, whichever is less', () => {
    const coldOhm = (24 / (0.02 * 12)) * (253 / 298) ** 1.2;
    const { criterion } = judged({ load });
    expect(criterion('peak-current')?.value).toBeLessThanOrEqual(26.4 / coldOhm);
    const tiny = judged({ load: { ...load, coldRatio: 1 } });
    expect(tiny.criterion('peak-current')?.value).toBeCloseTo(
      (26.4 * 0.02) / 24 / (253 / 298) ** 1.2,
      6,
    );
  });

  it('is open, not failed, where the inrush leaves saturation, and names the pulse power', () => {
    const { criterion, findings, evaluation } = judged({ load });
    expect(criterion('inrush-saturation')).toMatchObject({ limit: 1, status: 'open' });
    expect(findings).toContain('lamp-inrush');
    const coldOhm = (24 / (0.02 * 12)) * (253 / 298) ** 1.2;
    const watt = (26.4 ** 2 / (4 * coldOhm)).toPrecision(3);
    expect(evaluation.findings.find(({ id }) => id === 'lamp-inrush')?.text).toContain(`${watt} W`);
  });

  it('passes a small lamp driven hard enough', () => {
    const small = { ...load, currentA: 0.002, coldRatio: 8 };
    expect(judged({ load: small }).criterion('inrush-saturation')?.status).toBe('pass');
  });
});

describe('logic input behind an inverter', () => {
  const load = {
    kind: 'logic-input',
    pullUpOhm: 4700,
    tolerance: 0.05,
    ratingW: 0.1,
    count: 2,
    vilV: 0.8,
    vihV: 2,
    leakageA: 20e-6,
    lowCurrentA: 0.4e-3,
    capacitanceF: 10e-12,
    wiringF: 20e-12,
    riseTimeLimitSec: 1e-6,
  };
  const translator = (more: Changes = {}) =>
    judged({ topology: 'level-translator', supplyV: { min: 4.5, max: 5.5 }, load, ...more });

  it('sinks the pull-up and the low currents of all inputs', () => {
    const current = translator().criterion('collector-current')?.value ?? NaN;
    expect(current).toBeCloseTo(5.5 / (4700 * 0.95) + 2 * 0.4e-3, 9);
  });

  it('adds the ground shift to VCE(sat) for the low level', () => {
    const plain = translator().criterion('output-low')?.value ?? NaN;
    const drive = { ...RELAY_FILE.drive, groundShiftV: 0.2 };
    expect(translator({ drive }).criterion('output-low')?.value).toBeCloseTo(plain + 0.2, 3);
    expect(plain).toBeLessThan(0.25);
  });

  it('loses leakage across RC for the high level, at the lowest supply', () => {
    const high = translator().criterion('output-high');
    expect(high?.value).toBeLessThan(4.5 - 4700 * 1.05 * 40e-6);
    expect(high?.value).toBeGreaterThan(4.25);
    expect(high?.limit).toBe(2);
  });

  it('rises with 2.2 time constants of RC and all capacitance', () => {
    expect(translator().criterion('rise-time')?.value).toBeCloseTo(2.2 * 4700 * 1.05 * 34e-12, 12);
    const unknown = { ...load, capacitanceF: null };
    expect(translator({ load: unknown }).criterion('rise-time')?.status).toBe('open');
  });

  it('heats RC with the whole supply', () => {
    expect(translator().criterion('rc-dissipation')?.value).toBeCloseTo(5.5 ** 2 / 4465, 9);
  });

  it('can be sized', () => {
    const input = relayStage({
      topology: 'level-translator',
      supplyV: { min: 4.5, max: 5.5 },
      load,
      clamp: null,
    });
    expect(sizeStage(input).recommendedOhm).not.toBeNull();
  });
});

describe('low-side Darlington', () => {
  const transistor = {
    partNumber: 'TIP120',
    polarity: 'npn',
    darlington: true,
    limits: { vceoV: 60, veboV: 5, icA: 5, icPeakA: 8, ibA: 0.12, powerW: 2, tjMaxDegC: 150 },
    thermal: { rthJaKPerW: 62.5 },
    gain: [
      { icA: 0.5, vceV: 3, min: 1000 },
      { icA: 3, vceV: 3, min: 1000 },
    ],
    saturation: [
      { icA: 3, ibA: 0.012, maxV: 2 },
      { icA: 5, ibA: 0.02, maxV: 4 },
    ],
    baseEmitter: [{ kind: 'on' as const, icA: 3, maxV: 2.5 }],
    leakage: [
      { kind: 'iceo' as const, currentA: 5e-4, tempDegC: 25 },
      { kind: 'icbo' as const, currentA: 2e-4, tempDegC: 25 },
    ],
  };
  const darlington = (more: Changes = {}) =>
    judged({
      topology: 'low-side-darlington',
      transistor,
      load: { kind: 'resistor', resistanceOhm: 24, tolerance: 0.05 },
      drive: { ...RELAY_FILE.drive, railV: { min: 4.75, max: 5.25 } },
      ...more,
    });

  it('has two junctions in the cold: VBE + 4 mV/K, gain with twice the exponent', () => {
    const corner = darlington().criterion('overdrive-factor');
    const full = 26.4 / (24 * 0.95);
    const vbe = 2.5 + 0.05 + 0.004 * 45;
    const ib = (4.75 - vbe) / (75 + 1050) - vbe / (22000 * 0.95);
    const gain = 1000 * (253.15 / 298.15) ** 4.8;
    expect(corner?.value).toBeCloseTo((gain * ib) / full, 9);
    expect(corner?.corner).toMatchObject({ ambient: 'min', drive: 'weak' });
  });

  it('is held to the IC/IB of its rows and not to a forced β meant for single transistors', () => {
    // Rows at 3 A/12 mA and 5 A/20 mA: 250 either way.
    for (const guaranteedOnly of [true, false]) {
      const beta = darlington({
        policy: { name: 'General practice', guaranteedOnly },
      }).criterion('forced-beta');
      const ib = (4.75 - (2.5 + 0.05 + 0.004 * 45)) / 1125 - (2.5 + 0.05 + 0.004 * 45) / 20_900;
      expect(beta?.limit).toBeCloseTo(250, 9);
      expect(beta?.value).toBeCloseTo(26.4 / (24 * 0.95) / ib, 6);
    }
  });

  it('stays cold where its drive cannot turn it on cold, though it could once hot', () => {
    // 1.89 V at the most, against VBE = 2 + 0.05 − 0.004 · (60 − 25) = 1.91 V.
    const stage = relayStage({
      topology: 'low-side-darlington',
      supplyV: { min: 48, max: 48 },
      drive: { ...RELAY_FILE.drive, railV: { min: 1.71, max: 1.89 } },
      load: { kind: 'resistor', resistanceOhm: 3500, tolerance: 0 },
      baseResistor: { valueOhm: 6000, tolerance: 0 },
      shuntResistor: null,
      clamp: null,
      transistor: {
        partNumber: 'MPSA13',
        polarity: 'npn',
        darlington: true,
        limits: { vceoV: 30, veboV: 10, icA: 0.5, powerW: 0.625, tjMaxDegC: 150 },
        thermal: { rthJaKPerW: 200 },
        gain: [
          { icA: 0.01, vceV: 5, min: 5000 },
          { icA: 0.1, vceV: 5, min: 10_000 },
        ],
        saturation: [{ icA: 0.1, ibA: 1e-4, maxV: 1.5 }],
        baseEmitter: [{ kind: 'on', icA: 0.1, maxV: 2 }],
        leakage: [],
      },
    });
    const corner = { supply: 'max', ambient: 'max', drive: 'strong', gain: 'max', vbe: 'max' };
    const figures = figuresAtCorner(stage, { ...corner, vceSat: '0', instant: 'settled' });
    expect(figures.icA).toBe(0);
    expect(figures.tjDegC).toBe(60);
  });

  it('is held in reset by RBE against the pin alone where the sheet prints ICBO only', () => {
    const reset = { kind: 'high-z' as const, leakageA: 1e-5 };
    const found = darlington({
      transistor: { ...transistor, leakage: transistor.leakage.slice(1) },
      drive: { ...RELAY_FILE.drive, railV: { min: 4.75, max: 5.25 }, reset },
    });
    expect(found.criterion('reset-off')?.value).toBeCloseTo(1e-5 * 23_100, 12);
    expect(found.criterion('reset-off-current')?.status).toBe('open');
  });

  it('is held off by the plain divider and to twice the base voltage', () => {
    const base = darlington().criterion('off-base-voltage');
    expect(base?.value).toBeCloseTo((0.1 * 23100) / (23100 + 950), 9);
    expect(base?.limit).toBeLessThan(1);
    expect(base?.limit).toBeGreaterThan(0.4);
  });

  it('leaks what its collector row prints, doubling per 10 K', () => {
    const off = darlington().criterion('off-collector-current')?.value ?? NaN;
    expect(off).toBeGreaterThan(5e-4 * 2 ** ((60 - 25) / 10));
  });

  it('is open where only ICBO is printed', () => {
    const leakage = transistor.leakage.slice(1);
    const found = darlington({ transistor: { ...transistor, leakage } });
    expect(found.criterion('off-collector-current')?.status).toBe('open');
  });

  it('drops two junctions more than a single transistor', () => {
    expect(darlington().criterion('saturation-voltage')?.value).toBeGreaterThan(1);
    const single = judged({ transistor: TYPE_2N3904 }).criterion('saturation-voltage')?.value;
    expect(single).toBeLessThan(0.3);
  });
});
