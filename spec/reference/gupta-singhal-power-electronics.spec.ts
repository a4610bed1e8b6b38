/**
 * B. R. Gupta, V. Singhal, Power Electronics: Example 1.4 (p. 18, base drive and loss). Printed results by way of a
 * public transcription.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Gupta and Singhal, Power Electronics', () => {
  it('gives IB 1.825 A and P 28.6525 W at VBB 11.65 V for Example 1.4', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 220,
        loadOhm: 8,
        driveV: 11.65,
        rbOhm: 6,
        gain: 16,
        vbeV: 0.7,
        vceSatV: 1,
      }),
    );
    expect(figures.ibA).toBeCloseTo(1.825, 3);
    expect(figures.powerW).toBeCloseTo(28.6525, 2);
  });
});
