import { lampColdOhm } from '../physics/lamp.ts';
import { resistorShare } from '../physics/thermal.ts';
import type { LampLoad, LedStringLoad, LogicInputLoad } from '../stage/load.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { FigureBoard } from './figure-board.ts';

const LOAD_CURRENT = criterionNumber('load-current');
const LEAST_LOAD_CURRENT = criterionNumber('load-current-low');
const PEAK = criterionNumber('peak-current');
const INRUSH = criterionNumber('inrush-saturation');
const OUTPUT_LOW = criterionNumber('output-low');
const RISE = criterionNumber('rise-time');
const RC_POWER = criterionNumber('rc-dissipation');

/** The criteria that belong to LED strings, lamps and logic inputs; `visit` takes in one corner. */
export class LoadChecks {
  private readonly model: StageModel;
  private readonly worst: FigureBoard;

  constructor(model: StageModel, worst: FigureBoard) {
    this.model = model;
    this.worst = worst;
  }

  /** The figures no corner moves. */
  begin(): void {
    const { load } = this.model.input;
    const constantSec = riseConstantSec(this.model.input);
    if (load.kind !== 'logic-input' || constantSec === null) return;
    this.worst.note(RISE, RISE_FACTOR * constantSec, load.riseTimeLimitSec ?? NaN);
  }

  visit(point: OperatingPoint): void {
    const { load } = this.model.input;
    if (load.kind === 'led-string') this.visitLeds(load, point);
    else if (load.kind === 'lamp') this.visitLamp(load, point);
    else if (load.kind === 'logic-input') this.visitInputs(load, point);
  }

  private visitLeds(load: LedStringLoad, point: OperatingPoint): void {
    const { currentDerating } = this.model.input.policy;
    const limitA = load.maximumA === null ? NaN : load.maximumA * currentDerating;
    this.worst.note(LOAD_CURRENT, point.icA, limitA);
    this.worst.note(LEAST_LOAD_CURRENT, point.icA, load.minimumA ?? NaN);
  }

  private visitLamp(load: LampLoad, point: OperatingPoint): void {
    const { input } = this.model;
    const inrushA = inrushCurrentA(load, input.supplyV.max, point.condition.ambientDegC);
    const mostA = point.mostGainAt(inrushA) * point.ibA;
    const leastA = point.leastGainAt(inrushA) * point.ibA;
    const { icPeakA, icA } = input.transistor.limits;
    const limitA = (icPeakA ?? icA ?? NaN) * input.policy.currentDerating;
    this.worst.note(PEAK, Math.min(inrushA, mostA), limitA);
    this.worst.note(INRUSH, leastA / inrushA, 1);
  }

  private visitInputs(load: LogicInputLoad, point: OperatingPoint): void {
    const { drive, policy } = this.model.input;
    const { supplyV, ambientDegC } = point.condition;
    this.worst.note(OUTPUT_LOW, point.vceV + drive.groundShiftV, load.vilV);
    const smallestOhm = load.pullUpOhm * (1 - load.tolerance);
    const ratingW = (load.ratingW ?? NaN) * policy.resistorDerating;
    const limitW = ratingW * resistorShare(ambientDegC);
    this.worst.note(RC_POWER, (supplyV * supplyV) / smallestOhm, limitW);
  }
}

/** 10 to 90 % of an exponential, in time constants. */
const RISE_FACTOR = 2.2;

/** Largest time constant at a logic input, s; null for other loads, or without a stated capacitance. */
export function riseConstantSec({ load, transistor }: StageInput): number | null {
  if (load.kind !== 'logic-input' || load.capacitanceF === null) return null;
  const loadF = load.capacitanceF + (load.wiringF ?? 0) + (transistor.capacitanceF ?? 0);
  return load.pullUpOhm * (1 + load.tolerance) * loadF;
}

/** Current of a cold filament, A. */
function inrushCurrentA(load: LampLoad, supplyV: number, ambientDegC: number): number {
  const coldOhm = Math.max(Number.MIN_VALUE, lampColdOhm(load, ambientDegC));
  return Math.min(Number.MAX_VALUE, supplyV / coldOhm);
}

/** Largest current of a lamp's cold filament, A; 0 for other loads. */
export function largestInrushA({ input }: StageModel): number {
  const { load, ambientDegC, supplyV } = input;
  return load.kind === 'lamp' ? inrushCurrentA(load, supplyV.max, ambientDegC.min) : 0;
}
