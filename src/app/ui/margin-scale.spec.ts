import { marginBarShape, marginOffsetPx } from './margin-scale.ts';

describe('margin scale', () => {
  it('is a square root with 100 % at full length', () => {
    expect(marginOffsetPx(1, 40)).toBe(40);
    expect(marginOffsetPx(0.25, 40)).toBe(20);
    expect(marginOffsetPx(-0.25, 40)).toBe(20);
  });

  it('draws a met limit to the right of the tick', () => {
    expect(marginBarShape(0.25, 40, 12)).toEqual({ fromPx: 0, widthPx: 20, arrow: null });
  });

  it('ends in an arrow above 100 %', () => {
    expect(marginBarShape(1.87, 40, 12)).toEqual({ fromPx: 0, widthPx: 40, arrow: 'right' });
  });

  it('draws a missed limit to the left, cut with an arrow where the room ends', () => {
    expect(marginBarShape(-0.04, 40, 12)).toEqual({ fromPx: -8, widthPx: 8, arrow: null });
    expect(marginBarShape(-0.5, 40, 12)).toEqual({ fromPx: -12, widthPx: 12, arrow: 'left' });
  });

  it('never lets a bar vanish', () => {
    expect(marginBarShape(0, 40, 12).widthPx).toBe(2);
  });
});
