/** Tolerance letters of IEC 60062, as fractions. */
const CODES: Readonly<Record<string, number>> = {
  B: 0.001,
  C: 0.0025,
  D: 0.005,
  F: 0.01,
  G: 0.02,
  J: 0.05,
  K: 0.1,
  M: 0.2,
};

/**
 * The tolerance an IEC 60062 letter stands for.
 *
 * @returns fraction such as 0.05 for `J`, or null where the letter is none
 */
export function toleranceOfCode(letter: string): number | null {
  return Object.hasOwn(CODES, letter) ? (CODES[letter] ?? null) : null;
}

const SIGNS = ['±', '+/-', '+-'];

/**
 * A tolerance written out: `±1 %`, `1%`, `+/-0,5 %`.
 *
 * @param text what follows value and unit, without surrounding spaces
 * @returns fraction from 0 to below 1, or null where the text is no tolerance
 */
export function parseTolerance(text: string): number | null {
  const sign = SIGNS.find((candidate) => text.startsWith(candidate)) ?? '';
  const rest = text.slice(sign.length).trim();
  if (!rest.endsWith('%')) return null;
  const number = rest.slice(0, -1).trim().replace(',', '.');
  if (!/^\d+(?:\.\d+)?$/.test(number)) return null;
  const fraction = Number(`${number}e-2`);
  return fraction < 1 ? fraction : null;
}
