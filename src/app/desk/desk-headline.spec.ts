import { deskHeadline } from './desk-headline.ts';

const HOUR = 3_600_000;

describe('the headline of the desk', () => {
  it('counts in words and names the oldest', () => {
    expect(deskHeadline([{ sinceMs: 0 }, { sinceMs: 70 * HOUR }], 73 * HOUR)).toBe(
      'Two things wait for you. The oldest has waited 3 days.',
    );
  });

  it('speaks of one thing as one', () => {
    expect(deskHeadline([{ sinceMs: 0 }], 5 * HOUR)).toBe(
      'One thing waits for you. It has waited 5 hours.',
    );
  });

  it('says when nothing waits', () => {
    expect(deskHeadline([], 0)).toBe('Nothing waits for you.');
  });
});
