import { ApiError } from '../http/api-error.ts';

const MOST_WAITING = 1000;
const LONGEST_WAIT_MS = 5000;

/** One at a time, first come first served; refuses instead of growing without bound. */
export class TurnQueue {
  #last: Promise<unknown> = Promise.resolve();
  #pending = 0;

  constructor(
    private readonly mostWaiting = MOST_WAITING,
    private readonly longestWaitMs = LONGEST_WAIT_MS,
  ) {}

  get pending(): number {
    return this.#pending;
  }

  /** @throws {ApiError} busy, before `work` has begun */
  run<T>(work: () => Promise<T>): Promise<T> {
    if (this.#pending >= this.mostWaiting) return Promise.reject(busy());
    this.#pending += 1;
    const askedAtMs = performance.now();
    const result = this.#last.then(() => {
      if (performance.now() - askedAtMs > this.longestWaitMs) throw busy();
      return work();
    });
    const done = (): void => {
      this.#pending -= 1;
    };
    this.#last = result.then(
      done,
      done, // a failed turn must not block the next
    );
    return result;
  }

  /** Resolves when everything asked for so far has run. */
  async drained(): Promise<void> {
    await this.#last;
  }
}

function busy(): ApiError {
  return new ApiError('busy', 'Too much is being saved at once. Try again in a moment.');
}
