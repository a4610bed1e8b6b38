import { PREFIXES, QUANTITY_UNITS, type QuantityUnit } from './quantity-unit.ts';

/** How a number is written. */
export interface NotationOptions {
  /** Significant digits, 1 to 15; 3 where left out. */
  readonly digits?: number;
  /**
   * Whether trailing zeros fill up to `digits`. Off (the default) for values a person chose: 4.7 kΩ.
   * On for results, whose digits say how finely they are known: 4.70 V.
   */
  readonly pad?: boolean;
  /** `.` where left out. */
  readonly decimalMark?: '.' | ',';
  /** Plain ASCII for CSV: hyphen, ordinary space, `u`, `Ohm`, `degC`. */
  readonly ascii?: boolean;
}

/** Shown where a figure cannot be computed. */
export const NO_FIGURE = '–';

const NO_BREAK_SPACE = '\u00a0';

/**
 * A quantity in engineering notation: the exponent a multiple of 3, shown as an SI prefix; a no-break
 * space before the unit; U+2212 as minus. °C, K, K/W and ratios never get a prefix and never lose whole
 * digits (1234 stays 1234 at three digits). Prefixes reach from f to T; beyond them `1.2e-18 A`.
 *
 * @param value SI value, or null where there is no figure
 * @param unit key of `QUANTITY_UNITS` ('Ohm', 'V', '°C', '1' …) or any other unit text such as 'V/K'
 * @returns text such as `4.7 kΩ`, `−2 mV/K`, `61.3 °C`; `–` for null and NaN
 */
export function formatQuantity(
  value: number | null,
  unit: string,
  options: NotationOptions = {},
): string {
  const ascii = options.ascii ?? false;
  if (value === null || Number.isNaN(value)) return ascii ? '-' : NO_FIGURE;
  const kind = unitOf(unit);
  const { number, prefix } = kind.prefixed ? scaled(value, options) : plain(value, options);
  const symbol = (ascii && prefix === 'µ' ? 'u' : prefix) + (ascii ? kind.ascii : kind.symbol);
  return dressed(number, options) + (symbol === '' ? '' : (ascii ? ' ' : NO_BREAK_SPACE) + symbol);
}

/** A ratio or count without unit, as `formatQuantity` writes it. */
export function formatNumber(value: number | null, options: NotationOptions = {}): string {
  return formatQuantity(value, '1', options);
}

/**
 * A fraction as a percentage: 0.05 gives `5 %`.
 *
 * @param fraction ratio without unit, or null where there is no figure
 */
export function formatPercent(fraction: number | null, options: NotationOptions = {}): string {
  const percent = fraction === null ? null : Number((fraction * 100).toPrecision(15));
  return formatQuantity(percent, '%', options);
}

interface Written {
  readonly number: string;
  readonly prefix: string;
}

function unitOf(unit: string): Pick<QuantityUnit, 'symbol' | 'ascii' | 'prefixed'> {
  if (Object.hasOwn(QUANTITY_UNITS, unit)) {
    return QUANTITY_UNITS[unit as keyof typeof QUANTITY_UNITS];
  }
  return { symbol: unit, ascii: unit, prefixed: /^[A-Za-z]/.test(unit) };
}

/** Rounded once, in decimal, so that 999.96 carries over to 1.00 k. */
function scaled(value: number, options: NotationOptions): Written {
  if (!Number.isFinite(value) || value === 0) return plain(value, options);
  const [mantissa = '', power = '0'] = value.toExponential(digitsOf(options) - 1).split('e');
  const exponent = Number(power);
  const step = Math.floor(exponent / 3) * 3;
  const prefix = PREFIXES.find((candidate) => candidate.exponent === step);
  if (prefix === undefined) return { number: `${trimmed(mantissa, options)}e${power}`, prefix: '' };
  return {
    number: trimmed(shifted(mantissa, exponent - step), options),
    prefix: prefix.symbol,
  };
}

const SMALLEST_PLAIN = 1e-6;
const LARGEST_PLAIN = 1e15;

function plain(value: number, options: NotationOptions): Written {
  if (value === 0) return { number: '0', prefix: '' };
  if (!Number.isFinite(value)) return { number: value < 0 ? '-∞' : '∞', prefix: '' };
  const digits = digitsOf(options);
  const size = Math.abs(value);
  if (size < SMALLEST_PLAIN || size >= LARGEST_PLAIN) {
    const [mantissa = '', power = '0'] = value.toExponential(digits - 1).split('e');
    return { number: `${trimmed(mantissa, options)}e${power}`, prefix: '' };
  }
  const exponent = Number(value.toExponential(digits - 1).split('e')[1]);
  const decimals = Math.max(0, digits - 1 - exponent);
  const text = value.toFixed(decimals);
  return { number: Number(text) === 0 ? '0' : trimmed(text, options), prefix: '' };
}

/** `4.70` moved by 2 places gives `470`. */
function shifted(mantissa: string, places: number): string {
  const sign = mantissa.startsWith('-') ? '-' : '';
  const digits = mantissa
    .replace('-', '')
    .replace('.', '')
    .padEnd(places + 1, '0');
  const fraction = digits.slice(places + 1);
  return sign + digits.slice(0, places + 1) + (fraction === '' ? '' : `.${fraction}`);
}

function trimmed(text: string, { pad = false }: NotationOptions): string {
  return pad || !text.includes('.') ? text : text.replace(/\.?0+$/, '');
}

function dressed(text: string, { ascii = false, decimalMark = '.' }: NotationOptions): string {
  const marked = text.replace('.', decimalMark);
  return ascii ? marked.replace('∞', 'inf') : marked.replaceAll('-', '\u2212').replace('e+', 'e');
}

function digitsOf({ digits = 3 }: NotationOptions): number {
  if (!Number.isInteger(digits) || digits < 1 || digits > 15) {
    throw new RangeError(`${digits} significant digits: expected 1 to 15`);
  }
  return digits;
}
