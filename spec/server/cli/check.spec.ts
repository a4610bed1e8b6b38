import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ENGINE_VERSION } from '../../../shared/checks/evaluation.ts';
import { RELAY_FILE } from '../../shared/relay-stage.ts';

const ROOT = new URL('../../../', import.meta.url).pathname;

/** Runs the command as a shell does, from a folder that is not the project's. */
function run(args: string[], input?: string) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [join(ROOT, 'server/cli/check.mjs'), ...args],
    { cwd: tmpdir(), encoding: 'utf8', input },
  );
  return { status, lines: stdout.split('\n').slice(0, -1), stderr };
}

describe('check', { timeout: 120_000 }, () => {
  let folder = '';
  const file = (name: string, content: unknown) => {
    const path = join(folder, name);
    writeFileSync(path, typeof content === 'string' ? content : JSON.stringify(content));
    return path;
  };
  const sized = {
    ...RELAY_FILE,
    baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: null },
  };

  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'sinkwell-check-'));
  });
  afterAll(() => {
    rmSync(folder, { recursive: true });
  });

  it('prints one result per file and line, exits 0 when all are pass or marginal', () => {
    const { status, lines, stderr } = run([file('a.json', sized), file('b.json', sized)]);
    expect(stderr).toBe('');
    expect(status).toBe(0);
    expect(lines).toHaveLength(2);
    expect(JSON.parse(lines[0] ?? '')).toMatchObject({
      format: 'sinkwell-result/1',
      reference: 'Q12',
      verdict: 'marginal',
      engine: ENGINE_VERSION,
      corners: 1024,
      sizing: { rbMinOhm: 240, rbMaxOhm: 680, recommendedOhm: 620 },
    });
  });

  it('exits 1 when one fails, and reads standard input for -', () => {
    const { status, lines } = run([file('a.json', sized), '-'], JSON.stringify(RELAY_FILE));
    expect(status).toBe(1);
    expect(lines.map((line) => (JSON.parse(line) as { verdict: string }).verdict)).toEqual([
      'marginal',
      'fail',
    ]);
  });

  it('exits 2 naming file, path and what was expected; the other files are still judged', () => {
    const bad = file('bad.json', {
      ...RELAY_FILE,
      supplyV: { min: '21.6 V', max: 26.4 },
      extra: { nested: 1 },
    });
    const { status, lines, stderr } = run([bad, file('a.json', sized)]);
    expect(status).toBe(2);
    expect(lines).toHaveLength(1);
    expect(stderr).toContain(`${bad}: $.supplyV.min: expected a voltage above 0 and up to 2000 V`);
    expect(stderr).toContain(`${bad}: $.extra: no such key in a stage file`);
  });

  it.each([
    ['no JSON', '{"format": '],
    ['a number JSON does not know', '{"supplyV": NaN}'],
  ])('exits 2 for %s', (_, content) => {
    const { status, lines, stderr } = run([file('broken.json', content)]);
    expect(status).toBe(2);
    expect(lines).toEqual([]);
    expect(stderr).toMatch(/broken\.json: \$: expected a JSON document/);
  });

  it('exits 2 for a missing file, a folder, no file at all and unknown options', () => {
    expect(run([join(folder, 'none.json')]).stderr).toContain('expected a readable file (ENOENT)');
    expect(run([folder]).status).toBe(2);
    expect(run([]).status).toBe(2);
    expect(run(['--bogus']).status).toBe(2);
  });

  it('adds the statistics of stated samples and seed, the same bytes at every run', () => {
    const args = [file('a.json', sized), '--samples', '120000', '--seed', '7'];
    const first = run(args);
    expect(first.status).toBe(0);
    expect(run(args).lines).toEqual(first.lines);
    const { statistics, ...plain } = JSON.parse(first.lines[0] ?? '') as {
      statistics: { yield: number; percentiles: Record<string, number[]> };
    };
    expect(Object.keys(statistics)).toEqual(['samples', 'seed', 'yield', 'percentiles']);
    expect(statistics).toMatchObject({ samples: 120_000, seed: 7 });
    expect(statistics.yield).toBeGreaterThan(0.9);
    expect(Object.keys(statistics.percentiles)).toEqual([
      'overdriveFactor',
      'vceSatV',
      'icA',
      'powerW',
      'tjDegC',
    ]);
    expect(statistics.percentiles['overdriveFactor']).toHaveLength(3);
    expect(run([file('a.json', sized)]).lines).toEqual([JSON.stringify(plain)]);
    expect(run(['--samples=120000', '--seed=7', file('a.json', sized)]).lines).toEqual(first.lines);
  });

  it.each([
    [['--samples'], '--samples: expected a whole number from 1 to 10000000.'],
    [['--samples', '0'], '--samples: expected a whole number'],
    [['--samples', '1e5'], '--samples: expected a whole number'],
    [['--samples', '10000001'], '--samples: expected a whole number'],
    [['--samples', '10', '--seed', '-1'], '--seed: expected a whole number from 0'],
    [['--samples', '10', '--seed', '9007199254740992'], '--seed: expected a whole number'],
    [['--samples', '10', '--samples', '20'], '--samples: given twice.'],
    [['--seed', '7'], '--seed: expected --samples beside it.'],
  ])('exits 2 for %j and says why', (options, reason) => {
    const { status, lines, stderr } = run([file('a.json', sized), ...options]);
    expect(status).toBe(2);
    expect(lines).toEqual([]);
    expect(stderr).toContain(reason);
  });
});
