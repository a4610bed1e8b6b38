import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadOfValues } from '../../../shared/statistics/order-statistics.ts';

const quantiles = (values: number[], shares: number[]) =>
  spreadOfValues([Float64Array.from(values)], shares).quantiles;

describe('quantiles', () => {
  it('lie straight between the neighbours of rank p·(n − 1)', () => {
    expect(quantiles([15, 20, 35, 40, 50], [0, 0.25, 0.4, 0.5, 1])).toEqual([15, 20, 29, 35, 50]);
  });

  it('are null without values, and where they lie beyond the last finite one', () => {
    expect(quantiles([], [0.5])).toEqual([null]);
    expect(quantiles([1, Infinity, Infinity], [0, 0.5])).toEqual([1, null]);
  });

  it('are those of the sorted values, in whatever parts and order', () => {
    const value = fc.oneof(
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      fc.constantFrom(0, 1, 1, 1, 5e-324, 1e308, -1e308, Infinity),
      fc.double({ min: 0, max: 1, noNaN: true }),
    );
    fc.assert(
      fc.property(
        fc.array(value, { minLength: 1, maxLength: 900, size: 'max' }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.nat(),
        (values, share, cut) => {
          const sorted = Float64Array.from(values).sort();
          const rank = Math.round(share * (values.length - 1));
          const exact = rank / Math.max(1, values.length - 1);
          const at = cut % values.length;
          const parts = [values.slice(0, at), values.slice(at)].map((part) =>
            Float64Array.from(part),
          );
          const [found] = spreadOfValues(parts, [exact]).quantiles;
          const wanted = sorted[rank] ?? NaN;
          if (Number.isFinite(wanted)) expect(found).toBeCloseTo(wanted, 6);
          else expect(found).toBeNull();
        },
      ),
      { seed: 20261201, numRuns: 300 },
    );
  });
});

describe('histogram', () => {
  it('counts every finite value once, from the smallest to the largest', () => {
    const values = Float64Array.from({ length: 6000 }, (_, k) => k / 100);
    const { histogram } = spreadOfValues([values, Float64Array.of(Infinity)], []);
    expect(histogram?.from).toBe(0);
    expect(histogram?.classWidth).toBeCloseTo(59.99 / 60, 9);
    expect(histogram?.counts).toHaveLength(60);
    for (const count of histogram?.counts ?? []) expect(Math.abs(count - 100)).toBeLessThan(3);
    expect(histogram?.counts.reduce((sum, count) => sum + count, 0)).toBe(6000);
  });

  it('is null where nothing spreads', () => {
    expect(spreadOfValues([Float64Array.of(2, 2, 2)], []).histogram).toBeNull();
    expect(spreadOfValues([], []).histogram).toBeNull();
  });
});
