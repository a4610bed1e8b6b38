/** How one kind of quantity is spelt, shown and asked for. */
export interface QuantityUnit {
  /** As shown on screen. */
  readonly symbol: string;
  /** Spelling in plain ASCII, for CSV. */
  readonly ascii: string;
  /** What is asked for, with its article. */
  readonly noun: string;
  /** An accepted entry, for messages. */
  readonly example: string;
  /** Spellings accepted at entry, longest first. */
  readonly spellings: readonly string[];
  /** Whether k, m, µ … may stand before it. */
  readonly prefixed: boolean;
  /** Whether a part of this kind is bought with a tolerance, so that `±5 %` may follow. */
  readonly toleranced: boolean;
}

const unit = (
  symbol: string,
  noun: string,
  example: string,
  more: Partial<QuantityUnit> = {},
): QuantityUnit => ({
  symbol,
  ascii: symbol,
  noun,
  example,
  spellings: [symbol],
  prefixed: true,
  toleranced: false,
  ...more,
});

const CELSIUS = ['degC', '°C', 'ºC', '℃', 'C', '°'];

/** Every kind of quantity that fields take, by the name of its unit in the product. */
export const QUANTITY_UNITS = {
  Ohm: unit('Ω', 'a resistance', '4.7 kΩ', {
    ascii: 'Ohm',
    spellings: ['ohms', 'Ohms', 'ohm', 'Ohm', 'OHM', 'Ω', '\u2126', 'R'],
    toleranced: true,
  }),
  V: unit('V', 'a voltage', '12 V'),
  A: unit('A', 'a current', '30 mA'),
  W: unit('W', 'a power', '250 mW'),
  s: unit('s', 'a time', '10 ms', { spellings: ['sec', 's'] }),
  H: unit('H', 'an inductance', '100 mH', { toleranced: true }),
  F: unit('F', 'a capacitance', '100 nF', { toleranced: true }),
  Hz: unit('Hz', 'a frequency', '1 kHz', { spellings: ['Hz', 'hz', 'HZ'] }),
  K: unit('K', 'a temperature difference', '20 K', { prefixed: false }),
  '°C': unit('°C', 'a temperature', '60 °C', {
    ascii: 'degC',
    spellings: CELSIUS,
    prefixed: false,
  }),
  'K/W': unit('K/W', 'a thermal resistance', '200 K/W', {
    spellings: ['K/W', ...CELSIUS.map((spelling) => `${spelling}/W`)],
    prefixed: false,
  }),
  '1': unit('', 'a number', '2.5', { prefixed: false, spellings: [] }),
  '%': unit('%', 'a percentage', '5 %', { prefixed: false }),
} as const satisfies Record<string, QuantityUnit>;
export type UnitName = keyof typeof QUANTITY_UNITS;

/** SI prefixes by power of ten; micro shows as U+00B5. */
export const PREFIXES = [
  { exponent: 12, symbol: 'T', spellings: ['T'] },
  { exponent: 9, symbol: 'G', spellings: ['G'] },
  { exponent: 6, symbol: 'M', spellings: ['M'] },
  { exponent: 3, symbol: 'k', spellings: ['k', 'K'] },
  { exponent: 0, symbol: '', spellings: [] },
  { exponent: -3, symbol: 'm', spellings: ['m'] },
  { exponent: -6, symbol: 'µ', spellings: ['\u00b5', '\u03bc', 'u'] },
  { exponent: -9, symbol: 'n', spellings: ['n'] },
  { exponent: -12, symbol: 'p', spellings: ['p'] },
  { exponent: -15, symbol: 'f', spellings: ['f'] },
] as const;

/** Power of ten of a prefix letter, or null where the letter is none. */
export function prefixExponent(letter: string): number | null {
  const found = PREFIXES.find(({ spellings }) => (spellings as readonly string[]).includes(letter));
  return found === undefined ? null : found.exponent;
}
