import { formatPercent, formatQuantity } from '../../../shared/units/engineering-notation.ts';
import type { FieldSpec } from './field-spec.ts';
import { fieldSpec, type FieldPath } from './stage-fields.ts';

/** `10 Ω … 10 MΩ`, with the note behind it; stands below the label before anything is typed. */
export function rangeLine(spec: FieldSpec): string {
  if (spec.kind !== 'quantity' && spec.kind !== 'span') return spec.note ?? '';
  const { min, max, unit } = spec;
  const text = (value: number) =>
    unit === '%' ? formatPercent(value) : formatQuantity(value, unit, { digits: 4 });
  const range =
    min === undefined || max === undefined ? '' : `${min === 0 ? '0' : text(min)} … ${text(max)}`;
  return spec.note === undefined ? range : `${range}, ${spec.note}`;
}

const MOST_DIGITS = 6;

/** A field's value as text, for read-only sheets and comparisons. */
export function valueText(path: FieldPath, value: unknown): string {
  const spec = fieldSpec(path);
  switch (spec.kind) {
    case 'quantity':
      return quantityText(value as number | null, spec.unit);
    case 'span': {
      const { min, max } = value as { min: number | null; max: number | null };
      return `${quantityText(min, spec.unit)} … ${quantityText(max, spec.unit)}`;
    }
    case 'flag':
      return value === true ? 'Yes' : 'No';
    case 'choice':
      return spec.options.find(([key]) => key === value)?.[1] ?? String(value);
    case 'text':
      return String(value) === '' ? '–' : String(value);
  }
}

function quantityText(value: number | null, unit: Parameters<typeof formatQuantity>[1]): string {
  return unit === '%'
    ? formatPercent(value, { digits: MOST_DIGITS })
    : formatQuantity(value, unit, { digits: MOST_DIGITS });
}
