import * as z from 'zod';

/**
 * Number fields of the stage file. Each message says what was expected, so that it can stand beside
 * a form field as well as behind a JSON path. Bounds are physical, not advisory: they keep out
 * slipped units and nonsense, never an unusual design.
 */

const number = (expected: string) => z.number({ error: `expected ${expected}` });

const between = (low: number, high: number, what: string, unit: string) => {
  const expected = `${what} from ${low} to ${high}${unit}`;
  return number(expected).min(low, `expected ${expected}`).max(high, `expected ${expected}`);
};

const above = (low: number, high: number, what: string, unit: string) => {
  const expected = `${what} above ${low} and up to ${high}${unit}`;
  return number(expected).gt(low, `expected ${expected}`).max(high, `expected ${expected}`);
};

export const voltage = above(0, 2000, 'a voltage', ' V');
export const voltageOrZero = between(0, 2000, 'a voltage', ' V');
export const signedVoltage = between(-100, 100, 'a voltage', ' V');
export const current = above(0, 1000, 'a current', ' A');
export const currentOrZero = between(0, 1000, 'a current', ' A');
export const resistance = above(0, 1e12, 'a resistance', ' Ω');
export const resistanceOrZero = between(0, 1e12, 'a resistance', ' Ω');
export const power = above(0, 1e5, 'a power', ' W');
export const celsius = between(-200, 500, 'a temperature', ' °C');
export const kelvin = between(0, 500, 'a temperature rise', ' K');
export const thermalResistance = above(0, 1e5, 'a thermal resistance', ' K/W');
export const inductance = between(0, 1e4, 'an inductance', ' H');
export const capacitance = between(0, 10, 'a capacitance', ' F');
export const frequency = between(0, 1e9, 'a frequency', ' Hz');
export const time = between(0, 1e4, 'a time', ' s');
export const gainFigure = above(0, 1e6, 'a current gain', '');
export const tolerance = number('a tolerance as a fraction from 0 to below 1')
  .min(0, 'expected a tolerance as a fraction from 0 to below 1')
  .lt(1, 'expected a tolerance as a fraction from 0 to below 1');
export const fraction = above(0, 1, 'a fraction', '');
export const factor = above(0, 1e6, 'a factor', '');
export const count = z
  .int({ error: 'expected a whole number from 1 to 100000' })
  .min(1, 'expected a whole number from 1 to 100000')
  .max(100000, 'expected a whole number from 1 to 100000');

/** A key that may be left out; then it is null. */
export const optional = <T extends z.ZodType>(schema: T) => schema.nullable().default(null);

/** A smallest and a largest value, in that order. */
export const span = (schema: z.ZodNumber) =>
  z
    .strictObject({ min: schema, max: schema })
    .refine((value) => value.min <= value.max, { error: 'expected min not above max' });

/** One line of text without control characters. */
export const line = (max: number) =>
  z
    .string({ error: 'expected text' })
    .trim()
    .min(1, 'expected text, not an empty string')
    .max(max, `expected at most ${max} characters`)
    // eslint-disable-next-line no-control-regex -- control characters are what is refused
    .regex(/^[^\u0000-\u001f\u007f]*$/, 'expected one line of text without control characters');

/** A key that may be left out or null and then has the given value. */
export const orElse = <T extends z.ZodType>(schema: T, value: z.output<T>) =>
  schema.nullish().transform((given): z.output<T> => given ?? value);
