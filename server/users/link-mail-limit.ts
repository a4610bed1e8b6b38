import { RateLimiterMemory, type RateLimiterRes } from 'rate-limiter-flexible';
import { addressKey } from '../http/api-rate-limit.ts';
import { ApiError } from '../http/api-error.ts';

const HOUR_SEC = 3600;

/** How many mails with links one address may cause. */
export class LinkMailLimit {
  readonly #limiter: RateLimiterMemory;

  constructor(perHour: number) {
    this.#limiter = new RateLimiterMemory({ points: perHour, duration: HOUR_SEC });
  }

  /** @throws {ApiError} too-many-requests */
  async count(ip: string): Promise<void> {
    try {
      await this.#limiter.consume(addressKey(ip));
    } catch (refused) {
      throw new ApiError('too-many-requests', 'Too many mails asked for. Try again later.', {
        retryAfterSec: (refused as RateLimiterRes).msBeforeNext / 1000,
      });
    }
  }
}
