import { RateLimiterMemory } from 'rate-limiter-flexible';
import { addressKey } from '../http/api-rate-limit.ts';
import { ApiError } from '../http/api-error.ts';
import type { Limits } from '../http/limits.ts';

/**
 * Slows down guessing: after some wrong passwords for one account from one address each further one doubles
 * the wait, and an address may only miss so often over all accounts. Others cannot lock an owner out, who
 * signs in from elsewhere, keeps a running session, or resets the password. Counts live in memory.
 */
export class SignInThrottle {
  readonly #misses: RateLimiterMemory;
  readonly #missesOfAddress: RateLimiterMemory;
  readonly #waits: RateLimiterMemory;

  constructor(private readonly limits: Limits) {
    const duration = limits.signInWindowSec;
    this.#misses = new RateLimiterMemory({ points: limits.signInFailures, duration });
    const points = limits.signInFailuresPerAddress;
    this.#missesOfAddress = new RateLimiterMemory({ points, duration });
    this.#waits = new RateLimiterMemory({ points: 1, duration });
  }

  /**
   * Counts a try as wrong before the password is looked at, so that many at once gain nothing;
   * {@link succeeded} takes it back.
   *
   * @throws {ApiError} too-many-requests while a wait runs
   */
  async begin(email: string, ip: string): Promise<void> {
    const address = addressKey(ip);
    const key = `${email} ${address}`;
    const running = await this.#waits.get(key);
    if (running) throw tooMany(running.msBeforeNext);
    const ofAddress = await this.#missesOfAddress.penalty(address);
    if (ofAddress.consumedPoints > this.limits.signInFailuresPerAddress) {
      throw tooMany(ofAddress.msBeforeNext);
    }
    const { consumedPoints } = await this.#misses.penalty(key);
    const windowSec = this.limits.signInWindowSec;
    await this.#misses.set(key, consumedPoints, 2 * windowSec); // outlives the longest wait
    const beyond = consumedPoints - this.limits.signInFailures;
    if (beyond < 0) return;
    await this.#waits.block(key, Math.min(this.limits.signInFirstWaitSec * 2 ** beyond, windowSec));
  }

  async succeeded(email: string, ip: string): Promise<void> {
    const address = addressKey(ip);
    const key = `${email} ${address}`;
    await this.#misses.delete(key);
    await this.#waits.delete(key);
    await this.#missesOfAddress.reward(address);
  }
}

function tooMany(waitMs: number): ApiError {
  return new ApiError('too-many-requests', 'Too many tries. Wait a little, then try again.', {
    retryAfterSec: waitMs / 1000,
  });
}
