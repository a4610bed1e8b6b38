/**
 * A. S. Sedra, K. C. Smith, Microelectronic Circuits, exercise on BJT storage time: τs 10 ns, β 50, IC 10 mA, IB 2 mA on
 * (inputs confirmed, answers from memory: 90 and 8.2 ns by the linear form). The linear form holds for ts ≪ τs only;
 * beside it stands the charge equation integrated step by step.
 */
import { describe, expect, it } from 'vitest';
import { storageConstantSec, storageTimeSec } from '../../shared/physics/storage-time.ts';

const TAU = 10e-9;

/** Excess charge run down by dQ/dt = −Q/τs − (IC/β + IB2), in small steps. */
function integratedSec(onA: number, offA: number, icA: number, gain: number): number {
  const stepSec = 1e-13;
  let chargeC = TAU * (onA - icA / gain);
  let time = 0;
  while (chargeC > 0) {
    chargeC += stepSec * (-chargeC / TAU - icA / gain - offA);
    time += stepSec;
  }
  return time;
}

describe('storage time', () => {
  it.each([
    [0, 23.03],
    [2e-3, 5.978],
  ])('with IB2 %d A is %d ns', (offA, nanoSec) => {
    const sec = storageTimeSec(TAU, 2e-3, offA, 10e-3, 50);
    expect(sec * 1e9).toBeCloseTo(nanoSec, 2);
    expect(sec).toBeCloseTo(integratedSec(2e-3, offA, 10e-3, 50), 11);
  });

  it('comes back from the row its constant was taken from: 2N3904, 200 ns at 10/1/1 mA', () => {
    const row = { tsSec: 200e-9, icA: 0.01, ib1A: 1e-3, ib2A: 1e-3 };
    const tau = storageConstantSec(row, 100) ?? NaN;
    expect(tau * 1e9).toBeCloseTo(334.6, 0);
    expect(storageTimeSec(tau, 1e-3, 1e-3, 0.01, 100)).toBeCloseTo(200e-9, 12);
  });
});
