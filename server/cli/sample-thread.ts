import { parentPort, workerData } from 'node:worker_threads';
import { SampleRun } from '../../shared/statistics/monte-carlo.ts';
import type { ThreadMessage, ThreadTask } from './sample-threads.ts';

/** How often a thread says how far it is, blocks. */
const REPORT_BLOCKS = 64;

/** Judges one share of the samples of a stage and hands it over. */
const { input, request, index, workers } = workerData as ThreadTask;
const run = new SampleRun(input, request, index, workers);
const say = (message: ThreadMessage, transfer: ArrayBuffer[] = []) => {
  parentPort?.postMessage(message, transfer);
};
for (let blocks = 1; run.step(); blocks++) {
  if (blocks % REPORT_BLOCKS === 0) say({ samples: run.samples, share: null });
}
const share = run.share();
say(
  { samples: run.samples, share },
  Object.values(share.figures).map(({ buffer }) => buffer as ArrayBuffer),
);
