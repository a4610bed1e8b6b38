import { prefixExponent } from './quantity-unit.ts';

/** A decimal number as typed, kept as text so that nothing is rounded before the one conversion. */
export interface Decimal {
  /** Digits with at most one point, such as `4.7`. */
  readonly mantissa: string;
  readonly exponent: number;
}

/** The number at the front of an entry. */
export interface ScannedNumber {
  readonly decimal: Decimal;
  /** Set where one separator before three digits may also group thousands. */
  readonly grouped: Decimal | null;
  /** The separator that leaves the two readings open. */
  readonly separator: '.' | ',' | null;
  /** The letter that stood for the decimal point (`4k7`), or null. */
  readonly letter: string | null;
  /** Whether the digits are plain, so that letter code and tolerance code may follow. */
  readonly plainDigits: boolean;
  /** Index of the first character after the number. */
  readonly end: number;
}

const isDigit = (character: string | undefined) =>
  character !== undefined && character >= '0' && character <= '9';

function digitsEnd(text: string, start: number): number {
  let end = start;
  while (isDigit(text[end])) end += 1;
  return end;
}

/**
 * Scans digits with decimal mark, thousands grouping, exponent or IEC 60062 letter code.
 *
 * @param text entry without sign and surrounding spaces
 * @param pointLetters letters that may stand for the decimal point in this kind of field
 * @returns null where no well-formed number stands in front
 */
export function scanNumber(text: string, pointLetters: string): ScannedNumber | null {
  const bodyEnd = endOfBody(text);
  const body = text.slice(0, bodyEnd);
  const plainDigits = digitsEnd(body, 0) === body.length;
  const letter = text[bodyEnd];
  if (plainDigits && letter !== undefined && pointLetters.includes(letter)) {
    const end = digitsEnd(text, bodyEnd + 1);
    if (end > bodyEnd + 1) return letterCoded(body, letter, text.slice(bodyEnd + 1, end), end);
  }
  const separated = readSeparators(body);
  if (separated === null) return null;
  const { exponent, end } = scanExponent(text, bodyEnd);
  const decimal = { mantissa: separated.mantissa, exponent };
  if (separated.grouped === null || end > bodyEnd) {
    return { decimal, grouped: null, separator: null, letter: null, plainDigits, end };
  }
  const grouped = { mantissa: separated.grouped, exponent };
  return { decimal, grouped, separator: separated.separator, letter: null, plainDigits, end };
}

function letterCoded(whole: string, letter: string, digits: string, end: number): ScannedNumber {
  const mantissa = `${whole === '' ? '0' : whole}.${digits}`;
  const decimal = { mantissa, exponent: prefixExponent(letter) ?? 0 };
  return { decimal, grouped: null, separator: null, letter, plainDigits: true, end };
}

/** A space belongs to the number only where exactly three digits follow: `10 000`. */
function endOfBody(text: string): number {
  let end = 0;
  for (;;) {
    const character = text[end];
    if (isDigit(character) || character === '.' || character === ',') end += 1;
    else if (character === ' ' && end > 0 && digitsEnd(text, end + 1) === end + 4) end += 4;
    else return end;
  }
}

interface Separated {
  readonly mantissa: string;
  readonly grouped: string | null;
  readonly separator: '.' | ',' | null;
}

const GROUPED = /^\d{1,3}([ .,])\d{3}(?:\1\d{3})*$/;

function readSeparators(body: string): Separated | null {
  const point = Math.max(body.lastIndexOf('.'), body.lastIndexOf(','));
  if (point < 0) return body === '' ? null : wholeNumber(body);
  const separator = body[point] === '.' ? '.' : ',';
  const whole = body.slice(0, point);
  const fraction = body.slice(point + 1);
  if (whole.includes(separator)) return wholeNumber(body);
  const left = wholeNumber(whole === '' ? '0' : whole);
  if (left === null || digitsEnd(fraction, 0) !== fraction.length) return null;
  if (whole === '' && fraction === '') return null;
  const mantissa = `${left.mantissa}.${fraction === '' ? '0' : fraction}`;
  const both = GROUPED.test(body) && Number(whole) > 0 && !whole.startsWith('0');
  return both && digitsEnd(whole, 0) === whole.length
    ? { mantissa, grouped: whole + fraction, separator }
    : { mantissa, grouped: null, separator: null };
}

/** Digits alone, or digits in well-formed groups of three. */
function wholeNumber(text: string): Separated | null {
  const digits = digitsEnd(text, 0) === text.length ? text : null;
  const joined = digits ?? (GROUPED.test(text) ? text.replace(/[ .,]/g, '') : null);
  return joined === null ? null : { mantissa: joined, grouped: null, separator: null };
}

function scanExponent(text: string, start: number): { exponent: number; end: number } {
  if (text[start] !== 'e' && text[start] !== 'E') return { exponent: 0, end: start };
  const signed = text[start + 1] === '-' || text[start + 1] === '+';
  const digits = start + (signed ? 2 : 1);
  const end = digitsEnd(text, digits);
  if (end === digits) return { exponent: 0, end: start };
  return { exponent: Number(text.slice(start + 1, end)), end };
}
