import { describe, expect, it } from 'vitest';
import { commonPasswords } from '../../../server/users/common-passwords.ts';
import { passwordFault } from '../../../server/users/password-rules.ts';

const OWN = [
  'Dora Designer',
  'dora.designer@works.example',
  'Test Works',
  'CR-40',
  'CR-41',
  'VX-12',
];

describe('password rules', () => {
  it.each([
    'plain-otter-walks-north',
    'kettle fog marble spoon',
    'ändert sich täglich sieben',
    '😀😁😂🤣😃😄😅😆😉😊😋😎😍😘🥰',
    'x7#Kq!2mWp9$Lr4',
    'dora likes wild horses',
    '       leading spaces count',
    'qwerty but then twelve geese',
  ])('S-02: take %j', (password) => {
    expect(passwordFault(password, OWN)).toBeNull();
  });

  it.each([
    ['fourteen chars', 'at least 15'],
    ['😀'.repeat(14), 'at least 15'],
    ['wild geese '.repeat(12), 'more than 128'],
    ['passwordpassword', 'everybody tries'],
    ['PasswordPassword', 'everybody tries'],
    ['P@ssw0rdP@ssw0rd', 'everybody tries'],
    ['password password', 'everybody tries'],
    ['password-admin-2026', 'everybody tries'],
    ['welcomewelcome123', 'everybody tries'],
    ['iloveyouprincess1', 'everybody tries'],
    ['qwerty1234567890!', 'keyboard'],
    ['footballbaseball!!!', 'everybody tries'],
    ['correct horse battery staple', 'everybody tries'],
    ['monkeymonkeymonkey', 'everybody tries'],
    ['aaaaaaaaaaaaaaaa', 'repeats itself'],
    ['abcabcabcabcabcabc', 'repeats itself'],
    ['Xk4!Xk4!Xk4!Xk4!', 'repeats itself'],
    ['geese geese geese geese ', 'repeats itself'],
    ['qwertyuiopasdfghjkl', 'keyboard'],
    ['1qaz2wsx3edc4rfv', 'keyboard'],
    ['abcdefghijklmnop', 'keyboard'],
    ['poiuytrewqlkjhgfdsa', 'keyboard'],
    ['dora.designer@works.example', 'names that others know'],
    ['Dora Designer 1984', 'names that others know'],
    ['test works test works 1', 'names that others know'],
    ['sinkwell-transistor', 'names that others know'],
    ['CR-40-CR-41-VX-12', 'names that others know'],
  ])('S-02: refuse %j', (password, reason) => {
    expect(passwordFault(password, OWN)).toContain(reason);
  });

  it('S-02: know more than 10 000 common passwords of 15 characters and more', () => {
    const long = [...commonPasswords()].filter((entry) => entry.length >= 15);
    expect(long.length).toBeGreaterThan(10_000);
  });

  it('S-01: count code points after NFKC, 15 to 128', () => {
    expect(passwordFault('wildgeesefly14', [])).toContain('at least 15');
    expect(passwordFault('wildgeesefly15+', [])).toBeNull();
    expect(passwordFault('kettle fog marble spoon '.repeat(5) + 'end fog.', [])).toBeNull();
    expect(passwordFault('kettle fog marble spoon '.repeat(5) + 'end fog..', [])).toContain('128');
  });
});
