import { describe, expect, it } from 'vitest';
import { rowFigures } from '../../../server/revisions/row-figures.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { HIGH_SIDE_FILE, RELAY_FILE, relayStage } from '../../shared/relay-stage.ts';

const drive = { ...RELAY_FILE.drive, port: 'PB', portTotalA: 0.1 };

describe('the current a row asks of its port', () => {
  it('is the strong drive current against the derated total', () => {
    const stage = relayStage({ drive });
    const row = rowFigures(stage, evaluateStage(stage));
    // 3.6 V into 950 Ω: coldest, VBE min 0.65 V and 2 mV/K up to 45 K, a little more for the current.
    expect(row.portCurrentA).toBeGreaterThan((3.6 - 0.8) / 950);
    expect(row.portCurrentA).toBeLessThan(3.6 / 950);
    expect(row.portLimitA).toBeCloseTo(0.08, 12);
  });

  it('is that of the transistor in front where there are two', () => {
    const stage = relayStage({
      drive,
      topology: 'two-transistor-high-side',
      transistor: HIGH_SIDE_FILE.transistor,
      baseResistor: { valueOhm: 6200, tolerance: 0.05, ratingW: 0.5 },
      preDriver: {
        transistor: RELAY_FILE.transistor,
        baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
        shuntResistor: null,
      },
    });
    const row = rowFigures(stage, evaluateStage(stage));
    expect(row.portCurrentA).toBeGreaterThan((3.6 - 0.8) / 4465);
    expect(row.portCurrentA).toBeLessThan(3.6 / 4465);
  });
});
