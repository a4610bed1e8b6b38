/** Series of preferred values for resistors and capacitors. */
export const SERIES_NAMES = ['E3', 'E6', 'E12', 'E24', 'E48', 'E96', 'E192'] as const;
export type SeriesName = (typeof SERIES_NAMES)[number];

/** Two-digit values of IEC 60063: historical, several differ from the rounded power law. */
const E24 = [
  10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91,
];

const every = <T>(values: readonly T[], step: number) => values.filter((_, k) => k % step === 0);

/** Three-digit values of IEC 60063: the rounded power law, except 920. */
const E192 = Array.from({ length: 192 }, (_, k) => {
  const value = Math.round(100 * Math.pow(10, k / 192));
  return value === 919 ? 920 : value;
});

const SIGNIFICANTS: Record<SeriesName, readonly number[]> = {
  E3: every(E24, 8),
  E6: every(E24, 4),
  E12: every(E24, 2),
  E24,
  E48: every(E192, 4),
  E96: every(E192, 2),
  E192,
};

/**
 * Significant figures of a series over one decade, 1 up to below 10.
 *
 * @see IEC 60063:2015, Preferred number series for resistors and capacitors
 */
export function seriesDecade(series: SeriesName): number[] {
  const digits = SIGNIFICANTS[series];
  const scale = digits[0] ?? 1;
  return digits.map((value) => value / scale);
}

/** All preferred values from `smallest` to `largest` inclusive, rising; SI units in, SI units out. */
export function preferredValues(series: SeriesName, smallest: number, largest: number): number[] {
  const digits = SIGNIFICANTS[series];
  const shift = Math.log10(digits[0] ?? 1);
  const values: number[] = [];
  const first = Math.floor(Math.log10(smallest)) - 1;
  for (let decade = first; Math.pow(10, decade) <= largest; decade++) {
    for (const digit of digits) {
      // Read from text, so that 4.7e3 is exactly the number a person types.
      const value = Number(`${digit}e${decade - shift}`);
      if (value >= smallest && value <= largest) values.push(value);
    }
  }
  return values;
}
