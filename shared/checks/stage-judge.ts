import { cornerNumber, type CornerSpace } from '../stage/corners.ts';
import { operatingPoint } from '../stage/input-driven-point.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { type StageModel, stageModel, type Surroundings } from '../stage/stage-model.ts';
import type { Criterion } from './evaluation.ts';
import { StageChecks } from './stage-checks.ts';
import { standOffState, standOnData } from './standings.ts';
import { TestedRange } from './tested-range.ts';
import { NO_CORNER, WorstCases } from './worst-cases.ts';

/** Criteria that a few corners can already refute a base resistor by. */
const PROBED = [
  'overdrive-factor',
  'input-on',
  'forced-beta',
  'drive-current',
  'base-current',
  'rb-dissipation',
] as const;

/** The hardest corners of least drive, most drive, and most current from a weak pin. */
const PROBE_CORNERS = [
  { drive: 'weak', rb: '+', rbe: '-', gain: 'min', vbe: 'max' },
  { drive: 'strong', rb: '-', rbe: '+', gain: 'min', vbe: 'min' },
  { drive: 'weak', rb: '-', rbe: '+', gain: 'min', vbe: 'min' },
];

function probeCorners(corners: CornerSpace): number[] {
  return PROBE_CORNERS.flatMap((ends) =>
    ['min', 'max'].flatMap((supply) =>
      ['min', 'max'].flatMap((ambient) =>
        ['-', '+'].map((load) => cornerNumber(corners, { ...ends, supply, ambient, load })),
      ),
    ),
  );
}

/** Somebody who needs a figure of every corner besides the criteria. */
export interface CornerObserver {
  visit(point: OperatingPoint, corner: number): void;
}

/** What a run over the corners found besides the criteria. */
export interface CornerTraits {
  /** Quantities used above their last tested row. */
  readonly beyondRows: readonly string[];
  /** Whether a saturated corner is driven less than any data-sheet row. */
  readonly beyondTestBeta: boolean;
  readonly runaway: boolean;
  readonly leastOverdrive: number;
}

/**
 * Judges a stage at all corners for one base resistor after another. Everything RB does not change is worked
 * out once, so a sizing run costs little more than its corners.
 */
export class StageJudge {
  readonly model: StageModel;
  readonly point: OperatingPoint;
  private readonly worst = new WorstCases();
  private readonly checks: StageChecks;
  private readonly tested: TestedRange;
  private readonly observer: CornerObserver | null;
  private probes: readonly number[] = [];
  private readonly startW: Float64Array;
  private beyondTestBeta = false;
  private runaway = false;

  /**
   * @param around what stands in place of logic output and load's return for one transistor of two
   * @param observer is shown the operating point of every corner
   */
  constructor(
    input: StageInput,
    around: Surroundings = {},
    observer: CornerObserver | null = null,
  ) {
    this.observer = observer;
    this.model = stageModel(input, around);
    this.point = operatingPoint(this.model);
    this.checks = new StageChecks(this.model, this.worst);
    this.tested = new TestedRange(this.model);
    this.startW = new Float64Array(this.model.corners.count);
  }

  /** Every criterion of the stage with a base resistor of `rbOhm`, worst over all corners. */
  criteria(rbOhm: number): Criterion[] {
    this.run(rbOhm);
    standOnData(this.model, this.worst, this.checks.switching.known);
    if (this.checks.input?.beyondTest === true && this.worst.takesPart('input-on')) {
      this.worst.stand('input-on', 'at-best-open');
    }
    standOffState(this.model, this.worst, this.checks.off.baseOpen);
    const { corners, input } = this.model;
    return [...this.worst.criteria(corners, input.policy.marginalBand), this.tested.criterion()];
  }

  /** Number of corners a run goes through. */
  get cornerCount(): number {
    return this.model.corners.count;
  }

  /** Largest collector current of the last run's off states, A. */
  get largestOffA(): number {
    return this.checks.off.largestA;
  }

  /** What the last run found. */
  traits(): CornerTraits {
    return {
      beyondRows: this.tested.exceeded(),
      beyondTestBeta: this.beyondTestBeta,
      runaway: this.runaway,
      leastOverdrive: this.worst.worst('overdrive-factor'),
    };
  }

  /**
   * Smallest margin of what RB decides by nature, at a few cold-start corners: below 0 the value cannot pass,
   * whatever the other corners say. Proves nothing where it is not.
   */
  probeMargin(rbOhm: number): number {
    const { point, worst } = this;
    if (this.probes.length === 0) this.probes = probeCorners(this.model.corners);
    worst.reset();
    let beyondPin = false;
    for (const corner of this.probes) {
      point.place(corner, rbOhm);
      point.solve(point.condition.ambientDegC);
      this.checks.probe(point);
      worst.take(corner);
      beyondPin ||= point.beyondPin;
    }
    const margin = Math.min(...PROBED.map((id) => worst.key(id)));
    return beyondPin ? Math.min(margin, -Number.MIN_VALUE) : margin;
  }

  /** Settled junctions start from the dissipation of the same corner before it warmed up. */
  private run(rbOhm: number): void {
    const { point, model } = this;
    const { count, shift } = model.corners;
    const rth = model.part.rthJaKPerW ?? 0;
    this.worst.reset();
    this.checks.begin();
    this.worst.take(NO_CORNER);
    this.tested.begin();
    this.beyondTestBeta = false;
    this.runaway = false;
    for (let corner = 0; corner < count; corner++) {
      const settled = ((corner >> shift.instant) & 1) === 1;
      const startW = this.startW[corner & ~(1 << shift.instant)] ?? 0;
      point.place(corner, rbOhm);
      const { ambientDegC } = point.condition;
      if (settled) point.settle(ambientDegC + rth * startW);
      else {
        point.solve(ambientDegC);
        this.startW[corner] = point.powerW;
      }
      this.checks.visit(point, settled && ((corner >> shift.supply) & 1) === 1);
      this.worst.take(corner);
      this.tested.visit(point);
      this.notice(point);
      this.observer?.visit(point, corner);
    }
  }

  private notice(point: OperatingPoint): void {
    const { saturation } = this.model.part;
    if (point.runaway) this.runaway = true;
    if (saturation === null || !point.saturated) return;
    if (point.forcedBeta > (saturation.testBeta[point.piece] ?? Infinity)) {
      this.beyondTestBeta = true;
    }
  }
}
