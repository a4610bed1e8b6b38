import { prefixExponent, QUANTITY_UNITS, type UnitName } from './quantity-unit.ts';
import { toleranceOfCode } from './tolerance-text.ts';

/** What the letters behind a number say. */
export interface ScannedUnit {
  readonly exponent: number;
  /** The prefix as typed, '' where none. */
  readonly prefix: string;
  /** The unit as typed, '' where only a prefix or nothing was. */
  readonly spelling: string;
  /** Tolerance code at the end of an IEC 60062 value, as a fraction. */
  readonly tolerance: number | null;
}

/** What may stand in a word of letters. */
export interface WordRules {
  /** Off behind `4k7`, which has its prefix already. */
  readonly mayPrefix: boolean;
  /** On where the number so far, with the prefix or R of this word, is a complete IEC 60062 value. */
  readonly mayTolerance: boolean;
  /** On where the number itself carried the letter. */
  readonly hasLetter: boolean;
}

/**
 * Reads prefix, unit and tolerance code of one word. The unit alone goes first: `K` is kelvin in a
 * temperature field, `F` farad in a capacitance field.
 *
 * @returns null where the word means nothing in this kind of field
 */
export function readUnitWord(word: string, unit: UnitName, rules: WordRules): ScannedUnit | null {
  return readWhole(word, unit, rules) ?? readWithTolerance(word, unit, rules);
}

function readWhole(word: string, unit: UnitName, rules: WordRules): ScannedUnit | null {
  const { prefixed, spellings } = QUANTITY_UNITS[unit];
  const isUnit = (text: string) => spellings.includes(text);
  const nothing = { exponent: 0, prefix: '', tolerance: null };
  if (word === '' || isUnit(word)) return { ...nothing, spelling: word };
  if (word === '%' && unit === '1') return { ...nothing, exponent: -2, spelling: word };
  const prefix = word.charAt(0);
  const exponent = prefixed && rules.mayPrefix ? prefixExponent(prefix) : null;
  const rest = word.slice(1);
  if (exponent === null || (rest !== '' && !isUnit(rest))) return null;
  return { exponent, prefix, spelling: rest, tolerance: null };
}

function readWithTolerance(word: string, unit: UnitName, rules: WordRules): ScannedUnit | null {
  const tolerance = toleranceOfCode(word.slice(-1));
  if (tolerance === null || !rules.mayTolerance || !QUANTITY_UNITS[unit].toleranced) return null;
  const value = readWhole(word.slice(0, -1), unit, rules);
  if (value === null || (value.spelling !== '' && value.spelling !== 'R')) return null;
  const complete = rules.hasLetter || value.prefix !== '' || value.spelling === 'R';
  return complete ? { ...value, tolerance } : null;
}

/** The kind of quantity a word belongs to instead, for the message; null where none. */
export function unitOfWord(word: string): UnitName | null {
  const rules = { mayPrefix: true, mayTolerance: false, hasLetter: false };
  const names = Object.keys(QUANTITY_UNITS) as UnitName[];
  return (
    names.find((name) => {
      const read = readUnitWord(word, name, rules);
      return read !== null && read.spelling !== '';
    }) ?? null
  );
}
