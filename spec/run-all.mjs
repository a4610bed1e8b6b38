import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureBuilt } from '../server/cli/ensure-built.mjs';
import { giveUp, requireInstalled } from '../server/cli/preconditions.mjs';
import { findChromium } from './chromium.mjs';

/**
 * `npm test`: every suite, one after the other, each with a JSON report; the sum on the last line. A failing test, a
 * suite without a report and a suite without a test all end with exit code 1.
 */
const root = join(dirname(fileURLToPath(import.meta.url)), '..');
requireInstalled(root);
const chromium = findChromium();
if (chromium === null) {
  giveUp('Chromium is missing: install the package chromium or set CHROMIUM_PATH.');
}
const reports = mkdtempSync(join(tmpdir(), 'sinkwell-reports-'));

/** vitest and ng test report alike: counts of tests, and files that failed to load. */
function countsOfVitest(report) {
  const broken = report.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.length === 0,
  ).length;
  return { passed: report.numPassedTests, failed: report.numFailedTests + broken };
}

function countsOfPlaywright({ stats, errors }) {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length };
}

const SUITES = [
  {
    name: 'engine and server',
    args: (report) => [
      'node_modules/vitest/vitest.mjs',
      'run',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ],
    counts: countsOfVitest,
  },
  {
    name: 'client',
    // The builder writes the output file for the first reporter only.
    args: (report) => [
      'node_modules/@angular/cli/bin/ng.js',
      'test',
      '--watch=false',
      '--reporters=json',
      '--reporters=default',
      `--output-file=${report}`,
    ],
    counts: countsOfVitest,
  },
  {
    name: 'browser',
    before: () => ensureBuilt(root),
    args: () => ['node_modules/@playwright/test/cli.js', 'test', '--reporter=list,json'],
    counts: countsOfPlaywright,
  },
];

function run(args, report) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, {
      cwd: root,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: {
        ...process.env,
        CHROMIUM_PATH: chromium,
        NG_CLI_ANALYTICS: 'false',
        PLAYWRIGHT_JSON_OUTPUT_NAME: report,
      },
    });
    child.on('close', (code) => resolve(code ?? 1));
  });
}

let passed = 0;
let failed = 0;
for (const [index, suite] of SUITES.entries()) {
  process.stdout.write(`\n== ${suite.name} ==\n`);
  await suite.before?.();
  const report = join(reports, `${index}.json`);
  const code = await run(suite.args(report), report);
  let counts;
  try {
    counts = suite.counts(JSON.parse(readFileSync(report, 'utf8')));
  } catch (error) {
    process.stderr.write(`The suite "${suite.name}" left no report: ${error.message}\n`);
    counts = { passed: 0, failed: 1 };
  }
  if (counts.passed + counts.failed === 0) {
    process.stderr.write(`The suite "${suite.name}" ran no test.\n`);
    counts.failed = 1;
  }
  if (code !== 0 && counts.failed === 0) {
    process.stderr.write(`The suite "${suite.name}" ended with exit code ${code}.\n`);
    counts.failed = 1;
  }
  passed += counts.passed;
  failed += counts.failed;
}
rmSync(reports, { recursive: true, force: true });
process.stdout.write(`\n${passed} passed, ${failed} failed\n`);
process.exitCode = failed === 0 ? 0 : 1;
