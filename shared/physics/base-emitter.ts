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
  readonly volt: readonly number[];
}

/** VBE(sat) over IC at 25 °C with its limits. */
export interface BaseEmitterTable {
  /** Empty where the sheet prints no VBE figure at all. */
  readonly maximum: Curve;
  /** Empty where the sheet prints neither a minimum nor a typical figure. */
  readonly minimum: Curve;
  /** Whether the maximum is the sheet's own VBE(sat), not a substitute. */
  readonly guaranteed: boolean;
  readonly lastIcA: number;
  readonly usualMinV: number;
}

/** Judgement: what VBE(on) and typical figures are off the missing VBE(sat) limits by, V. */
const ON_TO_SAT_V = 0.05;
const TYP_TO_MAX_V = 0.15;
const TYP_TO_MIN_V = 0.1;

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
  return { icA, volt };
}

/** Straight in ln IC between the rows that enclose IC. */
function between(curve: Curve, icA: number): number {
  let k = 0;
  while (k < curve.icA.length - 2 && icA > (curve.icA[k + 1] ?? Infinity)) k++;
  const x0 = curve.icA[k] ?? 1;
  const x1 = curve.icA[k + 1] ?? 1;
  const y0 = curve.volt[k] ?? 0;
  const y1 = curve.volt[k + 1] ?? 0;
  return y0 + ((y1 - y0) * Math.log(icA / x0)) / Math.log(x1 / x0);
}

/**
 * Largest VBE(sat) at 25 °C, V: held below the first row; above the last the larger of the junction law
 * and the last segment continued straight in IC. Without any figure the usual minimum stands in; the
 * criteria that need a maximum are then open.
 */
export function maximumVbeV(table: BaseEmitterTable, icA: number): number {
  const { icA: rowA, volt } = table.maximum;
  const last = rowA.length - 1;
  if (last < 0) return table.usualMinV;
  const lastA = rowA[last] ?? 1;
  const lastV = volt[last] ?? 0;
  if (icA > lastA) {
    const junctionV = lastV + thermalVoltageV(SHEET_DEG_C) * Math.log(icA / lastA);
    if (last === 0) return junctionV;
    const slopeOhm = (lastV - (volt[last - 1] ?? 0)) / (lastA - (rowA[last - 1] ?? 0));
    return Math.max(junctionV, lastV + slopeOhm * (icA - lastA));
  }
  return icA <= (rowA[0] ?? 0) ? (volt[0] ?? 0) : between(table.maximum, icA);
}

/** Smallest VBE(sat) at 25 °C, V: the junction law below the first row, held above the last. */
export function minimumVbeV(table: BaseEmitterTable, icA: number): number {
  const { icA: rowA, volt } = table.minimum;
  const last = rowA.length - 1;
  if (last < 0) return table.usualMinV;
  const firstA = rowA[0] ?? 1;
  if (icA < firstA) {
    const junctionV = (volt[0] ?? 0) + thermalVoltageV(SHEET_DEG_C) * Math.log(icA / firstA);
    return Math.max(0, junctionV);
  }
  return icA >= (rowA[last] ?? 0) ? (volt[last] ?? 0) : between(table.minimum, icA);
}
