import { loadBundled } from '../../server/cli/bundle-engine.mjs';

const asJson = process.argv.includes('--json');
const { benchmarks } = await loadBundled('spec/performance/benchmarks.ts', [
  'shared',
  'spec/performance',
  'spec/shared',
]);

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

const results = benchmarks.map(({ name, budgetMs, task }) => ({
  name,
  budgetMs,
  ...measure(task),
}));

if (asJson) process.stdout.write(`${JSON.stringify({ node: process.version, results })}\n`);
else {
  for (const { name, budgetMs, medianMs, quartilesMs, rangeMs } of results) {
    const spread = quartilesMs.map((ms) => ms.toFixed(3)).join('…');
    const range = rangeMs.map((ms) => ms.toFixed(3)).join('…');
    process.stdout.write(
      `${name.padEnd(42)} ${medianMs.toFixed(3).padStart(9)} ms  (middle half ${spread}, all ${range}; at most ${budgetMs} ms)\n`,
    );
  }
}
