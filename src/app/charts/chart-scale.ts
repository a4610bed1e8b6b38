import { formatQuantity } from '../../../shared/units/engineering-notation.ts';
import { PREFIXES, QUANTITY_UNITS } from '../../../shared/units/quantity-unit.ts';
import { fixedFigure } from '../ui/fixed-figure.ts';
import type { ChartAxis } from './chart-model.ts';

/** In what an axis is lettered: one prefix for all its numbers. */
export interface AxisUnit {
  /** With its prefix, `mA`; '' for a bare number. */
  readonly symbol: string;
  /** Number shown per SI value, 1000 for mA. */
  readonly factor: number;
  /** Decimals that show three digits of the largest value, or the finest difference. */
  readonly decimals: number;
}

/** Volts stay volts down to this, as the trade writes them. */
const LARGEST_IN_PREFIX = { V: 0.1 } as const;

/** The one unit of an axis: an exponent of 3 that leaves its largest value (log: its middle) above 1. */
export function axisUnit(axis: ChartAxis): AxisUnit {
  const { unit, scale, from, to } = axis;
  const largest = Math.max(Math.abs(from), Math.abs(to));
  const decimals = (factor: number) => decimalsOf(largest * factor, axis.finest, factor);
  if (unit === '%') return { symbol: '%', factor: 100, decimals: decimals(100) };
  const kind = QUANTITY_UNITS[unit as keyof typeof QUANTITY_UNITS];
  if (!kind.prefixed) return { symbol: kind.symbol, factor: 1, decimals: decimals(1) };
  const size = scale === 'log' ? Math.sqrt(from * to) : largest;
  const least = unit === 'V' ? LARGEST_IN_PREFIX.V : 1;
  const prefix =
    PREFIXES.find(({ exponent }) => size >= least * 10 ** exponent) ??
    PREFIXES[PREFIXES.length - 1];
  const chosen = size > 0 && prefix !== undefined ? prefix : { exponent: 0, symbol: '' };
  const factor = 10 ** -chosen.exponent;
  return { symbol: chosen.symbol + kind.symbol, factor, decimals: decimals(factor) };
}

function decimalsOf(largest: number, finest: number | null, factor: number): number {
  const places = (least: number) => Math.ceil(-Math.log10(least) - 1e-9);
  const usual = largest > 0 ? 2 - Math.floor(Math.log10(largest) + 1e-9) : 0;
  const wanted = finest === null ? usual : Math.max(usual, places(finest * factor));
  return Math.min(6, Math.max(0, wanted));
}

/** "IC / mA"; a bare number has no unit to name. */
export function axisTitle(axis: ChartAxis): string {
  const { symbol } = axisUnit(axis);
  return symbol === '' ? axis.quantity : `${axis.quantity} / ${symbol}`;
}

/** A figure on an axis without its unit; on a log axis in engineering notation with it. */
export function axisFigure(axis: ChartAxis, value: number | null): string {
  if (axis.scale === 'log') return formatQuantity(value, axis.unit, { digits: 3, pad: true });
  const { factor, decimals } = axisUnit(axis);
  return fixedFigure(value, decimals, factor);
}

/** What stands behind `axisFigure`; '' where the figure carries it already. */
export const figureUnit = (axis: ChartAxis): string =>
  axis.scale === 'log' ? '' : axisUnit(axis).symbol;

export interface Tick {
  readonly value: number;
  /** '' for a minor tick. */
  readonly text: string;
}

/** An axis laid along a stretch of pixels. */
export interface Scale {
  readonly from: number;
  readonly to: number;
  readonly ticks: readonly Tick[];
  /** Not finite where the value has no place, such as zero on a log axis. */
  toPx(value: number): number;
}

/**
 * @param startPx where `from` lies
 * @param endPx where `to` lies; below `startPx` for an axis that runs up
 * @param gapPx least distance between two lettered ticks
 */
export function makeScale(axis: ChartAxis, startPx: number, endPx: number, gapPx: number): Scale {
  const room = Math.max(1, Math.floor(Math.abs(endPx - startPx) / gapPx));
  return axis.scale === 'log'
    ? logScale(axis, startPx, endPx, room)
    : linearScale(axis, startPx, endPx, room);
}

function linearScale(axis: ChartAxis, startPx: number, endPx: number, room: number): Scale {
  const { factor } = axisUnit(axis);
  const low = axis.from * factor;
  const high = axis.to > axis.from ? axis.to * factor : low + 1;
  const step = roundStep((high - low) / room);
  // A free end goes on to the next half step, so that little of the paper stays empty.
  const half = step / 2;
  const bottom = axis.exact ? low : Math.floor(low / half + 1e-9) * half;
  const top = axis.exact ? high : Math.ceil(high / half - 1e-9) * half;
  const first = Math.ceil(bottom / step - 1e-9);
  const last = Math.floor(top / step + 1e-9);
  const decimals = [0, 1, 2, 3, 4, 5, 6].find((each) => isWhole(step * 10 ** each)) ?? 6;
  const ticks = Array.from({ length: last - first + 1 }, (_, k) => {
    const shown = (first + k) * step;
    return { value: shown / factor, text: first + k === 0 ? '0' : fixedFigure(shown, decimals) };
  });
  const from = bottom / factor;
  const to = top / factor;
  const perValue = (endPx - startPx) / (to - from);
  return { from, to, ticks, toPx: (value) => startPx + (value - from) * perValue };
}

/** 1, 2, 2.5 or 5 times a power of ten, the smallest that is not below the step asked for. */
function roundStep(least: number): number {
  const decade = 10 ** Math.floor(Math.log10(least));
  const factor = [1, 2, 2.5, 5].find((each) => each * decade >= least * (1 - 1e-9)) ?? 10;
  return factor * decade;
}

const isWhole = (value: number) => Math.abs(value - Math.round(value)) < 1e-6;

function logScale(axis: ChartAxis, startPx: number, endPx: number, room: number): Scale {
  const { factor } = axisUnit(axis);
  const [low, high] = [Math.log10(axis.from), Math.log10(axis.to)];
  const perDecade = (endPx - startPx) / (high - low);
  const lettered = letteredMultiples(high - low, room);
  const stride = Math.max(1, Math.ceil((high - low) / room));
  const ticks: Tick[] = [];
  for (let decade = Math.floor(low); decade <= Math.ceil(high); decade++) {
    for (let multiple = 1; multiple < 10; multiple++) {
      const value = multiple * 10 ** decade;
      if (value < axis.from * (1 - 1e-9) || value > axis.to * (1 + 1e-9)) continue;
      const shown =
        lettered.includes(multiple) && (multiple > 1 || (decade - Math.ceil(low)) % stride === 0);
      const text = shown ? String(Number((value * factor).toPrecision(3))) : '';
      ticks.push({ value, text });
    }
  }
  return {
    from: axis.from,
    to: axis.to,
    ticks,
    toPx: (value) => (value > 0 ? startPx + (Math.log10(value) - low) * perDecade : NaN),
  };
}

/** Decades alone, or 1-2-5 where there is room and few decades. */
const letteredMultiples = (decades: number, room: number): readonly number[] =>
  decades * 3 <= room ? [1, 2, 5] : [1];
