import { describe, expect, it } from 'vitest';
import { cornerNamed, cornerNumber, cornerSpace } from '../../../shared/stage/corners.ts';

/** What a plain transistor with a coil or resistor does without. */
const PLAIN = ['vf', 'r1', 'ratio', 'veb'] as const;

describe('cornerSpace', () => {
  it('has 1024 corners with every variable and half as many without RBE', () => {
    expect(cornerSpace(PLAIN).count).toBe(1024);
    expect(cornerSpace(['rbe', ...PLAIN]).count).toBe(512);
  });

  it('numbers them with the supply slowest and the instant fastest', () => {
    const space = cornerSpace(PLAIN);
    expect(Object.values(cornerNamed(space, 0))).toEqual([
      'min',
      'min',
      'weak',
      '-',
      '-',
      '-',
      'min',
      'min',
      '0',
      'start',
    ]);
    expect(cornerNamed(space, 1)).toMatchObject({ supply: 'min', instant: 'settled' });
    expect(cornerNamed(space, 512)).toMatchObject({ supply: 'max', instant: 'start' });
  });

  it('finds every corner again by its name', () => {
    const space = cornerSpace(['rbe', ...PLAIN]);
    for (let index = 0; index < space.count; index++) {
      expect(cornerNumber(space, cornerNamed(space, index))).toBe(index);
    }
  });

  it('reads an unnamed variable as its first end', () => {
    const space = cornerSpace(PLAIN);
    expect(cornerNumber(space, {})).toBe(0);
    expect(cornerNamed(space, cornerNumber(space, { rb: '+' }))).toMatchObject({ rb: '+' });
  });
});
