import { concat, map, of, switchMap, timer, type Observable } from 'rxjs';
import type { SampleRequest } from '../../../../shared/statistics/monte-carlo.ts';
import type { StageInput } from '../../../../shared/stage/stage-input.ts';
import type { SpreadReport } from './spread-worker-message.ts';

/** A stage whose samples are wanted. */
export interface SpreadTask {
  readonly input: StageInput;
  readonly request: SampleRequest;
}

/** What judges samples; unsubscribing ends the run. */
export interface Sampler {
  sample(task: SpreadTask): Observable<Omit<SpreadReport, 'id'>>;
}

/** What is known of the samples of one state of the sheet; `report` is null until the worker has begun. */
export interface Sampling {
  readonly task: SpreadTask;
  readonly report: Omit<SpreadReport, 'id'> | null;
}

/** Samples wait until typing rests: they trail the verdicts. */
export const SAMPLING_REST_MS = 300;

/** The samples of every state of the sheet that stands still; a newer state, or null, ends the run of an older one. */
export function samplings(
  tasks: Observable<SpreadTask | null>,
  sampler: Sampler,
): Observable<Sampling | null> {
  return tasks.pipe(
    switchMap((task) => {
      if (task === null) return of(null);
      return concat(
        of({ task, report: null }),
        timer(SAMPLING_REST_MS).pipe(
          switchMap(() => sampler.sample(task)),
          map((report) => ({ task, report })),
        ),
      );
    }),
  );
}
