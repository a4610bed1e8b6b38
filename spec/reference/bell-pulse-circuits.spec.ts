/**
 * D. A. Bell, Solid State Pulse Circuits: Examples 4-1 (p. 111, gain needed), 4-2 (p. 112, dissipation), 4-5 (p. 125, RC and
 * RB), 4-7 (p. 126, series diode) and 4-8 (p. 129, base fed from the supply). Printed results by way of a public transcription.
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

  it('turns 2 mW into heat saturated and 16 mW at VCE 2 V in Example 4-2, VBE taken as nothing', () => {
    const stage = { supplyV: 10, loadOhm: 1000, driveV: 5, gain: 500, vbeV: 0, vceSatV: 0.2 };
    const saturated = nominalFigures(textbookStage({ ...stage, rbOhm: 100_000 }));
    // The text takes VCC/RC, 10 mA, for the 9.8 mA that flow.
    expect((saturated.powerW * 1e3) / (9.8 / 10)).toBeCloseTo(2, 3);
    const linear = nominalFigures(textbookStage({ ...stage, rbOhm: 312_500 }));
    expect(linear.vceV).toBeCloseTo(2, 6);
    expect(linear.powerW * 1e3).toBeCloseTo(16, 3);
  });

  it('puts the edge of saturation of Example 4-7 at RB 213 kΩ with a diode of 0.7 V in the emitter', () => {
    const stage = textbookStage({
      // Both loops run through the diode.
      supplyV: 15 - 0.7,
      loadOhm: 10_000,
      driveV: 10 - 0.7,
      rbOhm: 213_000,
      gain: 40,
      vbeV: 0.7,
      vceSatV: 0.2,
    });
    const figures = nominalFigures(stage);
    // Printed to three figures: 213.475 kΩ exactly.
    expect(Math.abs(figures.icA / figures.ibA / 35 - 213 / 213.475)).toBeLessThan(1e-3);
  });

  it('needs RC 980 Ω and RB 93 kΩ from the supply for 10 mA at a gain of 100 in Example 4-8', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 980,
        driveV: 10,
        rbOhm: 93_000,
        gain: 110,
        vbeV: 0.7,
        vceSatV: 0.2,
      }),
    );
    expect(figures.icA * 1e3).toBeCloseTo(10, 6);
    expect(figures.icA / figures.ibA).toBeCloseTo(100, 6);
  });
});
