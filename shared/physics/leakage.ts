import { SHEET_DEG_C, thermalVoltageV } from './constants.ts';

/** A printed leakage row, as far as the law needs it. */
export interface LeakagePoint {
  readonly kind: 'icbo' | 'ices' | 'icex' | 'iceo';
  readonly currentA: number;
  readonly tempDegC: number;
}

type LeakageClasses = readonly (readonly LeakagePoint['kind'][])[];

/** What flows from collector to base. */
const BASE_LEAKAGE: LeakageClasses = [['icbo'], ['ices', 'icex'], ['iceo']];

/** What a Darlington with its own base resistors lets through the collector: the first kind printed. */
export const DARLINGTON_LEAKAGE: LeakageClasses = [['icex'], ['ices'], ['iceo']];

/** ICBO over temperature: printed points, coldest first, and the doubling interval beyond the hottest. */
export interface LeakageTable {
  readonly degC: readonly number[];
  readonly currentA: readonly number[];
  readonly doublingK: number;
}

/**
 * Leakage table of a part: its ICBO rows, else ICES and ICEX, else ICEO; per temperature the largest.
 *
 * @param usualDoublingK interval beyond the hottest row where the part's own rows fit a longer one, K
 * @param classes kinds of rows in the order they are taken; those of one class count alike
 * @returns null where the sheet prints none
 */
export function leakageTable(
  points: readonly LeakagePoint[],
  usualDoublingK: number,
  classes: LeakageClasses = BASE_LEAKAGE,
): LeakageTable | null {
  const used = classes
    .map((kinds) => points.filter((point) => kinds.includes(point.kind)))
    .find((rows) => rows.length > 0);
  if (used === undefined) return null;
  const largest = new Map<number, number>();
  for (const { tempDegC, currentA } of used) {
    largest.set(tempDegC, Math.max(currentA, largest.get(tempDegC) ?? 0));
  }
  const rows = [...largest].sort(([a], [b]) => a - b);
  const degC = rows.map(([temp]) => temp);
  const currentA = rows.map(([, current]) => current);
  return { degC, currentA, doublingK: Math.min(usualDoublingK, fittedDoublingK(degC, currentA)) };
}

/** Doubling interval of the two hottest rows; Infinity where they do not rise. */
function fittedDoublingK(degC: readonly number[], currentA: readonly number[]): number {
  const last = degC.length - 1;
  const hotA = currentA[last] ?? 0;
  const coldA = currentA[last - 1] ?? 0;
  if (last < 1 || coldA <= 0 || hotA <= coldA) return Infinity;
  return ((degC[last] ?? 0) - (degC[last - 1] ?? 0)) / Math.log2(hotA / coldA);
}

/** ICBO in A at a junction temperature in °C: held in the cold, exponential through the rows and beyond. */
export function leakageA(table: LeakageTable, degC: number): number {
  const last = table.degC.length - 1;
  const hottest = table.degC[last] ?? SHEET_DEG_C;
  if (degC >= hottest) {
    return (table.currentA[last] ?? 0) * Math.exp((Math.LN2 * (degC - hottest)) / table.doublingK);
  }
  if (degC <= (table.degC[0] ?? SHEET_DEG_C)) return table.currentA[0] ?? 0;
  let k = 0;
  while (degC > (table.degC[k + 1] ?? Infinity)) k++;
  const t0 = table.degC[k] ?? 0;
  const t1 = table.degC[k + 1] ?? 0;
  const i0 = table.currentA[k] ?? 0;
  const i1 = table.currentA[k + 1] ?? 0;
  const share = (degC - t0) / (t1 - t0);
  if (i0 <= 0 || i1 <= 0) return i0 + (i1 - i0) * share;
  return i0 * Math.pow(i1 / i0, share);
}

/** A known point of the transfer curve near cut-off: the smallest VBE that lets a current through. */
export interface CutOffAnchor {
  readonly icA: number;
  readonly vbeV: number;
}

/**
 * Anchor of the off-state exponential: the lowest printed VBE minimum at no more than a tenth of the
 * largest collector current, else the usual minimum at a hundredth of it.
 */
export function cutOffAnchor(
  points: readonly { readonly icA: number; readonly minV: number | null }[],
  icMaxA: number,
  usualMinV: number,
): CutOffAnchor {
  let anchor: CutOffAnchor = { icA: 0, vbeV: Infinity };
  for (const { icA, minV } of points) {
    if (minV === null || icA > icMaxA / 10) continue;
    if (minV < anchor.vbeV || (minV === anchor.vbeV && icA > anchor.icA)) {
      anchor = { icA, vbeV: minV };
    }
  }
  return anchor.icA > 0 ? anchor : { icA: icMaxA / 100, vbeV: usualMinV };
}

/**
 * Collector current a base–emitter voltage still lets through, A, without the leakage itself.
 *
 * @param tempcoVPerK slope of the anchor's VBE, V/K
 * @param junctions base–emitter junctions in series: 2 in a Darlington
 */
export function cutOffCurrentA(
  anchor: CutOffAnchor,
  vbeV: number,
  degC: number,
  tempcoVPerK: number,
  junctions = 1,
): number {
  const anchorV = anchor.vbeV + tempcoVPerK * (degC - SHEET_DEG_C);
  return anchor.icA * Math.exp((vbeV - anchorV) / (junctions * thermalVoltageV(degC)));
}
