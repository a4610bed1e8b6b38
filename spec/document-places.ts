/** Keys and indices from the root of a JSON document to one of its values. */
export type Place = readonly (string | number)[];

/** Every place that holds a value and no further places. */
export function leaves(value: unknown, place: Place = []): Place[] {
  if (value === null || typeof value !== 'object') return [place];
  return Object.entries(value).flatMap(([key, inner]) =>
    leaves(inner, [...place, Array.isArray(value) ? Number(key) : key]),
  );
}

/** A copy of the document with another value at one place. */
export function replaced(document: unknown, place: Place, value: unknown): unknown {
  const last = place.at(-1);
  if (last === undefined) return value;
  const copy = structuredClone(document);
  let holder = copy as Record<string | number, unknown>;
  for (const step of place.slice(0, -1)) holder = holder[step] as Record<string | number, unknown>;
  holder[last] = value;
  return copy;
}
