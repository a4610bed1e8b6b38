/**
 * A. S. Sedra, K. C. Smith, Microelectronic Circuits: table of VCE(sat) against forced β for βF 50, βR 0.1, VT 25 mV (from
 * memory), and R. C. Jaeger, T. N. Blalock, Microelectronic Circuit Design, exercise with βF 50, βR 2 and text example
 * with βR 1 (inputs confirmed, 99.7 mV from memory). Held beside the exact solution of the Ebers–Moll equations below, so
 * that no figure rests on memory alone.
 */
import { describe, expect, it } from 'vitest';
import { ebersMollSaturationV, forcedBetaStepV } from '../../shared/physics/saturation.ts';
import { thermalVoltageV } from '../../shared/physics/constants.ts';

/** VCE of the Ebers–Moll transport equations at a given IC/IB, found by bisection on VBC. */
function solvedSaturationV(forcedBeta: number, gain: number, reverse: number, vt: number): number {
  const vbe = 0.7;
  const is = 1e-15;
  const beta = (vbc: number) => {
    const forward = is * Math.exp(vbe / vt);
    const back = is * Math.exp(vbc / vt);
    const ic = forward - back * (1 + 1 / reverse);
    return ic / (forward / gain + back / reverse);
  };
  let low = vbe - 1;
  let high = vbe;
  for (let step = 0; step < 200; step++) {
    const middle = (low + high) / 2;
    if (beta(middle) > forcedBeta) low = middle;
    else high = middle;
  }
  return vbe - low;
}

describe('VCE(sat) over forced β', () => {
  it.each([
    [48, 235],
    [45, 211],
    [40, 191],
    [30, 166],
    [20, 147],
    [10, 123],
    [0, 60],
  ])('at β_f %d is %d mV with βF 50, βR 0.1', (forcedBeta, milliV) => {
    const volt = ebersMollSaturationV(forcedBeta, 50, 0.1, 0.025);
    expect(Math.abs(volt * 1e3 - milliV)).toBeLessThan(0.5);
    expect(volt).toBeCloseTo(solvedSaturationV(forcedBeta, 50, 0.1, 0.025), 9);
  });

  it('is 17.83 mV at β_f 1 with βF 50, βR 2 and 99.7 mV at β_f 25 with βR 1', () => {
    expect(ebersMollSaturationV(1, 50, 2, 0.025) * 1e3).toBeCloseTo(17.83, 2);
    expect(ebersMollSaturationV(25, 50, 1, 0.025) * 1e3).toBeCloseTo(99.7, 1);
  });

  it('moves by the published difference from one forced β to another', () => {
    const vt = thermalVoltageV(25);
    const step = forcedBetaStepV(20, 10, 60, 0.5, 25);
    const difference = solvedSaturationV(20, 60, 0.5, vt) - solvedSaturationV(10, 60, 0.5, vt);
    expect(step).toBeCloseTo(difference, 9);
  });
});
