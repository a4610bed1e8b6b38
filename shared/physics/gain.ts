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

/** hFE over IC; logarithms stand beside the figures, since hFE is read on log–log paper. */
interface Curve {
  readonly icA: readonly number[];
  readonly gain: readonly number[];
  readonly logA: Float64Array;
  readonly logGain: Float64Array;
  /** Slope from each row to the next; 0 at the last. */
  readonly slope: Float64Array;
}

/** hFE over IC at 25 °C with its limits, and how the minimum falls in the cold. */
export interface GainTable {
  readonly minimum: Curve;
  readonly maximum: Curve;
  readonly typical: Curve;
  /** What a saturation row proves: hFE cannot be lower than its IC/IB at that IC or below. */
  readonly proven: Curve;
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
    proven: logarithmic(
      saturated.map(({ icA }) => icA),
      saturated.map(({ icA, ibA }) => icA / ibA),
    ),
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
  return logarithmic(icA, gain);
}

function logarithmic(icA: readonly number[], gain: readonly number[]): Curve {
  const logA = Float64Array.from(icA, Math.log);
  const logGain = Float64Array.from(gain, Math.log);
  const slope = logA.map((from, k) => {
    const run = (logA[k + 1] ?? from) - from;
    return run > 0 ? ((logGain[k + 1] ?? 0) - (logGain[k] ?? 0)) / run : 0;
  });
  return { icA, gain, logA, logGain, slope };
}

/** hFE of a logarithm; where it is a row's, the figure as printed. */
function figureOf(log: number, ...curves: readonly Curve[]): number {
  for (const { gain, logGain } of curves) {
    const printed = gain[logGain.indexOf(log)];
    if (printed !== undefined) return printed;
  }
  return Math.exp(log);
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
      const own =
        Math.log(warm.min / cold.min) / Math.log(SHEET_K / (cold.tempDegC + ZERO_CELSIUS_K));
      exponent = Math.max(exponent ?? 0, own);
    }
  }
  return exponent;
}

/** ln hFE straight in ln IC on the segment from row k to k + 1, continued where IC lies outside. */
function onSegment(curve: Curve, k: number, logA: number): number {
  const x0 = curve.logA[k] ?? 0;
  const y0 = curve.logGain[k] ?? 0;
  return y0 + (curve.slope[k] ?? 0) * (logA - x0);
}

function segmentOf({ logA }: Curve, atLogA: number): number {
  let k = 0;
  while (k < logA.length - 2 && atLogA > (logA[k + 1] ?? Infinity)) k++;
  return k;
}

/** ln of a curve's value; held outside its rows. */
function held(curve: Curve, logA: number): number {
  const last = curve.logA.length - 1;
  if (last === 0 || logA <= (curve.logA[0] ?? 0)) return curve.logGain[0] ?? 0;
  if (logA >= (curve.logA[last] ?? 0)) return curve.logGain[last] ?? 0;
  return onSegment(curve, segmentOf(curve, logA), logA);
}

/** ln of the guaranteed minimum; outside the rows the end segment goes on only where that lowers hFE. */
function logMinimum(table: GainTable, logA: number): number {
  const { minimum } = table;
  const last = minimum.logA.length - 1;
  if (last === 0) return singleRowMinimum(table, logA);
  if (logA < (minimum.logA[0] ?? 0)) {
    return (minimum.slope[0] ?? 0) > 0 ? onSegment(minimum, 0, logA) : (minimum.logGain[0] ?? 0);
  }
  if (logA > (minimum.logA[last] ?? 0)) {
    const falls = (minimum.slope[last - 1] ?? 0) < 0;
    return falls ? onSegment(minimum, last - 1, logA) : (minimum.logGain[last] ?? 0);
  }
  return onSegment(minimum, segmentOf(minimum, logA), logA);
}

/** One printed minimum: scaled by the typical curve above its row, else falling with 1/IC. */
function singleRowMinimum({ minimum, typical, proven }: GainTable, logA: number): number {
  const rowLogA = minimum.logA[0] ?? 0;
  const rowLog = minimum.logGain[0] ?? 0;
  if (logA <= rowLogA) return rowLog;
  const firstTyp = typical.logA[0] ?? Infinity;
  const lastTyp = typical.logA[typical.logA.length - 1] ?? -Infinity;
  const reach = rowLogA >= firstTyp && logA <= lastTyp;
  let log = reach ? rowLog + held(typical, logA) - held(typical, rowLogA) : rowLog + rowLogA - logA;
  proven.logA.forEach((provenLogA, k) => {
    if (provenLogA >= logA) log = Math.max(log, proven.logGain[k] ?? log);
  });
  return log;
}

/** Guaranteed minimum of hFE at 25 °C for a collector current in A. */
export function minimumGain(table: GainTable, icA: number): number {
  return figureOf(logMinimum(table, Math.log(icA)), table.minimum, table.proven);
}

/** Largest hFE at 25 °C for a collector current in A; held outside the rows. */
export function maximumGain(table: GainTable, icA: number): number {
  return figureOf(held(table.maximum, Math.log(icA)), table.maximum);
}

/**
 * hFE at 25 °C of one specimen for a collector current in A, a straight way along the logarithm.
 *
 * @param share −1 at the guaranteed minimum, 1 at the maximum
 */
export function gainBetween(table: GainTable, icA: number, share: number): number {
  return gainBetweenAt(table, Math.log(icA), share);
}

function gainBetweenAt(table: GainTable, logA: number, share: number): number {
  const low = logMinimum(table, logA);
  return Math.exp(low + ((1 + share) / 2) * (held(table.maximum, logA) - low));
}

/** `gainBetween` for a column of currents, given by their logarithms, and of shares. */
export function fillGainBetween(
  gain: Float64Array,
  table: GainTable,
  logA: Float64Array,
  share: Float64Array,
): void {
  for (let k = 0; k < gain.length; k++) {
    gain[k] = gainBetweenAt(table, logA[k] ?? 0, share[k] ?? 0);
  }
}

/** X of hFE(T) for expected figures, both ways. */
export const EXPECTED_GAIN_EXPONENT = 1.5;

/** How hFE moves with temperature, (T/298.15 K)^X. */
export function gainRatio(degC: number, exponent: number): number {
  const ratio = Math.max(0, degC + ZERO_CELSIUS_K) / SHEET_K;
  return exponent === EXPECTED_GAIN_EXPONENT ? ratio * Math.sqrt(ratio) : Math.pow(ratio, exponent);
}
