import type { PartTable } from '../../../shared/parts/part-table.ts';
import { shownColumns } from './shown-table.ts';

const table = (title: string, unit: string, values: (number | null)[]): PartTable => ({
  id: 't',
  title: 'T',
  columns: [{ title, unit }],
  rows: values.map((value) => ({
    cells: [value === null ? null : { value, unit }],
    source: null,
    confidence: 'high',
    note: null,
  })),
});

describe('column of a data-sheet table', () => {
  it('puts the unit of its largest figure in the head', () => {
    expect(shownColumns(table('IC', 'A', [1e-4, 0.01, 0.1]))[0]).toEqual({
      title: 'IC, mA',
      numeric: true,
      cells: ['0.1', '10', '100'],
    });
  });

  it('gives guaranteed figures equal decimals and keeps volts as volts from 0.1 V up', () => {
    expect(shownColumns(table('max', 'V', [0.2, 0.25, null]))[0]).toMatchObject({
      title: 'max, V',
      cells: ['0.20', '0.25', '–'],
    });
  });

  it('keeps the unit in each cell where the figures lie too far apart', () => {
    expect(shownColumns(table('max', 'A', [1e-9, 1e-3]))[0]?.cells).toEqual([
      '1\u00a0nA',
      '1\u00a0mA',
    ]);
  });
});
