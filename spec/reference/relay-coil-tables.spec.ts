/**
 * Coil data at 20 °C. Songle, SRD series relay data sheet, coil data chart; Matsushita Electric Works (Panasonic), DS
 * relays data sheet, single side stable table: printed nominal currents of printed voltages and resistances. R. S.
 * Sedha, A Textbook of Applied Electronics, Example 3.21 (p. 39): 1500 Ω at 16 mA take 24 V.
 */
import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import { relayStage, RELAY_FILE } from '../shared/relay-stage.ts';

/** Collector current with VCE = 0 of an exact coil at 20 °C. */
function coilA(voltV: number, ohm: number): number {
  const evaluation = evaluateStage(
    relayStage({
      supplyV: { min: voltV, max: voltV },
      ambientDegC: { min: 20, max: 20 },
      load: { ...RELAY_FILE.load, resistanceOhm: ohm, tolerance: 0, temperatureRiseK: 0 },
      baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: 150 },
    }),
  );
  return evaluation.criteria.find(({ id }) => id === 'collector-current')?.value ?? NaN;
}

describe('coil current at 20 °C', () => {
  it.each([
    ['Songle', 5, 70, 71.4],
    ['Songle', 6, 100, 60],
    ['Songle', 9, 225, 40],
    ['Songle', 12, 400, 30],
    ['Songle', 24, 1600, 15],
    ['Songle', 48, 6400, 7.5],
    ['Matsushita', 5, 62.5, 80],
    ['Matsushita', 12, 360, 33.3],
    ['Matsushita', 24, 1440, 16.7],
    ['Matsushita', 5, 125, 40],
    ['Matsushita', 12, 720, 16.7],
    ['Matsushita', 24, 2880, 8.3],
    ['Sedha', 24, 1500, 16],
  ])('%s: %d V across %d Ω draw %d mA', (_, voltV, ohm, milliA) => {
    expect(coilA(voltV, ohm) * 1e3).toBeCloseTo(milliA, 1);
  });
});
