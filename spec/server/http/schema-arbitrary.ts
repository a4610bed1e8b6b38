import fc from 'fast-check';
import * as z from 'zod';

/** As much of JSON Schema 2020-12 as the contract's zod schemas come out with. */
interface Schema {
  readonly type?: 'object' | 'array' | 'string' | 'number' | 'integer' | 'boolean' | 'null';
  readonly const?: unknown;
  readonly enum?: readonly unknown[];
  readonly anyOf?: readonly Schema[];
  readonly oneOf?: readonly Schema[];
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly required?: readonly string[];
  readonly additionalProperties?: boolean | Schema;
  readonly propertyNames?: Schema;
  readonly items?: Schema;
  readonly minItems?: number;
  readonly maxItems?: number;
  readonly pattern?: string;
  readonly minLength?: number;
  readonly maxLength?: number;
  readonly minimum?: number;
  readonly maximum?: number;
  readonly exclusiveMinimum?: number;
}

const MOST_ITEMS = 4;
const LONGEST = 200;

/** JSON values as a schema of the contract takes them, the ends of its ranges often among them. */
export function valuesOf(schema: z.ZodType): fc.Arbitrary<unknown> {
  return arbitraryOf(z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Schema);
}

/** The names an object's schema knows: of a route's query or parameters. */
export function namesOf(schema: z.ZodType): string[] {
  const { properties } = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Schema;
  return Object.keys(properties ?? {});
}

function arbitraryOf(schema: Schema): fc.Arbitrary<unknown> {
  if ('const' in schema) return fc.constant(schema.const);
  if (schema.enum) return fc.constantFrom(...schema.enum);
  const either = schema.anyOf ?? schema.oneOf;
  if (either) return fc.oneof(...either.map(arbitraryOf));
  switch (schema.type) {
    case 'object':
      return objectOf(schema);
    case 'array':
      return fc.array(arbitraryOf(schema.items ?? {}), {
        minLength: schema.minItems ?? 0,
        maxLength: Math.min(schema.maxItems ?? MOST_ITEMS, (schema.minItems ?? 0) + MOST_ITEMS),
      });
    case 'string':
      return textOf(schema);
    case 'number':
    case 'integer':
      return numberOf(schema);
    case 'boolean':
      return fc.boolean();
    case 'null':
      return fc.constant(null);
    default:
      return fc.jsonValue({ maxDepth: 2 });
  }
}

function objectOf({ properties, required, ...rest }: Schema): fc.Arbitrary<unknown> {
  if (properties) {
    const members = Object.entries(properties).map(
      ([name, schema]) => [name, arbitraryOf(schema)] as const,
    );
    return fc.record(Object.fromEntries(members), { requiredKeys: [...(required ?? [])] });
  }
  const values = typeof rest.additionalProperties === 'object' ? rest.additionalProperties : {};
  const names = arbitraryOf(rest.propertyNames ?? { type: 'string' }) as fc.Arbitrary<string>;
  return fc.dictionary(names, arbitraryOf(values), { maxKeys: MOST_ITEMS });
}

function textOf({ pattern, minLength = 0, maxLength = LONGEST }: Schema): fc.Arbitrary<string> {
  const longest = Math.min(maxLength, LONGEST);
  if (pattern !== undefined && !pattern.startsWith('^[^')) {
    return fc.stringMatching(new RegExp(pattern), { size: 'small' });
  }
  return fc.oneof(
    fc.string({ unit: 'grapheme', minLength, maxLength: Math.max(minLength, longest >> 2) }),
    fc.constant('x'.repeat(longest)),
  );
}

function numberOf(schema: Schema): fc.Arbitrary<number> {
  const min = schema.exclusiveMinimum ?? schema.minimum ?? -1e12;
  const max = schema.maximum ?? 1e12;
  const ends = fc.constantFrom(min, max, Math.min(max, Math.max(min, 1)));
  if (schema.type === 'integer') return fc.oneof(ends, fc.integer({ min, max }));
  return fc.oneof(ends, fc.double({ min, max, noNaN: true }));
}
