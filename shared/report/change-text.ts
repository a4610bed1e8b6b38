import { formatNumber, formatPercent, formatQuantity } from '../units/engineering-notation.ts';

/** Units whose zero is arbitrary: the difference counts, not the ratio. */
const DIFFERENCE_UNITS: Readonly<Record<string, string>> = { '°C': 'K', K: 'K' };

/**
 * How far a figure moved, in two digits: per cent of the earlier figure, kelvin for temperatures, points for
 * percentages, the difference with its unit where the earlier figure is 0.
 *
 * @param unit unit of both figures as `formatQuantity` knows it, or `%` for fractions shown as a percentage
 * @returns text such as `−8.8 %`, `+10 K`, `−4 points`, `none`
 */
export function changeText(before: number, after: number, unit: string): string {
  const difference = after - before;
  if (difference === 0) return 'none';
  return (difference > 0 ? '+' : '') + differenceText(difference, before, unit);
}

function differenceText(difference: number, before: number, unit: string): string {
  const digits = 2;
  if (unit === '%') {
    const points = Number((difference * 100).toPrecision(12));
    return `${formatNumber(points, { digits })}\u00a0points`;
  }
  const kelvin = DIFFERENCE_UNITS[unit];
  if (kelvin !== undefined || before === 0) {
    return formatQuantity(difference, kelvin ?? unit, { digits });
  }
  return formatPercent(difference / Math.abs(before), { digits });
}
