import { describe, expect, it } from 'vitest';
import { RandomStream } from '../../../shared/statistics/random-stream.ts';

/** A stream at a known state of its generator. */
function streamAt(words: number[]): RandomStream {
  const stream = new RandomStream();
  (stream as unknown as { state: Int32Array }).state.set(words);
  return stream;
}

function column(seed: number, stream: number, kind: 'normal' | 'uniform', size = 400_000) {
  const numbers = new Float64Array(size);
  const source = new RandomStream();
  source.start(seed, stream, 0);
  if (kind === 'normal') source.fillNormal(numbers);
  else source.fillUniform(numbers);
  return numbers;
}

const shareBelow = (numbers: Float64Array, limit: number) =>
  numbers.filter((value) => value < limit).length / numbers.length;

/** Four standard deviations of a share found in so many numbers. */
const chance = (share: number, size: number) => 4 * Math.sqrt((share * (1 - share)) / size);

describe('generator', () => {
  // PHP, ext/random/tests/02_engine/user_xoshiro128plusplus.phpt: state 1, 2, 3, 4; the first word follows by hand from
  // the published definition, rotl(1 + 4, 7) + 1.
  it('is xoshiro128++', () => {
    const stream = streamAt([1, 2, 3, 4]);
    expect(stream.next() >>> 0).toBe(641);
    for (let k = 1; k < 102_400; k++) stream.next();
    expect(stream.next() >>> 0).toBe(0x2c873cfa);
  });

  it('gives the same for the same seed and stream, something else for any other', () => {
    const first = [column(7, 1, 'uniform', 8), column(7, 1, 'uniform', 8)];
    expect(first[0]).toEqual(first[1]);
    for (const [seed, stream] of [
      [8, 1],
      [7, 2],
      [7 + 2 ** 32, 1],
    ] as const) {
      expect(column(seed, stream, 'uniform', 8)).not.toEqual(first[0]);
    }
  });
});

describe('uniform numbers', () => {
  it('are spread evenly between 0 and 1', () => {
    const numbers = column(11, 0, 'uniform');
    for (const share of [0.001, 0.1, 0.25, 0.5, 0.9, 0.999]) {
      expect(Math.abs(shareBelow(numbers, share) - share)).toBeLessThan(chance(share, 400_000));
    }
    expect(Math.min(...numbers.subarray(0, 50_000))).toBeGreaterThan(0);
    expect(Math.max(...numbers.subarray(0, 50_000))).toBeLessThan(1);
  });
});

describe('normal numbers', () => {
  // Cumulative normal distribution: NIST/SEMATECH e-Handbook of Statistical Methods, section 1.3.6.7.1.
  const PHI = [
    [0, 0.5],
    [0.5, 0.69146],
    [1, 0.84134],
    [1.5, 0.93319],
    [2, 0.97725],
    [2.5, 0.99379],
    [3, 0.99865],
  ] as const;
  const BEYOND = 1 - 0.99865;

  it.each(PHI)('lie below %f σ as often as the table says, cut at 3 σ', (sigma, phi) => {
    const numbers = column(3, 5, 'normal');
    const share = (phi - BEYOND) / (1 - 2 * BEYOND);
    const room = chance(share, numbers.length) + 1e-5;
    expect(Math.abs(shareBelow(numbers, sigma / 3) - share)).toBeLessThan(room);
    expect(Math.abs(1 - shareBelow(numbers, -sigma / 3) - share)).toBeLessThan(room);
  });

  it('never leave the tolerance, and reach nearly to it', () => {
    const numbers = column(3, 5, 'normal');
    const largest = numbers.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    expect(largest).toBeLessThanOrEqual(1);
    expect(largest).toBeGreaterThan(0.99);
  });

  it('of two streams have nothing to do with each other', () => {
    const a = column(3, 5, 'normal');
    const b = column(3, 6, 'normal');
    const product = a.reduce((sum, value, k) => sum + value * (b[k] ?? 0), 0);
    const square = a.reduce((sum, value) => sum + value * value, 0);
    expect(Math.abs(product / square)).toBeLessThan(4 / Math.sqrt(a.length));
  });
});
