import { describe, expect, it } from 'vitest';
import { clampChargeC, copperRatio, releaseTimeSec } from '../../../shared/physics/coil.ts';

/** The same run-down integrated step by step: L·di/dt = −R·i − Vc. */
function integrated(henry: number, ohm: number, startA: number, untilA: number, clampV: number) {
  const stepSec = 1e-7;
  let currentA = startA;
  let chargeC = 0;
  let timeSec = 0;
  while (currentA > untilA) {
    chargeC += currentA * stepSec;
    currentA -= ((ohm * currentA + clampV) / henry) * stepSec;
    timeSec += stepSec;
  }
  return { timeSec, chargeC };
}

describe('releaseTimeSec', () => {
  it('agrees with the differential equation', () => {
    const { timeSec } = integrated(0.5, 300, 0.08, 0.008, 0.5);
    expect(releaseTimeSec(0.5, 300, 0.08, 0.008, 0.5)).toBeCloseTo(timeSec, 6);
  });

  it('is nothing below the release current and endless without a clamp voltage', () => {
    expect(releaseTimeSec(1, 100, 0.01, 0.02, 0.5)).toBe(0);
    expect(releaseTimeSec(1, 100, 0.03, 0.02, 0)).toBe(Infinity);
  });

  it('gets shorter with a higher clamp', () => {
    expect(releaseTimeSec(1, 100, 0.1, 0.01, 24)).toBeLessThan(
      releaseTimeSec(1, 100, 0.1, 0.01, 0.5),
    );
  });
});

describe('clampChargeC', () => {
  it('agrees with the differential equation', () => {
    const { chargeC } = integrated(0.5, 300, 0.08, 0, 5);
    expect(clampChargeC(0.5, 300, 0.08, 5)).toBeCloseTo(chargeC, 7);
  });

  it('takes no more energy than the coil holds', () => {
    const heldJ = 0.5 * 0.5 * 0.08 ** 2;
    expect(30 * clampChargeC(0.5, 300, 0.08, 30)).toBeLessThan(heldJ);
    expect(3000 * clampChargeC(0.5, 300, 0.08, 3000)).toBeGreaterThan(0.95 * heldJ);
  });
});

describe('copperRatio', () => {
  it('is 1 at its reference and never negative', () => {
    expect(copperRatio(20, 20)).toBe(1);
    expect(copperRatio(-300, 20)).toBe(0);
  });
});
