import { SHEET_DEG_C, SHEET_K, thermalVoltageV, ZERO_CELSIUS_K } from './constants.ts';

/** A printed VCE(sat) row, as far as the line needs it. */
export interface SaturationPoint {
  readonly icA: number;
  readonly ibA: number;
  readonly maxV: number | null;
}

/** Reverse gain where the part gives none. */
export const USUAL_REVERSE_GAIN = 0.5;

/** What a Darlington adds to the intrinsic drop: the base–emitter voltage of its output transistor, V. */
const DARLINGTON_DROP_V = 0.6;

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
}

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
  const intrinsicV =
    thermalVoltageV(SHEET_DEG_C) * Math.log1p((first.beta + 1) / betaR) +
    (darlington ? DARLINGTON_DROP_V : 0);
  const second = rows[1];
  const firstInterceptV = second === undefined ? -Infinity : intercept(first, second);
  const startV = Math.min(Math.max(firstInterceptV, intrinsicV), first.vceV);

  const pieces = [piece({ icA: 0, vceV: startV, beta: first.beta }, first)];
  rows.slice(1).forEach((row, k) => pieces.push(piece(rows[k] ?? first, row)));
  return {
    upToA: Float64Array.from(pieces, (each, k) => (k === pieces.length - 1 ? Infinity : each.icA)),
    interceptV: Float64Array.from(pieces, (each) => each.interceptV),
    slopeOhm: Float64Array.from(pieces, (each) => each.slopeOhm),
    testBeta: Float64Array.from(pieces, (each) => each.beta),
    lastIcA: rows[rows.length - 1]?.icA ?? 0,
    reverseGain: betaR,
    darlington,
  };
}

interface Row {
  readonly icA: number;
  readonly vceV: number;
  readonly beta: number;
}

/** Rows of equal IC merged (larger VCE, smaller IC/IB), VCE made non-decreasing. */
function mergedRows(points: readonly SaturationPoint[]): Row[] {
  const rows: Row[] = [];
  let highestV = 0;
  for (const point of [...points].sort((a, b) => a.icA - b.icA)) {
    if (point.maxV === null) continue;
    highestV = Math.max(highestV, point.maxV);
    const beta = point.icA / point.ibA;
    const last = rows[rows.length - 1];
    if (last?.icA === point.icA) {
      rows[rows.length - 1] = { ...last, vceV: highestV, beta: Math.min(last.beta, beta) };
    } else rows.push({ icA: point.icA, vceV: highestV, beta });
  }
  return rows;
}

function intercept(from: Row, to: Row): number {
  return from.vceV - ((to.vceV - from.vceV) / (to.icA - from.icA)) * from.icA;
}

function piece(from: Row, to: Row) {
  return {
    icA: to.icA,
    interceptV: intercept(from, to),
    slopeOhm: (to.vceV - from.vceV) / (to.icA - from.icA),
    beta: Math.min(from.beta, to.beta),
  };
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

/** What a Darlington's VCE(sat) gains per kelvin below 25 °C: the VBE of its output transistor, V/K. */
const DARLINGTON_COLD_V_PER_K = 0.002;

/**
 * V0 of a piece at a temperature for limit figures: with absolute temperature above 25 °C where positive. A
 * Darlington's grows in the cold instead, with the base–emitter voltage in series.
 */
export function interceptAtV(line: SaturationLine, k: number, degC: number): number {
  const interceptV = line.interceptV[k] ?? 0;
  if (line.darlington) {
    return interceptV + DARLINGTON_COLD_V_PER_K * Math.max(0, SHEET_DEG_C - degC);
  }
  if (interceptV <= 0 || degC <= SHEET_DEG_C) return interceptV;
  return (interceptV * (degC + ZERO_CELSIUS_K)) / SHEET_K;
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
