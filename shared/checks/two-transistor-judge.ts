import { stiffSource } from '../stage/drive-source.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { frontStage, outputStage, type PreDriver } from '../stage/two-transistors.ts';
import { PRE } from './criteria.ts';
import type { Criterion } from './evaluation.ts';
import { type CornerObserver, type CornerTraits, StageJudge } from './stage-judge.ts';

/** Smallest and largest value of one figure by supply and ambient: bit 1, 0. */
class Extremes {
  readonly least = new Float64Array(4).fill(Infinity);
  readonly most = new Float64Array(4).fill(-Infinity);

  note(model: StageModel, corner: number, value: number): void {
    const { shift } = model.corners;
    const k = (((corner >> shift.supply) & 1) << 1) | ((corner >> shift.ambient) & 1);
    this.least[k] = Math.min(this.least[k] ?? value, value);
    this.most[k] = Math.max(this.most[k] ?? value, value);
  }
}

/** Criteria of the output transistor that speak of a logic output, which it does not have. */
const NOT_OF_OUTPUT = ['drive-current', 'pull-up-dissipation', 'drive-maximum'];

/**
 * Judges a two-transistor high side in two passes: the NPN in front with RB and the PNP's base as its load, then the PNP
 * with the NPN's saturation voltage as its low level. What each pass needs of the other is the worst it can be at the
 * same supply and ambient.
 */
export class TwoTransistorJudge {
  private readonly input: StageInput;
  private readonly front: PreDriver;
  /** The output transistor with its low level at 0 V. */
  private readonly shorted: StageJudge;
  private output: StageJudge;
  private pre: StageJudge | null = null;

  constructor(input: StageInput, front: PreDriver) {
    this.input = input;
    this.front = front;
    this.shorted = new StageJudge(outputStage(input, 0), lowLevels(input, null));
    this.output = this.shorted;
  }

  get model(): StageModel {
    return this.output.model;
  }

  get point(): OperatingPoint {
    return this.output.point;
  }

  /** The transistor in front after the last run; null before. */
  get preJudge(): StageJudge | null {
    return this.pre;
  }

  get cornerCount(): number {
    return this.output.cornerCount + (this.pre?.cornerCount ?? 0);
  }

  criteria(rbOhm: number): Criterion[] {
    const baseV = this.outputBaseV(rbOhm);
    const dropV = new Extremes();
    const watch: CornerObserver = {
      visit: (point, corner) => {
        dropV.note(point.model, corner, point.vceV);
      },
    };
    const seriesV = [0, 1, 2, 3].flatMap((k) => [baseV.least[k] ?? 0, baseV.most[k] ?? 0]);
    const nominalV = this.nominalBaseV(rbOhm);
    this.pre = new StageJudge(
      frontStage(this.input, this.front, rbOhm),
      { seriesV, nominalSeriesV: nominalV },
      watch,
    );
    const preCriteria = this.pre.criteria(this.front.baseResistor.valueOhm);
    this.pre.point.placeNominal(this.front.baseResistor.valueOhm);
    this.pre.point.settle(this.pre.point.condition.ambientDegC);
    this.output = new StageJudge(
      outputStage(this.input, this.pre.largestOffA),
      lowLevels(this.input, dropV.most, this.pre.point.vceV),
    );
    const leakKnown = preCriteria.some(
      ({ id, value }) => id === 'off-collector-current' && value !== null,
    );
    return [
      ...this.output
        .criteria(rbOhm)
        .filter(({ id }) => !NOT_OF_OUTPUT.includes(id))
        .map((criterion) => (leakKnown ? criterion : heldOffByUnknown(criterion))),
      ...preCriteria.map((criterion) => ({ ...criterion, id: PRE + criterion.id })),
    ];
  }

  traits(): CornerTraits {
    return this.output.traits();
  }

  /** With the transistor in front taken as a short circuit: what that refutes, its drop refutes all the more. */
  probeMargin(rbOhm: number): number {
    return this.shorted.probeMargin(rbOhm);
  }

  /** VEB of the output transistor over all corners with its low output at 0 V. */
  private outputBaseV(rbOhm: number): Extremes {
    const found = new Extremes();
    const { point } = this.shorted;
    const { count, shift } = point.model.corners;
    for (let corner = 0; corner < count; corner++) {
      // Without the transistor in front both drives are the same.
      if (((corner >> shift.drive) & 1) === 1) continue;
      point.place(corner, rbOhm);
      const { ambientDegC } = point.condition;
      if (((corner >> shift.instant) & 1) === 1) point.settle(ambientDegC);
      else point.solve(ambientDegC);
      found.note(point.model, corner, point.vbeV);
    }
    return found;
  }

  private nominalBaseV(rbOhm: number): number {
    const { point } = this.shorted;
    point.placeNominal(rbOhm);
    point.settle(point.condition.ambientDegC);
    return point.vbeV;
  }
}

/** Off-state figures of the output transistor that count the current of the transistor in front. */
const BEHIND_LEAKAGE = ['off-base-voltage', 'off-collector-current'];

/** Such a figure without that current is a part of the truth: it may fail, but never pass. */
function heldOffByUnknown(criterion: Criterion): Criterion {
  const counts = BEHIND_LEAKAGE.includes(criterion.id) && criterion.status !== 'fail';
  return counts ? { ...criterion, status: 'open' } : criterion;
}

/**
 * Where the PNP's base resistor is pulled to, measured from the supply down: weak by the largest drop of the transistor
 * in front, strong by none.
 *
 * @param dropV largest drop by supply and ambient, V; null: none
 */
function lowLevels(input: StageInput, dropV: Float64Array | null, nominalDropV = 0) {
  const supplies = [input.supplyV.min, input.supplyV.max];
  const drives = supplies.flatMap((supplyV, s) =>
    [0, 1].flatMap((a) => [
      stiffSource(supplyV - (dropV?.[(s << 1) | a] ?? 0)),
      stiffSource(supplyV),
    ]),
  );
  const middleV = (input.supplyV.min + input.supplyV.max) / 2;
  return { drives, nominalDrive: stiffSource(middleV - nominalDropV) };
}
