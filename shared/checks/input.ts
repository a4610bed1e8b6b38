import { SHEET_DEG_C, SHEET_K, ZERO_CELSIUS_K } from '../physics/constants.ts';
import type { InsideModel } from '../stage/internal-resistors.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { FigureBoard } from './figure-board.ts';

const ON = criterionNumber('input-on');
const MAXIMUM = criterionNumber('input-voltage');
const OFF = criterionNumber('input-off');

/** Part of VI(on) that is the junction's, V at 25 °C and without R2; and what it gains per kelvin in the cold. */
const JUNCTION_V = 0.75;
const JUNCTION_V_PER_K = 0.002;

/** The criteria of a pre-biased part's input; `visit` takes in one corner, `visitOff` one of the off state. */
export class InputChecks {
  private readonly model: StageModel;
  private readonly inside: InsideModel;
  private readonly worst: FigureBoard;
  private readonly exponent: number;

  constructor(model: StageModel, inside: InsideModel, worst: FigureBoard) {
    this.model = model;
    this.inside = inside;
    this.worst = worst;
    this.exponent = model.input.policy.gainExponent;
  }

  visit(point: OperatingPoint): void {
    if (this.inside.byInput) this.worst.note(ON, point.inputV, this.onV(point));
    this.worst.note(MAXIMUM, point.inputV, this.inside.input?.maximumV ?? NaN);
  }

  visitOff(): void {
    const { low, groundShiftV } = this.model.input.drive;
    const lowV = (low.unloadedV ?? low.levelV) + groundShiftV;
    this.worst.note(OFF, lowV, this.inside.input?.offV ?? NaN);
  }

  /** Whether the load draws more than VI(on) was tested with. */
  get beyondTest(): boolean {
    const testA = this.inside.input?.onOutputA ?? 0;
    return this.model.conditions.some(({ fullA }) => fullA > testA);
  }

  /** VI(on) at the corner's junction and load current. */
  private onV(point: OperatingPoint): number {
    const printedV = this.inside.input?.onV ?? NaN;
    const shunt = this.inside.ratio === null ? 1 : 1 + 1 / this.inside.ratio[0];
    const coldK = Math.max(0, SHEET_DEG_C - point.tjDegC);
    const junctionV = JUNCTION_V * shunt;
    const gainLoss =
      coldK > 0 ? Math.pow(SHEET_K / (point.tjDegC + ZERO_CELSIUS_K), this.exponent) : 1;
    const onV = junctionV + (printedV - junctionV) * gainLoss + shunt * JUNCTION_V_PER_K * coldK;
    return onV + this.extraV(point.condition.fullA);
  }

  /** What a load current above the tested one asks for: its input current across R1. */
  private extraV(outputA: number): number {
    const { input, r1Ohm } = this.inside;
    const moreA = outputA - (input?.onOutputA ?? outputA);
    return moreA > 0 && input?.gi != null ? (r1Ohm[1] * moreA) / input.gi : 0;
  }
}
