import { create, parseDependencies, type MathNode } from 'mathjs';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';
import {
  parseQuantity,
  type QuantityField,
  type QuantityResult,
} from '../../../shared/units/quantity.ts';
import { QUANTITY_UNITS } from '../../../shared/units/quantity-unit.ts';
import { measure } from './expression-walker.ts';
import { dimensionOf, NO_DIMENSION, sameDimension } from './quantity-dimension.ts';

/** Nothing but the parser: no evaluation, no import, no units of its own. */
const { parse } = create(parseDependencies ?? {});

const MAX_LENGTH = 200;

/**
 * Reads arithmetic with units, such as `24V/10mA` or `2*4k7 + 330`, in a field of a given unit. The text is
 * only parsed; an own walker adds it up and refuses everything that is not plain arithmetic.
 *
 * @returns the SI value with what it was read as, or a problem in a sentence; never throws
 */
export function parseArithmetic(text: string, field: QuantityField): QuantityResult {
  if (text.length > MAX_LENGTH) {
    return { ok: false, problem: `That is more than ${MAX_LENGTH} characters.` };
  }
  const { noun, example } = QUANTITY_UNITS[field.unit];
  const refuse = (what: string): QuantityResult => ({
    ok: false,
    problem: `${what} Enter ${noun}, for example ${example}.`,
  });
  let root: MathNode;
  try {
    root = parse(plainNotation(text));
  } catch {
    return refuse('That is not arithmetic this field understands.');
  }
  const measured = measure(root);
  if (typeof measured === 'string') return refuse(measured);
  const wanted = dimensionOf(field.unit);
  const bare = sameDimension(measured.dimension, NO_DIMENSION);
  if (!bare && !sameDimension(measured.dimension, wanted)) {
    return refuse(`The result is not ${noun}.`);
  }
  const percent = field.unit === '%' && bare;
  const result = parseQuantity(String(percent ? measured.value * 100 : measured.value), field);
  if (!result.ok) return result;
  const shown = formatQuantity(result.value, field.unit, { digits: 4 });
  return { ok: true, value: result.value, reading: `That makes ${shown}.` };
}

/** Letter code, comma, Ω and µ into what the parser knows. */
function plainNotation(text: string): string {
  return text
    .replace(/[\u00a0\u2009\u202f]/g, ' ')
    .replaceAll('\u2212', '-')
    .replace(/[×·]/g, '*')
    .replaceAll('÷', '/')
    .replace(/[Ω\u2126]/g, 'ohm')
    .replace(/[µ\u03bc]/g, 'u')
    .replace(/(\d),(\d)/g, '$1.$2')
    .replace(
      /(?<![\w.])(\d+)([RkKM])(\d+)(?![\w.])/g,
      (_, whole: string, letter: string, part: string) =>
        letter === 'R' ? `(${whole}.${part})` : `(${whole}.${part} ${letter})`,
    );
}
