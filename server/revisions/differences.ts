const MOST = 50;
/** Rounding of other processors' mathematics is no difference. */
const SAME_WITHIN = 1e-12;

/**
 * Where two JSON values differ, as lines such as `definition.baseResistor.valueOhm: 620, now 680`.
 *
 * @returns at most 50 lines, in the order of the first value's members
 */
export function differences(before: unknown, now: unknown, path = ''): string[] {
  if (isSame(before, now)) return [];
  if (!isContainer(before) || !isContainer(now)) {
    return [`${path === '' ? 'value' : path}: ${shown(before)}, now ${shown(now)}`];
  }
  const keys = new Set([...Object.keys(before), ...Object.keys(now)]);
  return [...keys]
    .flatMap((key) => differences(before[key], now[key], path === '' ? key : `${path}.${key}`))
    .slice(0, MOST);
}

function isContainer(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function isSame(a: unknown, b: unknown): boolean {
  if (typeof a !== 'number' || typeof b !== 'number') return a === b;
  return a === b || Math.abs(a - b) <= SAME_WITHIN * Math.max(Math.abs(a), Math.abs(b));
}

function shown(value: unknown): string {
  const text = JSON.stringify(value) as string | undefined;
  if (text === undefined) return 'nothing';
  return text.length > 80 ? `${text.slice(0, 79)}…` : text;
}
