import { obstacleTo } from '../checks/applicability.ts';
import { evaluateStage } from '../checks/evaluate-stage.ts';
import type { Evaluation } from '../checks/evaluation.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { type Histogram, spreadOfValues } from './order-statistics.ts';
import { Drawing } from './quantities.ts';
import { sampledStage, type SampledStage } from './sampled-stage.ts';
import { byFigure, type SpreadFigure } from './spread-figures.ts';

/** Which samples: the same request gives the same result, however it is shared out. */
export interface SampleRequest {
  readonly samples: number;
  readonly seed: number;
}

/** Samples beyond this would not fit into memory. */
export const MOST_SAMPLES = 10_000_000;
/** Seeds are whole numbers up to this. */
export const LARGEST_SEED = Number.MAX_SAFE_INTEGER;

/** Samples drawn at a time; each block of a seed is drawn by itself. */
export const BLOCK = 1024;

/** Percentiles of a result: ±3 σ of a normal distribution, and the middle. */
export const PERCENTILES = [0.00135, 0.5, 0.99865] as const;

/** What one worker found in its share of the samples. */
export interface SampleShare {
  readonly samples: number;
  readonly met: number;
  /** Samples that missed a criterion, by id. */
  readonly missed: Readonly<Record<string, number>>;
  /** Every sample's figure; empty where the stage's data do not give it. */
  readonly figures: Readonly<Record<SpreadFigure, Float64Array>>;
}

/** Statistics of a stage. What cannot be computed is null. */
export interface Statistics extends SampleRequest {
  /** Share of the samples that meet every criterion with a computed value. */
  readonly yield: number | null;
  /** 0.135, 50 and 99.865 %. */
  readonly percentiles: Readonly<Record<SpreadFigure, readonly (number | null)[]>>;
}

/** Statistics with what a chart of them needs. */
export interface SampleSpread extends Statistics {
  readonly histograms: Readonly<Record<SpreadFigure, Histogram | null>>;
  /** Share of the samples that miss a criterion, by id; those nobody misses are left out. */
  readonly missed: Readonly<Record<string, number>>;
}

/**
 * One share of the samples of a stage, block by block: worker `index` of `workers` takes every block whose number leaves
 * that remainder. Pure and total, like the evaluation.
 *
 * @param input a parsed stage with its base resistor; without one, or where the stage cannot be judged, nothing is drawn
 */
export class SampleRun {
  private readonly stage: SampledStage | null;
  private readonly drawing: Drawing;
  private readonly request: SampleRequest;
  private readonly workers: number;
  private readonly figures: Record<SpreadFigure, Float64Array>;
  private block: number;
  private done = 0;
  private met = 0;

  constructor(input: StageInput, request: SampleRequest, index = 0, workers = 1) {
    const judged = obstacleTo(input) === null && input.baseResistor.valueOhm !== null;
    const evaluation = judged ? evaluateStage(input) : null;
    this.stage = evaluation === null ? null : sampledStage(input, evaluation.criteria);
    this.drawing = new Drawing(input, request.seed, BLOCK);
    this.request = request;
    this.workers = workers;
    this.block = index;
    const total = this.stage === null ? 0 : ownSamples(request.samples, index, workers);
    const known = evaluation === null ? [] : knownFigures(evaluation);
    this.figures = byFigure((name) => new Float64Array(known.includes(name) ? total : 0));
  }

  /** Samples judged so far. */
  get samples(): number {
    return this.done;
  }

  /** Judges the next block; tells whether there was one. */
  step(): boolean {
    const from = this.block * BLOCK;
    const { stage } = this;
    if (stage === null || from >= this.request.samples) return false;
    const count = Math.min(BLOCK, this.request.samples - from);
    this.drawing.fill(this.block);
    const { draws } = this.drawing;
    const { overdriveFactor, vceSatV, icA, powerW, tjDegC } = this.figures;
    const { point } = stage;
    stage.take(draws);
    for (let k = 0; k < count; k++) {
      if (stage.judge(draws, k)) this.met++;
      const at = this.done + k;
      // Writing beyond the end of a column that is not kept does nothing.
      overdriveFactor[at] = point.overdrive;
      vceSatV[at] = point.vceV;
      icA[at] = point.icA;
      powerW[at] = point.powerW;
      tjDegC[at] = point.tjDegC;
    }
    this.done += count;
    this.block += this.workers;
    return true;
  }

  /** What the blocks so far gave; of use when `step` has come to its end. */
  share(): SampleShare {
    const { done, met, figures } = this;
    const missed = Object.fromEntries(this.stage?.misses() ?? []);
    return { samples: done, met, missed, figures };
  }
}

function ownSamples(samples: number, index: number, workers: number): number {
  let own = 0;
  for (let from = index * BLOCK; from < samples; from += workers * BLOCK) {
    own += Math.min(BLOCK, samples - from);
  }
  return own;
}

/** The figures the stage's data give. */
function knownFigures({ criteria, nominal }: Evaluation): SpreadFigure[] {
  const known: SpreadFigure[] = ['icA'];
  const overdrive = criteria.find(({ id }) => id === 'overdrive-factor');
  if (overdrive !== undefined && (overdrive.value !== null || overdrive.status === 'fail')) {
    known.push('overdriveFactor');
  }
  if (nominal.vceV === null) return known;
  known.push('vceSatV', 'powerW');
  const junction = criteria.find(({ id }) => id === 'junction-temperature');
  if (junction?.value !== null) known.push('tjDegC');
  return known;
}

/** Puts the shares of all workers together. */
export function spreadOf(request: SampleRequest, shares: readonly SampleShare[]): SampleSpread {
  const sum = (read: (share: SampleShare) => number) =>
    shares.reduce((total, share) => total + read(share), 0);
  const samples = sum((share) => share.samples);
  const ids = [...new Set(shares.flatMap(({ missed }) => Object.keys(missed)))];
  const spreads = byFigure((name) =>
    spreadOfValues(
      shares.map(({ figures }) => figures[name]),
      PERCENTILES,
    ),
  );
  return {
    samples: request.samples,
    seed: request.seed,
    yield: samples === 0 ? null : sum(({ met }) => met) / samples,
    percentiles: byFigure((name) => spreads[name].quantiles),
    histograms: byFigure((name) => spreads[name].histogram),
    missed: Object.fromEntries(
      ids.map((id) => [id, sum(({ missed }) => missed[id] ?? 0) / samples]),
    ),
  };
}

/** Statistics as a result document states them, keys in the format's order. */
export function statisticsOf(spread: SampleSpread): Statistics {
  const { samples, seed, percentiles } = spread;
  return { samples, seed, yield: spread.yield, percentiles };
}

/**
 * Runs all samples of a stage here and now.
 *
 * @param goOn is told the samples judged so far after each block; false cancels
 * @returns null where cancelled
 */
export function runMonteCarlo(
  input: StageInput,
  request: SampleRequest,
  goOn: (samples: number) => boolean = () => true,
): SampleSpread | null {
  const run = new SampleRun(input, request);
  while (run.step()) if (!goOn(run.samples)) return null;
  return spreadOf(request, [run.share()]);
}
