import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import type { Criterion, Evaluation } from '../../../shared/checks/evaluation.ts';
import { relayStage, highSideStage, RELAY_FILE, HIGH_SIDE_FILE } from '../relay-stage.ts';

function criterion(evaluation: Evaluation, id: string): Criterion {
  const found = evaluation.criteria.find((each) => each.id === id);
  if (found === undefined) throw new Error(`no criterion ${id}`);
  return found;
}

const LOGIC = {
  kind: 'logic-input',
  pullUpOhm: 4700,
  tolerance: 0.05,
  ratingW: 0.1,
  count: 1,
  vilV: 0.8,
  vihV: 2,
  leakageA: 1e-6,
  lowCurrentA: 1e-6,
  capacitanceF: null,
  wiringF: null,
  riseTimeLimitSec: null,
};

/** Agreement asked for against the independent calculation of the same stage. */
const AGREEMENT = 0.005;

function expectNear(actual: number | null, expected: number, share = AGREEMENT): void {
  expect(actual).not.toBeNull();
  expect(Math.abs((actual ?? NaN) - expected)).toBeLessThanOrEqual(share * Math.abs(expected));
}

describe('the 24 V relay stage with RB 1 kΩ', () => {
  const evaluation = evaluateStage(relayStage());

  it('is judged at 1024 corners', () => {
    expect(evaluation.corners).toBe(1024);
  });

  it.each([
    ['overdrive-factor', 3.66],
    ['forced-beta', 13.9],
    ['saturation-voltage', 0.245],
    ['collector-current', 24.2e-3],
    ['junction-temperature', 61.3],
    ['release-time', 9.0e-3],
    ['peak-collector-voltage', 27.4],
    ['load-voltage', 21.37],
    ['off-base-voltage', 0.097],
  ])('gives %s %d', (id, expected) => {
    expectNear(criterion(evaluation, id).value, expected);
  });

  it('fails forced β, because the sheet guarantees VCE(sat) at IC/IB = 10 only', () => {
    expect(criterion(evaluation, 'forced-beta')).toMatchObject({ limit: 10, status: 'fail' });
    expect(evaluation.verdict).toBe('fail');
  });

  it('is marginal in coil voltage: 20.76 V are needed from the hot coil', () => {
    const voltage = criterion(evaluation, 'load-voltage');
    expectNear(voltage.limit, 20.76);
    expect(voltage.status).toBe('marginal');
  });

  it('finds the least overdrive at high supply, cold, weak pin, RB high, RBE low, coil low, gain low', () => {
    expect(criterion(evaluation, 'overdrive-factor').corner).toEqual({
      supply: 'max',
      ambient: 'min',
      drive: 'weak',
      rb: '+',
      rbe: '-',
      load: '-',
      gain: 'min',
      vbe: 'max',
      vceSat: '0',
      instant: 'start',
    });
  });

  it('states what has no limit, and says so of the VCE(sat) difference', () => {
    expect(criterion(evaluation, 'saturation-voltage')).toMatchObject({
      limit: null,
      margin: null,
      status: 'stated',
    });
    expect(evaluation.findings.map(({ id }) => id)).toEqual(['forced-beta-beyond-the-data-sheet']);
  });

  it('lists 21 criteria, none twice', () => {
    const ids = evaluation.criteria.map(({ id }) => id);
    expect(new Set(ids).size).toBe(21);
    expect(ids).toHaveLength(21);
  });
});

describe('evaluateStage', () => {
  it('is marginal with RB 620 Ω: overdrive 5.73, forced β 8.90, only the coil voltage short of 10 %', () => {
    const evaluation = evaluateStage(
      relayStage({ baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 620 } }),
    );
    expect(evaluation.verdict).toBe('marginal');
    expectNear(criterion(evaluation, 'overdrive-factor').value, 5.73);
    expectNear(criterion(evaluation, 'forced-beta').value, 8.9);
    const short = evaluation.criteria.filter(({ status }) => status === 'marginal');
    expect(short.map(({ id }) => id)).toEqual(['load-voltage']);
  });

  it('drops RBE from the corners where none is fitted, and says so', () => {
    const evaluation = evaluateStage(relayStage({ shuntResistor: null }));
    expect(evaluation.corners).toBe(512);
    expect(evaluation.findings.map(({ id }) => id)).toContain('no-base-emitter-resistor');
    expect(criterion(evaluation, 'overdrive-factor').corner).not.toHaveProperty('rbe');
  });

  it('fails a base resistor left open with a finding', () => {
    const evaluation = evaluateStage(
      relayStage({ baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: null } }),
    );
    expect(evaluation.verdict).toBe('fail');
    expect(evaluation.findings.map(({ id }) => id)).toEqual(['no-base-resistor']);
  });

  it('fails a PNP in a low-side NPN stage', () => {
    const evaluation = evaluateStage(relayStage({ transistor: HIGH_SIDE_FILE.transistor }));
    expect(evaluation.verdict).toBe('fail');
    expect(evaluation.findings[0]).toMatchObject({ id: 'polarity' });
  });

  it('fails a stage that cannot turn on: overdrive 0, forced β infinite and written as null', () => {
    const drive = { ...RELAY_FILE.drive, railV: { min: 0.5, max: 3.6 } };
    const evaluation = evaluateStage(relayStage({ drive }));
    expect(criterion(evaluation, 'overdrive-factor')).toMatchObject({ value: 0, margin: -1 });
    expect(criterion(evaluation, 'forced-beta')).toMatchObject({
      value: null,
      margin: null,
      status: 'fail',
    });
  });

  it('judges a high-side PNP from an open drain at its own supply', () => {
    const evaluation = evaluateStage(highSideStage());
    // I_R = (VS − VEB)/(VOL/IOL + RB) at 26.4 V, cold, minimum RB: hand figure 4.0 mA.
    expectNear(criterion(evaluation, 'drive-current').value, (26.4 - 0.577) / 6460, 0.01);
    expect(criterion(evaluation, 'drive-maximum')).toMatchObject({ value: 40, limit: 26.4 });
    expect(evaluation.verdict).not.toBe('open');
  });

  it('says plainly that a load does not belong to a topology', () => {
    const evaluation = evaluateStage(highSideStage({ load: LOGIC }));
    expect(evaluation.verdict).toBe('open');
    expect(evaluation.findings).toEqual([
      {
        id: 'not-judged',
        text: 'A load of kind logic-input is not judged in the topology high-side-pnp.',
      },
    ]);
  });
});
