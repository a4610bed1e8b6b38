import { axis } from './chart-model.ts';
import { axisFigure, axisTitle, figureUnit, makeScale } from './chart-scale.ts';

const texts = (scale: ReturnType<typeof makeScale>) => scale.ticks.map(({ text }) => text);

describe('chart scale', () => {
  // Quantity and unit as a quotient, numerical values at the ticks: ISO 80000-1, 7.1.4.
  it('letters an axis in one prefixed unit with round steps, on to the next half step', () => {
    const current = axis('IC', 'A', [0, 0.0272]);
    const scale = makeScale(current, 300, 20, 34);
    expect(axisTitle(current)).toBe('IC / mA');
    expect(texts(scale)).toEqual(['0', '5', '10', '15', '20', '25']);
    expect(scale.to).toBeCloseTo(0.0275, 12);
    expect(scale.toPx(0.01375)).toBeCloseTo(160, 9);
  });

  it('keeps fractions of a volt in volts, as the trade writes saturation voltages', () => {
    const voltage = axis('VCE', 'V', [0, 0.4]);
    expect(axisTitle(voltage)).toBe('VCE / V');
    expect(texts(makeScale(voltage, 0, 300, 56))).toEqual(['0', '0.1', '0.2', '0.3', '0.4']);
    expect(axisTitle(axis('VCE', 'V', [0, 0.04]))).toBe('VCE / mV');
  });

  it('shows a ratio in percent and a bare number without a unit', () => {
    const margin = axis('margin', '%', [-0.2, 0.4], { exact: true });
    expect(axisTitle(margin)).toBe('margin / %');
    expect(axisFigure(margin, -0.034)).toBe('−3.4');
    expect(axisTitle(axis('hFE', '1', [0, 300]))).toBe('hFE');
  });

  it('leaves exact ends where they are and letters only what lies between', () => {
    const ambient = axis('TA', '°C', [-20, 65], { exact: true });
    const scale = makeScale(ambient, 0, 400, 56);
    expect([scale.from, scale.to]).toEqual([-20, 65]);
    expect(texts(scale)).toEqual(['−20', '0', '20', '40', '60']);
  });

  it('letters decades on a log axis and ticks what lies between', () => {
    const current = axis('IC', 'A', [1e-4, 0.2], { scale: 'log' });
    const scale = makeScale(current, 0, 300, 56);
    expect(axisTitle(current)).toBe('IC / mA');
    expect(texts(scale).filter((text) => text !== '')).toEqual(['0.1', '1', '10', '100']);
    expect(scale.ticks).toHaveLength(29);
    expect(scale.toPx(Math.sqrt(1e-4 * 0.2))).toBeCloseTo(150, 9);
    expect(scale.toPx(0)).toBeNaN();
  });

  it('writes figures of a log axis with their own prefix', () => {
    const current = axis('IC', 'A', [1e-5, 1], { scale: 'log' });
    expect(axisFigure(current, 0.0123)).toBe('12.3\u00a0mA');
    expect(figureUnit(current)).toBe('');
  });

  it('survives an axis without extent', () => {
    const scale = makeScale(axis('IC', 'A', [0, 0]), 0, 300, 56);
    expect(scale.ticks.every(({ value }) => Number.isFinite(value))).toBe(true);
    expect(scale.toPx(0)).toBe(0);
  });
});
