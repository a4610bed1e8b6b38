import type { RevisionAnswer } from '../revisions/revision-reply.ts';

/** Day of the story and time of day, UTC: `[3, '14:30']`. */
export type When = readonly [day: number, clock: string];

type Work = () => Promise<void>;

/** What happens when: planned stage by stage, carried out in the order of time as it would have happened. */
export class DemoSchedule {
  readonly #steps: { readonly when: When; readonly work: Work }[] = [];

  at(when: When, work: Work): void {
    this.#steps.push({ when, work });
  }

  /** The way of one revision through the review. */
  thread(): DemoThread {
    return new DemoThread(this);
  }

  async run(): Promise<void> {
    const sorted = [...this.#steps].sort(
      ({ when: a }, { when: b }) => a[0] - b[0] || a[1].localeCompare(b[1]),
    );
    for (const { work } of sorted) await work();
  }
}

/** Each step gets the answer of the one before it. */
export class DemoThread {
  #answer: RevisionAnswer | null = null;

  constructor(private readonly schedule: DemoSchedule) {}

  /** What the last step taken answered. */
  get answer(): RevisionAnswer {
    if (this.#answer === null) throw new Error('nothing has happened yet');
    return this.#answer;
  }

  begin(when: When, step: (when: When) => Promise<RevisionAnswer>): this {
    this.schedule.at(when, async () => {
      this.#answer = await step(when);
    });
    return this;
  }

  next(when: When, step: (before: RevisionAnswer, when: When) => Promise<RevisionAnswer>): this {
    return this.begin(when, (now) => step(this.answer, now));
  }
}
