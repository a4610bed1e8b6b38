import { describe, expect, it } from 'vitest';
import { sourceOf } from '../../../shared/parts/provenance.ts';
import { diodes, find, loads, logicOutputs, transistors } from './library-file.ts';

/** How many rows print a figure, and what the figures add up to: a lost or slipped one shows. */
function tally(rows: readonly object[], key: string): [number, number] {
  const figures = rows
    .map((row) => (row as Record<string, unknown>)[key])
    .filter((value): value is number => typeof value === 'number');
  const sum = figures.reduce((total, value) => total + value, 0);
  return [figures.length, Number(sum.toPrecision(9))];
}

/** Tallies counted apart from the library, in the collection of data-sheet figures it was made from. */
describe('the transistor library', () => {
  const rows = {
    gain: transistors.flatMap((part) => part.gain),
    saturation: transistors.flatMap((part) => part.saturation),
    sat: transistors.flatMap((part) => part.baseEmitter).filter(({ kind }) => kind === 'sat'),
    on: transistors.flatMap((part) => part.baseEmitter).filter(({ kind }) => kind === 'on'),
    leakage: transistors.flatMap((part) => part.leakage),
    switching: transistors.flatMap((part) => part.switching),
    limits: transistors.map((part) => part.limits),
    alternatives: transistors.flatMap((part) => part.alternatives),
    capacitance: transistors.flatMap((part) => part.outputCapacitance ?? []),
    frequency: transistors.flatMap((part) => part.transitionFrequency ?? []),
  };

  it.each([
    ['gain', 'icA', 115, 37.98602],
    ['gain', 'vceV', 113, 504],
    ['gain', 'min', 110, 86572],
    ['gain', 'typ', 7, 6060],
    ['gain', 'max', 31, 10130],
    ['gain', 'tempDegC', 115, 2635],
    ['saturation', 'icA', 53, 37.76],
    ['saturation', 'ibA', 53, 2.215],
    ['saturation', 'typV', 9, 3.92],
    ['saturation', 'maxV', 53, 47.6],
    ['sat', 'icA', 31, 6.14],
    ['sat', 'ibA', 31, 0.5975],
    ['sat', 'minV', 8, 5.25],
    ['sat', 'typV', 6, 4.88],
    ['sat', 'maxV', 25, 32.5],
    ['on', 'icA', 21, 21.346],
    ['on', 'vceV', 21, 72],
    ['on', 'minV', 3, 1.73],
    ['on', 'typV', 2, 1.31],
    ['on', 'maxV', 21, 28.51],
    ['leakage', 'maxA', 87, 0.01236889],
    ['leakage', 'vcbV', 43, 2210],
    ['leakage', 'vceV', 30, 1360],
    ['leakage', 'vebV', 22, 86.8],
    ['leakage', 'tempDegC', 87, 4845],
    ['switching', 'icA', 11, 1.23],
    ['switching', 'ib1A', 11, 0.123],
    ['switching', 'tdSec', 10, 1.85e-7],
    ['switching', 'trSec', 10, 3e-7],
    ['switching', 'tsSec', 10, 1.885e-6],
    ['switching', 'tfSec', 10, 4.75e-7],
    ['switching', 'tonSec', 3, 1.25e-7],
    ['switching', 'toffSec', 3, 4.85e-7],
    ['limits', 'vceoV', 34, 2175],
    ['limits', 'vcboV', 30, 2205],
    ['limits', 'veboV', 30, 180],
    ['limits', 'vccV', 2, 100],
    ['limits', 'icA', 32, 37.3],
    ['limits', 'icPeakA', 12, 45.4],
    ['limits', 'ioA', 5, 0.45],
    ['limits', 'ibA', 11, 7.565],
    ['limits', 'ibPeakA', 4, 0.7],
    ['limits', 'powerW', 33, 25.55],
    ['limits', 'powerCaseW', 19, 319.3],
    ['limits', 'deratingWPerK', 15, 0.1058],
    ['limits', 'rthJaKPerW', 30, 6732],
    ['limits', 'rthJcKPerW', 22, 1314.91],
    ['limits', 'tjMaxDegC', 36, 5500],
    ['limits', 'inputMinV', 4, -30],
    ['limits', 'inputMaxV', 5, 122],
    ['limits', 'unclampedEnergyJ', 3, 0.1625],
    ['alternatives', 'icA', 7, 5.8],
    ['alternatives', 'powerW', 9, 4.11],
    ['alternatives', 'rthJaKPerW', 10, 2790],
    ['alternatives', 'rthJcKPerW', 5, 250.97],
    ['alternatives', 'tjMaxDegC', 2, 400],
    ['capacitance', 'maxF', 17, 5.895e-10],
    ['capacitance', 'typF', 7, 3.72e-11],
    ['frequency', 'minHz', 22, 3.539e9],
    ['frequency', 'typHz', 8, 1.6e9],
  ] as const)('prints %s %s in %d rows adding up to %d', (group, key, count, sum) => {
    expect(tally(rows[group], key)).toEqual([count, sum]);
  });

  it('holds 36 parts with 48 remarks, each with a source that names a document of the record', () => {
    expect(transistors).toHaveLength(36);
    expect(transistors.flatMap((part) => part.notes)).toHaveLength(48);
    for (const part of transistors) {
      const ids = part.documents.map(({ id }) => id);
      for (const group of ['limits', 'electrical'] as const) {
        const source = sourceOf(part.sources, group);
        expect(
          ids.some((id) => source?.includes(id)),
          `${part.partNumber} ${group}`,
        ).toBe(true);
      }
    }
  });

  it('names every part once', () => {
    const names = [...transistors, ...loads, ...logicOutputs, ...diodes].map((p) => p.partNumber);
    expect(new Set(names).size).toBe(names.length);
  });
});

describe('figures against the data sheets', () => {
  it('prints the 2N3904 as onsemi 2N3903/D Rev. 9 does', () => {
    const part = find(transistors, '2N3904');
    expect(part.limits).toMatchObject({ vceoV: 40, vcboV: 60, veboV: 6, icA: 0.2, powerW: 0.625 });
    expect(part.limits).toMatchObject({ rthJaKPerW: 200, rthJcKPerW: 83.3, tjMaxDegC: 150 });
    expect(part.gain.map(({ icA, min, max }) => [icA, min, max])).toEqual([
      [1e-4, 40, null],
      [1e-3, 70, null],
      [0.01, 100, 300],
      [0.05, 60, null],
      [0.1, 30, null],
    ]);
    expect(part.saturation.map(({ icA, ibA, maxV }) => [icA, ibA, maxV])).toEqual([
      [0.01, 0.001, 0.2],
      [0.05, 0.005, 0.3],
    ]);
    expect(part.switching[0]).toMatchObject({ tdSec: 35e-9, trSec: 35e-9, tsSec: 2e-7 });
  });

  it('prints the cold and hot rows of the 2N2222A (Philips 1997 May 29, ST June 1999)', () => {
    const part = find(transistors, '2N2222A');
    expect(part.gain).toContainEqual(
      expect.objectContaining({ icA: 0.01, vceV: 10, min: 35, tempDegC: -55 }),
    );
    expect(part.leakage).toContainEqual(
      expect.objectContaining({ symbol: 'ICBO', maxA: 1e-5, vcbV: 60, tempDegC: 150 }),
    );
    expect(part.alternatives[0]).toMatchObject({
      maker: 'Philips Semiconductors',
      tjMaxDegC: 200,
      rthJaKPerW: 350,
    });
  });

  it('keeps the input rows of the DTC114E (Leshan Radio, p. 1)', () => {
    const { input, limits } = find(transistors, 'DTC114E');
    expect(input?.r1).toMatchObject({ minOhm: 7000, typOhm: 10_000, maxOhm: 13_000 });
    expect(input?.on[0]).toMatchObject({ minV: 3, outputV: 0.3, outputA: 0.01 });
    expect(input?.off[0]).toMatchObject({ maxV: 0.5, vccV: 5, outputA: 1e-4 });
    expect(input?.outputOn[0]).toMatchObject({ maxV: 0.3, outputA: 0.01, inputA: 5e-4 });
    expect(limits).toMatchObject({ inputMinV: -10, inputMaxV: 40, ioA: 0.05 });
  });

  it('keeps the array rows of the ULN2003A (TI SLRS027M, ST Doc ID 5279)', () => {
    const part = find(transistors, 'ULN2003A');
    expect(part.saturation.filter(({ variant }) => variant !== null)).toHaveLength(3);
    expect(part.limits.rthJaByPackage).toHaveLength(4);
    expect(part.alternatives[0]?.rthJaByPackage).toHaveLength(2);
    expect(part.clampDiode).toMatchObject({ forwardA: 0.35, typV: 1.7, maxV: 2 });
    expect(part.input?.on.map(({ maxV }) => maxV)).toEqual([2.4, 2.7, 3]);
    expect(part.input?.baseEmitterOhm).toEqual([7200, 3000]);
  });

  it('marks figures from memory so, row by row', () => {
    expect(find(transistors, 'TIP120').baseEmitter[0]?.confidence).toBe('memory');
    expect(find(transistors, 'DTC123J').input?.on[0]?.confidence).toBe('memory');
    expect(find(transistors, 'DTC123J').input?.r1?.confidence).toBeNull();
  });
});

describe('the other libraries', () => {
  it('prints every logic level', () => {
    const points = logicOutputs
      .flatMap((part) => part.points)
      .filter((p) => p.supplyV !== null || p.sourceA !== null);
    expect(logicOutputs).toHaveLength(17);
    expect(points).toHaveLength(67);
    expect(tally(points, 'highV')).toEqual([52, 223]);
    expect(tally(points, 'highDropV')[0]).toBe(12);
    expect(tally(points, 'sourceA')).toEqual([64, 0.566071]);
    expect(tally(points, 'lowV')).toEqual([64, 34.37]);
    expect(tally(points, 'sinkA')).toEqual([64, 0.575371]);
  });

  it('prints the 3.3 V controller of DocID13587 Rev 17, table 36', () => {
    const part = find(logicOutputs, 'MCU 3.3 V, 8 mA class');
    expect(part.points[0]).toMatchObject({ highDropV: 0.4, sourceA: 0.008, lowV: 0.4 });
    expect(part).toMatchObject({ outputA: 0.025, totalA: 0.15 });
  });

  it('prints every coil', () => {
    const coils = loads.filter(({ family }) => family === 'relay').flatMap((load) => load.coils);
    expect(tally(coils, 'nominalV')).toEqual([33, 455]);
    expect(tally(coils, 'resistanceOhm')).toEqual([30, 34872.93]);
    expect(tally(coils, 'currentA')).toEqual([31, 1.864318]);
    expect(tally(coils, 'powerW')).toEqual([32, 12.1693]);
  });

  it('has diodes from memory only, and says so', () => {
    expect(diodes.length).toBeGreaterThan(10);
    expect(diodes.every(({ confidence }) => confidence === 'memory')).toBe(true);
    expect(find(diodes, '1N4148').forward[0]).toMatchObject({ currentA: 0.01, maxV: 1 });
  });
});
