import { bundledFile, loadBundled } from '../../server/cli/bundle-engine.mjs';

const asJson = process.argv.includes('--json');
const FOLDERS = ['server/cli', 'shared', 'spec/performance', 'spec/shared'];
const { benchmarks, rates } = await loadBundled('spec/performance/benchmarks.ts', FOLDERS);
const threadFile = await bundledFile('server/cli/sample-thread.ts', FOLDERS);

const ROUNDS = 31;
const ROUND_MS = 20;

/** Median, quartiles and extremes of a task's duration in ms, over rounds of at least 20 ms each. */
function measure(task) {
  const warmUntil = performance.now() + 300;
  while (performance.now() < warmUntil) task();
  const rounds = Array.from({ length: ROUNDS }, () => {
    const start = performance.now();
    let times = 0;
    do {
      task();
      times++;
    } while (performance.now() - start < ROUND_MS);
    return (performance.now() - start) / times;
  }).sort((a, b) => a - b);
  const at = (share) => rounds[Math.round(share * (ROUNDS - 1))];
  return { medianMs: at(0.5), quartilesMs: [at(0.25), at(0.75)], rangeMs: [at(0), at(1)] };
}

const RATE_ROUNDS = 7;

/** Median, quartiles and extremes of a task's samples per second. */
async function measureRate({ samples, task }) {
  await task(threadFile);
  const rounds = [];
  for (let round = 0; round < RATE_ROUNDS; round++) {
    const start = performance.now();
    await task(threadFile);
    rounds.push((samples / (performance.now() - start)) * 1e3);
  }
  rounds.sort((a, b) => a - b);
  const at = (share) => rounds[Math.round(share * (RATE_ROUNDS - 1))];
  return {
    medianPerSec: at(0.5),
    quartilesPerSec: [at(0.25), at(0.75)],
    rangePerSec: [at(0), at(1)],
  };
}

const results = benchmarks.map(({ name, budgetMs, task }) => ({
  name,
  budgetMs,
  ...measure(task),
}));
const sampling = [];
for (const rate of rates) {
  const { name, floorPerSec } = rate;
  sampling.push({ name, floorPerSec, ...(await measureRate(rate)) });
}

if (asJson) {
  process.stdout.write(`${JSON.stringify({ node: process.version, results, rates: sampling })}\n`);
} else {
  for (const { name, budgetMs, medianMs, quartilesMs, rangeMs } of results) {
    const spread = quartilesMs.map((ms) => ms.toFixed(3)).join('…');
    const range = rangeMs.map((ms) => ms.toFixed(3)).join('…');
    process.stdout.write(
      `${name.padEnd(42)} ${medianMs.toFixed(3).padStart(9)} ms  (middle half ${spread}, all ${range}; at most ${budgetMs} ms)\n`,
    );
  }
  const million = (perSec) => (perSec / 1e6).toFixed(2);
  for (const { name, floorPerSec, medianPerSec, quartilesPerSec, rangePerSec } of sampling) {
    process.stdout.write(
      `${name.padEnd(42)} ${million(medianPerSec).padStart(9)} million samples/s  (middle half ${quartilesPerSec.map(million).join('…')}, all ${rangePerSec.map(million).join('…')}; at least ${million(floorPerSec)})\n`,
    );
  }
}
