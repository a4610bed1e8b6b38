import { SHEET_DEG_C, SHEET_K, thermalVoltageV, ZERO_CELSIUS_K } from './constants.ts';

/** A printed VCE(sat) row, as far as the line needs it. */
export interface SaturationPoint {
  readonly icA: number;
  readonly ibA: number;
  readonly typV?: number | null;
  readonly maxV: number | null;
}

/** Reverse gain where the part gives none. */
export const USUAL_REVERSE_GAIN = 0.5;

/** What a Darlington adds to the intrinsic drop: the base–emitter voltage of its output transistor, V. */
export const DARLINGTON_DROP_V = 0.6;

/**
 * VCE(sat) over IC at 25 °C as straight pieces VCE = V0 + RCE·IC. Piece k reaches up to `upToA[k]`; the
 * last goes on without end.
 */
export interface SaturationLine {
  readonly upToA: Float64Array;
  readonly interceptV: Float64Array;
  readonly slopeOhm: Float64Array;
  /** Smallest IC/IB of the rows a piece runs between. */
  readonly testBeta: Float64Array;
  readonly lastIcA: number;
  readonly reverseGain: number;
  readonly darlington: boolean;
  /** The rows the line runs through: IC, largest VCE and that of a usual specimen. */
  readonly rowA: Float64Array;
  readonly maxV: Float64Array;
  readonly usualV: Float64Array;
  /** Drop at IC = 0 of the Ebers–Moll equations, V. */
  readonly intrinsicV: number;
}

/** Judgement: what a usual specimen drops where no typical figure is printed, of the maximum. */
const USUAL_SHARE = 0.7;

/**
 * Line through the printed maxima, made non-decreasing; below the first row it starts at the intrinsic
 * drop of the Ebers–Moll equations.
 *
 * @param reverseGain βR of the part; null: 0.5
 * @returns null where no row prints a maximum
 */
export function saturationLine(
  points: readonly SaturationPoint[],
  reverseGain: number | null,
  darlington: boolean,
): SaturationLine | null {
  const rows = mergedRows(points);
  const first = rows[0];
  if (first === undefined) return null;
  const betaR = reverseGain ?? USUAL_REVERSE_GAIN;
  const line: SaturationLine = {
    upToA: Float64Array.from(rows, ({ icA }, k) => (k === rows.length - 1 ? Infinity : icA)),
    interceptV: new Float64Array(rows.length),
    slopeOhm: new Float64Array(rows.length),
    testBeta: Float64Array.from(rows, ({ beta }, k) => Math.min(beta, rows[k - 1]?.beta ?? beta)),
    lastIcA: rows[rows.length - 1]?.icA ?? 0,
    reverseGain: betaR,
    darlington,
    rowA: Float64Array.from(rows, ({ icA }) => icA),
    maxV: Float64Array.from(rows, ({ maxV }) => maxV),
    usualV: Float64Array.from(rows, ({ usualV }) => usualV),
    intrinsicV:
      thermalVoltageV(SHEET_DEG_C) * Math.log1p((first.beta + 1) / betaR) +
      (darlington ? DARLINGTON_DROP_V : 0),
  };
  drawSpecimen(line, 1);
  return line;
}

/**
 * Puts the line through the rows of one specimen: never below 0 V, never falling, and from at most the intrinsic drop
 * at IC = 0.
 *
 * @param share 1 at the printed maxima, 0 at the typical figures (else 0.7 of the maxima), −1 as far below those
 */
export function drawSpecimen(line: SaturationLine, share: number): void {
  const { rowA, interceptV, slopeOhm } = line;
  let fromV = rowV(line, 0, share, 0);
  for (let k = 1; k < rowA.length; k++) {
    const fromA = rowA[k - 1] ?? 0;
    const toV = rowV(line, k, share, fromV);
    const slope = (toV - fromV) / ((rowA[k] ?? 0) - fromA);
    slopeOhm[k] = slope;
    interceptV[k] = fromV - slope * fromA;
    fromV = toV;
  }
  const firstV = rowV(line, 0, share, 0);
  const onwardsV = rowA.length === 1 ? -Infinity : (interceptV[1] ?? 0);
  const startV = Math.min(Math.max(onwardsV, line.intrinsicV), firstV);
  slopeOhm[0] = (firstV - startV) / (rowA[0] ?? 1);
  interceptV[0] = startV;
}

/** VCE(sat) of a specimen at a row, V; at least that of the row before. */
function rowV({ maxV, usualV }: SaturationLine, k: number, share: number, leastV: number): number {
  const highest = maxV[k] ?? 0;
  return Math.max(leastV, highest - (1 - share) * (highest - (usualV[k] ?? 0)));
}

interface Row {
  readonly icA: number;
  readonly maxV: number;
  readonly usualV: number;
  readonly beta: number;
}

/** Rows of equal IC merged (larger VCE, smaller IC/IB), VCE made non-decreasing. */
function mergedRows(points: readonly SaturationPoint[]): Row[] {
  const rows: Row[] = [];
  let highestV = 0;
  let usualV = 0;
  for (const point of [...points].sort((a, b) => a.icA - b.icA)) {
    if (point.maxV === null) continue;
    highestV = Math.max(highestV, point.maxV);
    usualV = Math.max(usualV, Math.min(point.typV ?? USUAL_SHARE * point.maxV, point.maxV));
    const beta = point.icA / point.ibA;
    const last = rows[rows.length - 1];
    const row = { icA: point.icA, maxV: highestV, usualV };
    if (last?.icA === point.icA) {
      rows[rows.length - 1] = { ...row, beta: Math.min(last.beta, beta) };
    } else rows.push({ ...row, beta });
  }
  return rows;
}

/** Which piece of the line a collector current in A lies on; at a row the piece below it. */
export function pieceAt(line: SaturationLine, icA: number): number {
  const { upToA } = line;
  let k = 0;
  while (k < upToA.length - 1 && icA > (upToA[k] ?? Infinity)) k++;
  return k;
}

/** Temperature factor of RCE(sat) for limit figures: no credit in the cold. */
export function resistanceRatio(degC: number, tempcoPerK: number): number {
  return degC > SHEET_DEG_C ? Math.max(0, 1 + tempcoPerK * (degC - SHEET_DEG_C)) : 1;
}

/** Temperature factor of RCE(sat) for expected figures: both ways. */
export function expectedResistanceRatio(degC: number, tempcoPerK: number): number {
  return Math.max(0, 1 + tempcoPerK * (degC - SHEET_DEG_C));
}

/** What a Darlington's VCE(sat) gains per kelvin below 25 °C: the VBE of its output transistor, V/K. */
const DARLINGTON_COLD_V_PER_K = 0.002;

/**
 * V0 of a piece at a temperature for limit figures: with absolute temperature above 25 °C where positive. A
 * Darlington's grows in the cold instead, with the base–emitter voltage in series.
 */
export function interceptAtV(line: SaturationLine, k: number, degC: number): number {
  const penalty = line.darlington ? degC < SHEET_DEG_C : degC > SHEET_DEG_C;
  return penalty ? expectedInterceptAtV(line, k, degC) : (line.interceptV[k] ?? 0);
}

/** V0 of a piece at a temperature for expected figures: the same laws, both ways. */
export function expectedInterceptAtV(line: SaturationLine, k: number, degC: number): number {
  const interceptV = line.interceptV[k] ?? 0;
  if (line.darlington) return interceptV + DARLINGTON_COLD_V_PER_K * (SHEET_DEG_C - degC);
  return interceptV <= 0 ? interceptV : (interceptV * (degC + ZERO_CELSIUS_K)) / SHEET_K;
}

/**
 * What driving less than the data sheet's test adds to VCE(sat) (Ebers–Moll).
 *
 *   ΔV = VT·ln{ [1 + (βf+1)/βR]/[1 + (βt+1)/βR] · [1 − βt/βF]/[1 − βf/βF] }
 *
 * @param forcedBeta IC/IB in the circuit, below `gain`
 * @param testBeta IC/IB of the data-sheet rows
 * @returns V; 0 where the drive is at least the tested one
 */
export function forcedBetaStepV(
  forcedBeta: number,
  testBeta: number,
  gain: number,
  reverseGain: number,
  degC: number,
): number {
  if (forcedBeta <= testBeta || forcedBeta >= gain) return 0;
  const chargeRatio = (reverseGain + forcedBeta + 1) / (reverseGain + testBeta + 1);
  // Without gain rows the edge is unknown; what remains is the charge term.
  const edgeRatio = Number.isFinite(gain) ? (gain - testBeta) / (gain - forcedBeta) : 1;
  return thermalVoltageV(degC) * Math.log(chargeRatio * edgeRatio);
}

/**
 * VCE(sat) of the Ebers–Moll equations, V.
 *
 *   VCE(sat) = VT·ln{ [1 + (βf+1)/βR]/[1 − βf/βF] }
 */
export function ebersMollSaturationV(
  forcedBeta: number,
  gain: number,
  reverseGain: number,
  thermalV: number,
): number {
  return thermalV * Math.log((1 + (forcedBeta + 1) / reverseGain) / (1 - forcedBeta / gain));
}
