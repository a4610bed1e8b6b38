/**
 * Y. N. Bapat, Electronics Circuits and Systems: Example 9.1 (p. 278, least gain). Printed results by way of a
 * public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Bapat, Electronics Circuits and Systems', () => {
  it('gives IC(sat) 4.80 mA, IB 0.420 mA and a least gain of 11.43 for Example 9.1', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 5,
        loadOhm: 1000,
        driveV: 5,
        rbOhm: 10_000,
        gain: 50,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.icA).toBeCloseTo(4.8e-3, 6);
    expect(figures.ibA).toBeCloseTo(4.2e-4, 8);
    expect(figures.icA / figures.ibA).toBeCloseTo(11.43, 2);
  });
});
