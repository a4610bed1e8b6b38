import type { LimitSet } from '../../../shared/parts/transistor-limits.ts';
import type { PolicyLimits } from '../../../shared/stage/policy.ts';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';

export interface UsableLimit {
  readonly rating: string;
  readonly printed: string;
  readonly usable: string;
}

/**
 * The ratings of a transistor as printed and as a policy lets them be used. VEBO and VCBO are not derated;
 * without a peak current IC is used; RθJA in use is the larger of the printed one and what Ptot implies.
 */
export function usableLimits(set: LimitSet, policy: PolicyLimits): UsableLimit[] {
  const { voltageDerating, currentDerating, powerDerating, junctionDerating } = policy;
  const implied =
    set.tjMaxDegC === null || set.powerW === null ? null : (set.tjMaxDegC - 25) / set.powerW;
  const rth = larger(set.rthJaKPerW, implied);
  const peak = set.icPeakA ?? set.icA;
  return [
    row('VCEO', set.vceoV, times(set.vceoV, voltageDerating), 'V'),
    row('VCBO', set.vcboV, set.vcboV, 'V'),
    row('VEBO', set.veboV, set.veboV, 'V'),
    row('IC', set.icA, times(set.icA, currentDerating), 'A'),
    row('IC peak', set.icPeakA, times(peak, currentDerating), 'A'),
    row('IB', set.ibA, times(set.ibA, currentDerating), 'A'),
    row('Ptot, 25 °C', set.powerW, times(set.powerW, powerDerating), 'W'),
    row('RθJA', set.rthJaKPerW, rth, 'K/W'),
    row('TJ', set.tjMaxDegC, times(set.tjMaxDegC, junctionDerating), '°C'),
  ].filter(({ printed, usable }) => printed !== NONE || usable !== NONE);
}

const NONE = formatQuantity(null, 'V');

const times = (value: number | null, factor: number) => (value === null ? null : value * factor);

function larger(a: number | null, b: number | null): number | null {
  if (a === null || b === null) return a ?? b;
  return Math.max(a, b);
}

function row(rating: string, printed: number | null, usable: number | null, unit: string) {
  return {
    rating,
    printed: formatQuantity(printed, unit, { digits: 4 }),
    usable: formatQuantity(usable, unit, { digits: 4 }),
  };
}
