import type { UnitName } from '../../../shared/units/quantity-unit.ts';

/** Powers of volt, ampere, second and kelvin; every unit of the fields is made of them. */
export interface Dimension {
  readonly volt: number;
  readonly ampere: number;
  readonly second: number;
  readonly kelvin: number;
}

/** A value in SI with what it measures. */
export interface Measured {
  readonly value: number;
  readonly dimension: Dimension;
}

const dimension = (volt: number, ampere: number, second = 0, kelvin = 0): Dimension => ({
  volt,
  ampere,
  second,
  kelvin,
});

export const NO_DIMENSION = dimension(0, 0);

const OF_UNIT: Readonly<Record<UnitName, Dimension>> = {
  V: dimension(1, 0),
  A: dimension(0, 1),
  Ohm: dimension(1, -1),
  W: dimension(1, 1),
  H: dimension(1, -1, 1),
  F: dimension(-1, 1, 1),
  s: dimension(0, 0, 1),
  Hz: dimension(0, 0, -1),
  K: dimension(0, 0, 0, 1),
  '°C': dimension(0, 0, 0, 1),
  'K/W': dimension(-1, -1, 0, 1),
  '1': NO_DIMENSION,
  '%': NO_DIMENSION,
};

export const dimensionOf = (unit: UnitName): Dimension => OF_UNIT[unit];

const KEYS = ['volt', 'ampere', 'second', 'kelvin'] as const;

export const sameDimension = (a: Dimension, b: Dimension): boolean =>
  KEYS.every((key) => a[key] === b[key]);

/** The dimension of a product; with `power` of a power, with −1 of a quotient. */
export function combined(a: Dimension, b: Dimension, power: number): Dimension {
  return dimension(
    a.volt + power * b.volt,
    a.ampere + power * b.ampere,
    a.second + power * b.second,
    a.kelvin + power * b.kelvin,
  );
}

const PREFIX: Readonly<Record<string, number>> = {
  '': 1,
  T: 1e12,
  G: 1e9,
  M: 1e6,
  k: 1e3,
  K: 1e3,
  m: 1e-3,
  u: 1e-6,
  n: 1e-9,
  p: 1e-12,
};

const SYMBOLS: readonly (readonly [RegExp, UnitName])[] = [
  [/^([TGMkKmunp]?)(?:[oO]hms?|R)$/, 'Ohm'],
  [/^([TGMkKmunp]?)V$/, 'V'],
  [/^([TGMkKmunp]?)A$/, 'A'],
  [/^([TGMkKmunp]?)W$/, 'W'],
  [/^([TGMkKmunp]?)Hz$/, 'Hz'],
  [/^([TGMkKmunp]?)H$/, 'H'],
  [/^([TGMkKmunp]?)F$/, 'F'],
  [/^([TGMkKmunp]?)s$/, 's'],
];

/** What a word such as `mA`, `kohm` or a bare prefix `k` stands for in an expression; null if nothing. */
export function unitWord(word: string): Measured | null {
  if (word !== '' && Object.hasOwn(PREFIX, word)) {
    return { value: PREFIX[word] ?? 1, dimension: NO_DIMENSION };
  }
  for (const [pattern, unit] of SYMBOLS) {
    const match = pattern.exec(word);
    if (match !== null) return { value: PREFIX[match[1] ?? ''] ?? 1, dimension: OF_UNIT[unit] };
  }
  return null;
}
