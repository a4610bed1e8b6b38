import { describe, expect, it } from 'vitest';
import { deriveDrive, drivePoints } from '../../../shared/parts/derive-drive.ts';
import { find, logicOutputs } from './library-file.ts';

function derived(name: string, index: number) {
  const result = deriveDrive(find(logicOutputs, name), index);
  if (!result.ok) throw new Error(result.reason);
  return result.data;
}

describe('deriveDrive', () => {
  it('reads levels relative to the rail (STM32F103, DocID13587 Rev 17, table 36)', () => {
    expect(derived('MCU 3.3 V, 8 mA class', 0)).toEqual({
      kind: 'push-pull',
      high: { dropV: 0.4, currentA: 0.008, unloadedDropV: 0 },
      low: { levelV: 0.4, currentA: 0.008, unloadedV: null },
      sourceLimitA: 0.025,
      sinkLimitA: 0.025,
      portTotalA: 0.15,
      maximumV: null,
    });
  });

  it('takes the light-load level of the same supply (SN74HC00, SCLS181H)', () => {
    expect(derived('74HC', 1)).toMatchObject({
      high: { dropV: 0.66, currentA: 0.004, unloadedDropV: 0.1 },
      low: { levelV: 0.33, currentA: 0.004, unloadedV: 0.1 },
    });
    expect(derived('74HC', 4)).toMatchObject({ high: { dropV: 0.66, unloadedDropV: 0 } });
  });

  it('keeps the drop of a bipolar output unloaded (LS, Motorola p. 5-245)', () => {
    expect(derived('74LS', 0)).toMatchObject({
      high: { dropV: 2.05, currentA: 0.0004, unloadedDropV: 2.05 },
      low: { levelV: 0.5, currentA: 0.008 },
      sourceLimitA: 0.0004,
      sinkLimitA: 0.008,
    });
  });

  it('gives an open collector no high level and no source', () => {
    expect(derived('open-collector / open-drain', 1)).toMatchObject({
      kind: 'open-collector',
      high: null,
      low: { levelV: 0.7, currentA: 0.04 },
      sourceLimitA: null,
      sinkLimitA: 0.04,
      maximumV: 30,
    });
  });

  it('offers only points that print both levels under load', () => {
    expect(drivePoints(find(logicOutputs, '74LS'))).toEqual([0, 2]);
    expect(drivePoints(find(logicOutputs, '74HC'))).toEqual([0, 1, 2, 3, 4, 5]);
  });

  it('derives every point it offers, with a drop that is not negative', () => {
    for (const record of logicOutputs) {
      const points = drivePoints(record);
      expect(points.length, record.partNumber).toBeGreaterThan(0);
      for (const index of points) {
        const { high, low } = derived(record.partNumber, index);
        if (high !== null) expect(high.dropV).toBeGreaterThanOrEqual(high.unloadedDropV);
        expect(low.levelV).toBeGreaterThan(0);
      }
    }
  });

  it('refuses a point without the level the output needs', () => {
    expect(deriveDrive(find(logicOutputs, '74LS'), 1)).toEqual({
      ok: false,
      reason: '74LS prints no high level at this point.',
    });
    expect(deriveDrive(find(logicOutputs, 'CD4000B'), 1)).toMatchObject({ ok: false });
    expect(deriveDrive(find(logicOutputs, 'CD4000B'), 99)).toMatchObject({ ok: false });
  });
});
