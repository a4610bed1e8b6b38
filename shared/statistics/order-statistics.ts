/** How many equal classes the values of a figure are sorted into at a time, and those of a histogram. */
const HISTOGRAM_CLASSES = 60;
const CLASSES = 34 * HISTOGRAM_CLASSES;

/** So few values are sorted outright. */
const FEW = 256;

/** Values counted into equal classes from the smallest to the largest. */
export interface Histogram {
  readonly from: number;
  readonly classWidth: number;
  readonly counts: readonly number[];
}

/** How the values of one figure spread. */
export interface Spread {
  /** null for each quantile that is not finite, or where there are no values. */
  readonly quantiles: readonly (number | null)[];
  /** null where no value is finite, or all are the same. */
  readonly histogram: Histogram | null;
}

/**
 * Quantiles and histogram of values given in parts. By selection: the values are counted into classes, and only those of
 * the classes that hold a wanted rank are looked at again; nothing is sorted as a whole and the order of the values does
 * not matter. What is not finite ranks above everything.
 *
 * Quantiles by definition 7 of Hyndman and Fan, "Sample quantiles in statistical packages", The American Statistician 50
 * (1996): straight between the order statistics around rank p·(n − 1).
 */
export function spreadOfValues(parts: readonly Float64Array[], shares: readonly number[]): Spread {
  const count = parts.reduce((sum, part) => sum + part.length, 0);
  const classes = countIntoClasses(parts);
  const places = shares.map((share) => share * (count - 1));
  const ranks = places.flatMap((place) => [Math.floor(place), Math.ceil(place)]);
  const values = count === 0 ? [] : valuesAtRanks(parts, classes, ranks);
  const quantiles = places.map((place, k) => {
    const low = values[2 * k] ?? NaN;
    const high = values[2 * k + 1] ?? NaN;
    const value = low === high ? low : low + (place - Math.floor(place)) * (high - low);
    return Number.isFinite(value) ? value : null;
  });
  return { quantiles, histogram: histogramOf(classes) };
}

interface Classes {
  readonly least: number;
  /** Classes per unit of the figure; 0 where the values do not spread, or further than numbers go. */
  readonly perUnit: number;
  readonly sizes: Uint32Array;
}

/** Loops over values go by index: an iterator takes twice the time. */
function countIntoClasses(parts: readonly Float64Array[]): Classes {
  let least = Infinity;
  let most = -Infinity;
  for (const part of parts) {
    for (let k = part.length - 1; k >= 0; k--) {
      const value = part[k] ?? NaN;
      if (value < least) least = value;
      if (value > most && value < Infinity) most = value;
    }
  }
  const sizes = new Uint32Array(CLASSES);
  const fitting = CLASSES / (most - least);
  const perUnit = fitting > 0 && fitting < Infinity && least > -Infinity ? fitting : 0;
  for (const part of parts) {
    for (let k = part.length - 1; k >= 0; k--) {
      const value = part[k] ?? NaN;
      if (value < Infinity) {
        const own = classOf(value, least, perUnit);
        sizes[own] = (sizes[own] ?? 0) + 1;
      }
    }
  }
  return { least, perUnit, sizes };
}

/** The last class takes the largest value too. */
function classOf(value: number, least: number, perUnit: number): number {
  return Math.min(CLASSES - 1, ((value - least) * perUnit) | 0);
}

function histogramOf({ least, perUnit, sizes }: Classes): Histogram | null {
  if (perUnit === 0) return null;
  const together = CLASSES / HISTOGRAM_CLASSES;
  const counts = Array.from({ length: HISTOGRAM_CLASSES }, (_, k) =>
    sizes.subarray(k * together, (k + 1) * together).reduce((sum, size) => sum + size, 0),
  );
  return { from: least, classWidth: together / perUnit, counts };
}

/** The values at some ranks, 0 the smallest; Infinity beyond the last finite one. */
function valuesAtRanks(
  parts: readonly Float64Array[],
  { least, perUnit, sizes }: Classes,
  ranks: readonly number[],
): number[] {
  const places = ranks.map((rank) => placeOf(sizes, rank));
  const wanted = new Map<number, { values: Float64Array; filled: number }>();
  for (const { own } of places) {
    wanted.set(own, { values: new Float64Array(sizes[own] ?? 0), filled: 0 });
  }
  const slots = Uint8Array.from(sizes, (_, k) => (wanted.has(k) ? 1 : 0));
  for (const part of parts) {
    for (let k = part.length - 1; k >= 0; k--) {
      const value = part[k] ?? NaN;
      if (value < Infinity) {
        const own = classOf(value, least, perUnit);
        if (slots[own] === 1) {
          const holder = wanted.get(own);
          if (holder !== undefined) holder.values[holder.filled++] = value;
        }
      }
    }
  }
  return places.map(({ own, rank }) => valueAtRank(wanted.get(own)?.values, rank, perUnit));
}

function valueAtRank(values: Float64Array | undefined, rank: number, perUnit: number): number {
  if (values === undefined || rank >= values.length) return Infinity;
  if (values.length <= FEW || perUnit === 0) return values.sort()[rank] ?? NaN;
  return valuesAtRanks([values], countIntoClasses([values]), [rank])[0] ?? NaN;
}

/** The class that holds a rank, and the rank inside it. */
function placeOf(sizes: Uint32Array, rank: number): { own: number; rank: number } {
  let left = rank;
  for (let own = 0; own < sizes.length; own++) {
    const size = sizes[own] ?? 0;
    if (left < size) return { own, rank: left };
    left -= size;
  }
  return { own: sizes.length, rank: left };
}
