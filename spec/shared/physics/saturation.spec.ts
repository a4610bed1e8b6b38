import { describe, expect, it } from 'vitest';
import { thermalVoltageV } from '../../../shared/physics/constants.ts';
import {
  forcedBetaStepV,
  interceptAtV,
  pieceAt,
  resistanceRatio,
  type SaturationLine,
  saturationLine,
} from '../../../shared/physics/saturation.ts';

function line(
  rows: { icA: number; ibA: number; maxV: number | null }[],
  betaR: number | null = null,
): SaturationLine {
  const made = saturationLine(rows, betaR, false);
  if (made === null) throw new Error('no line');
  return made;
}

const at = (made: SaturationLine, icA: number) => {
  const k = pieceAt(made, icA);
  return (made.interceptV[k] ?? NaN) + (made.slopeOhm[k] ?? NaN) * icA;
};

describe('saturationLine', () => {
  it('is null where no row prints a maximum', () => {
    expect(saturationLine([{ icA: 0.01, ibA: 0.001, maxV: null }], null, false)).toBeNull();
  });

  it('runs through its rows, straight between them and on beyond the last', () => {
    const part = line([
      { icA: 0.05, ibA: 0.005, maxV: 0.3 },
      { icA: 0.01, ibA: 0.001, maxV: 0.2 },
    ]);
    expect(at(part, 0.01)).toBeCloseTo(0.2, 12);
    expect(at(part, 0.03)).toBeCloseTo(0.25, 12);
    expect(at(part, 0.1)).toBeCloseTo(0.425, 12);
  });

  it('starts at the larger of the first offset and the intrinsic drop', () => {
    const steep = line([
      { icA: 0.15, ibA: 0.015, maxV: 0.3 },
      { icA: 0.5, ibA: 0.05, maxV: 1 },
    ]);
    const intrinsicV = thermalVoltageV(25) * Math.log(1 + 11 / 0.5);
    expect(at(steep, 0)).toBeCloseTo(intrinsicV, 12);
  });

  it('never starts above the first row', () => {
    const flat = line([{ icA: 0.01, ibA: 0.001, maxV: 0.05 }]);
    expect(at(flat, 0)).toBeCloseTo(0.05, 12);
    expect(at(flat, 1)).toBeCloseTo(0.05, 12);
  });

  it('merges rows of equal current and never falls', () => {
    const part = line([
      { icA: 0.01, ibA: 0.001, maxV: 0.3 },
      { icA: 0.01, ibA: 0.0005, maxV: 0.25 },
      { icA: 0.1, ibA: 0.01, maxV: 0.2 },
    ]);
    expect(at(part, 0.1)).toBeCloseTo(0.3, 12);
    expect(part.testBeta[0]).toBe(10);
  });
});

describe('temperature of VCE(sat)', () => {
  it('takes penalties above 25 °C and no credit below', () => {
    expect(resistanceRatio(125, 0.004)).toBeCloseTo(1.4, 12);
    expect(resistanceRatio(-40, 0.004)).toBe(1);
    const part = line([
      { icA: 0.01, ibA: 0.001, maxV: 0.2 },
      { icA: 0.05, ibA: 0.005, maxV: 0.3 },
      { icA: 0.1, ibA: 0.01, maxV: 0.8 },
    ]);
    const [, rising = 0, negative = 0] = part.interceptV;
    expect(interceptAtV(part, 1, 125)).toBeCloseTo(rising * (398.15 / 298.15), 12);
    expect(interceptAtV(part, 1, -40)).toBe(rising);
    expect(negative).toBeLessThan(0);
    expect(interceptAtV(part, 2, 125)).toBe(negative);
  });
});

describe('VCE(sat) of a Darlington', () => {
  it('starts 0.6 V higher and grows by 2 mV/K in the cold, not with heat', () => {
    const part = saturationLine([{ icA: 3, ibA: 0.012, maxV: 2 }], null, true);
    expect(part).not.toBeNull();
    if (part === null) return;
    const intrinsicV = thermalVoltageV(25) * Math.log(1 + 251 / 0.5) + 0.6;
    expect(interceptAtV(part, 0, 25)).toBeCloseTo(intrinsicV, 12);
    expect(interceptAtV(part, 0, 125)).toBeCloseTo(intrinsicV, 12);
    expect(interceptAtV(part, 0, -25)).toBeCloseTo(intrinsicV + 0.1, 12);
  });
});

describe('forcedBetaStepV', () => {
  it('is nothing at or below the tested IC/IB and grows towards the edge', () => {
    expect(forcedBetaStepV(10, 10, 50, 0.5, 25)).toBe(0);
    expect(forcedBetaStepV(8, 10, 50, 0.5, 25)).toBe(0);
    const steps = [15, 25, 40, 49.9].map((beta) => forcedBetaStepV(beta, 10, 50, 0.5, 25));
    expect(steps).toEqual([...steps].sort((a, b) => a - b));
    expect(steps[0]).toBeGreaterThan(0);
  });
});
