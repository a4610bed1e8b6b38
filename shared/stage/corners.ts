/**
 * What a corner names, in the order corners are run through (first variable slowest) and reported (of
 * equal worst corners the first). Each has two ends, the first named first.
 */
export const CORNER_VARIABLES = {
  supply: ['min', 'max'],
  ambient: ['min', 'max'],
  drive: ['weak', 'strong'],
  rb: ['-', '+'],
  rbe: ['-', '+'],
  load: ['-', '+'],
  gain: ['min', 'max'],
  vbe: ['min', 'max'],
  vceSat: ['0', 'max'],
  instant: ['start', 'settled'],
  /** Forward voltage of an LED string. */
  vf: ['min', 'max'],
  /** Resistors inside a pre-biased part: R1, and R2/R1. */
  r1: ['-', '+'],
  ratio: ['-', '+'],
  /** Base–emitter voltage of the transistor behind a pre-driver. */
  veb: ['min', 'max'],
} as const satisfies Record<string, readonly [string, string]>;
export type CornerVariable = keyof typeof CORNER_VARIABLES;

const ALL = Object.keys(CORNER_VARIABLES) as CornerVariable[];

/** Shift of a variable the stage lacks: its bit then always reads 0. */
const ABSENT = 31;

/** Every combination of the variables a stage has, numbered from 0. */
export interface CornerSpace {
  readonly variables: readonly CornerVariable[];
  readonly count: number;
  /** Where each variable's bit stands in a corner's number. */
  readonly shift: Readonly<Record<CornerVariable, number>>;
}

/** The corners of a stage that lacks some of the variables. */
export function cornerSpace(lacks: readonly CornerVariable[]): CornerSpace {
  const variables = ALL.filter((variable) => !lacks.includes(variable));
  const shift = Object.fromEntries(ALL.map((variable) => [variable, ABSENT])) as Record<
    CornerVariable,
    number
  >;
  variables.forEach((variable, k) => {
    shift[variable] = variables.length - 1 - k;
  });
  return { variables, count: 2 ** variables.length, shift };
}

/** The ends a numbered corner stands at, by name. */
export function cornerNamed(space: CornerSpace, index: number): Record<string, string> {
  return Object.fromEntries(
    space.variables.map((variable) => [
      variable,
      CORNER_VARIABLES[variable][((index >> space.shift[variable]) & 1) as 0 | 1],
    ]),
  );
}

/** Number of a named corner; a variable it does not name stands at its first end. */
export function cornerNumber(space: CornerSpace, corner: Readonly<Record<string, string>>): number {
  return space.variables.reduce(
    (index, variable) =>
      corner[variable] === CORNER_VARIABLES[variable][1]
        ? index | (1 << space.shift[variable])
        : index,
    0,
  );
}
