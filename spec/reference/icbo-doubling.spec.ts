/**
 * ICBO doubling per 10 K. R. S. Sedha, A Textbook of Applied Electronics, Example 14.13 (p. 318), and S. Salivahanan
 * et al., Electronics Devices and Circuits, Example 6.13 (p. 164), the same numbers; J. J. Cathey, Schaum's Outline of
 * Electronic Devices and Circuits, Problem 5.1 (p. 143); D. A. Bell, Electronic Devices and Circuits, Example 1.4
 * (p. 25). Printed results by way of public transcriptions.
 */
import { describe, expect, it } from 'vitest';
import { leakageA, leakageTable } from '../../shared/physics/leakage.ts';

function leakage(currentA: number, tempDegC: number, atDegC: number): number {
  const table = leakageTable([{ kind: 'icbo', currentA, tempDegC }], 10);
  return table === null ? NaN : leakageA(table, atDegC);
}

describe('ICBO doubling per 10 K', () => {
  it('gives 49.25 µA at 50 °C from 10 µA at 27 °C (Sedha; Salivahanan)', () => {
    expect(leakage(10e-6, 27, 50) * 1e6).toBeCloseTo(49.25, 2);
  });

  it('amplifies it to a collector current of 15.01 mA with β 50 and IB 0.25 mA', () => {
    const icboA = leakage(10e-6, 27, 50);
    expect((50 * 0.25e-3 + (1 + 50) * icboA) * 1e3).toBeCloseTo(15.01, 2);
  });

  it('gives 45.255 µA at 90 °C from 0.5 µA at 25 °C (Cathey)', () => {
    expect(leakage(0.5e-6, 25, 90) * 1e6).toBeCloseTo(45.255, 3);
  });

  it.each([
    [35, 60],
    [45, 120],
  ])('gives at %d °C %d nA from 30 nA at 25 °C (Bell)', (degC, nanoA) => {
    expect(leakage(30e-9, 25, degC) * 1e9).toBeCloseTo(nanoA, 6);
  });
});
