/**
 * V. K. Mehta, R. Mehta, Principles of Electronics: Examples 18.1 (p. 472), 18.2 (p. 475), 18.3 (pp. 475-476), 12.16 and 12.17
 * (pp. 323-324). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookOffV, textbookStage } from './textbook-stage.ts';
import { powerShare } from '../../shared/physics/thermal.ts';

describe('Mehta, Principles of Electronics', () => {
  it('reaches the edge of saturation at an input of 5.4 V in Example 18.1', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 1000,
        driveV: 5.4,
        rbOhm: 47_000,
        gain: 100,
        vbeV: 0.7,
        vceSatV: 0,
      }),
    );
    expect(figures.overdriveFactor).toBeCloseTo(1, 6);
  });

  it('needs a gain of 19.3 in Example 18.3, printed as 19.4 with IB rounded first', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 1000,
        driveV: 2,
        rbOhm: 2700,
        gain: 50,
        vbeV: 0.7,
        vceSatV: 0.7,
      }),
    );
    expect(figures.icA / figures.ibA).toBeCloseTo(19.3, 1);
    expect(figures.icA / 0.48e-3).toBeCloseTo(19.4, 1);
  });

  it('leaves the stage of Example 18.3 with VBB 1 V unsaturated', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 1000,
        driveV: 1,
        rbOhm: 2700,
        gain: 50,
        vbeV: 0.7,
        vceSatV: 0.7,
      }),
    );
    expect(figures.saturated).toBe(false);
  });

  it.each([
    [300, 200],
    [60, 1000],
  ])('allows with %d K/W at 30 °C and TJmax 90 °C %d mW in Example 12.16', (rthKPerW, powerMw) => {
    const ratedW = (90 - 25) / rthKPerW;
    expect(ratedW * powerShare(30, 90) * 1e3).toBeCloseTo(powerMw, 6);
  });

  it.each([
    [25, 2.19],
    [75, 1.56],
  ])('allows at %d °C, VCE 4 V and 20 K/W %d A in Example 12.17', (ambientDegC, icA) => {
    const ratedW = (200 - 25) / 20;
    expect((ratedW * powerShare(ambientDegC, 200)) / 4).toBeCloseTo(icA, 2);
  });

  it('stands at 9.99 V off in Example 18.2: ICBO 10 µA across 1 kΩ', () => {
    expect(textbookOffV({ supplyV: 10, loadOhm: 1000, leakageA: 1e-5 })).toBeCloseTo(9.99, 4);
  });
});
