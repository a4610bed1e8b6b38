/**
 * K. L. Kishore, Electronic Devices and Circuits: Example 4.1 (p. 203, least base current) and Example 4.6 (p. 207,
 * temperature limit of the off state). Printed results by way of a public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';
import { leakageA, leakageTable } from '../../shared/physics/leakage.ts';

describe('Kishore, Electronic Devices and Circuits', () => {
  it('needs IB 61.2 µA for IC 3 mA at α 0.98 in Example 4.1', () => {
    const gain = 0.98 / (1 - 0.98);
    const figures = nominalFigures(
      textbookStage({
        supplyV: 12,
        loadOhm: 4000,
        driveV: 5,
        rbOhm: 4.3 / 61.2e-6,
        gain,
        vbeV: 0.7,
        vceSatV: 0,
      }),
    );
    expect(figures.overdriveFactor).toBeCloseTo(1, 3);
  });

  it('reaches the ICBO limit of 18 µA of Example 4.6 at 57 °C, rounded up in the text', () => {
    const table = leakageTable([{ kind: 'icbo', currentA: 2e-6, tempDegC: 25 }], 10);
    expect(table).not.toBeNull();
    if (table === null) return;
    expect(leakageA(table, 56)).toBeLessThan(18e-6);
    expect(leakageA(table, 57)).toBeGreaterThanOrEqual(18e-6);
  });
});
