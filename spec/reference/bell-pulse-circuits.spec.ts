/**
 * D. A. Bell, Solid State Pulse Circuits: Example 4-1 (p. 111, gain needed) and Example 4-5 (p. 125, RC and RB).
 * Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Bell, Solid State Pulse Circuits', () => {
  it.each([
    [1000, 50],
    [220, 227],
  ])('needs a gain for a load of %d Ω at IB 0.2 mA of %d in Example 4-1', (loadOhm, gain) => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm,
        driveV: 5,
        rbOhm: 21_500,
        gain: 500,
        vbeV: 0.7,
        vceSatV: 0,
      }),
    );
    expect(figures.ibA).toBeCloseTo(0.2e-3, 9);
    expect(Math.abs((figures.forcedBeta ?? 0) - gain)).toBeLessThan(0.5);
  });

  it('puts IC 1 mA at RC 11.8 kΩ and the edge of saturation at RB 161 kΩ in Example 4-5', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 12,
        loadOhm: 11_800,
        driveV: 3,
        rbOhm: 161_000,
        gain: 75,
        vbeV: 0.7,
        vceSatV: 0.2,
      }),
    );
    expect(figures.icA * 1e3).toBeCloseTo(1, 6);
    expect(figures.icA / figures.ibA).toBeCloseTo(70, 1);
  });
});
