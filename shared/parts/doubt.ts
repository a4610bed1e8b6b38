import { formatQuantity } from '../units/engineering-notation.ts';

/** A figure that may be right but looks slipped; it never blocks, a person decides. */
export interface Doubt {
  /** Dotted path into the record, such as `gain.2.max`. */
  readonly path: string;
  readonly message: string;
}

/** A figure outside what parts of its kind have; most often a unit slipped by a thousand. */
export function outside(
  path: string,
  value: number | null,
  [low, high]: readonly [number, number],
  unit: string,
): Doubt[] {
  if (value === null || (value >= low && value <= high)) return [];
  const [shown, from, to] = [value, low, high].map((figure) => formatQuantity(figure, unit));
  return [
    { path, message: `${shown} is unusual here: expected ${from} to ${to}. Check the unit.` },
  ];
}

const ORDER = ['min', 'typ', 'max'] as const;

/**
 * Objects whose printed minimum, typical and maximum do not rise, anywhere in a record: keys `min`,
 * `typ`, `max`, alone or with the same unit behind (`minV`, `maxV`).
 */
export function disordered(value: unknown, path = ''): Doubt[] {
  if (value === null || typeof value !== 'object') return [];
  const own = unordered(value as Record<string, unknown>, path);
  const inner = Object.entries(value).flatMap(([key, child]) =>
    disordered(child, path === '' ? key : `${path}.${key}`),
  );
  return [...own, ...inner];
}

function unordered(row: Record<string, unknown>, path: string): Doubt[] {
  const units = [
    ...new Set(Object.keys(row).flatMap((key) => /^(?:min|typ|max)(.*)$/.exec(key)?.[1] ?? [])),
  ];
  return units.flatMap((unit) => {
    const printed = ORDER.map((end) => ({ key: end + unit, value: row[end + unit] })).filter(
      (entry): entry is { key: string; value: number } => typeof entry.value === 'number',
    );
    return printed.slice(1).flatMap(({ key, value }, index) => {
      const before = printed[index];
      if (before === undefined || before.value <= value) return [];
      return [{ path: `${path}.${key}`, message: `${key} lies below ${before.key}.` }];
    });
  });
}
