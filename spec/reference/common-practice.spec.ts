/**
 * Facts every designer of switching stages works with (common practice; Sedra, Smith, Microelectronic Circuits, for the
 * incremental gain): VBE falls 2 mV/K at constant current, ICBO doubles every 10 K, incremental and dc gain agree in the active
 * region, and a junction takes 60 mV more for ten times the current.
 */
import { describe, expect, it } from 'vitest';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { collectorCurrentA, type Device } from '../../shared/physics/device-model.ts';
import { thermalVoltageV } from '../../shared/physics/constants.ts';
import { leakageA, leakageTable } from '../../shared/physics/leakage.ts';
import { relayStage, RELAY_FILE } from '../shared/relay-stage.ts';

const DEVICE: Device = {
  isA: 1e-14,
  gain: 150,
  reverseGain: 2,
  earlyV: 80,
  collectorOhm: 1,
  dropV: 0,
  thermalV: thermalVoltageV(25),
  junctions: 1,
};

describe('common practice', () => {
  it('VBE falls 2 mV/K at a constant load current', () => {
    const load = { kind: 'resistor', resistanceOhm: 1440, tolerance: 0 };
    const vbeV = (degC: number) => {
      const ambientDegC = { min: degC, max: degC };
      const limits = { ...RELAY_FILE.transistor.limits, powerW: 1e5 };
      const transistor = { ...RELAY_FILE.transistor, limits, thermal: { rthJaKPerW: 1e-6 } };
      return nominalFigures(relayStage({ ambientDegC, load, transistor, clamp: null })).vbeV;
    };
    expect((vbeV(75) - vbeV(-25)) / 100).toBeCloseTo(-0.002, 6);
  });

  it('ICBO of one printed row doubles every 10 K', () => {
    const table = leakageTable([{ kind: 'icbo', currentA: 1e-8, tempDegC: 25 }], 10);
    if (table === null) throw new Error('no table');
    expect(leakageA(table, 35) / 1e-8).toBeCloseTo(2, 9);
    expect(leakageA(table, 125) / 1e-8).toBeCloseTo(1024, 6);
  });

  it('incremental gain is dc gain in the active region', () => {
    const at = (ibA: number) => collectorCurrentA(DEVICE, { kind: 'current', ibA }, 5);
    for (const ibA of [1e-5, 1e-4, 5e-4]) {
      const direct = at(ibA) / ibA;
      const incremental = (at(ibA * 1.01) - at(ibA * 0.99)) / (ibA * 0.02);
      expect(Math.abs(incremental / direct - 1)).toBeLessThan(0.01);
    }
  });

  it('saturated it is far lower: the load decides, not the base', () => {
    const at = (ibA: number) => collectorCurrentA(DEVICE, { kind: 'current', ibA }, 0.15);
    const incremental = (at(2.02e-3) - at(1.98e-3)) / 4e-5;
    expect(incremental).toBeLessThan(0.5 * (at(2e-3) / 2e-3));
  });

  it('ten times the current takes 59 mV more at 25 °C', () => {
    const at = (vbeV: number) => collectorCurrentA(DEVICE, { kind: 'voltage', vbeV }, 5);
    const stepV = thermalVoltageV(25) * Math.LN10;
    expect(stepV).toBeCloseTo(0.0592, 4);
    // At small currents, where the collector resistance plays no part.
    expect(at(0.5 + stepV) / at(0.5)).toBeCloseTo(10, 3);
  });
});
