import type { PolicyLimits } from '../../../shared/stage/policy.ts';
import {
  formatNumber,
  formatPercent,
  formatQuantity,
} from '../../../shared/units/engineering-notation.ts';

interface LimitWords {
  readonly name: string;
  readonly unit: 'ratio' | 'percent' | 'V' | 'A' | 'Ohm' | 'Hz' | 'K' | 'V/K' | '1/K' | 'word';
}

/** Every limit of a policy in words, in the order the policy page shows them. */
export const POLICY_LIMITS: Record<keyof PolicyLimits, LimitWords> = {
  overdriveFactor: { name: 'Smallest overdrive factor', unit: 'ratio' },
  forcedBeta: { name: 'Largest forced β', unit: 'ratio' },
  guaranteedOnly: { name: 'Only the forced β of guaranteed rows', unit: 'word' },
  marginalBand: { name: 'Marginal below a margin of', unit: 'percent' },
  voltageDerating: { name: 'Usable share of rated voltages', unit: 'percent' },
  currentDerating: { name: 'Usable share of rated currents', unit: 'percent' },
  powerDerating: { name: 'Usable share of rated power', unit: 'percent' },
  junctionDerating: { name: 'Usable share of the junction limit', unit: 'percent' },
  resistorDerating: { name: 'Usable share of resistor ratings', unit: 'percent' },
  driveDerating: { name: 'Usable share of pin and port currents', unit: 'percent' },
  offBaseV: { name: 'Largest off-state VBE', unit: 'V' },
  offCurrentA: { name: 'Largest off-state collector current', unit: 'A' },
  averagingHz: { name: 'Power averaged from', unit: 'Hz' },
  overdrivenRatio: { name: 'Overdriven above this multiple of the demand', unit: 'ratio' },
  gainExponent: { name: 'Exponent of gain over absolute temperature', unit: 'ratio' },
  vbeTempcoVPerK: { name: 'Slope of VBE over temperature', unit: 'V/K' },
  vbeMinV: { name: 'Smallest VBE of a conducting junction', unit: 'V' },
  rceTempcoPerK: { name: 'Slope of RCE(sat) over temperature', unit: '1/K' },
  leakageDoublingK: { name: 'Leakage doubles every', unit: 'K' },
  series: { name: 'Preferred values', unit: 'word' },
  smallestOhm: { name: 'Smallest resistor', unit: 'Ohm' },
  largestOhm: { name: 'Largest resistor', unit: 'Ohm' },
};

/** What a limit is called; `name` is the policy's own. */
export function limitName(key: string): string {
  if (key === 'name') return 'Policy';
  return key in POLICY_LIMITS ? POLICY_LIMITS[key as keyof PolicyLimits].name : key;
}

/** A limit's value with its unit. */
export function limitText(key: string, value: number | string | boolean): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return value;
  const unit = key in POLICY_LIMITS ? POLICY_LIMITS[key as keyof PolicyLimits].unit : 'ratio';
  if (unit === 'percent') return formatPercent(value);
  return unit === 'ratio' || unit === 'word' ? formatNumber(value) : formatQuantity(value, unit);
}
