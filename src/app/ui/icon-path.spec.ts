import { iconPath } from './icon-path.ts';

describe('icon path', () => {
  it('turns every element of an icon into one outline', () => {
    const outline = iconPath([
      ['circle', { cx: '12', cy: '12', r: '10' }],
      ['line', { x1: 1, y1: 2, x2: 3, y2: 4 }],
      ['polyline', { points: '1 1 2 2' }],
    ]);
    expect(outline).toBe('M2 12a10 10 0 1 0 20 0a10 10 0 1 0 -20 0ZM1 2L3 4M1 1 2 2');
  });

  it('starts a relative path at the origin, not where the element before it ended', () => {
    expect(iconPath([['path', { d: 'm16 9-5 5' }]])).toBe('M0 0m16 9-5 5');
  });

  it('rounds the corners of a rectangle', () => {
    expect(iconPath([['rect', { x: 0, y: 0, width: 10, height: 8, rx: 2 }]])).toContain(
      'a2 2 0 0 1',
    );
  });

  it('refuses an element it has no outline for', () => {
    expect(() => iconPath([['text', {}]])).toThrow(RangeError);
  });
});
