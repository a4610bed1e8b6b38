/**
 * D. A. Neamen, Electronic Circuit Analysis and Design: Example 3.5 (p. 119, saturation currents) and Example
 * 3.10 (p. 132, power switch). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Neamen, Electronic Circuit Analysis and Design', () => {
  it('gives IB 0.033 mA and IC 2.45 mA for Example 3.5, which the active region would put at 3.32 mA', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 4000,
        driveV: 8,
        rbOhm: 220_000,
        gain: 100,
        vbeV: 0.7,
        vceSatV: 0.2,
      }),
    );
    expect(figures.ibA * 1e3).toBeCloseTo(0.033, 3);
    expect(figures.icA * 1e3).toBeCloseTo(2.45, 3);
    expect(figures.ibA * 100 * 1e3).toBeCloseTo(3.32, 2);
    expect((figures.icA + figures.ibA) * 1e3).toBeCloseTo(2.48, 2);
    expect(figures.saturated).toBe(true);
  });

  it('gives IB 47.08 mA, IC 2.38 A and P 0.27 W with the base term for Example 3.10', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 12,
        loadOhm: 5,
        driveV: 12,
        rbOhm: 240,
        gain: 75,
        vbeV: 0.7,
        vceSatV: 0.1,
      }),
    );
    expect(figures.ibA * 1e3).toBeCloseTo(47.08, 2);
    expect(figures.icA).toBeCloseTo(2.38, 3);
    expect(figures.powerW).toBeCloseTo(0.271, 3);
  });
});
