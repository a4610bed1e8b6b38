import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatPercent, formatQuantity } from '../../../shared/units/engineering-notation.ts';
import { QUANTITY_UNITS, type UnitName } from '../../../shared/units/quantity-unit.ts';
import { parseQuantity, rangeText } from '../../../shared/units/quantity.ts';

/** Letter code and tolerance letters: IEC 60062:2016; everything else as designers write it. */
const VALUES: [string, UnitName, number][] = [
  ['4700', 'Ohm', 4700],
  ['4.7k', 'Ohm', 4700],
  ['4,7k', 'Ohm', 4700],
  ['4k7', 'Ohm', 4700],
  ['4K7', 'Ohm', 4700],
  ['4.7 kΩ', 'Ohm', 4700],
  ['4.7\u00a0k\u2126', 'Ohm', 4700],
  ['4.7\u2009k\u03a9', 'Ohm', 4700],
  ['4.7\u202fkΩ', 'Ohm', 4700],
  ['4.7kohm', 'Ohm', 4700],
  ['4.7 kOhm', 'Ohm', 4700],
  ['4k7Ω', 'Ohm', 4700],
  ['4R7', 'Ohm', 4.7],
  ['R47', 'Ohm', 0.47],
  ['0R1', 'Ohm', 0.1],
  ['1M', 'Ohm', 1e6],
  ['2M2', 'Ohm', 2.2e6],
  ['k47', 'Ohm', 470],
  ['470R', 'Ohm', 470],
  ['470 ohms', 'Ohm', 470],
  ['10K', 'Ohm', 1e4],
  ['10 k', 'Ohm', 1e4],
  ['10 000', 'Ohm', 1e4],
  ['1 000 000 Ω', 'Ohm', 1e6],
  ['1,000,000', 'Ohm', 1e6],
  ['1.000.000', 'Ohm', 1e6],
  ['1,234.5', 'Ohm', 1234.5],
  ['1.234,5', 'Ohm', 1234.5],
  ['0.125', 'Ohm', 0.125],
  ['4700.125', 'Ohm', 4700.125],
  ['4.7e3', 'Ohm', 4700],
  ['1.234e3', 'Ohm', 1234],
  ['1G', 'Ohm', 1e9],
  ['7mΩ', 'Ohm', 0.007],
  ['12V', 'V', 12],
  ['12 V', 'V', 12],
  ['12V5', 'V', 12.5],
  ['3V3', 'V', 3.3],
  ['24', 'V', 24],
  ['245 mV', 'V', 0.245],
  ['-0,5 V', 'V', -0.5],
  ['\u22120.5 V', 'V', -0.5],
  ['+5 V', 'V', 5],
  ['-0', 'V', 0],
  ['.5', 'V', 0.5],
  [',5', 'V', 0.5],
  ['50m', 'A', 0.05],
  ['50mA', 'A', 0.05],
  ['30 mA', 'A', 0.03],
  ['0.03', 'A', 0.03],
  ['0,03', 'A', 0.03],
  ['30m', 'A', 0.03],
  ['0.05', 'A', 0.05],
  ['5e-2', 'A', 0.05],
  ['5E\u22122 A', 'A', 0.05],
  ['1µ', 'A', 1e-6],
  ['1\u03bc', 'A', 1e-6],
  ['1u', 'A', 1e-6],
  ['1\u00b5A', 'A', 1e-6],
  ['1 uA', 'A', 1e-6],
  ['15 nA', 'A', 1.5e-8],
  ['20 pA', 'A', 2e-11],
  ['1A5', 'A', 1.5],
  ['250 mW', 'W', 0.25],
  ['0W25', 'W', 0.25],
  ['10 ms', 's', 0.01],
  ['200n', 's', 2e-7],
  ['2 sec', 's', 2],
  ['4 H', 'H', 4],
  ['100 mH', 'H', 0.1],
  ['100nF', 'F', 1e-7],
  ['4n7', 'F', 4.7e-9],
  ['4n7F', 'F', 4.7e-9],
  ['p33', 'F', 3.3e-13],
  ['4µ7', 'F', 4.7e-6],
  ['1 kHz', 'Hz', 1000],
  ['1k5', 'Hz', 1500],
  ['50hz', 'Hz', 50],
  ['20K', 'K', 20],
  ['20 K', 'K', 20],
  ['60', '°C', 60],
  ['60 °C', '°C', 60],
  ['60C', '°C', 60],
  ['-20 degC', '°C', -20],
  ['85°', '°C', 85],
  ['200 K/W', 'K/W', 200],
  ['200 °C/W', 'K/W', 200],
  ['2.5', '1', 2.5],
  ['30 %', '1', 0.3],
  ['5', '%', 0.05],
  ['5 %', '%', 0.05],
  ['±0,5 %', '%', 0.005],
  ['J', '%', 0.05],
];

const TOLERANCES: [string, number, number][] = [
  ['4.7k ±1 %', 4700, 0.01],
  ['4k7 5%', 4700, 0.05],
  ['4.7 kΩ ±0,5 %', 4700, 0.005],
  ['470 +/-10%', 470, 0.1],
  ['4k7J', 4700, 0.05],
  ['4k7 J', 4700, 0.05],
  ['R47F', 0.47, 0.01],
  ['470RG', 470, 0.02],
  ['470R G', 470, 0.02],
  ['10KK', 1e4, 0.1],
  ['10KM', 1e4, 0.2],
  ['10MK', 1e7, 0.1],
  ['10MM', 1e7, 0.2],
  ['2M2D', 2.2e6, 0.005],
  ['1k0B', 1000, 0.001],
  ['1k0C', 1000, 0.0025],
];

const PROBLEMS: [string, UnitName, RegExp][] = [
  ['', 'Ohm', /^Enter a resistance, for example 4\.7 kΩ\.$/],
  ['   ', 'V', /^Enter a voltage, for example 12 V\.$/],
  ['abc', 'Ohm', /not a number.*4\.7 kΩ/],
  ['NaN', 'V', /not a number/],
  ['Infinity', 'V', /not a number/],
  ['0x10', 'V', /“x” means nothing/],
  ['12V', 'Ohm', /“V” belongs to a voltage.*4\.7 kΩ/],
  ['5 mA', 'V', /“mA” belongs to a current/],
  ['4k7', '°C', /“k” means nothing/],
  ['60 m°C', '°C', /“m°C” means nothing/],
  ['4.7 kx', 'Ohm', /“kx” means nothing/],
  ['1.2.3', 'V', /not a number/],
  ['1,23,4', 'V', /not a number/],
  ['12,34.5', 'V', /not a number/],
  ['1,2345,678', 'V', /not a number/],
  ['4k7k', 'Ohm', /“k” means nothing/],
  ['--5', 'V', /not a number/],
  ['.', 'V', /not a number/],
  ['5e', 'V', /“e” means nothing/],
  ['1e999', 'V', /beyond all bounds/],
  ['1e-999', 'V', /beyond all bounds/],
  ['1e99999999999999999999999', 'V', /beyond all bounds/],
  ['100J', 'Ohm', /“J” means nothing/],
  ['4.7kJ', 'Ohm', /“kJ” means nothing/],
  ['4k7JJ', 'Ohm', /“JJ” means nothing/],
  ['4k7 ±1', 'Ohm', /“±1” is left over/],
  ['4k7 ±100 %', 'Ohm', /left over/],
  ['4k7J 5%', 'Ohm', /left over/],
  ['24 V ±10 %', 'V', /tolerance cannot follow a voltage/],
  ['12 V 5', 'V', /“5” is left over/],
  ['five', '%', /not a percentage/],
  ["1'000", 'Ohm', /means nothing/],
  ['<b>1</b>', 'Ohm', /not a number/],
];

describe('quantity entry', () => {
  it.each(VALUES)('reads %j in a field of %s as %d', (text, unit, value) => {
    expect(parseQuantity(text, { unit })).toEqual({ ok: true, value });
  });

  it.each(TOLERANCES)('reads %j as %d Ω with tolerance %d', (text, value, tolerance) => {
    expect(parseQuantity(text, { unit: 'Ohm' })).toEqual({ ok: true, value, tolerance });
  });

  it.each(PROBLEMS)('says what is wrong with %j in a field of %s', (text, unit, message) => {
    const result = parseQuantity(text, { unit });
    expect(result.ok ? 'accepted' : result.problem).toMatch(message);
  });

  it('covers at least 80 inputs', () => {
    expect(VALUES.length + TOLERANCES.length + PROBLEMS.length).toBeGreaterThanOrEqual(80);
  });
});

describe('the milliohm guard', () => {
  it.each(['4m7', '4.7m', '4.7 mohm'])('asks before it takes %j as milliohm', (text) => {
    expect(parseQuantity(text, { unit: 'Ohm' })).toMatchObject({
      ok: true,
      value: 0.0047,
      confirm: 'That is 4.7\u00a0mΩ, milliohm. Did you mean 4.7\u00a0MΩ?',
    });
  });

  it('asks nothing where mΩ is written out or the field is a current', () => {
    expect(parseQuantity('4.7 mΩ', { unit: 'Ohm' })).toEqual({ ok: true, value: 0.0047 });
    expect(parseQuantity('4m7', { unit: 'A' })).toEqual({ ok: true, value: 0.0047 });
  });
});

describe('one separator before three digits', () => {
  it('asks where both readings are in range', () => {
    expect(parseQuantity('1,234', { unit: 'Ohm', min: 1, max: 1e7 })).toEqual({
      ok: true,
      value: 1.234,
      reading: 'Read as 1.234\u00a0Ω.',
      confirm: 'Read as 1.234\u00a0Ω. Did you mean 1.234\u00a0kΩ?',
    });
  });

  it('takes the reading of the person’s decimal mark first', () => {
    const field = { unit: 'Ohm', min: 1, max: 1e7 } as const;
    const value = (text: string, decimalMark: '.' | ',') =>
      parseQuantity(text, { ...field, decimalMark });
    expect(value('1,234', '.')).toMatchObject({ value: 1234 });
    expect(value('1,234', ',')).toMatchObject({ value: 1.234 });
    expect(value('1.234', '.')).toMatchObject({ value: 1.234 });
    expect(value('1.234', ',')).toMatchObject({ value: 1234 });
  });

  it('shows the reading and asks nothing where only one is in range', () => {
    expect(parseQuantity('21.370 V', { unit: 'V', min: 0, max: 2000 })).toEqual({
      ok: true,
      value: 21.37,
      reading: 'Read as 21.37\u00a0V.',
    });
    expect(parseQuantity('1,234', { unit: 'Ohm', min: 100, max: 1e7 })).toMatchObject({
      value: 1234,
      reading: 'Read as 1.234\u00a0kΩ.',
    });
  });
});

describe('the range of a field', () => {
  it('names it in the problem', () => {
    expect(parseQuantity('12G', { unit: 'Ohm', min: 1, max: 1e7 })).toEqual({
      ok: false,
      problem:
        '12\u00a0GΩ is not within 1\u00a0Ω to 10\u00a0MΩ. Enter a resistance, for example 4.7 kΩ.',
    });
    expect(parseQuantity('120', { unit: '%', min: 0, max: 0.5 })).toMatchObject({
      problem:
        '120\u00a0% is not within 0\u00a0% to 50\u00a0%. Enter a percentage, for example 5 %.',
    });
  });

  it('stands in words', () => {
    expect(rangeText({ unit: 'V', min: 0 })).toBe('at least 0\u00a0V');
    expect(rangeText({ unit: 'V', max: 2000 })).toBe('at most 2\u00a0kV');
    expect(rangeText({ unit: 'V' })).toBe('');
  });
});

describe('round trips', () => {
  const units = Object.keys(QUANTITY_UNITS).filter((unit) => unit !== '%') as UnitName[];
  const value = fc
    .tuple(fc.integer({ min: 1, max: 999_999 }), fc.integer({ min: -18, max: 9 }), fc.boolean())
    .map(([digits, power, negative]) => Number(`${negative ? '-' : ''}${digits}e${power}`));
  const style = fc.record({
    pad: fc.boolean(),
    decimalMark: fc.constantFrom('.' as const, ',' as const),
    ascii: fc.boolean(),
    digits: fc.integer({ min: 2, max: 9 }),
  });

  it('reads back what it shows, to the same text', () => {
    fc.assert(
      fc.property(value, fc.constantFrom(...units), style, (number, unit, options) => {
        const text = formatQuantity(number, unit, options);
        const read = parseQuantity(text, { unit, decimalMark: options.decimalMark });
        expect(read.ok, text).toBe(true);
        if (!read.ok) return;
        expect(formatQuantity(read.value, unit, options)).toBe(text);
      }),
      { numRuns: 2000, seed: 20 },
    );
  });

  it('keeps the value itself at twelve digits', () => {
    fc.assert(
      fc.property(value, fc.constantFrom(...units), (number, unit) => {
        const text = formatQuantity(number, unit, { digits: 12 });
        expect(parseQuantity(text, { unit, decimalMark: '.' })).toMatchObject({ value: number });
      }),
      { numRuns: 1000, seed: 21 },
    );
  });

  it('reads back percentages', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 9999 }), (number) => {
        const text = formatPercent(number / 1e4, { digits: 6 });
        expect(parseQuantity(text, { unit: '%' })).toEqual({ ok: true, value: number / 1e4 });
      }),
    );
  });
});

describe('hostile text', () => {
  it.each([
    '9'.repeat(65_536),
    '1,'.repeat(32_768),
    '1 000'.repeat(13_107),
    ' '.repeat(65_536),
    '('.repeat(65_536),
    `4k${'7'.repeat(65_534)}`,
    '1e'.repeat(32_768),
    '.'.repeat(65_536),
  ])('refuses 64 KiB within 50 ms (%#)', (text) => {
    const start = performance.now();
    const result = parseQuantity(text, { unit: 'Ohm' });
    expect(performance.now() - start).toBeLessThan(50);
    expect(result).toMatchObject({ ok: false });
    if (!result.ok) expect(result.problem.length).toBeLessThan(200);
  });

  it('never throws and never gives a number that is not finite', () => {
    const letters = fc.constantFrom(...Array.from('0123456789.,-+±%eEkKmMµuRΩVAFJGHzs°C/ \u00a0'));
    fc.assert(
      fc.property(
        fc.string({ unit: letters, maxLength: 20 }),
        fc.constantFrom(...(Object.keys(QUANTITY_UNITS) as UnitName[])),
        (text, unit) => {
          const result = parseQuantity(text, { unit });
          if (result.ok) expect(Number.isFinite(result.value)).toBe(true);
          else expect(result.problem).toContain(QUANTITY_UNITS[unit].example);
        },
      ),
      { numRuns: 3000, seed: 22 },
    );
  });
});
