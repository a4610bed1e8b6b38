import { readFile } from 'node:fs/promises';
import { text } from 'node:stream/consumers';
import { judgeStage } from '../../shared/sizing/judge-stage.ts';
import { stageResult } from '../../shared/sizing/result.ts';
import { statisticsOf } from '../../shared/statistics/monte-carlo.ts';
import { StageInput } from '../../shared/stage/stage-input.ts';
import { stageIssues } from '../../shared/stage/stage-issues.ts';
import { CheckOptions, Misused } from './check-options.ts';
import { spreadOnThreads } from './sample-threads.ts';

/** Exit codes: every stage pass or marginal · one failing or open · one file that cannot be read. */
const MET = 0;
const NOT_MET = 1;
const UNREADABLE = 2;

/** A file that is no stage file; the message is what standard error says. */
class Unreadable extends Error {}

/**
 * Judges stage files: one `sinkwell-result/1` per file and line on standard output, errors on standard error.
 *
 * @param args file names and options; `-` is standard input
 * @param threadFile plain JavaScript of `sample-thread.ts`
 * @returns the exit code
 */
export async function check(args: readonly string[], threadFile: string): Promise<number> {
  try {
    const options = new CheckOptions(args);
    let code = MET;
    for (const file of options.files) {
      code = Math.max(code, await checkFile(file, options, threadFile));
    }
    return code;
  } catch (error) {
    if (error instanceof Misused) return refuse(error.message);
    throw error;
  }
}

function refuse(reason: string): number {
  process.stderr.write(`${reason}\n`);
  return UNREADABLE;
}

async function checkFile(
  file: string,
  { samples }: CheckOptions,
  threadFile: string,
): Promise<number> {
  try {
    const judged = judgeStage(await readStage(file));
    const result = stageResult(judged);
    const sampled =
      samples === null
        ? {}
        : {
            statistics: statisticsOf(await spreadOnThreads(judged.input, samples, { threadFile })),
          };
    process.stdout.write(`${JSON.stringify({ ...result, ...sampled })}\n`);
    const { verdict } = judged.evaluation;
    return verdict === 'pass' || verdict === 'marginal' ? MET : NOT_MET;
  } catch (error) {
    if (error instanceof Unreadable) return refuse(error.message);
    throw error;
  }
}

async function readStage(file: string): Promise<StageInput> {
  const parsed = StageInput.safeParse(parseJson(file, await readText(file)));
  if (parsed.success) return parsed.data;
  const lines = stageIssues(parsed.error).map(
    ({ path, expected }) => `${file}: ${path}: ${expected}`,
  );
  throw new Unreadable(lines.join('\n'));
}

async function readText(file: string): Promise<string> {
  try {
    return file === '-' ? await text(process.stdin) : await readFile(file, 'utf8');
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? String(error.code) : String(error);
    throw new Unreadable(`${file}: $: expected a readable file (${code})`);
  }
}

function parseJson(file: string, content: string): unknown {
  try {
    return JSON.parse(content.replace(/^\uFEFF/, ''));
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new Unreadable(`${file}: $: expected a JSON document (${reason})`);
  }
}
