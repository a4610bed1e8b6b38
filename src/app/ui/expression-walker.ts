import type { MathNode } from 'mathjs';
import {
  combined,
  NO_DIMENSION,
  sameDimension,
  unitWord,
  type Measured,
} from './quantity-dimension.ts';

const MAX_NODES = 200;
const MAX_DEPTH = 20;

/** The parts of a parsed node that the walker looks at. */
interface Shape {
  readonly type: string;
  readonly value?: unknown;
  readonly name?: string;
  readonly fn?: unknown;
  readonly args?: readonly MathNode[];
  readonly content?: MathNode;
}

class NotArithmetic extends Error {}

const refuse = (sentence: string): never => {
  throw new NotArithmetic(sentence);
};

/**
 * Adds up a parsed expression with its units. Numbers, unit words, brackets, + − * / ^, signs and
 * sqrt, abs, min, max are all there is; every other kind of node is refused.
 *
 * @returns the SI value and dimension, or what is wrong as a sentence
 */
export function measure(root: MathNode): Measured | string {
  let nodes = 0;
  const walk = (node: MathNode, depth: number): Measured => {
    nodes += 1;
    if (nodes > MAX_NODES || depth > MAX_DEPTH)
      refuse('That is too much arithmetic for one field.');
    const shape = node as unknown as Shape;
    const below = (child: MathNode) => walk(child, depth + 1);
    switch (shape.type) {
      case 'ConstantNode':
        return typeof shape.value === 'number'
          ? { value: shape.value, dimension: NO_DIMENSION }
          : refuse('That is not a number.');
      case 'SymbolNode':
        return unitWord(shape.name ?? '') ?? refuse(`“${shape.name ?? ''}” means nothing here.`);
      case 'ParenthesisNode':
        return below(shape.content ?? refuse('An empty bracket.'));
      case 'OperatorNode':
        return operator(shape, below);
      case 'FunctionNode':
        return call(functionName(shape.fn), (shape.args ?? []).map(below));
      default:
        return refuse('Only numbers, units, brackets and + − × ÷ are understood.');
    }
  };
  try {
    const result = walk(root, 1);
    return Number.isFinite(result.value) ? result : 'The result is beyond all bounds.';
  } catch (error) {
    if (error instanceof NotArithmetic) return error.message;
    throw error;
  }
}

/** In `12V^2` only the unit would be squared, which nobody means. */
const isWord = (node: MathNode | undefined) => node?.type === 'SymbolNode';

function operator({ fn, args = [] }: Shape, below: (node: MathNode) => Measured): Measured {
  if (fn === 'pow' && isWord(args[0])) {
    refuse('Put the quantity in brackets before its power, such as (12 V)^2.');
  }
  return operate(String(fn), args.map(below));
}

const functionName = (fn: unknown): string => {
  const name = (fn as { name?: unknown } | undefined)?.name;
  return typeof name === 'string' ? name : '';
};

function operate(name: string, [a, b]: readonly Measured[]): Measured {
  if (a === undefined) return refuse('Something is missing.');
  if (name === 'unaryMinus') return { ...a, value: -a.value };
  if (name === 'unaryPlus') return a;
  if (b === undefined) return refuse('Something is missing.');
  switch (name) {
    case 'add':
      return alike([a, b], a.value + b.value);
    case 'subtract':
      return alike([a, b], a.value - b.value);
    case 'multiply':
      return { value: a.value * b.value, dimension: combined(a.dimension, b.dimension, 1) };
    case 'divide':
      return { value: a.value / b.value, dimension: combined(a.dimension, b.dimension, -1) };
    case 'pow':
      return power(a, b);
    default:
      return refuse('Only + − × ÷ and powers are understood.');
  }
}

function power(base: Measured, exponent: Measured): Measured {
  if (!sameDimension(exponent.dimension, NO_DIMENSION)) refuse('An exponent has no unit.');
  const dimension = combined(NO_DIMENSION, base.dimension, exponent.value);
  return { value: base.value ** exponent.value, dimension };
}

/** Sums and choices make sense among like quantities only. */
function alike(all: readonly Measured[], value: number): Measured {
  const [first = refuse('Something is missing.')] = all;
  if (!all.every(({ dimension }) => sameDimension(dimension, first.dimension))) {
    refuse('Different quantities cannot be added.');
  }
  return { value, dimension: first.dimension };
}

function call(name: string, given: readonly Measured[]): Measured {
  const values = given.map(({ value }) => value);
  const [first = refuse(`${name} of nothing.`)] = given;
  switch (name) {
    case 'abs':
      return { ...first, value: Math.abs(first.value) };
    case 'min':
      return alike(given, Math.min(...values));
    case 'max':
      return alike(given, Math.max(...values));
    case 'sqrt':
      return power(first, { value: 0.5, dimension: NO_DIMENSION });
    default:
      return refuse(`“${name}” is not understood here.`);
  }
}
