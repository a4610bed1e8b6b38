import { readFileSync } from 'node:fs';
import { spreadOnThreads } from '../../server/cli/sample-threads.ts';
import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import { deriveTransistor } from '../../shared/parts/derive-transistor.ts';
import { TransistorRecord } from '../../shared/parts/transistor-record.ts';
import { judgePart, rankParts } from '../../shared/sizing/rank-parts.ts';
import { sizeStage } from '../../shared/sizing/size-stage.ts';
import { runMonteCarlo } from '../../shared/statistics/monte-carlo.ts';
import { relayStage } from '../shared/relay-stage.ts';

const stage = relayStage();
const fine = relayStage({ policy: { name: 'General practice', series: 'E96' } });
/** The shipped library, as the project's root holds it; an array cannot stand in a stage and costs nothing. */
const library = (
  JSON.parse(readFileSync('server/seed/library/transistors.json', 'utf8')) as unknown[]
).flatMap((record) => {
  const derived = deriveTransistor(TransistorRecord.parse(record));
  return derived.ok ? [derived.data] : [];
});
const sampled = relayStage({ baseResistor: { valueOhm: 620, tolerance: 0.05, ratingW: 0.1 } });

/** What the bench measures, and what each may take on a quiet two-core machine. */
export const benchmarks = [
  {
    name: 'criteria and verdict of 1024 corners',
    budgetMs: 2,
    task: () => evaluateStage(stage),
  },
  { name: 'sizing, E24', budgetMs: 50, task: () => sizeStage(stage) },
  { name: 'sizing, E96', budgetMs: 150, task: () => sizeStage(fine) },
  {
    name: 'ranking the transistor library',
    budgetMs: 1500,
    task: () => rankParts(library.map((transistor) => judgePart(stage, transistor))),
  },
];

const ONE_THREAD = { samples: 1_000_000, seed: 7 };
const ALL_CORES = { samples: 4_000_000, seed: 7 };

/**
 * What is measured in samples per second, percentiles included, and what each is to reach on a quiet two-core machine:
 * 1.7 times the numpy script beside the tests on one thread, 1.7 times that on two cores.
 */
export const rates = [
  {
    name: 'Monte-Carlo, one thread',
    floorPerSec: 1.9e6,
    samples: ONE_THREAD.samples,
    task: () => Promise.resolve(runMonteCarlo(sampled, ONE_THREAD)),
  },
  {
    name: 'Monte-Carlo, all cores',
    floorPerSec: 3.2e6,
    samples: ALL_CORES.samples,
    task: (threadFile: string) => spreadOnThreads(sampled, ALL_CORES, { threadFile }),
  },
];
