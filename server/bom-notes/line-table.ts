import type { BomLine, BomNote, BomUnit } from '../../shared/report/bom-note.ts';
import {
  descriptionText,
  NOTHING,
  ratingText,
  valueText,
} from '../../shared/report/bom-note-text.ts';
import type { Cell, Column, TableSection } from '../documents/technical-document.ts';

interface LineColumn extends Column {
  readonly cell: (line: BomLine) => Cell;
}

/** On the sheet as people read it; in workbook and CSV every quantity in a column of its own unit. */
const COLUMNS: readonly LineColumn[] = [
  shown('Line', 20, (line) => count(line.line), { right: true }),
  shown('Qty', 20, (line) => count(line.quantity), { right: true, strong: true }),
  shown('Designators', 138, designators),
  shown('Description', 98, (line) => ({ text: descriptionText(line) })),
  shown('Value', 46, (line) => ({ text: valueText(line) }), { right: true }),
  shown('Tol., rating', 74, (line) => ({ text: ratingText(line) })),
  dataOnly('Resistance', 'Ω', (line) => value(line, 'Ohm', 'max')),
  dataOnly('Capacitance', 'F', (line) => value(line, 'F', 'max')),
  dataOnly('Voltage', 'V', (line) => value(line, 'V', 'max')),
  dataOnly('Voltage, smallest', 'V', (line) => value(line, 'V', 'min')),
  dataOnly('Tolerance', '%', (line) => number(percent(line.tolerance))),
  dataOnly('Rated current', 'A', (line) => rating(line, 'A')),
  dataOnly('Rated power', 'W', (line) => rating(line, 'W')),
  dataOnly('Clamping voltage', 'V', (line) => rating(line, 'V')),
  dataOnly('Reference temperature', '°C', (line) => rating(line, '°C')),
  shown('Package', 44, (line) => ({ text: line.package ?? NOTHING })),
  shown('Part number', 82, (line) => ({ text: line.partNumber ?? NOTHING }), { strong: true }),
  shown('Approved sources', 46, ({ approvedSources }) => ({
    text: approvedSources.length === 0 ? NOTHING : approvedSources.join(', '),
  })),
  shown('Rev', 22, ({ partRevision }) =>
    partRevision === null ? { text: NOTHING } : count(partRevision),
  ),
  { heading: 'Flagged designators', widthPx: null, data: true, cell: flaggedOnes },
  { heading: 'Data', widthPx: null, data: true, cell: (line) => ({ text: dataWord(line) }) },
];

export function lineTable({ lines }: BomNote): TableSection {
  return {
    kind: 'table',
    heading: 'Merged lines',
    widthPx: 680,
    columns: COLUMNS,
    records: lines.map((line) => COLUMNS.map(({ cell }) => cell(line))),
  };
}

function shown(
  heading: string,
  widthPx: number,
  cell: LineColumn['cell'],
  style: Pick<Column, 'right' | 'strong'> = {},
): LineColumn {
  return { heading, widthPx, data: true, cell, ...style };
}

function dataOnly(heading: string, unit: string, cell: LineColumn['cell']): LineColumn {
  return { heading, unit, widthPx: null, data: true, cell };
}

function designators({ designators }: BomLine): Cell {
  return {
    text: designators.map(({ text }) => text).join(', '),
    runs: designators.flatMap((designator, index) =>
      index === 0 ? [designator] : [{ text: ', ', flagged: false }, designator],
    ),
  };
}

/** Of revisions that are not locked, or locked on data that changed since. */
function flaggedOnes({ designators }: BomLine): Cell {
  const flagged = designators.filter((designator) => designator.flagged);
  return { text: flagged.map(({ text }) => text).join(', ') };
}

const count = (whole: number): Cell => ({ text: String(whole), number: whole });

const number = (value: number | null): Cell =>
  value === null ? { text: '' } : { text: String(value), number: value };

const value = (line: BomLine, unit: BomUnit, end: 'min' | 'max') =>
  number(line.value?.unit === unit ? line.value[end] : null);

const rating = (line: BomLine, unit: BomUnit) =>
  number(line.ratings.find((given) => given.unit === unit)?.value ?? null);

/** Without the dust of binary fractions. */
const percent = (fraction: number | null) =>
  fraction === null ? null : Number((fraction * 100).toPrecision(12));

function dataWord({ unverified, partNumber }: BomLine): string {
  if (unverified) return 'unverified';
  return partNumber === null ? '' : 'verified';
}
