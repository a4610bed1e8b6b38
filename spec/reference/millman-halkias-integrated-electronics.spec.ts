/**
 * J. Millman, C. C. Halkias, Integrated Electronics: Example 5.2 (p. 134, saturation check) and Example 6.1 (p. 165, negative
 * base bias, put in by its Thévenin equivalent). Printed results, rounded to 0.01 mA, by way of a public transcription.
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

  it('gives IC 5.36 mA and IB 0.62 mA against 0.18 mA needed for Example 6.1', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 12,
        loadOhm: 2200,
        driveV: (12 * 100 - 12 * 15) / 115,
        rbOhm: (15_000 * 100_000) / 115_000,
        gain: 30,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.icA * 1e3).toBeCloseTo(5.36, 2);
    expect(figures.ibA * 1e3).toBeCloseTo(0.62, 2);
    expect((figures.icA / 30) * 1e3).toBeCloseTo(0.18, 2);
  });
});
