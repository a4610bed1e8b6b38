import { SHEET_DEG_C, SHEET_K, ZERO_CELSIUS_K } from './constants.ts';

/** A printed hFE row, as far as the interpolation needs it. */
export interface GainPoint {
  readonly icA: number;
  readonly vceV: number | null;
  readonly min: number | null;
  readonly typ: number | null;
  readonly max: number | null;
  readonly tempDegC: number;
}

/** A collector and base current at which the sheet guarantees saturation. */
export interface SaturatedPair {
  readonly icA: number;
  readonly ibA: number;
}

interface Curve {
  readonly icA: readonly number[];
  readonly gain: readonly number[];
}

/** hFE over IC at 25 °C with its limits, and how the minimum falls in the cold. */
export interface GainTable {
  readonly minimum: Curve;
  readonly maximum: Curve;
  readonly typical: Curve;
  /** What a saturation row proves: hFE cannot be lower than its IC/IB at that IC or below. */
  readonly proven: readonly SaturatedPair[];
  readonly lastIcA: number;
  /** X of hFE(T) = hFE(25)·(T/298.15 K)^X for limit figures. */
  readonly exponent: number;
}

const byCurrent = (a: { icA: number }, b: { icA: number }) => a.icA - b.icA;

/**
 * Gain table of a part from its printed rows. Rows at 25 °C only, merged at equal IC to the lowest minimum
 * and highest maximum; minima measured at a higher VCE beyond such a pair are cut by the pair's ratio.
 *
 * @param defaultExponent cold exponent where the part prints no cold row of its own
 * @returns null where no row prints a minimum at 25 °C
 */
export function gainTable(
  rows: readonly GainPoint[],
  saturated: readonly SaturatedPair[],
  defaultExponent: number,
): GainTable | null {
  const sheet = rows.filter((row) => row.tempDegC === SHEET_DEG_C).sort(byCurrent);
  const minimum = minimumCurve(sheet);
  if (minimum.icA.length === 0) return null;
  return {
    minimum,
    maximum: maximumCurve(sheet),
    typical: curveOf(sheet, (row) => row.typ, Math.min),
    proven: saturated,
    lastIcA: minimum.icA[minimum.icA.length - 1] ?? 0,
    exponent: coldExponent(rows) ?? defaultExponent,
  };
}

/** Values of one column over IC, rows of equal IC merged. */
function curveOf(
  sheet: readonly GainPoint[],
  read: (row: GainPoint) => number | null,
  merge: (a: number, b: number) => number,
): Curve {
  const icA: number[] = [];
  const gain: number[] = [];
  for (const row of sheet) {
    const value = read(row);
    if (value === null) continue;
    const last = icA.length - 1;
    if (icA[last] === row.icA) gain[last] = merge(gain[last] ?? value, value);
    else {
      icA.push(row.icA);
      gain.push(value);
    }
  }
  return { icA, gain };
}

function minimumCurve(sheet: readonly GainPoint[]): Curve {
  const cuts = voltageCuts(sheet);
  const cut = (row: GainPoint) => {
    if (row.min === null) return null;
    let min = row.min;
    for (const pair of cuts) {
      if (row.icA > pair.icA && row.vceV === pair.vceV) min *= pair.ratio;
    }
    return min;
  };
  return curveOf(sheet, cut, Math.min);
}

/** A missing maximum is three times the row's minimum. */
function maximumCurve(sheet: readonly GainPoint[]): Curve {
  return curveOf(sheet, (row) => row.max ?? (row.min === null ? null : 3 * row.min), Math.max);
}

/** Pairs of equal IC measured at two VCE: what the lower voltage costs. */
function voltageCuts(sheet: readonly GainPoint[]) {
  const cuts: { icA: number; vceV: number; ratio: number }[] = [];
  for (const high of sheet) {
    for (const low of sheet) {
      if (high.icA !== low.icA || high.min === null || low.min === null) continue;
      if (high.vceV === null || low.vceV === null || high.vceV <= low.vceV) continue;
      if (low.min < high.min) {
        cuts.push({ icA: high.icA, vceV: high.vceV, ratio: low.min / high.min });
      }
    }
  }
  return cuts;
}

/** The largest exponent of the part's own cold rows against 25 °C rows of the same IC; null without any. */
function coldExponent(rows: readonly GainPoint[]): number | null {
  let exponent: number | null = null;
  for (const cold of rows) {
    if (cold.tempDegC >= SHEET_DEG_C || cold.min === null) continue;
    for (const warm of rows) {
      if (warm.tempDegC !== SHEET_DEG_C || warm.icA !== cold.icA || warm.min === null) continue;
      if (warm.vceV !== cold.vceV && warm.vceV !== null && cold.vceV !== null) continue;
      const own =
        Math.log(warm.min / cold.min) / Math.log(SHEET_K / (cold.tempDegC + ZERO_CELSIUS_K));
      exponent = Math.max(exponent ?? 0, own);
    }
  }
  return exponent;
}

/** Straight in log IC – log hFE on the segment from row k to k + 1, continued where IC lies outside. */
function onSegment(curve: Curve, k: number, icA: number): number {
  const x0 = Math.log(curve.icA[k] ?? 1);
  const x1 = Math.log(curve.icA[k + 1] ?? 1);
  const y0 = Math.log(curve.gain[k] ?? 1);
  const y1 = Math.log(curve.gain[k + 1] ?? 1);
  return Math.exp(y0 + ((y1 - y0) / (x1 - x0)) * (Math.log(icA) - x0));
}

function segmentOf(curve: Curve, icA: number): number {
  let k = 0;
  while (k < curve.icA.length - 2 && icA > (curve.icA[k + 1] ?? Infinity)) k++;
  return k;
}

/** Value of a curve; held outside its rows. */
function held(curve: Curve, icA: number): number {
  const last = curve.icA.length - 1;
  if (last === 0 || icA <= (curve.icA[0] ?? 0)) return curve.gain[0] ?? 0;
  if (icA >= (curve.icA[last] ?? 0)) return curve.gain[last] ?? 0;
  return onSegment(curve, segmentOf(curve, icA), icA);
}

/** Guaranteed minimum of hFE at 25 °C for a collector current in A. */
export function minimumGain(table: GainTable, icA: number): number {
  const { minimum } = table;
  if (minimum.icA.length === 1) return singleRowMinimum(table, icA);
  const last = minimum.icA.length - 1;
  const inside = icA >= (minimum.icA[0] ?? 0) && icA <= (minimum.icA[last] ?? 0);
  const line = onSegment(minimum, segmentOf(minimum, icA), icA);
  // Outside the rows the end segment goes on only where that lowers hFE.
  return inside ? line : Math.min(line, held(minimum, icA));
}

/** One printed minimum: scaled by the typical curve above its row, else falling with 1/IC. */
function singleRowMinimum(table: GainTable, icA: number): number {
  const rowA = table.minimum.icA[0] ?? 0;
  const rowGain = table.minimum.gain[0] ?? 0;
  if (icA <= rowA) return rowGain;
  const { typical, proven } = table;
  const firstTypA = typical.icA[0] ?? Infinity;
  const lastTypA = typical.icA[typical.icA.length - 1] ?? 0;
  const reach = rowA >= firstTypA && icA <= lastTypA;
  let gain = reach ? rowGain * (held(typical, icA) / held(typical, rowA)) : rowGain * (rowA / icA);
  for (const row of proven) if (row.icA >= icA) gain = Math.max(gain, row.icA / row.ibA);
  return gain;
}

/** Largest hFE at 25 °C for a collector current in A; held outside the rows. */
export function maximumGain(table: GainTable, icA: number): number {
  return held(table.maximum, icA);
}

/** How hFE moves with temperature, (T/298.15 K)^X. */
export function gainRatio(degC: number, exponent: number): number {
  return Math.pow(Math.max(0, degC + ZERO_CELSIUS_K) / SHEET_K, exponent);
}
