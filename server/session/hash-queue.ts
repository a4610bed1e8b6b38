import { ApiError } from '../http/api-error.ts';

const AT_ONCE = 2;
const MOST_WAITING = 50;

/** Each password hash takes 128 MiB: two at once, fifty in line, then come back later. */
export class HashQueue {
  #running = 0;
  readonly #waiting: (() => void)[] = [];

  /** @throws {ApiError} busy when the line is full */
  async run<T>(work: () => Promise<T>): Promise<T> {
    if (this.#running >= AT_ONCE) await this.#turn();
    else this.#running += 1;
    try {
      return await work();
    } finally {
      const next = this.#waiting.shift();
      if (next) next();
      else this.#running -= 1;
    }
  }

  #turn(): Promise<void> {
    if (this.#waiting.length >= MOST_WAITING) {
      throw new ApiError('busy', 'Too many people are signing in. Try again in a moment.', {
        retryAfterSec: 5,
      });
    }
    return new Promise((resolve) => this.#waiting.push(resolve));
  }
}
