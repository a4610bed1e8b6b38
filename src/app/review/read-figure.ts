import { parseQuantity } from '../../../shared/units/quantity.ts';

/** The checker's figure as read: `value` is null while nothing is entered or it is not understood. */
export interface ReadFigure {
  readonly ok: boolean;
  readonly value: number | null;
  readonly problem: string | null;
}

/** Reads an overdrive factor as typed: `5.55` or `5,55`. */
export function readFigure(text: string): ReadFigure {
  if (text.trim() === '') return { ok: true, value: null, problem: null };
  const read = parseQuantity(text, { unit: '1', max: 1e6 });
  if (!read.ok) return { ok: false, value: null, problem: read.problem };
  if (read.value > 0) return { ok: true, value: read.value, problem: null };
  return { ok: false, value: null, problem: 'Enter an overdrive factor above 0, such as 5.5.' };
}
