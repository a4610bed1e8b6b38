import type { Provenance } from './provenance.ts';
import { limitSetName, type LimitSet } from './transistor-limits.ts';
import type { TransistorRecord } from './transistor-record.ts';
import type { GainFigure } from './transistor-rows.ts';

/** The gain groups a record has rows for, such as `-16`. */
export function gainGroups(record: TransistorRecord): string[] {
  return [...new Set(record.gain.flatMap(({ group }) => group ?? []))];
}

/**
 * Gain rows of one group: its own rows, and the common rows at points it does not print. Without a group
 * only the common rows, which hold for every group.
 */
export function rowsOfGroup(rows: readonly GainFigure[], group: string | null): GainFigure[] {
  const own = rows.filter((row) => row.group !== null && row.group === group);
  const common = rows.filter(
    (row) => row.group === null && !own.some((mine) => gainPoint(mine) === gainPoint(row)),
  );
  return [...own, ...common];
}

/** Where a gain row was measured. */
export const gainPoint = ({ icA, vceV, tempDegC }: GainFigure) => [icA, vceV, tempDegC].join();

/**
 * Rows with the maker fixed: another maker's row goes where the chosen one prints the same point. With
 * the maker open every row stays, and the engine takes the worst.
 *
 * @param point what makes two rows the same test
 */
export function rowsOfMaker<T extends Provenance>(
  rows: readonly T[],
  record: TransistorRecord,
  maker: string | null,
  point: (row: T) => string,
): T[] {
  if (maker === null) return [...rows];
  const sets = [record.limits, ...record.alternatives];
  const set = sets.find((candidate) => limitSetName(candidate) === maker);
  const isOwn = (row: T) => belongs(row, set, set === record.limits);
  const printed = new Set(rows.filter(isOwn).map(point));
  return rows.filter((row) => isOwn(row) || !printed.has(point(row)));
}

/** A row that names no source belongs to the maker the record lists first. */
function belongs(row: Provenance, set: LimitSet | undefined, first: boolean): boolean {
  if (row.source === null) return first;
  const ids = (set?.source ?? '').split(/[\s,]+/).filter((id) => id !== '');
  return row.source.split(/[\s,]+/).some((id) => ids.includes(id));
}
