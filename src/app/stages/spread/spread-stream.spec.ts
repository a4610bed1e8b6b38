import { Observable, Subject } from 'rxjs';
import { draftRevision } from '../testing/stage-samples.ts';
import { samplings, type Sampling, type SpreadTask } from './spread-stream.ts';

const task = (seed: number): SpreadTask => ({
  input: draftRevision().definition,
  request: { samples: 1000, seed },
});
const SENSITIVITY = {
  nominal: { overdriveFactor: 1, vceSatV: 1, icA: 1, powerW: 1, tjDegC: 1 },
  rows: [],
};

describe('samplings', () => {
  let tasks: Subject<SpreadTask | null>;
  let seen: (Sampling | null)[];
  let running: number[];
  let ended: number[];

  beforeEach(() => {
    vi.useFakeTimers();
    tasks = new Subject();
    seen = [];
    running = [];
    ended = [];
    const sampler = {
      sample: ({ request }: SpreadTask) =>
        new Observable<{ samples: number; sensitivity: typeof SENSITIVITY; spread: null }>(
          (subscriber) => {
            running.push(request.seed);
            subscriber.next({ samples: 500, sensitivity: SENSITIVITY, spread: null });
            return () => ended.push(request.seed);
          },
        ),
    };
    samplings(tasks, sampler).subscribe((sampling) => seen.push(sampling));
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('wait until the sheet stands still, then report how far they are', () => {
    tasks.next(task(1));
    vi.advanceTimersByTime(100);
    tasks.next(task(2));
    expect(running).toEqual([]);
    vi.advanceTimersByTime(1000);
    expect(running).toEqual([2]);
    expect(seen.at(-1)?.task.request.seed).toBe(2);
    expect(seen.at(-1)?.report?.samples).toBe(500);
  });

  it('end the run of an older state', () => {
    tasks.next(task(1));
    vi.advanceTimersByTime(1000);
    tasks.next(task(2));
    expect(ended).toEqual([1]);
  });

  it('stop without anything new', () => {
    tasks.next(task(1));
    vi.advanceTimersByTime(1000);
    tasks.next(null);
    vi.advanceTimersByTime(1000);
    expect(ended).toEqual([1]);
    expect(running).toEqual([1]);
    expect(seen.at(-1)).toBeNull();
  });
});
