import type { CriterionStatus, Unit, Verdict } from './evaluation.ts';

/** Limits nearer to zero than this are counted as this much when a margin is formed. */
const LEAST_LIMIT: Record<Unit, number> = {
  '1': 0,
  V: 0.05,
  A: 10e-6,
  W: 1e-3,
  '°C': 1,
  s: 1e-6,
  Ohm: 0,
};

export function leastLimit(unit: Unit): number {
  return LEAST_LIMIT[unit];
}

/**
 * Distance of a figure to its limit as a fraction of the limit, positive when met.
 *
 * @param sign 1 for a figure that must not exceed its limit, −1 for one that must reach it
 * @param least smallest magnitude the limit counts with
 * @returns −1 for an upper limit that is not positive; −Infinity for an infinite figure
 */
export function marginOf(sign: number, value: number, limit: number, least: number): number {
  if (sign > 0 && limit <= 0) return -1;
  return (sign * (limit - value)) / Math.max(Math.abs(limit), least);
}

/**
 * A margin on one scale for both relations: 1 − value/limit or 1 − limit/value. The margin of a figure that must reach
 * its limit ends at −1, however far it falls short, so two that are missed compare by this.
 *
 * @param sign as for `marginOf`
 */
export function evenMargin(sign: number, margin: number): number {
  return sign < 0 && margin < 0 ? 1 - 1 / Math.max(0, 1 + margin) : margin;
}

/**
 * Whether a figure meets its limit: where its margin is not below 0. Nothing is asked of it without a limit (NaN).
 *
 * @param sign 1 for a figure that must not exceed its limit, −1 for one that must reach it
 */
export function meets(sign: number, value: number, limit: number): boolean {
  if (Number.isNaN(limit)) return true;
  return sign > 0 ? value <= limit && limit > 0 : value >= limit;
}

/** A margin this near to a bound differs from it by rounding alone. */
const ROUNDING = 1e-12;

/** A margin as it is reported: on the bounds of its status where only rounding keeps it off them. */
export function roundedMargin(margin: number, band: number): number {
  const bound = [band, 0].find((each) => Math.abs(margin - each) < ROUNDING);
  return bound ?? margin;
}

/** Status of a margin: at least the policy's band is a pass, met at all is marginal. */
export function statusOf(
  margin: number,
  band: number,
): Exclude<CriterionStatus, 'open' | 'stated'> {
  if (margin >= band) return 'pass';
  return margin >= 0 ? 'marginal' : 'fail';
}

const SEVERITY = ['pass', 'marginal', 'open', 'fail'] as const satisfies readonly Verdict[];

/** The worst of several statuses; `stated` does not count, and nothing at all is a pass. */
export function verdictOf(statuses: readonly CriterionStatus[]): Verdict {
  return statuses.reduce<Verdict>(
    (worst, status) => (status === 'stated' ? worst : worseOf(worst, status)),
    'pass',
  );
}

/** fail > open > marginal > pass. */
export function worseOf(a: Verdict, b: Verdict): Verdict {
  return SEVERITY.indexOf(a) >= SEVERITY.indexOf(b) ? a : b;
}
