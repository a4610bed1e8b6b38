import { dayHeading, waitingText } from './time-text.ts';

const at = (day: number, hour: number) => new Date(2026, 2, day, hour).getTime();

describe('times', () => {
  it('head a day by its distance', () => {
    expect(dayHeading(at(10, 1), at(10, 23))).toBe('Today, 10 March');
    expect(dayHeading(at(9, 23), at(10, 1))).toBe('Yesterday, 9 March');
    expect(dayHeading(at(2, 12), at(10, 1))).toBe('2 March');
  });

  it('name the year of another year', () => {
    expect(dayHeading(new Date(2025, 10, 3).getTime(), at(10, 1))).toBe('3 November 2025');
  });

  it('say coarsely how long something waits', () => {
    expect(waitingText(at(10, 8), at(10, 8))).toBe('now');
    expect(waitingText(at(10, 8), at(10, 9))).toBe('1 hour');
    expect(waitingText(at(7, 7), at(10, 8))).toBe('3 days');
  });
});
