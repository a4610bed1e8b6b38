/**
 * B. Kumar, S. B. Jain, Electronic Devices and Circuits: Example 4.4 (p. 203, saturation check) and Example 4.5
 * (p. 205, RB with tenfold drive). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Kumar and Jain, Electronic Devices and Circuits', () => {
  it('gives IB 0.084 mA against 0.049 mA needed for Example 4.4', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 2000,
        driveV: 5,
        rbOhm: 50_000,
        gain: 100,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.ibA * 1e3).toBeCloseTo(0.084, 6);
    expect((figures.icA / 100) * 1e3).toBeCloseTo(0.049, 6);
  });

  it('drives the transistor of Example 4.5 ten times over with RB 2.14 kΩ', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 1000,
        driveV: 5,
        rbOhm: 2140,
        gain: 50,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.ibA / (figures.icA / 50)).toBeCloseTo(10, 1);
  });
});
