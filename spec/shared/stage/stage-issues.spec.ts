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
});
