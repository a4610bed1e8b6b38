import {
  cellText,
  type Figure,
  type PartCell,
  type PartTable,
} from '../../../shared/parts/part-table.ts';
import { PREFIXES, QUANTITY_UNITS } from '../../../shared/units/quantity-unit.ts';

export interface ShownColumn {
  /** `IC, mA` */
  readonly title: string;
  readonly numeric: boolean;
  readonly cells: readonly string[];
}

/** A data-sheet table as a sheet prints it: the unit in the head, figures in line below it. */
export function shownColumns(table: PartTable): ShownColumn[] {
  return table.columns.map(({ title, unit }, index) => {
    const cells = table.rows.map((row) => row.cells[index] ?? null);
    const figures = cells.filter(
      (cell): cell is Figure => cell !== null && typeof cell !== 'string',
    );
    const scale = unit === null ? null : scaleOf(unit, figures);
    if (scale === null) {
      return { title, numeric: figures.length > 0, cells: cells.map((cell) => textOf(cell)) };
    }
    const texts = cells.map((cell) => scaledText(cell, scale.exponent));
    const padded = isResult(title) ? sameDecimals(texts) : texts;
    return { title: `${title}, ${scale.unit}`, numeric: true, cells: padded };
  });
}

/** Guaranteed figures stand with equal decimals; the conditions they hold at as a person would write them. */
const isResult = (title: string) => /\b(min|typ|max)$/.test(title);

const NONE = '–';

const textOf = (cell: PartCell) => (cell === null ? NONE : cellText(cell));

/** A column whose figures reach over more than this keeps a unit in each cell. */
const LARGEST_SPAN = 1e5;

/** The prefix of the largest figure, where all figures can be read with it. */
function scaleOf(
  unit: string,
  figures: readonly Figure[],
): { exponent: number; unit: string } | null {
  const known = Object.hasOwn(QUANTITY_UNITS, unit)
    ? QUANTITY_UNITS[unit as keyof typeof QUANTITY_UNITS]
    : null;
  if (known === null) return null;
  if (!known.prefixed) return { exponent: 0, unit: known.symbol };
  const sizes = figures.map(({ value }) => Math.abs(value)).filter((size) => size > 0);
  const largest = Math.max(...sizes);
  if (sizes.length === 0 || largest / Math.min(...sizes) > LARGEST_SPAN) return null;
  const power = Math.floor(Math.log10(largest * (1 + 1e-12)) / 3) * 3;
  const exponent = unit === 'V' && power === -3 && largest >= 0.1 ? 0 : power;
  const prefix = PREFIXES.find((candidate) => candidate.exponent === exponent);
  return prefix === undefined ? null : { exponent, unit: prefix.symbol + known.symbol };
}

function scaledText(cell: PartCell, exponent: number): string {
  if (cell === null || typeof cell === 'string') return textOf(cell);
  const value = Number((cell.value / 10 ** exponent).toPrecision(12));
  return String(value).replace('-', '\u2212');
}

function sameDecimals(texts: readonly string[]): string[] {
  const decimals = Math.max(...texts.map((text) => text.split('.')[1]?.length ?? 0));
  return texts.map((text) => (text === NONE ? text : pad(text, decimals)));
}

function pad(text: string, decimals: number): string {
  const [whole = '', fraction = ''] = text.split('.');
  return decimals === 0 ? whole : `${whole}.${fraction.padEnd(decimals, '0')}`;
}
