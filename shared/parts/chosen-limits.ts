import { limitSetName, type LimitSet } from './transistor-limits.ts';
import type { TransistorRecord } from './transistor-record.ts';

const SMALLER_IS_SAFE = [
  'vceoV',
  'vcboV',
  'veboV',
  'vccV',
  'inputMaxV',
  'icA',
  'icPeakA',
  'ioA',
  'ibA',
  'ibPeakA',
  'powerW',
  'powerCaseW',
  'tjMaxDegC',
] as const;
const LARGER_IS_SAFE = ['rthJaKPerW', 'rthJcKPerW', 'rthJsKPerW', 'inputMinV'] as const;

/** The ratings one can fix a part to: each maker, and each mounting a maker prints. */
export function makerNames(record: TransistorRecord): string[] {
  return [record.limits, ...record.alternatives].map(limitSetName);
}

/**
 * The ratings of one maker, or with the maker left open the safest figure any maker prints.
 *
 * @param maker one of `makerNames`; null leaves it open
 * @returns null where the record has no such maker
 */
export function chosenLimits(record: TransistorRecord, maker: string | null): LimitSet | null {
  const { limits, alternatives } = record;
  if (maker === null) return alternatives.reduce(safest, limits);
  if (limitSetName(limits) === maker) return limits;
  const set = alternatives.find((candidate) => limitSetName(candidate) === maker);
  return set === undefined ? null : overlaid(limits, set);
}

function safest(left: LimitSet, right: LimitSet): LimitSet {
  const merged = { ...left };
  for (const key of SMALLER_IS_SAFE) merged[key] = extreme(left[key], right[key], Math.min);
  for (const key of LARGER_IS_SAFE) merged[key] = extreme(left[key], right[key], Math.max);
  return { ...merged, rthJaByPackage: [...left.rthJaByPackage, ...right.rthJaByPackage] };
}

function extreme(
  left: number | null,
  right: number | null,
  pick: (...values: number[]) => number,
): number | null {
  const printed = [left, right].filter((value) => value !== null);
  return printed.length === 0 ? null : pick(...printed);
}

function overlaid(base: LimitSet, set: LimitSet): LimitSet {
  const own = Object.entries(set).filter(
    ([, value]) => value !== null && !(Array.isArray(value) && value.length === 0),
  );
  return { ...base, ...(Object.fromEntries(own) as Partial<LimitSet>) };
}

/**
 * Junction to ambient in a given package; without one the largest the limits print.
 *
 * @returns K/W, or null where nothing is printed
 */
export function rthJaOf(limits: LimitSet, packageName: string | null): number | null {
  const rows = limits.rthJaByPackage;
  const own = rows.filter((row) => row.package === packageName);
  const figures = (own.length > 0 ? own : rows).map((row) => row.rthJaKPerW);
  if (own.length > 0) return Math.max(...figures);
  if (limits.rthJaKPerW !== null) return limits.rthJaKPerW;
  return figures.length === 0 ? null : Math.max(...figures);
}
