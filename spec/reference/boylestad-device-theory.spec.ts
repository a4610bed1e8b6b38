/**
 * R. L. Boylestad, L. Nashelsky, Electronic Devices and Circuit Theory: Examples 12.17 (derating) and 12.18 (heat sink
 * chain). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { powerShare } from '../../shared/physics/thermal.ts';

describe('Boylestad and Nashelsky, Electronic Devices and Circuit Theory', () => {
  it('leaves 30 W of 80 W at 125 °C with 0.5 W/K in Example 12.17', () => {
    const tjMaxDegC = 25 + 80 / 0.5;
    expect(80 * powerShare(125, tjMaxDegC)).toBeCloseTo(30, 9);
  });

  it('allows 61.54 W through 0.5 + 0.6 + 1.5 K/W from 40 to 200 °C in Example 12.18', () => {
    const ratedW = (200 - 25) / (0.5 + 0.6 + 1.5);
    expect(ratedW * powerShare(40, 200)).toBeCloseTo(61.54, 2);
  });
});
