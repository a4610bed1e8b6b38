import type * as z from 'zod';
import { recordWords } from './record-words.ts';

interface Named {
  readonly key: string;
  readonly label: string;
  readonly optional: boolean;
}

/** A single value to type or choose. `unit` is one of `parseQuantity`, or a text shown beside a plain number. */
export type Leaf = Named &
  (
    | { readonly kind: 'number'; readonly unit: string }
    | { readonly kind: 'text' }
    | { readonly kind: 'choice'; readonly options: readonly string[] }
    | { readonly kind: 'flag' }
  );

export type Group = Named & { readonly kind: 'group'; readonly fields: readonly Outline[] };
export type Rows = Named & { readonly kind: 'rows'; readonly row: Outline };
/** The shape of a record as a form needs it, read off its schema. */
export type Outline = Leaf | Group | Rows;

const ENDS: readonly (readonly [RegExp, string])[] = [
  [/KPerW$/, 'K/W'],
  [/VPerK$/, 'V/K'],
  [/WPerK$/, 'W/K'],
  [/DegC$/, '°C'],
  [/Ohm$/, 'Ohm'],
  [/Sec$/, 's'],
  [/Hz$/, 'Hz'],
  [/V$/, 'V'],
  [/A$/, 'A'],
  [/W$/, 'W'],
  [/J$/, 'J'],
  [/H$/, 'H'],
  [/F$/, 'F'],
  [/^(tolerance|operate|release|maximum|range|coldRatio)$/, '%'],
];

const unitOfKey = (key: string) => ENDS.find(([end]) => end.test(key))?.[1] ?? null;

/**
 * The outline of a schema: what to ask for, in its order, with labels and units.
 *
 * @param schema part record or any piece of it
 * @param key name of the field; the unit is read off its end
 * @param parent name of the group around it, whose unit `min` and `max` take
 * @throws {RangeError} for a schema no form field is known for
 */
export function outlineOf(schema: z.core.$ZodType, key: string, parent = ''): Outline {
  const { inner, optional } = unwrapped(schema as z.core.$ZodTypes);
  const named = { key, label: recordWords(key), optional };
  const { def } = inner._zod;
  switch (def.type) {
    case 'object': {
      const fields = Object.entries(def.shape).filter(([name]) => !isFixed(def.shape[name]));
      return {
        ...named,
        kind: 'group',
        fields: fields.map(([name, each]) => outlineOf(each, name, key)),
      };
    }
    case 'array':
      return { ...named, kind: 'rows', row: outlineOf(def.element, key, parent) };
    case 'number':
      return { ...named, kind: 'number', unit: unitOfKey(key) ?? unitOfKey(parent) ?? '1' };
    case 'string':
      return { ...named, kind: 'text' };
    case 'boolean':
      return { ...named, kind: 'flag' };
    case 'enum':
      return { ...named, kind: 'choice', options: Object.values(def.entries).map(String) };
    default:
      throw new RangeError(`no form field for ${def.type} at ${key}`);
  }
}

/** Takes `nullable` and `default` off; a value they supply may be left out. */
function unwrapped(schema: z.core.$ZodTypes): { inner: z.core.$ZodTypes; optional: boolean } {
  const { def } = schema._zod;
  if (def.type === 'nullable' || def.type === 'default' || def.type === 'optional') {
    return { inner: unwrapped(def.innerType as z.core.$ZodTypes).inner, optional: true };
  }
  return { inner: schema, optional: false };
}

/** The kind of a record is chosen before the form, never in it. */
function isFixed(schema: z.core.$ZodType | undefined): boolean {
  return (schema as z.core.$ZodTypes | undefined)?._zod.def.type === 'literal';
}

/** Whether a row can stand in a line of a table: single values and ranges, no rows inside. */
export function isFlat(outline: Outline): boolean {
  if (outline.kind === 'rows') return false;
  return outline.kind !== 'group' || outline.fields.every((field) => isFlat(field));
}

export interface Column {
  readonly path: readonly string[];
  readonly leaf: Leaf;
  readonly label: string;
}

/** The single values of a flat outline, with what to call them and the way to each. */
export function columnsOf(outline: Outline, path: readonly string[] = [], prefix = ''): Column[] {
  if (outline.kind === 'rows') return [];
  if (outline.kind !== 'group') return [{ path, leaf: outline, label: prefix + outline.label }];
  return outline.fields.flatMap((field) => {
    const inside = field.kind === 'group' ? `${prefix}${field.label}, ` : prefix;
    return columnsOf(field, [...path, field.key], inside);
  });
}
