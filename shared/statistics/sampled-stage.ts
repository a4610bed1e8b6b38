import { PRE } from '../checks/criteria.ts';
import type { Criterion } from '../checks/evaluation.ts';
import { stiffSource } from '../stage/drive-source.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { frontStage, outputStage, type PreDriver } from '../stage/two-transistors.ts';
import type { Draws } from './quantities.ts';
import { SampledTransistor } from './sampled-transistor.ts';

/** A stage that is judged at one block of samples after another. */
export interface SampledStage {
  /** The output transistor at the sample judged last. */
  readonly point: OperatingPoint;
  /** Takes a block of drawn columns. */
  take(draws: Draws): void;
  /** Judges sample k of the columns it took; tells whether it meets every criterion with a computed value. */
  judge(draws: Draws, k: number): boolean;
  /** Samples that missed a criterion, by id. */
  misses(): [string, number][];
}

/** @param criteria of the stage at its corners: which of them have a computed value */
export function sampledStage(input: StageInput, criteria: readonly Criterion[]): SampledStage {
  return input.topology === 'two-transistor-high-side' && input.preDriver !== null
    ? new TwoSampledTransistors(input, input.preDriver, criteria)
    : new OneSampledTransistor(input, criteria);
}

class OneSampledTransistor implements SampledStage {
  readonly point: OperatingPoint;
  private readonly transistor: SampledTransistor;

  constructor(input: StageInput, criteria: readonly Criterion[]) {
    this.transistor = new SampledTransistor(input, criteria, '');
    this.point = this.transistor.point;
  }

  take(draws: Draws): void {
    this.transistor.take(draws);
  }

  judge(draws: Draws, k: number): boolean {
    this.transistor.goTo(draws, k);
    return this.transistor.judge();
  }

  misses(): [string, number][] {
    return this.transistor.tally.misses();
  }
}

/** The two know of each other as at the corners: VEB with a low output of 0 V, then the NPN, then its drop and leakage. */
class TwoSampledTransistors implements SampledStage {
  readonly point: OperatingPoint;
  private readonly front: SampledTransistor;
  private readonly output: SampledTransistor;

  constructor(input: StageInput, front: PreDriver, criteria: readonly Criterion[]) {
    const rbOhm = input.baseResistor.valueOhm ?? Infinity;
    this.output = new SampledTransistor(outputStage(input, 0), criteria, '', {
      nominalDrive: stiffSource(0),
    });
    this.front = new SampledTransistor(frontStage(input, front, rbOhm), criteria, PRE, {
      nominalSeriesV: 0,
    });
    this.point = this.output.point;
  }

  /** Each waits for what the other comes to: sample by sample. */
  take(): void {
    return;
  }

  judge(draws: Draws, k: number): boolean {
    const { front, output } = this;
    output.dropV = 0;
    output.settleAt(draws, k);
    front.seriesV = output.point.vbeV;
    front.settleAt(draws, k);
    const frontMet = front.judge();
    output.dropV = front.point.vceV;
    output.holdingLeakA = front.offA;
    output.settleAt(draws, k);
    return output.judge() && frontMet;
  }

  misses(): [string, number][] {
    return [...this.output.tally.misses(), ...this.front.tally.misses()];
  }
}
