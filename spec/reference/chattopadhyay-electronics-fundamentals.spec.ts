/**
 * D. Chattopadhyay, P. C. Rakshit, Electronics Fundamentals and Applications: chapter 17, example 9 (p. 442), a NOT gate with
 * R1 15 kΩ and R2 100 kΩ to −10 V; low level 0.2 V as printed, by way of a public transcription. The bias resistor is put in
 * by its Thévenin equivalent, since a stage has its base–emitter resistor at the emitter.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { textbookStage } from './textbook-stage.ts';

describe('Chattopadhyay and Rakshit, Electronics Fundamentals and Applications', () => {
  it('saturates the gate of example 9: VOL 0.2 V, IB 0.505 mA where 0.163 mA are needed', () => {
    const figures = nominalFigures(
      textbookStage({
        supplyV: 10,
        loadOhm: 2000,
        driveV: (10 * 100 - 10 * 15) / 115,
        rbOhm: (15_000 * 100_000) / 115_000,
        gain: 30,
        vbeV: 0.8,
        vceSatV: 0.2,
      }),
    );
    expect(figures.saturated).toBe(true);
    expect(figures.vceV).toBeCloseTo(0.2, 6);
    expect(figures.ibA * 1e3).toBeCloseTo(9.2 / 15 - 10.8 / 100, 6);
    expect((figures.icA / 30) * 1e3).toBeCloseTo(0.163, 3);
  });
});
