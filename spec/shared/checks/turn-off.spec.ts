import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { RELAY_FILE, relayStage } from '../relay-stage.ts';

type Changes = Parameters<typeof relayStage>[0];

function judged(changes: Changes) {
  const evaluation = evaluateStage(
    relayStage({
      baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 620 },
      ...changes,
    }),
  );
  const criterion = (id: string) => evaluation.criteria.find((each) => each.id === id);
  const findings = evaluation.findings.map(({ id }) => id);
  return { evaluation, criterion, findings };
}

const zener = (min: number, max: number) => ({
  kind: 'zener-across-transistor',
  zenerV: { min, max },
  currentRatingA: 0.2,
});

describe('turning a coil off', () => {
  it('fails without a clamp, whatever else holds', () => {
    const { evaluation, criterion, findings } = judged({ clamp: { kind: 'none' } });
    expect(evaluation.verdict).toBe('fail');
    expect(findings).toContain('no-clamp');
    expect(criterion('peak-collector-voltage')).toMatchObject({ value: null, status: 'fail' });
  });

  it('adds zener and diode to the supply and gets faster', () => {
    const clamp = {
      kind: 'diode-zener',
      forwardV: 1,
      zenerV: { min: 4.5, max: 5.5 },
      reverseV: 75,
      currentRatingA: 0.2,
    };
    const { criterion } = judged({ clamp });
    expect(criterion('peak-collector-voltage')?.value).toBeCloseTo(26.4 + 5.5 + 1, 9);
    expect(criterion('release-time')?.value).toBeLessThan(6e-3);
  });

  it('takes the zener voltage alone across the transistor', () => {
    const { criterion } = judged({ clamp: zener(29, 31) });
    expect(criterion('peak-collector-voltage')).toMatchObject({ value: 31, status: 'marginal' });
    // Vc = 29 − 26.4 = 2.6 V, cold coil of 1092 Ω at 24.2 mA.
    expect(criterion('release-time')?.value).toBeCloseTo(
      (4 / 1092.33) * Math.log((24.168e-3 + 2.6 / 1092.33) / (2.4 / 1440 + 2.6 / 1092.33)),
      5,
    );
  });

  it('fails a clamp that conducts at the highest supply', () => {
    const { evaluation, findings, criterion } = judged({ clamp: zener(26, 28) });
    expect(evaluation.verdict).toBe('fail');
    expect(findings).toContain('clamp-conducts-at-supply');
    expect(criterion('release-time')?.value).toBeNull();
  });

  it('takes the stand-off of a TVS, not its breakdown, for what the supply may reach', () => {
    const tvs = {
      kind: 'tvs-across-transistor',
      zenerV: { min: 28.9, max: 38 },
      standOffV: 26,
      currentRatingA: 5,
    };
    expect(judged({ clamp: tvs }).findings).toContain('clamp-conducts-at-supply');
  });

  it('asks twice the supply of the diode, and says so where its rating is unknown', () => {
    const diode = { ...RELAY_FILE.clamp, reverseV: null };
    expect(judged({ clamp: diode }).findings).toContain('diode-reverse-voltage-unknown');
    expect(judged({ clamp: diode }).evaluation.verdict).toBe('marginal');
    const weak = judged({ clamp: { ...RELAY_FILE.clamp, reverseV: 50 } });
    expect(weak.findings).toContain('diode-reverse-voltage');
    expect(weak.evaluation.verdict).toBe('fail');
  });

  it('judges the release time once a limit is set, and is open without the inductance', () => {
    const load = { ...RELAY_FILE.load, releaseTimeLimitSec: 8e-3 };
    expect(judged({ load }).criterion('release-time')?.status).toBe('fail');
    const unknown = judged({ load: { ...load, inductanceH: null } }).criterion('release-time');
    expect(unknown).toMatchObject({ value: null, status: 'open' });
    const stated = judged({ load: { ...RELAY_FILE.load, inductanceH: null } });
    expect(stated.criterion('release-time')?.status).toBe('stated');
  });

  it('is open where the clamp has no current rating', () => {
    const clamp = { ...RELAY_FILE.clamp, currentRatingA: null };
    expect(judged({ clamp }).criterion('clamp-current')?.status).toBe('open');
  });
});

describe('surge and dip', () => {
  it('adds the clamp to the surge and compares with VCEO underated', () => {
    const { criterion } = judged({ supplyV: { min: 21.6, max: 26.4, surge: 36 } });
    expect(criterion('surge-voltage')).toMatchObject({ value: 37, limit: 40, status: 'marginal' });
  });

  it('holds a clamp across the transistor to its stand-off in a surge', () => {
    const { criterion } = judged({
      supplyV: { min: 21.6, max: 26.4, surge: 36 },
      clamp: zener(29, 31),
    });
    expect(criterion('surge-voltage')).toMatchObject({ value: 36, limit: 29, status: 'fail' });
  });

  it('compares a dip with what the coil needs to hold', () => {
    const supplyV = { min: 21.6, max: 26.4, dip: 10 };
    const load = { ...RELAY_FILE.load, holdV: 12 };
    expect(judged({ supplyV, load }).criterion('holding-voltage')?.status).toBe('fail');
    expect(judged({ supplyV }).criterion('holding-voltage')?.status).toBe('stated');
  });
});

describe('switching at a frequency', () => {
  const pulsed = (changes: Changes = {}) =>
    judged({
      frequencyHz: 200,
      duty: 0.8,
      load: { ...RELAY_FILE.load, holdV: 12 },
      clamp: { ...RELAY_FILE.clamp, powerRatingW: 0.5 },
      ...changes,
    });

  it('judges duty times supply against the holding voltage', () => {
    expect(pulsed().criterion('load-voltage')).toMatchObject({ limit: 12 });
    expect(pulsed().criterion('load-voltage')?.value).toBeCloseTo(0.8 * 21.6, 9);
  });

  it('allows storage and fall a tenth of the shorter part of the period', () => {
    const storage = pulsed().criterion('storage-time');
    expect(storage?.limit).toBeCloseTo((0.1 * 0.2) / 200, 12);
    expect(storage?.value).toBeGreaterThan(5e-8);
    expect(storage?.value).toBeLessThan(5e-6);
    expect(pulsed({ storageTimeLimitSec: 1e-7 }).criterion('storage-time')?.status).toBe('fail');
  });

  it('is open without a switching row', () => {
    const transistor = { ...RELAY_FILE.transistor, switching: null };
    expect(pulsed({ transistor }).criterion('storage-time')?.status).toBe('open');
    expect(pulsed({ transistor }).criterion('dissipation')?.status).toBe('open');
  });

  it('gives the clamp no more than the current it carries while off', () => {
    const power = pulsed().criterion('clamp-power');
    expect(power?.value).toBeLessThanOrEqual(1 * 24.2e-3 * 0.2);
    expect(power?.status).toBe('pass');
  });

  it('adds switching loss to the dissipation', () => {
    const slow = pulsed({ frequencyHz: 200 }).criterion('dissipation')?.value ?? NaN;
    const fast = pulsed({ frequencyHz: 20_000 }).criterion('dissipation')?.value ?? NaN;
    expect(fast - slow).toBeGreaterThan(1e-4);
  });

  it('never passes a duty of 1 at a frequency', () => {
    expect(pulsed({ duty: 1 }).criterion('storage-time')).toMatchObject({
      margin: -1,
      status: 'fail',
    });
  });
});
