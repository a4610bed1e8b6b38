/**
 * M. H. Rashid, Power Electronics, Example 4-2 (overdrive factor 5; from memory): 200 V, 11 Ω, 10 V at the base, β 8…40, VCE(sat)
 * 1 V, VBE(sat) 1.5 V. Held beside the loop equations worked out below, so that no figure rests on memory alone.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Rashid, Power Electronics', () => {
  const rbOhm = 0.7514;
  const figures = nominalFigures(
    textbookStage({
      supplyV: 200,
      loadOhm: 11,
      driveV: 10,
      rbOhm,
      gain: 8,
      vbeV: 1.5,
      vceSatV: 1,
    }),
  );

  it('draws 18.1 A and drives 11.31 A into the base with RB 0.7514 Ω', () => {
    const icA = (200 - 1) / 11;
    const ibA = (10 - 1.5) / rbOhm;
    expect(figures.icA).toBeCloseTo(icA, 5);
    expect(figures.ibA).toBeCloseTo(ibA, 5);
    expect(icA).toBeCloseTo(18.1, 1);
    expect(ibA).toBeCloseTo(11.3125, 2);
  });

  it('is overdriven five times, forced β 1.6, and loses 35.07 W', () => {
    // The engine takes the load at VCE = 0 for both ratios, half a per cent more current.
    expect(Math.abs((figures.overdriveFactor * 200) / 199 / 5 - 1)).toBeLessThan(1e-3);
    expect(((figures.forcedBeta ?? NaN) * 199) / 200).toBeCloseTo(1.6, 2);
    expect(figures.powerW).toBeCloseTo(18.0909 * 1 + 11.3122 * 1.5, 2);
    expect(Math.abs(figures.powerW / 35.07 - 1)).toBeLessThan(1e-3);
  });
});
