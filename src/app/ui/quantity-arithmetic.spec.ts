import { parseArithmetic } from './quantity-arithmetic.ts';

const ohm = { unit: 'Ohm', min: 0.001, max: 1e12 } as const;
const valueOf = (text: string, field: Parameters<typeof parseArithmetic>[1] = ohm) => {
  const result = parseArithmetic(text, field);
  return result.ok ? result.value : result.problem;
};

describe('parseArithmetic', () => {
  it.each([
    ['24V/10mA', 2400],
    ['2*4k7', 9400],
    ['(3.3V-0.7V)/2.6mA', 1000],
    ['1k+220', 1220],
    ['sqrt(4)*100', 200],
    ['max(100 ohm, 1kΩ)', 1000],
    ['(12V)^2/0,25W', 576],
  ])('reads %s as %d Ω', (text, valueOhm) => {
    const value = valueOf(text);
    expect(typeof value === 'number' ? Number(value.toPrecision(9)) : value).toBe(valueOhm);
  });

  it('reads a power from voltage and current', () => {
    expect(valueOf('24V*10mA', { unit: 'W' })).toBeCloseTo(0.24, 12);
  });

  it.each(['24V*10mA', '5V', '12V^2/0.25W', '10mA+5V', '1/0', '2^1e9'])(
    'refuses %s as a resistance',
    (text) => {
      expect(typeof valueOf(text)).toBe('string');
    },
  );

  it.each([
    'import("x")',
    'a=5',
    'f(x)=x',
    '1:1e9',
    '[1,2]',
    '"text"',
    'createUnit("x")',
    'x.constructor',
    'parse("1")',
    '{a:1}',
    'true?1:2',
    `${'('.repeat(60)}1${')'.repeat(60)}`,
    Array.from({ length: 300 }, () => '1').join('+'),
  ])('refuses hostile %s without evaluating it', (text) => {
    expect(typeof valueOf(text)).toBe('string');
  });
});
