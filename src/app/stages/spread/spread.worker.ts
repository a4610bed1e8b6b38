/// <reference lib="webworker" />
import '../../../zod-without-eval.ts';
import { SampleRun, spreadOf } from '../../../../shared/statistics/monte-carlo.ts';
import { sensitivityOf } from '../../../../shared/statistics/sensitivity.ts';
import type { SpreadOrder, SpreadReport, SpreadStart } from './spread-worker-message.ts';

/** So long the worker judges without looking for another order, ms. */
const SLICE_MS = 30;

let runningId = 0;

addEventListener('message', ({ data }: MessageEvent<SpreadOrder>) => {
  if (data.input !== null) void judge(data);
  else if (data.id === runningId) runningId = 0;
});

async function judge({ id, input, request }: SpreadStart): Promise<void> {
  runningId = id;
  const sensitivity = sensitivityOf(input);
  const run = new SampleRun(input, request);
  const report = (spread: SpreadReport['spread']) => {
    postMessage({ id, samples: run.samples, sensitivity, spread } satisfies SpreadReport);
  };
  for (let more = true; more;) {
    const untilMs = performance.now() + SLICE_MS;
    while (more && performance.now() < untilMs) more = run.step();
    if (more) report(null);
    // Lets a waiting message in: a newer request, or the end of this one.
    await new Promise((resume) => setTimeout(resume));
    if (runningId !== id) return;
  }
  report(spreadOf(request, [run.share()]));
}
