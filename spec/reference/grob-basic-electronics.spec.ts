/**
 * M. E. Schultz, Grob's Basic Electronics: Examples 22-1 and 22-3 (pp. 674-675, L/R time constants); J. Bird,
 * Electrical Circuit Theory and Technology, chapter 17 example 12 (p. 274). Printed results by way of a public
 * transcription. A coil shorted by an ideal clamp falls to 1/e within one time constant.
 */
import { describe, expect, it } from 'vitest';
import { releaseTimeSec } from '../../shared/physics/coil.ts';

const NO_CLAMP_V = 1e-12;

describe('L/R time constant', () => {
  it.each([
    [20, 100, 0.2],
    [20, 1e6, 2e-5],
    [0.2, 1000, 0.2e-3],
  ])('of %d H and %d Ω is %d s', (henry, ohm, seconds) => {
    expect(releaseTimeSec(henry, ohm, 1, 1 / Math.E, NO_CLAMP_V)).toBeCloseTo(seconds, 9);
  });
});
