import { describe, expect, it } from 'vitest';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { stageIssues } from '../../../shared/stage/stage-issues.ts';
import { RELAY_FILE } from '../relay-stage.ts';

function issuesOf(document: unknown) {
  const parsed = StageInput.safeParse(document);
  return parsed.success ? [] : stageIssues(parsed.error);
}

describe('stageIssues', () => {
  it('has nothing to say about a good stage', () => {
    expect(issuesOf(RELAY_FILE)).toEqual([]);
  });

  it('names an unknown key with its full path', () => {
    const drive = { ...RELAY_FILE.drive, high: { ...RELAY_FILE.drive.high, dropVolt: 0.6 } };
    expect(issuesOf({ ...RELAY_FILE, drive })).toEqual([
      { path: '$.drive.high.dropVolt', expected: 'no such key in a stage file' },
    ]);
  });

  it('names a wrong number by its path, rows by their index, with what was expected', () => {
    const gain = [...RELAY_FILE.transistor.gain];
    gain[1] = { icA: -1, vceV: 1, min: 70 };
    expect(issuesOf({ ...RELAY_FILE, transistor: { ...RELAY_FILE.transistor, gain } })).toEqual([
      { path: '$.transistor.gain[1].icA', expected: 'expected a current above 0 and up to 1000 A' },
    ]);
  });

  it.each([null, 7, 'text', []])('refuses %j as a whole', (document) => {
    expect(issuesOf(document)[0]?.path).toBe('$');
  });

  it('takes null for any key that may be left out, and reads the same from both', () => {
    const { drive, load, transistor } = RELAY_FILE;
    const withNulls = {
      ...RELAY_FILE,
      quantity: null,
      frequencyHz: null,
      duty: null,
      drive: {
        ...drive,
        railTracksSupply: null,
        leakageA: null,
        groundShiftV: null,
        high: { ...drive.high, unloadedDropV: null },
        reset: { kind: 'high-z', leakageA: null },
      },
      load: { ...load, temperatureRiseK: null },
      transistor: {
        ...transistor,
        darlington: null,
        leakage: null,
        gain: transistor.gain.map((row) => ({ ...row, tempDegC: null })),
        baseEmitter: transistor.baseEmitter.map((row) => ({ ...row, kind: null })),
      },
      policy: { name: 'High reliability', overdriveFactor: null },
    };
    const left = (from: object, key: string) =>
      Object.fromEntries(Object.entries(from).filter(([each]) => each !== key));
    const without = {
      ...RELAY_FILE,
      drive: { ...drive, reset: { kind: 'high-z' } },
      load: left(load, 'temperatureRiseK'),
      transistor: left(transistor, 'leakage'),
      policy: { name: 'High reliability' },
    };
    expect(issuesOf(withNulls)).toEqual([]);
    const read = StageInput.parse(withNulls);
    expect(read).toEqual(StageInput.parse(without));
    expect(read).toMatchObject({ quantity: 1, duty: 1, policy: { overdriveFactor: 3 } });
    expect(read.drive.reset?.leakageA).toBe(1e-6);
  });
});
