/**
 * Yageo, RC0402 chip resistor data sheet, derating curve: 100 % up to 70 °C, straight to 0 at 155 °C.
 */
import { describe, expect, it } from 'vitest';
import { resistorShare } from '../../shared/physics/thermal.ts';

describe('chip resistor derating', () => {
  it.each([
    [-55, 1],
    [70, 1],
    [112.5, 0.5],
    [155, 0],
    [200, 0],
  ])('at %d °C leaves a share of %d', (degC, share) => {
    expect(resistorShare(degC)).toBeCloseTo(share, 12);
  });
});
