/**
 * T. L. Floyd, Electronic Devices: Example 4.4 (p. 125, saturation check) and Example 4.9 (p. 132, largest base
 * resistor). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Floyd, Electronic Devices', () => {
  it('finds the stage of Example 4.4 saturated: IC 9.8 mA, β·IB 11.5 mA', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 1000,
        driveV: 3,
        rbOhm: 10_000,
        gain: 50,
        vbeV: 0.7,
        vceSatV: 0.2,
      }),
    );
    expect(figures.saturated).toBe(true);
    expect(figures.icA).toBeCloseTo(9.8e-3, 6);
    expect(50 * figures.ibA).toBeCloseTo(11.5e-3, 6);
  });

  it('puts the edge of saturation of Example 4.9 at RB = 86 kΩ: IB 50 µA', () => {
    const at = (rbOhm: number) =>
      nominalFigures(
        textbookStage({
          supplyV: 10,
          loadOhm: 1000,
          driveV: 5,
          rbOhm,
          gain: 200,
          vbeV: 0.7,
          vceSatV: 0,
        }),
      );
    expect(at(86_000).ibA).toBeCloseTo(50e-6, 10);
    expect(at(86_000).overdriveFactor).toBeCloseTo(1, 6);
    expect(at(85_900).saturated).toBe(true);
    expect(at(86_100).saturated).toBe(false);
  });
});
