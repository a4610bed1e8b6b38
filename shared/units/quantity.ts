import { formatPercent, formatQuantity } from './engineering-notation.ts';
import { scanNumber, type Decimal, type ScannedNumber } from './number-text.ts';
import { PREFIXES, QUANTITY_UNITS, type UnitName } from './quantity-unit.ts';
import { parseTolerance, toleranceOfCode } from './tolerance-text.ts';
import { readUnitWord, unitOfWord, type ScannedUnit } from './unit-text.ts';

/** The field an entry is typed into. Bounds are inclusive, in SI. */
export interface QuantityField {
  readonly unit: UnitName;
  readonly min?: number;
  readonly max?: number;
  /** The person's decimal mark; decides which reading of `1,234` goes first. Left out: decimal. */
  readonly decimalMark?: '.' | ',';
}

/** An entry understood. `%` fields and `30 %` in ratio fields give the fraction. */
export interface QuantityRead {
  readonly ok: true;
  /** SI value. */
  readonly value: number;
  /** Fraction, where a tolerance was typed. */
  readonly tolerance?: number;
  /** How an ambiguous entry was read; to be shown. */
  readonly reading?: string;
  /** A question; the entry counts only after a second commit. */
  readonly confirm?: string;
}

/** An entry not understood, with a sentence that gives an accepted example. */
export interface QuantityProblem {
  readonly ok: false;
  readonly problem: string;
}

export type QuantityResult = QuantityRead | QuantityProblem;

const MAX_LENGTH = 64;

/**
 * Understands a quantity as designers type it: `4k7`, `4.7 kΩ`, `30 mA`, `0,03`, `5e-2`, `10K ±1 %`.
 * Letter code and tolerance letters by IEC 60062; decimal comma and point; grouping only where it cannot
 * be mistaken, else `reading` and `confirm` say so. `m` is milli and `M` mega everywhere.
 *
 * @returns the SI value, or a problem in a sentence; never throws, whatever the text
 */
export function parseQuantity(text: string, field: QuantityField): QuantityResult {
  if (text.length > MAX_LENGTH)
    return problem(field, `That is more than ${MAX_LENGTH} characters.`);
  const entry = tidied(text);
  if (entry === '') return { ok: false, problem: `Enter ${expected(field)}.` };
  if (field.unit === '%') return parsePercent(entry, field);
  const negative = entry.startsWith('-');
  const unsigned = negative || entry.startsWith('+') ? entry.slice(1).trim() : entry;
  const number = scanNumber(unsigned, pointLetters(field.unit));
  if (number === null) return problem(field, 'That is not a number.');
  const word = wordAt(unsigned, number.end);
  const unit = readUnitWord(word.text, field.unit, {
    mayPrefix: number.letter === null,
    mayTolerance: number.plainDigits,
    hasLetter: number.letter !== null,
  });
  if (unit === null) return wrongWord(word.text, field);
  const tolerance = readTolerance(unsigned.slice(word.end).trim(), number, unit, field);
  if (typeof tolerance === 'string') return problem(field, tolerance);
  return decide(negative, number, unit, tolerance, field);
}

const SPACES = /[\t\u00a0\u2007\u2009\u202f]/g;

function tidied(text: string): string {
  return text.replace(SPACES, ' ').replaceAll('\u2212', '-').trim();
}

/** Letters that may stand for the decimal point: R, the prefixes, and the unit's own letter. */
function pointLetters(unit: UnitName): string {
  if (!QUANTITY_UNITS[unit].prefixed) return '';
  const prefixes = PREFIXES.flatMap(({ spellings }) => spellings).join('');
  return prefixes + (unit === 'Ohm' ? 'R' : unit === 'Hz' ? '' : unit);
}

/** Letters and signs up to a space, a digit or the sign of a tolerance. */
function wordAt(text: string, start: number): { text: string; end: number } {
  let from = start;
  while (text[from] === ' ') from += 1;
  let end = from;
  while (end < text.length && !' ±+-0123456789'.includes(text.charAt(end))) end += 1;
  return { text: text.slice(from, end), end };
}

function wrongWord(word: string, field: QuantityField): QuantityProblem {
  const other = unitOfWord(word);
  return other === null || other === field.unit
    ? problem(field, `“${word}” means nothing behind ${QUANTITY_UNITS[field.unit].noun}.`)
    : problem(field, `“${word}” belongs to ${QUANTITY_UNITS[other].noun}.`);
}

/** @returns fraction, null where none was typed, or what is wrong */
function readTolerance(
  rest: string,
  number: ScannedNumber,
  unit: ScannedUnit,
  field: QuantityField,
): number | null | string {
  if (rest === '') return unit.tolerance;
  const { toleranced, noun } = QUANTITY_UNITS[field.unit];
  const lettered = number.letter !== null || unit.prefix !== '' || unit.spelling === 'R';
  const coded = number.plainDigits && lettered && unit.tolerance === null;
  const tolerance = (coded ? toleranceOfCode(rest) : null) ?? parseTolerance(rest);
  if (tolerance === null || unit.tolerance !== null) return `“${rest}” is left over.`;
  return toleranced ? tolerance : `A tolerance cannot follow ${noun} here.`;
}

function decide(
  negative: boolean,
  number: ScannedNumber,
  unit: ScannedUnit,
  tolerance: number | null,
  field: QuantityField,
): QuantityResult {
  const valueOf = (decimal: Decimal) => toValue(decimal, unit.exponent, negative);
  const decimal = valueOf(number.decimal);
  if (decimal === null) return problem(field, 'That number is beyond all bounds.');
  const choice = choose(decimal, number.grouped === null ? null : valueOf(number.grouped), {
    field,
    groups: number.separator !== null && field.decimalMark === other(number.separator),
  });
  if (!inRange(choice.value, field)) return outOfRange(choice.value, field);
  const milli = field.unit === 'Ohm' && isMilli(number, unit) ? milliohm(choice.value) : null;
  const confirm = milli ?? choice.confirm;
  return {
    ok: true,
    value: choice.value,
    ...(tolerance === null ? {} : { tolerance }),
    ...(choice.reading === null ? {} : { reading: choice.reading }),
    ...(confirm === null ? {} : { confirm }),
  };
}

const other = (mark: '.' | ','): '.' | ',' => (mark === '.' ? ',' : '.');

/** @returns null where a number that is not zero runs over, or under to zero */
function toValue({ mantissa, exponent }: Decimal, by: number, negative: boolean): number | null {
  const value = Number(`${mantissa}e${exponent + by}`);
  const vanished = value === 0 && /[1-9]/.test(mantissa);
  if (!Number.isFinite(value) || vanished) return null;
  return negative && value !== 0 ? -value : value;
}

interface Choice {
  readonly value: number;
  readonly reading: string | null;
  readonly confirm: string | null;
}

/** Never guesses between grouping and decimal: says which was taken, asks where both fit. */
function choose(
  decimal: number,
  grouped: number | null,
  { field, groups }: { field: QuantityField; groups: boolean },
): Choice {
  if (grouped === null) return { value: decimal, reading: null, confirm: null };
  const [first, second] = groups ? [grouped, decimal] : [decimal, grouped];
  const taken = !inRange(first, field) && inRange(second, field) ? second : first;
  const rejected = taken === first ? second : first;
  const reading = `Read as ${exact(taken, field.unit)}.`;
  const asks = inRange(taken, field) && inRange(rejected, field);
  const question = `${reading} Did you mean ${exact(rejected, field.unit)}?`;
  return { value: taken, reading, confirm: asks ? question : null };
}

/** `m` without a written-out Ω: too often meant as M. */
function isMilli(number: ScannedNumber, unit: ScannedUnit): boolean {
  const symbol = unit.spelling === 'Ω' || unit.spelling === '\u2126';
  return number.letter === 'm' || (unit.prefix === 'm' && !symbol);
}

const milliohm = (value: number) =>
  `That is ${exact(value, 'Ohm')}, milliohm. Did you mean ${exact(value * 1e9, 'Ohm')}?`;

function parsePercent(entry: string, field: QuantityField): QuantityResult {
  const code = toleranceOfCode(entry);
  const bare = entry.startsWith('±') ? entry.slice(1).trim() : entry;
  const read: QuantityResult =
    code === null
      ? parseQuantity(bare.endsWith('%') ? bare : `${bare}%`, { unit: '1' })
      : { ok: true, value: code };
  if (!read.ok) return problem(field, 'That is not a percentage.');
  if (!inRange(read.value, field)) return outOfRange(read.value, field);
  return { ok: true, value: read.value };
}

function inRange(value: number, { min = -Infinity, max = Infinity }: QuantityField): boolean {
  return value >= min && value <= max;
}

function outOfRange(value: number, field: QuantityField): QuantityProblem {
  return problem(field, `${exact(value, field.unit)} is not within ${rangeText(field)}.`);
}

/**
 * The accepted range of a field in words: `1 Ω to 10 MΩ`, `at least 0 V`; '' where it has none.
 */
export function rangeText({ unit, min, max }: QuantityField): string {
  if (min !== undefined && max !== undefined) return `${exact(min, unit)} to ${exact(max, unit)}`;
  if (min !== undefined) return `at least ${exact(min, unit)}`;
  return max === undefined ? '' : `at most ${exact(max, unit)}`;
}

function exact(value: number, unit: UnitName): string {
  return unit === '%'
    ? formatPercent(value, { digits: 12 })
    : formatQuantity(value, unit, { digits: 12 });
}

const expected = ({ unit }: QuantityField) =>
  `${QUANTITY_UNITS[unit].noun}, for example ${QUANTITY_UNITS[unit].example}`;

function problem(field: QuantityField, what: string): QuantityProblem {
  return { ok: false, problem: `${what} Enter ${expected(field)}.` };
}
