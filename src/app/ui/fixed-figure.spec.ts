import { fixedFigure, marginText } from './fixed-figure.ts';

describe('figures of a column', () => {
  it('keep the same decimals, with a true minus', () => {
    expect(fixedFigure(0.0108, 1, 1000)).toBe('10.8');
    expect(fixedFigure(-0.5, 2)).toBe('−0.50');
  });

  it('show a dash where there is none', () => {
    expect(fixedFigure(null, 2)).toBe('–');
    expect(fixedFigure(Infinity, 2)).toBe('–');
  });

  it('write margins without a sign when met and with one when not', () => {
    expect(marginText(0.029)).toBe('2.9\u00a0%');
    expect(marginText(-0.061)).toBe('−6.1\u00a0%');
    expect(marginText(1.87)).toBe('187\u00a0%');
    expect(marginText(null)).toBe('');
  });
});
