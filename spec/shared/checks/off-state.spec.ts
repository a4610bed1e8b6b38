import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import type { Criterion } from '../../../shared/checks/evaluation.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import {
  HIGH_SIDE_FILE,
  highSideStage,
  RELAY_FILE,
  relayStage,
  TYPE_2N3904,
  TYPE_2N3906,
} from '../relay-stage.ts';

function criterion(stage: StageInput, id: string): Criterion | undefined {
  return evaluateStage(stage).criteria.find((each) => each.id === id);
}

/** ICBO of 50 nA at 25 °C, doubling per 10 K. */
const icbo = (degC: number) => 50e-9 * 2 ** ((degC - 25) / 10);

describe('off state of a low-side NPN', () => {
  it('divides the low level over RB and RBE and adds hot leakage', () => {
    const found = criterion(relayStage(), 'off-base-voltage');
    const tj = 61.26;
    const parallel = (950 * 23100) / (950 + 23100);
    expect(found?.value).toBeCloseTo((0.1 / 950 + icbo(tj)) * parallel, 5);
    expect(found?.limit).toBeCloseTo(0.5 - 0.002 * (tj - 25), 3);
    expect(found?.corner).toMatchObject({ supply: 'max', ambient: 'max', instant: 'settled' });
  });

  it('takes the loaded low level where no unloaded one is printed, and the ground shift', () => {
    const low = { levelV: 0.4, currentA: 0.008 };
    const drive = { ...RELAY_FILE.drive, low, groundShiftV: 0.1 };
    const found = criterion(relayStage({ drive }), 'off-base-voltage');
    expect(found?.value).toBeGreaterThan(0.47);
    expect(found?.status).toBe('fail');
  });

  it('holds the collector current to a tenth of the release current', () => {
    const found = criterion(relayStage(), 'off-collector-current');
    expect(found?.limit).toBeCloseTo((0.1 * 2.4) / 1440, 12);
  });

  it('reads hot printed leakage instead of the doubling rule', () => {
    const leakage = [
      { kind: 'icbo' as const, currentA: 50e-9, tempDegC: 25 },
      { kind: 'icbo' as const, currentA: 50e-6, tempDegC: 100 },
    ];
    const hot = relayStage({
      ambientDegC: { min: 0, max: 100 },
      transistor: { ...TYPE_2N3904, leakage },
    });
    expect(criterion(hot, 'off-base-voltage')?.value).toBeGreaterThan(0.1 + 50e-6 * 900);
  });

  it('is open where the sheet prints no leakage', () => {
    const stage = relayStage({ transistor: { ...TYPE_2N3904, leakage: [] } });
    expect(criterion(stage, 'off-base-voltage')).toMatchObject({ value: null, status: 'open' });
    expect(criterion(stage, 'off-collector-current')?.status).toBe('open');
  });

  it('shows the reverse voltage of a ground shift below the load return, and of a speed-up capacitor', () => {
    const drive = { ...RELAY_FILE.drive, groundShiftV: -1 };
    expect(criterion(relayStage({ drive }), 'reverse-base-voltage')?.value).toBeCloseTo(1, 1);
    const quick = criterion(relayStage({ speedUpCapacitorF: 1e-9 }), 'reverse-base-voltage');
    expect(quick?.value).toBeGreaterThan(2.8);
    expect(quick?.value).toBeLessThan(3.6);
  });
});

describe('reset', () => {
  const reset = (more: object) => ({ ...RELAY_FILE.drive, reset: { kind: 'high-z', ...more } });

  it('lets a floating pin leak 1 µA into RBE', () => {
    const found = criterion(relayStage({ drive: reset({}) }), 'reset-off');
    expect(found?.value).toBeCloseTo((1e-6 + icbo(61.26)) * 23100, 4);
    expect(found?.status).toBe('pass');
  });

  it('fails a pull-up that RBE cannot hold', () => {
    const drive = reset({ kind: 'pull-up', pullUpOhm: 10_000 });
    const found = criterion(relayStage({ drive }), 'reset-off');
    expect(found?.value).toBeCloseTo((3.6 * 23100) / (10_000 + 950 + 23100), 1);
    expect(found?.status).toBe('fail');
  });

  it('amplifies the leakage of an open base and judges it as a current', () => {
    const found = criterion(relayStage({ drive: reset({}), shuntResistor: null }), 'reset-off');
    expect(found?.unit).toBe('A');
    expect(found?.value).toBeGreaterThan(100e-6);
    expect(found?.status).toBe('fail');
  });

  it('is the plain off state where the pin is driven low', () => {
    const stage = relayStage({ drive: reset({ kind: 'driven-low' }) });
    expect(criterion(stage, 'reset-off')?.value).toBe(criterion(stage, 'off-base-voltage')?.value);
  });
});

describe('off state of a high-side PNP', () => {
  const fromLogic = (more: object = {}) =>
    highSideStage({
      drive: {
        kind: 'push-pull',
        railV: { min: 3, max: 3.6 },
        high: { dropV: 0.6, currentA: 0.008 },
        low: { levelV: 0.4, currentA: 0.008 },
        sourceLimitA: 0.02,
        sinkLimitA: 0.02,
        ...more,
      },
    });

  it('cannot be ended by a lower rail; the finding names the clamp-diode current', () => {
    const evaluation = evaluateStage(fromLogic());
    const base = evaluation.criteria.find(({ id }) => id === 'off-base-voltage');
    expect(base?.status).toBe('fail');
    const finding = evaluation.findings.find(({ id }) => id === 'rail-below-supply');
    // (26.4 − 0.87 − 3 − 0.5)/6800
    expect(finding?.text).toMatch(/3\.2\d\smA/);
    expect(finding?.text).toContain('while the rail is down');
  });

  it('counts at least 0.1 V below the rail for a high output at the same supply', () => {
    const stage = fromLogic({ railTracksSupply: true });
    const found = criterion(stage, 'off-base-voltage');
    expect(found?.value).toBeLessThan(0.1);
    expect(found?.status).toBe('pass');
  });

  it('leaves leakage and the pin to RBE with an open drain', () => {
    const found = criterion(highSideStage(), 'off-base-voltage');
    expect(found?.value).toBeCloseTo((1e-6 + icbo(62)) * 23100, 2);
  });

  it('has an open base without RBE: only the amplified current is judged', () => {
    const stage = highSideStage({ shuntResistor: null });
    expect(criterion(stage, 'off-base-voltage')).toBeUndefined();
    expect(criterion(stage, 'off-collector-current')?.status).toBe('fail');
  });

  it('fails an open drain that does not stand the supply', () => {
    const drive = { ...HIGH_SIDE_FILE.drive, maximumV: 5.5 };
    expect(criterion(highSideStage({ drive }), 'drive-maximum')?.status).toBe('fail');
    const unknown = { ...HIGH_SIDE_FILE.drive, maximumV: null };
    expect(criterion(highSideStage({ drive: unknown }), 'drive-maximum')?.status).toBe('stated');
  });

  it('holds a rail above the supply against VEBO', () => {
    const stage = fromLogic({ railV: { min: 28, max: 32 } });
    const found = criterion(stage, 'reverse-base-voltage');
    expect(found?.value).toBeGreaterThan(7);
    expect(found?.limit).toBe(TYPE_2N3906.limits.veboV);
    expect(found?.status).toBe('fail');
  });
});
