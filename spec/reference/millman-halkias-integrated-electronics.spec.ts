/**
 * J. Millman, C. C. Halkias, Integrated Electronics: Example 5.2 (p. 134, saturation check). Printed results,
 * rounded to 0.01 mA, by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Millman and Halkias, Integrated Electronics', () => {
  it('gives IC 3.27 mA, IB 0.08 mA against 0.03 mA needed for Example 5.2', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 3000,
        driveV: 5,
        rbOhm: 50_000,
        gain: 100,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.icA * 1e3).toBeCloseTo(3.27, 2);
    expect(figures.ibA * 1e3).toBeCloseTo(0.08, 2);
    expect((figures.icA / 100) * 1e3).toBeCloseTo(0.03, 2);
  });
});
