/** Inferred absolute zero of annealed copper's resistance, °C below zero (IEC 60028). */
const COPPER_DEG_C = 234.5;

/** R(T)/R(Tr) of annealed copper between two temperatures in °C (IEC 60028: 0.00393/K at 20 °C). */
export function copperRatio(degC: number, referenceDegC: number): number {
  return Math.max(0, COPPER_DEG_C + degC) / (COPPER_DEG_C + referenceDegC);
}

/**
 * Time until the current of a clamped coil has fallen to its release current.
 *
 *   t = (L/R)·ln[(I0 + Vc/R)/(I_rel + Vc/R)]
 *
 * @param clampV smallest voltage of the clamp across the coil, V; not above 0: the current never falls
 * @returns s; 0 where the current starts below release, Infinity where it never gets there
 */
export function releaseTimeSec(
  inductanceH: number,
  resistanceOhm: number,
  startA: number,
  releaseA: number,
  clampV: number,
): number {
  if (startA <= releaseA) return 0;
  if (clampV <= 0) return Infinity;
  const clampA = clampV / resistanceOhm;
  return (inductanceH / resistanceOhm) * Math.log((startA + clampA) / (releaseA + clampA));
}

/**
 * Charge a clamp carries while a coil runs down from `startA` to zero.
 *
 *   Q = (L/R)·[I0 − (Vc/R)·ln(1 + I0·R/Vc)]
 *
 * @returns A·s
 */
export function clampChargeC(
  inductanceH: number,
  resistanceOhm: number,
  startA: number,
  clampV: number,
): number {
  if (clampV <= 0) return Infinity;
  const clampA = clampV / resistanceOhm;
  return (inductanceH / resistanceOhm) * (startA - clampA * Math.log1p(startA / clampA));
}
