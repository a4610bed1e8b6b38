import { execFileSync } from 'node:child_process';
import path from 'node:path';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { fileHashes } from './file-hashes.ts';

describe('the same document', () => {
  afterEach(() => {
    vi.useRealTimers();
  });

  it('gives the same bytes on another day, in another process and time zone', async () => {
    const today = await fileHashes();

    vi.useFakeTimers({ now: Date.UTC(2031, 6, 4, 3, 2, 1), toFake: ['Date'] });
    expect(await fileHashes()).toEqual(today);

    const script = path.join(import.meta.dirname, 'file-hashes.ts');
    const output = execFileSync(process.execPath, ['--import', 'tsx', script], {
      env: { ...process.env, TZ: 'Asia/Tokyo' },
      encoding: 'utf8',
    });
    expect(JSON.parse(output)).toEqual(today);
  }, 60_000);
});
