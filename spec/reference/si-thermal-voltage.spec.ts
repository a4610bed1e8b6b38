/**
 * SI Brochure, 9th edition (2019): k = 1.380649e-23 J/K and e = 1.602176634e-19 C, both exact. kT/q: 25.693 mV at 25 °C,
 * 25.852 mV at 300 K, 25.003 mV at 17 °C.
 */
import { describe, expect, it } from 'vitest';
import { thermalVoltageV } from '../../shared/physics/constants.ts';

describe('thermal voltage', () => {
  it.each([
    [25, 25.693],
    [26.85, 25.852],
    [17, 25.003],
  ])('at %d °C is %d mV', (degC, milliV) => {
    expect(thermalVoltageV(degC) * 1e3).toBeCloseTo(milliV, 3);
  });
});
