/**
 * A. Malvino, D. J. Bates, Electronic Principles: Example 7-7 (p. 235, current gain in hard saturation, ideal diode) and
 * Example 7-8 (p. 236, voltage while off). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookOffV, textbookStage } from './textbook-stage.ts';

describe('Malvino and Bates, Electronic Principles', () => {
  it('gives IC(sat) 4.0 mA and IC/IB 40 for Example 7-7', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 20,
        loadOhm: 5000,
        driveV: 10,
        rbOhm: 100_000,
        gain: 150,
        vbeV: 0,
        vceSatV: 0,
      }),
    );
    expect(figures.icA).toBeCloseTo(4.0e-3, 7);
    expect(figures.forcedBeta).toBeCloseTo(40, 4);
  });

  it('stands at 5.00 V off in Example 7-8: ICEO 50 nA across 1 kΩ', () => {
    expect(textbookOffV({ supplyV: 5, loadOhm: 1000, leakageA: 5e-8 })).toBeCloseTo(5.0, 3);
  });
});
