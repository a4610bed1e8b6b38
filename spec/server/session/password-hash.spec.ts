import { monitorEventLoopDelay } from 'node:perf_hooks';
import { describe, expect, it } from 'vitest';
import { ApiError } from '../../../server/http/api-error.ts';
import { PasswordHash } from '../../../server/session/password-hash.ts';
import { SHIPPED_SCRYPT } from '../../../server/session/scrypt-cost.ts';

const CHEAP = { logN: 4, blockSize: 8, parallel: 1 };

describe('password hashes', () => {
  const hashes = new PasswordHash(CHEAP);

  it('S-05: store cost and a salt of 16 bytes, different each time', async () => {
    const [first, second] = [await hashes.hash('a'), await hashes.hash('a')];
    expect(first).not.toBe(second);
    const [scheme, logN, r, p, salt, key] = first.split('$');
    expect([scheme, logN, r, p]).toEqual(['scrypt', '4', '8', '1']);
    expect(Buffer.from(salt!, 'base64url')).toHaveLength(16);
    expect(Buffer.from(key!, 'base64url')).toHaveLength(32);
  });

  it('S-05: ship with N = 2^17, r = 8, p = 1', () => {
    expect(SHIPPED_SCRYPT).toEqual({ logN: 17, blockSize: 8, parallel: 1 });
  });

  it.each([
    'x'.repeat(15),
    '😀'.repeat(64),
    'ab cd '.repeat(21) + 'ef',
    'ünïcødé — пароль — 密码 ',
  ])('S-01: tell %j from one whose last character differs', async (password) => {
    const stored = await hashes.hash(password);
    expect(await hashes.verify(password, stored)).toBe(true);
    expect(await hashes.verify(`${password.slice(0, -1)}#`, stored)).toBe(false);
  });

  it('S-01: take two ways of writing the same letter for one', async () => {
    expect(await hashes.verify('e\u0301tude', await hashes.hash('\u00e9tude'))).toBe(true);
  });

  it('S-07: spend the same time on nobody', async () => {
    const slow = new PasswordHash({ ...CHEAP, logN: 10 });
    const stored = await slow.hash('right');
    const time = async (of: string | null): Promise<number> => {
      const startedAtMs = performance.now();
      expect(await slow.verify('wrong', of)).toBe(false);
      return performance.now() - startedAtMs;
    };
    const known: number[] = [];
    const unknown: number[] = [];
    for (let i = 0; i < 100; i++) {
      known.push(await time(stored));
      unknown.push(await time(null));
    }
    const typical = (times: number[]): number => times.sort((a, b) => a - b)[times.length / 4]!;
    expect(Math.abs(typical(known) - typical(unknown))).toBeLessThan(15);
  });

  it('S-05: run two at once, keep fifty waiting, then answer busy; memory and event loop stay calm', async () => {
    const shipped = new PasswordHash({ ...SHIPPED_SCRYPT, logN: 12 });
    await shipped.verify('warm', null);
    const rssBefore = process.memoryUsage.rss();
    const delay = monitorEventLoopDelay({ resolution: 5 });
    delay.enable();
    const results = await Promise.allSettled(
      Array.from({ length: 100 }, () => shipped.verify('x', null)),
    );
    delay.disable();
    const refused = results.filter((r) => r.status === 'rejected');
    expect(results.length - refused.length).toBe(52);
    for (const { reason } of refused) {
      expect(reason).toBeInstanceOf(ApiError);
      expect(reason).toMatchObject({ code: 'busy', details: { retryAfterSec: 5 } });
    }
    expect(process.memoryUsage.rss() - rssBefore).toBeLessThan(400 * 2 ** 20);
    expect(delay.percentile(99) / 1e6).toBeLessThan(100);
  });
});
