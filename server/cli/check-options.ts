import {
  LARGEST_SEED,
  MOST_SAMPLES,
  type SampleRequest,
} from '../../shared/statistics/monte-carlo.ts';

const USAGE =
  'Usage: npm run --silent check -- [--samples N [--seed S]] FILE [FILE …]   (- reads standard input)';

/** The command was called in a way it does not know; the message is what standard error says. */
export class Misused extends Error {}

/** Seed where none is given: the result states it, so the samples can be drawn again. */
const USUAL_SEED = 1;

/** What the command line asks for. */
export class CheckOptions {
  readonly files: readonly string[];
  /** null without `--samples`. */
  readonly samples: SampleRequest | null;

  /** @throws {Misused} for unknown options, values out of range and a missing file name */
  constructor(args: readonly string[]) {
    const { files, given } = readArguments(args);
    const samples = given.get('--samples');
    const seed = given.get('--seed');
    if (samples === undefined && seed !== undefined) {
      throw new Misused(`--seed: expected --samples beside it.\n${USAGE}`);
    }
    if (files.length === 0) throw new Misused(`Name at least one stage file.\n${USAGE}`);
    this.files = files;
    this.samples = samples === undefined ? null : { samples, seed: seed ?? USUAL_SEED };
  }
}

function readArguments(args: readonly string[]) {
  const files: string[] = [];
  const given = new Map<string, number>();
  for (let k = 0; k < args.length; k++) {
    const arg = args[k] ?? '';
    if (!arg.startsWith('-') || arg === '-') {
      files.push(arg);
      continue;
    }
    const [name = '', joined] = arg.split('=', 2);
    if (name !== '--samples' && name !== '--seed') {
      throw new Misused(`${name}: unknown option.\n${USAGE}`);
    }
    if (given.has(name)) throw new Misused(`${name}: given twice.\n${USAGE}`);
    if (joined === undefined) k++;
    given.set(name, wholeNumber(name, joined ?? args[k]));
  }
  return { files, given };
}

function wholeNumber(name: '--samples' | '--seed', text: string | undefined): number {
  const [least, most] = name === '--samples' ? [1, MOST_SAMPLES] : [0, LARGEST_SEED];
  const value = text !== undefined && /^\d{1,16}$/.test(text) ? Number(text) : NaN;
  if (value >= least && value <= most) return value;
  throw new Misused(`${name}: expected a whole number from ${least} to ${most}.\n${USAGE}`);
}
