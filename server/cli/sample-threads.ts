import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import {
  runMonteCarlo,
  type SampleRequest,
  type SampleShare,
  type SampleSpread,
  spreadOf,
} from '../../shared/statistics/monte-carlo.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';

/** What a thread is started with. */
export interface ThreadTask {
  readonly input: StageInput;
  readonly request: SampleRequest;
  readonly index: number;
  readonly workers: number;
}

/** What a thread says: how far it is, and at its end its share. */
export interface ThreadMessage {
  readonly samples: number;
  readonly share: SampleShare | null;
}

export interface ThreadOptions {
  /** Plain JavaScript of `sample-thread.ts`. */
  readonly threadFile: string;
  /** At most so many; as a rule one for each core. */
  readonly threads?: number;
  /** Is told the samples judged so far. */
  readonly onProgress?: (samples: number) => void;
  /** Ends the run early; it then fails with the signal's reason. */
  readonly signal?: AbortSignal;
}

/** A thread takes longer to start than so many samples take to judge. */
const WORTH_A_THREAD = 50_000;

/**
 * Runs the samples of a stage on several threads. The result is the same for any number of them.
 *
 * @throws what a thread failed with, or the reason of the signal
 */
export async function spreadOnThreads(
  input: StageInput,
  request: SampleRequest,
  { threadFile, threads = availableParallelism(), onProgress, signal }: ThreadOptions,
): Promise<SampleSpread> {
  const workers = Math.min(threads, Math.ceil(request.samples / WORTH_A_THREAD));
  if (workers <= 1) {
    const spread = runMonteCarlo(input, request, (samples) => {
      onProgress?.(samples);
      return signal?.aborted !== true;
    });
    signal?.throwIfAborted();
    if (spread !== null) return spread;
  }
  const done = new Float64Array(workers);
  const shares = Array.from({ length: workers }, (_, index) =>
    shareOfThread(threadFile, { input, request, index, workers }, signal, (samples) => {
      done[index] = samples;
      onProgress?.(done.reduce((sum, each) => sum + each, 0));
    }),
  );
  return spreadOf(request, await Promise.all(shares));
}

function shareOfThread(
  threadFile: string,
  task: ThreadTask,
  signal: AbortSignal | undefined,
  tell: (samples: number) => void,
): Promise<SampleShare> {
  return new Promise((resolve, reject) => {
    signal?.throwIfAborted();
    const worker = new Worker(threadFile, { workerData: task });
    const stop = () => {
      void worker.terminate();
      reject(signal?.reason as Error);
    };
    signal?.addEventListener('abort', stop, { once: true });
    worker.on('message', ({ samples, share }: ThreadMessage) => {
      tell(samples);
      if (share !== null) resolve(share);
    });
    worker.on('error', reject);
    worker.on('exit', (code) => {
      signal?.removeEventListener('abort', stop);
      reject(new Error(`A thread ended with code ${code} before its samples were judged.`));
    });
  });
}
