import { describe, expect, it } from 'vitest';
import { partGroups } from '../../../shared/parts/part-groups.ts';
import type { PartRecord } from '../../../shared/parts/part-record.ts';
import { cellText } from '../../../shared/parts/part-table.ts';
import { diodes, find, loads, logicOutputs, transistors } from './library-file.ts';

const all: PartRecord[] = [...transistors, ...loads, ...logicOutputs, ...diodes];

/** Every number of a record, wherever it stands. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  if (value === null || typeof value !== 'object') return [];
  return Object.values(value).flatMap(numbersIn);
}

const near = (left: number, right: number) => Math.abs(left - right) <= 1e-9 * Math.abs(right);

/** Fractions show in percent; both ways of a figure count. */
function shows(shown: readonly number[], figure: number): boolean {
  return shown.some((value) => near(value, figure) || near(value, figure * 100));
}

function table(partNumber: string, id: string) {
  const group = partGroups(find(all, partNumber)).find((candidate) => candidate.id === id);
  if (group === undefined) throw new Error(`${partNumber} has no ${id}`);
  return {
    titles: group.columns.map(({ title }) => title),
    text: group.rows.map(({ cells }) =>
      cells.map((cell) => cellText(cell).replaceAll('\u00a0', ' ')),
    ),
    rows: group.rows,
  };
}

describe('partGroups', () => {
  it.each(all.map((record) => [record.partNumber, record] as const))(
    'shows every figure of %s',
    (_partNumber, record) => {
      const cells = partGroups(record).flatMap(({ rows }) => rows.flatMap((row) => row.cells));
      const shown = cells.flatMap((cell) =>
        cell !== null && typeof cell === 'object' ? cell.value : [],
      );
      const words = cells.filter((cell) => typeof cell === 'string').join(' ');
      const missing = numbersIn(record).filter(
        (figure) => !shows(shown, figure) && !words.includes(`${figure}`),
      );
      expect(missing).toEqual([]);
    },
  );

  it('gives each row as many cells as columns, a source and a confidence', () => {
    for (const record of all) {
      for (const { id, columns, rows } of partGroups(record)) {
        expect(rows.length, `${record.partNumber} ${id}`).toBeGreaterThan(0);
        for (const row of rows) {
          expect(row.cells).toHaveLength(columns.length);
          expect(row.source, `${record.partNumber} ${id}`).not.toBeNull();
        }
      }
    }
  });

  it('names every group of a record once', () => {
    for (const record of all) {
      const ids = partGroups(record).map(({ id }) => id);
      expect(new Set(ids).size, record.partNumber).toBe(ids.length);
    }
  });

  it('writes the gain rows of the 2N3904 and leaves empty columns out', () => {
    expect(table('2N3904', 'gain')).toMatchObject({
      titles: ['IC', 'VCE', 'T', 'min', 'max'],
      text: [
        ['100 µA', '1 V', '25 °C', '40', ''],
        ['1 mA', '1 V', '25 °C', '70', ''],
        ['10 mA', '1 V', '25 °C', '100', '300'],
        ['50 mA', '1 V', '25 °C', '60', ''],
        ['100 mA', '1 V', '25 °C', '30', ''],
      ],
    });
  });

  it('sets the makers of a rating side by side, each with its own source', () => {
    const { text, rows } = table('2N2222A', 'thermal');
    expect(text.slice(0, 2)).toEqual([
      ['RθJA, junction to ambient', '300 K/W', 'STMicroelectronics'],
      ['RθJA, junction to ambient', '350 K/W', 'Philips Semiconductors'],
    ]);
    expect(rows.slice(0, 2).map(({ source }) => source)).toEqual(['ST-2N2222A', 'PH-2N2222A']);
  });

  it('carries source, confidence and remark of a single row', () => {
    const row = table('BC807-40', 'leakage').rows[1];
    expect(row?.note).toContain('micro sign lost');
    expect(table('TIP120', 'base-emitter').rows[0]).toMatchObject({
      source: 'MEM',
      confidence: 'memory',
    });
    expect(table('2N3904', 'gain').rows[0]).toMatchObject({
      source: 'ON-2N3903',
      confidence: 'high',
    });
  });

  it('shows fractions of nominal in percent', () => {
    expect(table('signal-0.4W', 'levels').text).toEqual([
      ['1c', '70 %', '10 %', '120 %'],
      ['2c,4c', '70 %', '10 %', '150 %'],
    ]);
  });
});
