import { describe, expect, it } from 'vitest';
import { sensitivityOf } from '../../../shared/statistics/sensitivity.ts';
import { highSideStage, RELAY_FILE, relayStage } from '../relay-stage.ts';

describe('sensitivity at the nominal point', () => {
  const stage = relayStage({ baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: 0.1 } });
  const { nominal, rows } = sensitivityOf(stage);
  const relative = (input: string, figure: 'overdriveFactor' | 'icA') =>
    (rows.find((row) => row.input === input)?.change[figure] ?? NaN) / (nominal[figure] ?? NaN);

  // ODF = hFE·IB/I_full: by the definition one for one with hFE; with RB as −RB/(RB + R_OH)·I_R/IB; IC with the supply.
  it('is what the definitions say', () => {
    expect(relative('gain', 'overdriveFactor')).toBeCloseTo(0.01, 6);
    const driveA = (3.3 - 0.86) / (620 + 75);
    const shuntA = 0.86 / 22_000;
    const wanted = ((-620 / (620 + 75)) * driveA) / (driveA - shuntA);
    expect(relative('base-resistor', 'overdriveFactor')).toBeCloseTo(wanted / 100, 3);
    expect(relative('supply', 'icA')).toBeCloseTo(0.01, 3);
    expect(relative('load', 'icA')).toBeCloseTo(-0.01, 3);
    expect(rows.find(({ input }) => input === 'ambient')?.change.tjDegC).toBeCloseTo(2.98, 1);
  });

  it('leaves out what the stage does not have or does not answer to', () => {
    const inputs = rows.map(({ input }) => input);
    expect(inputs).not.toContain('forward-voltage');
    expect(inputs).not.toContain('pre-gain');
    const highSide = sensitivityOf(highSideStage()).rows.map(({ input }) => input);
    expect(highSide).not.toContain('rail');
    expect(highSide).toContain('supply');
  });

  it('knows nothing without a base resistor', () => {
    const open = { ...RELAY_FILE.baseResistor, valueOhm: null };
    const nothing = sensitivityOf(relayStage({ baseResistor: open }));
    expect(nothing.rows).toEqual([]);
    expect(nothing.nominal.icA).toBeNull();
  });
});
