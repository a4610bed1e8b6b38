/**
 * R. C. Jaeger, T. N. Blalock, Microelectronic Circuit Design, exercise on saturation (IC = IB = 1 mA, βF 50, βR 2,
 * IS 1 fA, VT 25 mV; inputs confirmed, answers recomputed from the book's equations), and A. S. Sedra, K. C. Smith,
 * Microelectronic Circuits: table of VCE(sat) against forced β (from memory), the Early effect as a common intercept of
 * the output characteristics at −VA, ro = VA/IC, IS doubling per about 5 K and VBE falling by about 2 mV/K (common
 * practice). The device solves its equations numerically, so the closed forms of the books are a second way.
 */
import { describe, expect, it } from 'vitest';
import {
  baseVoltageV,
  collectorCurrentA,
  saturationCurrentA,
  saturationCurrentRatio,
  voltageAtCurrentV,
  type Device,
} from '../../shared/physics/device-model.ts';
import { thermalVoltageV } from '../../shared/physics/constants.ts';

const NO_EARLY_V = 1e9;
const device = (change: Partial<Device>): Device => ({
  isA: 1e-15,
  gain: 50,
  reverseGain: 2,
  earlyV: NO_EARLY_V,
  collectorOhm: 0,
  dropV: 0,
  thermalV: 0.025,
  junctions: 1,
  ...change,
});
const current = (ibA: number) => ({ kind: 'current', ibA }) as const;

describe('the Ebers–Moll device', () => {
  it('has VCE(sat) 17.83 mV and VBE(sat) 0.72398 V at IC = IB = 1 mA (Jaeger, Blalock)', () => {
    const saturated = device({});
    expect(voltageAtCurrentV(saturated, current(1e-3), 1e-3)).toBeCloseTo(0.0178337, 6);
    expect(baseVoltageV(saturated, 1e-3, 1e-3)).toBeCloseTo(0.7239762, 6);
    expect(saturationCurrentA(saturated, 1e-3, 1e-3, 0.72397616)).toBeCloseTo(1e-15, 19);
  });

  it.each([
    [48, 235],
    [45, 211],
    [40, 191],
    [30, 166],
    [20, 147],
    [10, 123],
  ])('drops at a forced β of %d, βF 50, βR 0.1, %d mV (Sedra, Smith)', (beta, milliV) => {
    const volt = voltageAtCurrentV(device({ reverseGain: 0.1 }), current(1e-3), beta * 1e-3);
    expect(Math.abs(volt * 1e3 - milliV)).toBeLessThan(0.5);
  });

  it('adds a collector resistance in series: IC·RC more', () => {
    const without = voltageAtCurrentV(device({}), current(1e-3), 0.01);
    const withIt = voltageAtCurrentV(device({ collectorOhm: 2.5 }), current(1e-3), 0.01);
    expect(withIt - without).toBeCloseTo(0.025, 9);
  });

  it('carries βF·IB·(1 + VCE/VA) in the active region, all curves meeting at −VA (Sedra, Smith)', () => {
    const early = device({ earlyV: 100 });
    for (const ibA of [2e-5, 6e-5, 1e-4]) {
      const [atFive, atTen] = [5, 10].map((vceV) => collectorCurrentA(early, current(ibA), vceV));
      expect(atFive).toBeCloseTo(50 * ibA * 1.05, 9);
      const slope = ((atTen ?? 0) - (atFive ?? 0)) / 5;
      expect(5 - (atFive ?? 0) / slope).toBeCloseTo(-100, 6);
      expect(1 / slope).toBeCloseTo(100 / (50 * ibA), 3);
    }
    const [atFive, atTen] = [5, 10].map((vceV) =>
      collectorCurrentA(early, { kind: 'voltage', vbeV: 0.65 }, vceV),
    );
    expect((atTen ?? 0) / (atFive ?? 1)).toBeCloseTo(110 / 105, 9);
  });

  it('follows IS·e^(VBE/VT): ten times the current every 57.6 mV', () => {
    const at = (vbeV: number) => collectorCurrentA(device({}), { kind: 'voltage', vbeV }, 5);
    expect(at(0.6)).toBeCloseTo(1e-15 * Math.exp(0.6 / 0.025), 9);
    expect(at(0.6 + 0.025 * Math.LN10) / at(0.6)).toBeCloseTo(10, 6);
  });

  it('doubles IS about every 5 K near 25 °C: ln 2/(3/T + Eg/(VT·T)), 4.47 K', () => {
    const perK = Math.log(saturationCurrentRatio(25.5) / saturationCurrentRatio(24.5));
    expect(perK).toBeCloseTo(3 / 298.15 + 1.11 / (thermalVoltageV(25) * 298.15), 6);
    expect(Math.LN2 / perK).toBeGreaterThan(4.4);
    expect(Math.LN2 / perK).toBeLessThan(5);
  });

  it('lets VBE fall by about 2 mV/K at constant current', () => {
    const vbe = (degC: number) =>
      baseVoltageV(
        device({ isA: 1e-14 * saturationCurrentRatio(degC), thermalV: thermalVoltageV(degC) }),
        0.01,
        2e-4,
      );
    const slope = (vbe(35) - vbe(15)) / 20;
    expect(slope).toBeLessThan(-1.5e-3);
    expect(slope).toBeGreaterThan(-2.3e-3);
  });
});
