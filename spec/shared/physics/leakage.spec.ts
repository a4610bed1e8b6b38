import { describe, expect, it } from 'vitest';
import { thermalVoltageV } from '../../../shared/physics/constants.ts';
import {
  cutOffAnchor,
  cutOffCurrentA,
  leakageA,
  leakageTable,
  type LeakagePoint,
  type LeakageTable,
} from '../../../shared/physics/leakage.ts';

function table(points: LeakagePoint[]): LeakageTable {
  const made = leakageTable(points, 10);
  if (made === null) throw new Error('no table');
  return made;
}

describe('leakageTable', () => {
  it('prefers ICBO to ICES and ICEX, and those to ICEO', () => {
    expect(leakageTable([], 10)).toBeNull();
    const icbo = table([
      { kind: 'iceo', currentA: 1e-3, tempDegC: 25 },
      { kind: 'icbo', currentA: 1e-8, tempDegC: 25 },
      { kind: 'ices', currentA: 1e-5, tempDegC: 25 },
    ]);
    expect(icbo.currentA).toEqual([1e-8]);
  });

  it('takes the largest of equal temperature', () => {
    const part = table([
      { kind: 'icbo', currentA: 1e-8, tempDegC: 25 },
      { kind: 'icbo', currentA: 2e-8, tempDegC: 25 },
    ]);
    expect(leakageA(part, 25)).toBe(2e-8);
  });
});

describe('leakageA', () => {
  const printed = table([
    { kind: 'icbo', currentA: 1e-5, tempDegC: 150 },
    { kind: 'icbo', currentA: 1e-8, tempDegC: 25 },
  ]);

  it('is held below the coldest row and exponential through the rows', () => {
    expect(leakageA(printed, -55)).toBe(1e-8);
    expect(leakageA(printed, 25)).toBeCloseTo(1e-8, 20);
    expect(leakageA(printed, 87.5)).toBeCloseTo(Math.sqrt(1e-13), 12);
    expect(leakageA(printed, 150)).toBeCloseTo(1e-5, 15);
  });

  it('doubles every 10 K beyond the hottest row, or sooner where the rows fit less', () => {
    expect(leakageA(printed, 160)).toBeCloseTo(2e-5, 12);
    const steep = table([
      { kind: 'icbo', currentA: 50e-9, tempDegC: 25 },
      { kind: 'icbo', currentA: 50e-6, tempDegC: 100 },
    ]);
    const fittedK = 75 / Math.log2(1000);
    expect(leakageA(steep, 100 + fittedK)).toBeCloseTo(100e-6, 12);
  });

  it('keeps a printed zero at zero', () => {
    expect(leakageA(table([{ kind: 'icbo', currentA: 0, tempDegC: 25 }]), 125)).toBe(0);
  });
});

describe('cutOffAnchor', () => {
  it('takes the lowest printed minimum at no more than a tenth of the rated current', () => {
    const rows = [
      { icA: 0.002, minV: 0.55 },
      { icA: 0.01, minV: 0.65 },
      { icA: 0.15, minV: 0.5 },
    ];
    expect(cutOffAnchor(rows, 0.2, 0.55)).toEqual({ icA: 0.002, vbeV: 0.55 });
  });

  it('falls back to the usual minimum at a hundredth', () => {
    expect(cutOffAnchor([{ icA: 0.15, minV: 0.5 }], 0.2, 0.55)).toEqual({
      icA: 0.002,
      vbeV: 0.55,
    });
  });
});

describe('cutOffCurrentA', () => {
  it('passes the anchor and rises by e per thermal voltage', () => {
    const anchor = { icA: 0.01, vbeV: 0.65 };
    expect(cutOffCurrentA(anchor, 0.65, 25, -0.002)).toBeCloseTo(0.01, 12);
    expect(cutOffCurrentA(anchor, 0.65 - 0.2, 125, -0.002)).toBeCloseTo(0.01, 12);
    const lower = 0.65 - thermalVoltageV(25);
    expect(cutOffCurrentA(anchor, lower, 25, -0.002)).toBeCloseTo(0.01 / Math.E, 12);
  });
});
