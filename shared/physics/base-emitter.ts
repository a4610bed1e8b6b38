import { SHEET_DEG_C, thermalVoltageV } from './constants.ts';

/** A printed VBE row, as far as the interpolation needs it. */
export interface BaseEmitterPoint {
  readonly kind: 'sat' | 'on';
  readonly icA: number;
  readonly minV: number | null;
  readonly typV: number | null;
  readonly maxV: number | null;
}

interface Curve {
  readonly icA: readonly number[];
  readonly logA: readonly number[];
  readonly volt: readonly number[];
}

/** VBE(sat) over IC at 25 °C with its limits. */
export interface BaseEmitterTable {
  /** Empty where the sheet prints no VBE figure at all. */
  readonly maximum: Curve;
  /** Empty where the sheet prints neither a minimum nor a typical figure. */
  readonly minimum: Curve;
  /** What a usual specimen lies below the maximum: the typical figures where printed. */
  readonly gap: Curve;
  /** Whether the maximum is the sheet's own VBE(sat), not a substitute. */
  readonly guaranteed: boolean;
  readonly lastIcA: number;
  readonly usualMinV: number;
}

/** Judgement: what VBE(on) and typical figures are off the missing VBE(sat) limits by, V. */
const ON_TO_SAT_V = 0.05;
const TYP_TO_MAX_V = 0.15;
const TYP_TO_MIN_V = 0.1;

/** Judgement: what a usual specimen lies below the maximum where no typical figure is printed, V. */
const USUAL_GAP_V = 0.1;

/**
 * VBE(sat) table of a part from its printed rows, with the substitutes for what the sheet leaves out.
 *
 * @param usualMinV minimum taken where the sheet prints neither minimum nor typical, V at 25 °C
 */
export function baseEmitterTable(
  points: readonly BaseEmitterPoint[],
  usualMinV: number,
): BaseEmitterTable {
  const rows = [...points].sort((a, b) => a.icA - b.icA);
  const saturated = rows.filter((row) => row.kind === 'sat');
  const on = rows.filter((row) => row.kind === 'on');
  const printed = curveOf(saturated, (row) => row.maxV, Math.max);
  const guaranteed = printed.icA.length > 0;
  const maximum = guaranteed ? printed : substituteMaximum(saturated, on);
  return {
    maximum,
    minimum: minimumOf(saturated, on),
    gap: gapBelow(maximum, saturated, on),
    guaranteed,
    lastIcA: maximum.icA[maximum.icA.length - 1] ?? 0,
    usualMinV,
  };
}

function substituteMaximum(saturated: BaseEmitterPoint[], on: BaseEmitterPoint[]): Curve {
  const onMaxV = (icA: number) => {
    const found = on.filter((row) => row.icA === icA && row.maxV !== null);
    return found.length === 0 ? null : Math.max(...found.map((row) => row.maxV ?? 0));
  };
  const substitute = (row: BaseEmitterPoint) => {
    const maxV = onMaxV(row.icA);
    if (maxV !== null) return maxV + ON_TO_SAT_V;
    return row.typV === null ? null : row.typV + TYP_TO_MAX_V;
  };
  const curve = curveOf(saturated, substitute, Math.max);
  return curve.icA.length > 0 ? curve : curveOf(on, substitute, Math.max);
}

function minimumOf(saturated: BaseEmitterPoint[], on: BaseEmitterPoint[]): Curve {
  const typLess = (row: BaseEmitterPoint) =>
    row.typV === null ? null : Math.max(0, row.typV - TYP_TO_MIN_V);
  const printed = curveOf(saturated, (row) => row.minV, Math.min);
  if (printed.icA.length > 0) return printed;
  const typical = curveOf(saturated, typLess, Math.min);
  return typical.icA.length > 0 ? typical : curveOf(on, typLess, Math.min);
}

/** How far the typical figures lie below the maximum; VBE(on) rows count where no VBE(sat) row prints one. */
function gapBelow(maximum: Curve, saturated: BaseEmitterPoint[], on: BaseEmitterPoint[]): Curve {
  const below = (row: BaseEmitterPoint) =>
    row.typV === null || maximum.icA.length === 0
      ? null
      : Math.max(0, highestV(maximum, row.icA, Math.log(row.icA)) - row.typV);
  const typical = curveOf(saturated, below, Math.max);
  return typical.icA.length > 0 ? typical : curveOf(on, below, Math.max);
}

function curveOf(
  rows: readonly BaseEmitterPoint[],
  read: (row: BaseEmitterPoint) => number | null,
  merge: (a: number, b: number) => number,
): Curve {
  const icA: number[] = [];
  const volt: number[] = [];
  for (const row of rows) {
    const value = read(row);
    if (value === null) continue;
    const last = icA.length - 1;
    if (icA[last] === row.icA) volt[last] = merge(volt[last] ?? value, value);
    else {
      icA.push(row.icA);
      volt.push(value);
    }
  }
  return { icA, logA: icA.map(Math.log), volt };
}

/** Straight in ln IC between the rows that enclose IC; held outside them. */
function between({ logA: rowLogA, volt }: Curve, logA: number): number {
  const last = rowLogA.length - 1;
  if (logA <= (rowLogA[0] ?? Infinity)) return volt[0] ?? 0;
  if (logA >= (rowLogA[last] ?? -Infinity)) return volt[last] ?? 0;
  let k = 0;
  while (logA > (rowLogA[k + 1] ?? Infinity)) k++;
  const x0 = rowLogA[k] ?? 0;
  const x1 = rowLogA[k + 1] ?? 1;
  const y0 = volt[k] ?? 0;
  const y1 = volt[k + 1] ?? 0;
  return y0 + ((y1 - y0) * (logA - x0)) / (x1 - x0);
}

/**
 * Largest VBE(sat) at 25 °C, V: held below the first row; above the last the larger of the junction law
 * and the last segment continued straight in IC. Without any figure the usual minimum stands in; the
 * criteria that need a maximum are then open.
 */
export function maximumVbeV(table: BaseEmitterTable, icA: number): number {
  return table.maximum.icA.length === 0
    ? table.usualMinV
    : highestV(table.maximum, icA, Math.log(icA));
}

function highestV(maximum: Curve, icA: number, logA: number): number {
  const { icA: rowA, logA: rowLogA, volt } = maximum;
  const last = rowA.length - 1;
  const lastA = rowA[last] ?? 1;
  if (icA <= lastA) return between(maximum, logA);
  const lastV = volt[last] ?? 0;
  const junctionV = lastV + thermalVoltageV(SHEET_DEG_C) * (logA - (rowLogA[last] ?? 0));
  if (last === 0) return junctionV;
  const slopeOhm = (lastV - (volt[last - 1] ?? 0)) / (lastA - (rowA[last - 1] ?? 0));
  return Math.max(junctionV, lastV + slopeOhm * (icA - lastA));
}

/** Smallest VBE(sat) at 25 °C, V: the junction law below the first row, held above the last. */
export function minimumVbeV(table: BaseEmitterTable, icA: number): number {
  const { logA: rowLogA, volt } = table.minimum;
  if (rowLogA.length === 0) return table.usualMinV;
  const logA = Math.log(icA);
  const firstLogA = rowLogA[0] ?? 0;
  if (logA >= firstLogA) return between(table.minimum, logA);
  return Math.max(0, (volt[0] ?? 0) + thermalVoltageV(SHEET_DEG_C) * (logA - firstLogA));
}

/**
 * VBE(sat) at 25 °C of one specimen, V: as far below the maximum as the typical figures are, or a usual gap; without any
 * figure the usual minimum.
 *
 * @param share 0 at the typical figure, 1 at the maximum, −1 as far below the typical one
 */
export function vbeBetweenV(table: BaseEmitterTable, icA: number, share: number): number {
  if (table.maximum.icA.length === 0) return table.usualMinV;
  return vbeBetweenAtV(table, icA, Math.log(icA), share);
}

function vbeBetweenAtV(table: BaseEmitterTable, icA: number, logA: number, share: number): number {
  const gapV = table.gap.icA.length === 0 ? USUAL_GAP_V : between(table.gap, logA);
  return highestV(table.maximum, icA, logA) - (1 - share) * gapV;
}

/** `vbeBetweenV` for a column of currents, given with their logarithms, and of shares. */
export function fillVbeBetweenV(
  vbeV: Float64Array,
  table: BaseEmitterTable,
  icA: Float64Array,
  logA: Float64Array,
  share: Float64Array,
): void {
  if (table.maximum.icA.length === 0) vbeV.fill(table.usualMinV);
  else {
    for (let k = 0; k < vbeV.length; k++) {
      vbeV[k] = vbeBetweenAtV(table, icA[k] ?? 0, logA[k] ?? 0, share[k] ?? 0);
    }
  }
}
