import { describe, expect, it } from 'vitest';
import {
  gainOverCurrent,
  gainOverTemperature,
  sheetSaturation,
} from '../../../shared/stage/part-curves.ts';
import { partModel } from '../../../shared/stage/part-model.ts';
import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import { relayStage } from '../relay-stage.ts';
import { transistors } from '../parts/library-file.ts';

const { transistor } = relayStage();
const part = partModel(transistor, GENERAL_PRACTICE);
if (part.gain === null || part.saturation === null) throw new Error('no rows');
const { gain, saturation } = part;
const at = (samples: readonly (readonly [number, number])[], x: number) =>
  samples.find(([each]) => Math.abs(each - x) <= 1e-12 * Math.abs(x))?.[1];

describe('curves of a part', () => {
  // onsemi 2N3903/D, Rev. 9: hFE min 40, 70, 100, 60, 30 at 0.1, 1, 10, 50, 100 mA; max 300 at 10 mA.
  it('run through every printed gain, lower in the cold', () => {
    const curves = gainOverCurrent(gain, transistor, [1e-4, 0.2], -20);
    for (const [icA, min] of curves.minima.slice(1))
      expect(at(curves.least, icA)).toBeCloseTo(min, 9);
    expect(curves.minima.map(([, min]) => min)).toEqual([40, 70, 100, 60, 30]);
    expect(curves.maxima).toEqual([[0.01, 300]]);
    // (253.15/298.15)^2.4 = 0.675 of the figure at 25 °C.
    expect((at(curves.leastCold, 0.01) ?? 0) / 100).toBeCloseTo(0.675, 3);
    expect(at(curves.expected, 0.01)).toBeCloseTo(Math.sqrt(100 * 300), 6);
  });

  it('take penalties of temperature in the limits and both ways in what is expected', () => {
    const curves = gainOverTemperature(gain, transistor, 0.01, [-20, 80]);
    expect(at(curves.least, 80)).toBeCloseTo(100, 9);
    expect(at(curves.least, -20)).toBeCloseTo(67.5, 1);
    expect(at(curves.most, -20)).toBeCloseTo(300, 9);
    expect(at(curves.expected, 80)! / at(curves.expected, 25)!).toBeCloseTo(
      Math.pow(353.15 / 298.15, 1.5),
      6,
    );
  });

  // (0.3 V − 0.2 V)/(50 mA − 10 mA) = 2.5 Ω, V0 = 0.175 V.
  it('give the slope of the last VCE(sat) rows as RCE(sat)', () => {
    const { piece, testBeta } = sheetSaturation(saturation, transistor, 0.004, 0.06);
    expect(piece.slopeOhm).toBeCloseTo(2.5, 9);
    expect(piece.interceptV).toBeCloseTo(0.175, 9);
    expect(testBeta).toBe(10);
  });

  it('can be drawn for every transistor of the library that prints rows', () => {
    let drawn = 0;
    for (const record of transistors) {
      const derived = deriveTransistor(record);
      if (!derived.ok) continue;
      const { data } = derived;
      const model = partModel(data, GENERAL_PRACTICE);
      const icMaxA = data.limits.icA ?? 0.1;
      if (model.gain !== null) {
        const curves = gainOverCurrent(model.gain, data, [icMaxA / 1e4, icMaxA], -40);
        for (const [, figure] of [...curves.least, ...curves.most, ...curves.expected]) {
          expect(figure).toBeGreaterThan(0);
          expect(Number.isFinite(figure)).toBe(true);
        }
        drawn++;
      }
      if (model.saturation !== null) {
        const { sheet } = sheetSaturation(model.saturation, data, 0.004, icMaxA);
        for (let k = 1; k < sheet.length; k++) {
          expect(sheet[k]![1]).toBeGreaterThanOrEqual(sheet[k - 1]![1]);
        }
      }
    }
    expect(drawn).toBeGreaterThan(25);
  });
});
