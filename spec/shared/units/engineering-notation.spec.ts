import { describe, expect, it } from 'vitest';
import {
  formatNumber,
  formatPercent,
  formatQuantity,
} from '../../../shared/units/engineering-notation.ts';

const shown = (text: string) => text.replaceAll('\u00a0', '_');

describe('engineering notation', () => {
  it.each([
    [4700, 'Ohm', '4.7_kΩ'],
    [470, 'Ohm', '470_Ω'],
    [1e7, 'Ohm', '10_MΩ'],
    [0.03, 'A', '30_mA'],
    [8.5e-5, 'A', '85_µA'],
    [5e-8, 'A', '50_nA'],
    [0.009, 's', '9_ms'],
    [4e-12, 'F', '4_pF'],
    [1.3e-15, 'A', '1.3_fA'],
    [3e8, 'Hz', '300_MHz'],
    [2.5e9, 'Hz', '2.5_GHz'],
    [0.2451, 'V', '245_mV'],
    [-0.002, 'V/K', '−2_mV/K'],
    [-12, 'V', '−12_V'],
    [0, 'V', '0_V'],
    [-0, 'V', '0_V'],
    [61.34, '°C', '61.3_°C'],
    [-40, '°C', '−40_°C'],
    [0.001, '°C', '0.001_°C'],
    [1500, 'K/W', '1500_K/W'],
    [20, 'K', '20_K'],
    [3.6612, '1', '3.66'],
    [1234.5, '1', '1235'],
    [1e-18, 'A', '1e−18_A'],
    [1.25e16, 'Ohm', '1.25e16_Ω'],
  ])('writes %d %s as %s', (value, unit, text) => {
    expect(shown(formatQuantity(value, unit))).toBe(text);
  });

  it.each([
    [999.96, 'Ohm', '1.00_kΩ'],
    [999.4, 'Ohm', '999_Ω'],
    [999.5, 'Ohm', '1.00_kΩ'],
    [0.99949, 'V', '999_mV'],
    [0.9996, 'V', '1.00_V'],
    [9.996, 'V', '10.0_V'],
    [99.96, 'V', '100_V'],
    [99.96, '°C', '100_°C'],
    [4700, 'Ohm', '4.70_kΩ'],
    [0.097, '1', '0.0970'],
    [0.000999996, 'A', '1.00_mA'],
  ])('carries %d %s over to %s when it pads results', (value, unit, text) => {
    expect(shown(formatQuantity(value, unit, { pad: true }))).toBe(text);
  });

  it('shows what is no figure or infinite as such', () => {
    expect(formatQuantity(null, 'V')).toBe('–');
    expect(formatQuantity(Number.NaN, 'V')).toBe('–');
    expect(shown(formatQuantity(Infinity, '1'))).toBe('∞');
    expect(shown(formatQuantity(-Infinity, 'V'))).toBe('−∞_V');
    expect(formatQuantity(Infinity, 'V', { ascii: true })).toBe('inf V');
  });

  it('writes plain ASCII for files', () => {
    expect(formatQuantity(-8.5e-5, 'A', { ascii: true })).toBe('-85 uA');
    expect(formatQuantity(4700, 'Ohm', { ascii: true })).toBe('4.7 kOhm');
    expect(formatQuantity(60, '°C', { ascii: true })).toBe('60 degC');
    expect(formatQuantity(null, 'V', { ascii: true })).toBe('-');
  });

  it('takes the decimal mark and the number of digits', () => {
    expect(shown(formatQuantity(4700, 'Ohm', { decimalMark: ',' }))).toBe('4,7_kΩ');
    expect(shown(formatQuantity(12345, 'Ohm', { digits: 2 }))).toBe('12_kΩ');
    expect(shown(formatQuantity(12345, 'Ohm', { digits: 1 }))).toBe('10_kΩ');
    expect(shown(formatQuantity(12345, 'Ohm', { digits: 6, pad: true }))).toBe('12.3450_kΩ');
    expect(() => formatQuantity(1, 'V', { digits: 0 })).toThrow(RangeError);
  });

  it('writes ratios and percentages', () => {
    expect(formatNumber(13.879)).toBe('13.9');
    expect(formatNumber(5.7, { pad: true })).toBe('5.70');
    expect(shown(formatPercent(0.05))).toBe('5_%');
    expect(shown(formatPercent(0.07))).toBe('7_%');
    expect(shown(formatPercent(-0.2833))).toBe('−28.3_%');
    expect(shown(formatPercent(0.0002))).toBe('0.02_%');
    expect(formatPercent(null)).toBe('–');
  });
});
