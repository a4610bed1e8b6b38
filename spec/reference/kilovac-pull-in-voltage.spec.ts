/**
 * TE Connectivity / Kilovac, High Voltage Relay Application Notes, "Calculating Pull-in and Drop-out Voltages at High or
 * Low Temperatures", text to Figure 47: 16 V at 25 °C with 0.003853/K. Leach International, Application Note 102:
 * 290 Ω at 25 °C is read off a chart as 403.31 Ω at 125 °C. IEC 60028: 0.00393/K at 20 °C.
 */
import { describe, expect, it } from 'vitest';
import { copperRatio } from '../../shared/physics/coil.ts';

describe('resistance of a copper coil over temperature', () => {
  it.each([
    [85, 19.7],
    [100, 20.6],
    [-25, 12.9],
  ])('moves a pull-in voltage of 16 V at 25 °C to that at %d °C, %d V', (degC, voltageV) => {
    expect(16 * copperRatio(degC, 25)).toBeCloseTo(voltageV, 1);
  });

  it('lies within 0.5 % of the chart reading of 403.31 Ω at 125 °C', () => {
    const ohm = 290 * copperRatio(125, 25);
    expect(Math.abs(ohm - 403.31) / 403.31).toBeLessThan(0.005);
  });

  it('rises by 0.00393/K at 20 °C', () => {
    expect(copperRatio(21, 20) - 1).toBeCloseTo(0.00393, 5);
  });
});
