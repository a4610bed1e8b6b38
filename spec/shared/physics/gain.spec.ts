import { describe, expect, it } from 'vitest';
import {
  type GainPoint,
  gainRatio,
  gainTable,
  maximumGain,
  minimumGain,
} from '../../../shared/physics/gain.ts';

const row = (icA: number, min: number | null, more: Partial<GainPoint> = {}): GainPoint => ({
  icA,
  vceV: 5,
  min,
  typ: null,
  max: null,
  tempDegC: 25,
  ...more,
});

function table(rows: GainPoint[], saturated: { icA: number; ibA: number }[] = []) {
  const made = gainTable(rows, saturated, 2.4);
  if (made === null) throw new Error('no table');
  return made;
}

describe('gainTable', () => {
  it('is null without a minimum at 25 °C', () => {
    expect(gainTable([row(0.01, null, { typ: 200 })], [], 2.4)).toBeNull();
    expect(gainTable([row(0.01, 50, { tempDegC: -55 })], [], 2.4)).toBeNull();
  });

  it('runs straight in log–log between rows', () => {
    expect(minimumGain(table([row(0.001, 50), row(0.1, 200)]), 0.01)).toBeCloseTo(100, 9);
  });

  it('keeps the end slope of the minimum where that lowers it, and holds it where not', () => {
    const peaked = table([row(0.001, 50), row(0.01, 100), row(0.1, 50)]);
    expect(minimumGain(peaked, 1e-4)).toBeCloseTo(25, 9);
    expect(minimumGain(peaked, 1)).toBeCloseTo(25, 9);
    const bowl = table([row(0.001, 100), row(0.01, 50), row(0.1, 100)]);
    expect(minimumGain(bowl, 1e-4)).toBe(100);
    expect(minimumGain(bowl, 1)).toBe(100);
  });

  it('takes three times the minimum for a missing maximum and holds it outside', () => {
    const part = table([row(0.01, 100, { max: 250 }), row(0.1, 40)]);
    expect(maximumGain(part, 0.01)).toBe(250);
    expect(maximumGain(part, 1)).toBe(120);
    expect(maximumGain(part, 1e-5)).toBe(250);
  });

  it('lets one row follow the typical curve as far as that reaches, then fall with 1/IC', () => {
    const part = table([
      row(0.002, 200, { typ: 290 }),
      row(0.001, null, { typ: 270 }),
      row(0.1, null, { typ: 145 }),
    ]);
    expect(minimumGain(part, 1e-4)).toBe(200);
    expect(minimumGain(part, 0.1)).toBeCloseTo(100, 9);
    expect(minimumGain(part, 0.2)).toBeCloseTo(2, 9);
  });

  it('never takes one row below what a saturation row proves', () => {
    const part = table([row(0.002, 200)], [{ icA: 0.1, ibA: 0.005 }]);
    expect(minimumGain(part, 0.05)).toBe(20);
    expect(minimumGain(part, 0.2)).toBeCloseTo(2, 9);
  });

  it("takes the largest of the part's own cold exponents, at least 0, before the usual one", () => {
    const cold = [row(0.01, 100), row(0.01, 120, { tempDegC: -55 })];
    expect(table(cold).exponent).toBe(0);
    expect(table([row(0.01, 100)]).exponent).toBe(2.4);
    const own = table([row(0.01, 100), row(0.01, 50, { tempDegC: -55 })]);
    expect(100 * gainRatio(-55, own.exponent)).toBeCloseTo(50, 9);
    // Pairs are of equal IC, whatever VCE they were measured at.
    const other = table([row(0.01, 100), row(0.01, 50, { vceV: 10, tempDegC: -55 })]);
    expect(other.exponent).toBe(own.exponent);
  });
});
