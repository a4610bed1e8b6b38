import { describe, expect, it } from 'vitest';
import type { PartRecord } from '../../../shared/parts/part-record.ts';
import { plausibilityDoubts } from '../../../shared/parts/plausibility.ts';
import type { TransistorRecord } from '../../../shared/parts/transistor-record.ts';
import { diodes, find, loads, logicOutputs, transistors } from './library-file.ts';

const paths = (record: PartRecord) => plausibilityDoubts(record).map(({ path }) => path);

/** The 2N3904 with one list of rows changed. */
function slipped<K extends 'gain' | 'saturation' | 'baseEmitter' | 'leakage' | 'switching'>(
  list: K,
  index: number,
  change: Partial<TransistorRecord[K][number]>,
): string[] {
  const record = structuredClone(find(transistors, '2N3904'));
  Object.assign(record[list][index]!, change);
  return paths(record);
}

describe('plausibilityDoubts', () => {
  it('doubts nothing in the library but the contradictions the data sheets print', () => {
    const doubted = [...transistors, ...loads, ...logicOutputs, ...diodes].flatMap((record) =>
      plausibilityDoubts(record).map(({ path }) => `${record.partNumber} ${path}`),
    );
    expect(doubted).toEqual([
      '2N2907A limits.rthJcKPerW', // 150 K/W against 1.0 W at TC and 200 °C
      'TIP41C alternatives.0.rthJcKPerW', // the 2014 issue keeps 65 W but prints 1.67 K/W
      '74AC points.5.sourceA', // 75 mA for 2 ms on a 50 mA output
      '74AC points.5.sinkA',
    ]);
  });

  it('finds figures out of order', () => {
    expect(slipped('gain', 2, { min: 400 })).toEqual(['gain.2.max']);
    expect(slipped('baseEmitter', 0, { typV: 0.9 })).toEqual(['baseEmitter.0.maxV']);
  });

  it('finds units slipped by a thousand', () => {
    expect(slipped('gain', 0, { icA: 10 })).toContain('gain.0.icA');
    expect(slipped('saturation', 0, { maxV: 200 })).toContain('saturation.0.maxV');
    expect(slipped('saturation', 0, { ibA: 1 })).toContain('saturation.0.ibA');
    expect(slipped('baseEmitter', 1, { maxV: 950 })).toContain('baseEmitter.1.maxV');
    expect(slipped('leakage', 0, { maxA: 0.05 })).toContain('leakage.0.maxA');
    expect(slipped('switching', 0, { tsSec: 2e-4 })).toContain('switching.0.tsSec');
    expect(slipped('gain', 2, { min: 0.1 })).toContain('gain.2.min');
  });

  it('finds leakage that shrinks with temperature', () => {
    const record = structuredClone(find(transistors, '2N2222A'));
    record.leakage[1]!.maxA = 1e-9;
    expect(paths(record)).toEqual(['leakage.1.maxA']);
  });

  it('finds ratings that contradict each other', () => {
    const record = structuredClone(find(transistors, '2N3904'));
    record.limits = { ...record.limits, vcboV: 30, powerCaseW: 0.1, rthJaKPerW: 20 };
    expect(paths(record)).toEqual([
      'limits.vcboV',
      'limits.powerCaseW',
      'limits.rthJaKPerW',
      'limits.rthJcKPerW',
    ]);
  });

  it('finds a coil whose figures do not fit together', () => {
    const record = structuredClone(find(loads, 'pcb-10A-0.36W'));
    record.coils[5]!.resistanceOhm = 1.6;
    record.levels[0]!.operate = 1.75;
    expect(paths(record)).toEqual(['coils.5.currentA', 'levels.0.operate']);
  });

  it('finds levels beyond the supply and diodes beyond their rating', () => {
    const gate = structuredClone(find(logicOutputs, '74HC'));
    gate.points[0]!.highV = 39.8;
    expect(paths(gate)).toEqual(['points.0.highV']);
    const diode = structuredClone(find(diodes, '1N4148'));
    diode.reverse[1]!.voltageV = 750;
    diode.forward[0]!.maxV = 1000;
    expect(paths(diode)).toEqual(['forward.0.maxV', 'reverse.1.voltageV']);
  });

  it('says in a sentence what was expected', () => {
    const record = structuredClone(find(transistors, '2N3904'));
    record.saturation[0]!.maxV = 200;
    expect(plausibilityDoubts(record)[0]?.message.replaceAll('\u00a0', ' ')).toBe(
      '200 V is unusual here: expected 10 mV to 2.5 V. Check the unit.',
    );
  });
});
