import { describe, expect, it } from 'vitest';
import {
  figureDifference,
  missingForPass,
  type CheckUnderWay,
  type JudgedStage,
} from '../../../shared/review/pass-conditions.ts';

const STAGE: JudgedStage = {
  verdict: 'marginal',
  criteria: [
    { id: 'overdrive-factor', value: 5.73, status: 'pass' },
    { id: 'load-voltage', value: 21.37, status: 'marginal' },
    { id: 'saturation-voltage', value: 0.245, status: 'stated' },
  ],
};
const DONE: CheckUnderWay = {
  overdriveFactor: 5.55,
  method: 'hand',
  note: 'Gain read from the table.',
  reason: '',
  justifications: { 'load-voltage': 'Panel heater holds the supply above 22 V.' },
  read: ['overdrive-factor', 'load-voltage', 'saturation-voltage'],
};
const missing = (check: Partial<CheckUnderWay>, stage: Partial<JudgedStage> = {}) =>
  missingForPass({ ...DONE, ...check }, { ...STAGE, ...stage }, [], 0.05);

describe('conditions of a pass', () => {
  it('are met by a complete check', () => {
    expect(missing({})).toEqual([]);
  });

  it('name everything of a check not begun', () => {
    expect(missingForPass(null, STAGE, [{ number: 2, state: 'answered' }], 0.05)).toEqual([
      'Enter an overdrive factor of your own.',
      'Say how it was found: by hand or on the bench.',
      'Note how the figure was got.',
      'Justify load voltage, which is marginal.',
      'Read all 3 criteria; 0 are read so far.',
      'Close finding 2.',
    ]);
  });

  it('measure the difference against the tool', () => {
    expect(figureDifference(DONE, STAGE.criteria)).toBeCloseTo(-0.0314, 4);
  });

  it.each([
    { overdriveFactor: 5.73 * 1.049, asked: false },
    { overdriveFactor: 5.73 * 1.051, asked: true },
    { overdriveFactor: 5.73 * 0.949, asked: true },
  ])('ask a reason above 5 % either way: %o', ({ overdriveFactor, asked }) => {
    expect(missing({ overdriveFactor }).length).toBe(asked ? 1 : 0);
    expect(missing({ overdriveFactor, reason: 'Bench part is hotter.' })).toEqual([]);
  });

  it('cannot be met while a criterion fails, whatever is written', () => {
    const criteria = [{ id: 'forced-beta', value: 13.9, status: 'fail' }];
    expect(missing({ read: ['forced-beta'] }, { verdict: 'fail', criteria })).toEqual([
      'The criterion forced beta fails: return the revision.',
    ]);
  });

  it.each(['fail', 'open'])(
    'cannot be met by a verdict of %s that no criterion carries',
    (verdict) => {
      const criteria = [{ id: 'overdrive-factor', value: 5.73, status: 'pass' }];
      expect(missing({ read: ['overdrive-factor'] }, { verdict, criteria })).toEqual([
        `The verdict is ${verdict} for the whole stage: return the revision.`,
      ]);
    },
  );
});
