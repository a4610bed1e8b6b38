/**
 * K. C. Nandi, Electronic Devices: Example 5.13.8 (p. 5-51, saturation check, base fed from the supply).
 * Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Nandi, Electronic Devices', () => {
  it('gives IB 61.33 µA against 49 µA needed for Example 5.13.8', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 2000,
        driveV: 10,
        rbOhm: 150_000,
        gain: 100,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.ibA * 1e6).toBeCloseTo(61.33, 2);
    expect((figures.icA / 100) * 1e6).toBeCloseTo(49, 3);
  });
});
