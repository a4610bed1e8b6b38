/**
 * The copper law. IEC 60028: 0.00393/K at 20 °C, zero resistance inferred at −234.5 °C. J. Bird, Electrical Circuit Theory and
 * Technology, chapter 3 example 12 (p. 28, 0.0039/K at 18 °C); C. R. Robertson, Fundamental Electrical and Electronic
 * Principles, Example 1.18 (p. 23, 0.00428/K at 0 °C); R. S. Sedha, A Textbook of Applied Electronics, Example 3.13 (p. 32,
 * 0.0039/K at 20 °C); Leach International, Application Note 102 (290 Ω at 25 °C, 403.31 Ω at 125 °C read from a chart). The
 * books round the coefficient, so agreement is within 0.4 %. Printed results by way of public transcriptions.
 */
import { describe, expect, it } from 'vitest';
import { copperRatio } from '../../shared/physics/coil.ts';

describe('copper', () => {
  it('rises by 0.00393 of its resistance at 20 °C per kelvin (IEC 60028)', () => {
    expect(copperRatio(21, 20) - 1).toBeCloseTo(0.00393, 5);
    expect(copperRatio(-234.5, 20)).toBe(0);
  });

  it.each([
    ['Bird', 200, 18, 69.28, 240],
    ['Robertson', 250, 15, 45, 280.2],
    ['Sedha, hot', 10_000, 20, 80, 12_340],
    ['Sedha, cold', 10_000, 20, -25, 8245],
    ['Leach', 290, 25, 125, 403.31],
  ])('%s: %d Ω at %d °C', (_, ohm, referenceDegC, degC, expectedOhm) => {
    const found = ohm * copperRatio(degC, referenceDegC);
    expect(Math.abs(found / expectedOhm - 1)).toBeLessThan(0.004);
  });
});
