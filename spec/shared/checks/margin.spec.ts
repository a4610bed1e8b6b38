import { describe, expect, it } from 'vitest';
import {
  evenMargin,
  marginOf,
  roundedMargin,
  statusOf,
  verdictOf,
  worseOf,
} from '../../../shared/checks/margin.ts';

describe('marginOf', () => {
  it('is the distance to the limit as a fraction of it', () => {
    expect(marginOf(1, 8, 10, 0)).toBeCloseTo(0.2, 12);
    expect(marginOf(-1, 3, 2, 0)).toBeCloseTo(0.5, 12);
    expect(marginOf(-1, 1, 2, 0)).toBeCloseTo(-0.5, 12);
  });

  it('counts a small limit with its least size', () => {
    expect(marginOf(1, 0, 0.01, 0.05)).toBeCloseTo(0.2, 12);
  });

  it('is −1 for an upper limit that is not positive, whatever the figure', () => {
    expect(marginOf(1, -5, 0, 0.05)).toBe(-1);
    expect(marginOf(1, -5, -1, 0.05)).toBe(-1);
  });
});

describe('statusOf', () => {
  it.each([
    [0.1, 'pass'],
    [0.0999, 'marginal'],
    [0, 'marginal'],
    [-1e-12, 'fail'],
    [-Infinity, 'fail'],
  ])('of a margin of %d is %s', (margin, status) => {
    expect(statusOf(margin, 0.1)).toBe(status);
  });
});

describe('roundedMargin', () => {
  it('puts a margin on the bound that only rounding keeps it off: 28.8 V of 0.8 · 40 V are 10 %', () => {
    const margin = marginOf(1, 28.8, 0.8 * 40, 0.05);
    expect(margin).toBeLessThan(0.1);
    expect(roundedMargin(margin, 0.1)).toBe(0.1);
    expect(roundedMargin(marginOf(1, 0.1 + 0.2, 0.3, 0), 0.1)).toBe(0);
  });

  it('leaves any other margin as it is', () => {
    for (const margin of [0.0999999, 0.1000001, -1e-9, -1, -Infinity]) {
      expect(roundedMargin(margin, 0.1)).toBe(margin);
    }
  });
});

describe('verdictOf', () => {
  it('is fail before open before marginal before pass; stated does not count', () => {
    expect(verdictOf(['pass', 'stated'])).toBe('pass');
    expect(verdictOf(['pass', 'marginal', 'stated'])).toBe('marginal');
    expect(verdictOf(['open', 'marginal'])).toBe('open');
    expect(verdictOf(['open', 'fail', 'pass'])).toBe('fail');
    expect(verdictOf([])).toBe('pass');
    expect(worseOf('fail', 'open')).toBe('fail');
  });
});

describe('evenMargin', () => {
  it('tells how far a figure falls short on one scale for both relations', () => {
    // Half of what it must reach and twice what it may be are equally far off.
    expect(evenMargin(-1, marginOf(-1, 1, 2, 0))).toBeCloseTo(-1, 12);
    expect(evenMargin(1, marginOf(1, 4, 2, 0))).toBeCloseTo(-1, 12);
    expect(evenMargin(-1, -1)).toBe(-Infinity);
  });

  it('leaves a met margin as it is', () => {
    expect(evenMargin(-1, 0.2)).toBe(0.2);
    expect(evenMargin(1, 0.2)).toBe(0.2);
  });
});
