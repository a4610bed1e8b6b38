import { formatPercent, formatQuantity } from '../units/engineering-notation.ts';
import { choiceWords } from './definition-words.ts';

export type LeafValue = number | string | boolean;

/** One value of a definition, with what it is called and what it is measured in. */
export interface DefinitionLeaf {
  /** Dotted path into the definition; rows are named by what they were measured at, not by place. */
  readonly path: string;
  readonly label: string;
  /** A unit of `formatQuantity`, `%` for fractions shown as a percentage, null for words. */
  readonly unit: string | null;
  readonly value: LeafValue;
}

/** Ends of names and the unit they stand for, longest first. */
const UNITS: readonly (readonly [RegExp, string])[] = [
  [/KPerW$/, 'K/W'],
  [/VPerK$/, 'V/K'],
  [/PerK$/, '1/K'],
  [/DegC$/, '°C'],
  [/Ohm$/, 'Ohm'],
  [/Sec$/, 's'],
  [/Hz$/, 'Hz'],
  [/V$/, 'V'],
  [/A$/, 'A'],
  [/W$/, 'W'],
  [/K$/, 'K'],
  [/H$/, 'H'],
  [/F$/, 'F'],
  [/(tolerance|Tolerance|duty|marginalBand)$/, '%'],
];

/** The unit a dotted path's numbers are in, read off the names along it. */
export function unitOfPath(path: string): string {
  const names = path.split('.').reverse();
  for (const name of names.slice(0, 2)) {
    const found = UNITS.find(([end]) => end.test(name));
    if (found !== undefined) return found[1];
  }
  return '1';
}

/** A value as screens and documents show it. */
export function leafText({ value, unit }: Pick<DefinitionLeaf, 'value' | 'unit'>): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return choiceWords(value);
  return unit === '%' ? formatPercent(value) : formatQuantity(value, unit ?? '1', { digits: 4 });
}
