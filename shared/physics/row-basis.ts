import type { BaseEmitterTable } from './base-emitter.ts';
import type { GainTable } from './gain.ts';
import type { LeakageTable } from './leakage.ts';

/** A figure of a data sheet over the quantity its rows are sorted by: A, or °C for leakage. */
export interface RowPoint {
  readonly at: number;
  readonly value: number;
}

/** Which rows a figure was read from, and how: what a checker needs to read it again. */
export type RowBasis =
  /** Held at one row. */
  | { readonly kind: 'row'; readonly from: RowPoint }
  /** On the segment of two rows, also where it is continued beyond them. */
  | { readonly kind: 'between'; readonly from: RowPoint; readonly to: RowPoint }
  /** Above the last of two rows, or above the only one (`before` is null). */
  | { readonly kind: 'above'; readonly from: RowPoint; readonly before: RowPoint | null }
  | { readonly kind: 'below'; readonly from: RowPoint };

/** One printed minimum of hFE above its row: what stands in for the missing rows. */
export interface SingleGainBasis {
  readonly kind: 'single';
  readonly from: RowPoint;
  /** Typical curve at the row and at the current; null where it does not reach: then hFE falls with 1/IC. */
  readonly typical: { readonly atRow: RowBasis; readonly atCurrent: RowBasis } | null;
  /** Saturation rows that prove more, by IC and IC/IB; the largest counts. */
  readonly floor: RowPoint | null;
}

interface Rows {
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
}

const point = ({ x, y }: Rows, k: number): RowPoint => ({ at: x[k] ?? 0, value: y[k] ?? 0 });

/** The segment that encloses a place; the end segment beyond the rows. */
function segmentOf(rows: Rows, at: number): RowBasis {
  let k = 0;
  while (k < rows.x.length - 2 && at > (rows.x[k + 1] ?? Infinity)) k++;
  return { kind: 'between', from: point(rows, k), to: point(rows, k + 1) };
}

function heldBasis(rows: Rows, at: number): RowBasis {
  const last = rows.x.length - 1;
  if (last === 0 || at <= (rows.x[0] ?? 0)) return { kind: 'row', from: point(rows, 0) };
  if (at >= (rows.x[last] ?? 0)) return { kind: 'row', from: point(rows, last) };
  return segmentOf(rows, at);
}

const gainRows = ({ icA, gain }: GainTable['minimum']): Rows => ({ x: icA, y: gain });

/** How `minimumGain` reads a collector current in A. */
export function minimumGainBasis(table: GainTable, icA: number): RowBasis | SingleGainBasis {
  const rows = gainRows(table.minimum);
  const last = rows.x.length - 1;
  if (last === 0) return singleBasis(table, icA);
  const rising = (k: number) => (rows.y[k + 1] ?? 0) - (rows.y[k] ?? 0);
  if (icA < (rows.x[0] ?? 0) && !(rising(0) > 0)) return { kind: 'row', from: point(rows, 0) };
  if (icA > (rows.x[last] ?? 0) && !(rising(last - 1) < 0)) {
    return { kind: 'row', from: point(rows, last) };
  }
  return segmentOf(rows, icA);
}

function singleBasis(table: GainTable, icA: number): RowBasis | SingleGainBasis {
  const from = point(gainRows(table.minimum), 0);
  if (icA <= from.at) return { kind: 'row', from };
  const typical = gainRows(table.typical);
  const reaches =
    from.at >= (typical.x[0] ?? Infinity) && icA <= (typical.x[typical.x.length - 1] ?? -Infinity);
  const proven = gainRows(table.proven);
  let floor: RowPoint | null = null;
  for (let k = 0; k < proven.x.length; k++) {
    const each = point(proven, k);
    if (each.at >= icA && each.value > (floor?.value ?? 0)) floor = each;
  }
  return {
    kind: 'single',
    from,
    typical: reaches
      ? { atRow: heldBasis(typical, from.at), atCurrent: heldBasis(typical, icA) }
      : null,
    floor,
  };
}

/** How `maximumGain` reads a collector current in A. */
export function maximumGainBasis(table: GainTable, icA: number): RowBasis {
  return heldBasis(gainRows(table.maximum), icA);
}

/** How `maximumVbeV` reads a collector current in A; null where the sheet prints no VBE figure. */
export function maximumVbeBasis({ maximum }: BaseEmitterTable, icA: number): RowBasis | null {
  const rows = { x: maximum.icA, y: maximum.volt };
  const last = rows.x.length - 1;
  if (last < 0) return null;
  if (icA <= (rows.x[last] ?? 0)) return heldBasis(rows, icA);
  const before = last === 0 ? null : point(rows, last - 1);
  return { kind: 'above', from: point(rows, last), before };
}

/** How `minimumVbeV` reads a collector current in A; null where the sheet prints neither minimum nor typical. */
export function minimumVbeBasis({ minimum }: BaseEmitterTable, icA: number): RowBasis | null {
  const rows = { x: minimum.icA, y: minimum.volt };
  if (rows.x.length === 0) return null;
  return icA < (rows.x[0] ?? 0) ? { kind: 'below', from: point(rows, 0) } : heldBasis(rows, icA);
}

/** How `leakageA` reads a junction temperature in °C; `above` means by the doubling interval. */
export function leakageBasis({ degC, currentA }: LeakageTable, atDegC: number): RowBasis {
  const rows = { x: degC, y: currentA };
  const last = rows.x.length - 1;
  if (atDegC >= (rows.x[last] ?? 0)) {
    const before = last === 0 ? null : point(rows, last - 1);
    return { kind: 'above', from: point(rows, last), before };
  }
  return heldBasis(rows, atDegC);
}
