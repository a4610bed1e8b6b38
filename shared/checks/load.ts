import { gainRatio, maximumGain, minimumGain } from '../physics/gain.ts';
import { SHEET_DEG_C } from '../physics/constants.ts';
import { lampColdOhm } from '../physics/lamp.ts';
import { resistorShare } from '../physics/thermal.ts';
import type { LampLoad, LedStringLoad, LogicInputLoad } from '../stage/load.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { WorstCases } from './worst-cases.ts';

const LOAD_CURRENT = criterionNumber('load-current');
const LEAST_LOAD_CURRENT = criterionNumber('load-current-low');
const PEAK = criterionNumber('peak-current');
const INRUSH = criterionNumber('inrush-saturation');
const OUTPUT_LOW = criterionNumber('output-low');
const RISE = criterionNumber('rise-time');
const RC_POWER = criterionNumber('rc-dissipation');

const NO_CORNER = -1;

/** A cold filament at one ambient: its current at the highest supply and the gain limits there, 25 °C. */
interface Inrush {
  readonly peakA: number;
  readonly gainMin: number;
  readonly gainMax: number;
}

/** The criteria that belong to LED strings, lamps and logic inputs; `visit` takes in one corner. */
export class LoadChecks {
  private readonly model: StageModel;
  private readonly worst: WorstCases;
  /** By end of the ambient; empty for loads that are no lamp. */
  private readonly inrush: readonly Inrush[];

  constructor(model: StageModel, worst: WorstCases) {
    this.model = model;
    this.worst = worst;
    const { load, ambientDegC } = model.input;
    this.inrush =
      load.kind === 'lamp'
        ? [ambientDegC.min, ambientDegC.max].map((degC) => inrushAt(model, load, degC))
        : [];
  }

  /** The figures no corner moves. */
  begin(): void {
    const { load, transistor } = this.model.input;
    if (load.kind !== 'logic-input' || load.capacitanceF === null) return;
    const loadF = load.capacitanceF + (load.wiringF ?? 0) + (transistor.capacitanceF ?? 0);
    const largestOhm = load.pullUpOhm * (1 + load.tolerance);
    this.worst.note(
      RISE,
      RISE_FACTOR * largestOhm * loadF,
      load.riseTimeLimitSec ?? NaN,
      NO_CORNER,
    );
  }

  visit(point: OperatingPoint, corner: number): void {
    const { load } = this.model.input;
    if (load.kind === 'led-string') this.visitLeds(load, point, corner);
    else if (load.kind === 'lamp') this.visitLamp(point, corner);
    else if (load.kind === 'logic-input') this.visitInputs(load, point, corner);
  }

  private visitLeds(load: LedStringLoad, point: OperatingPoint, corner: number): void {
    const { currentDerating } = this.model.input.policy;
    const limitA = load.maximumA === null ? NaN : load.maximumA * currentDerating;
    this.worst.note(LOAD_CURRENT, point.icA, limitA, corner);
    if (load.minimumA !== null) {
      this.worst.note(LEAST_LOAD_CURRENT, point.icA, load.minimumA, corner);
    }
  }

  private visitLamp(point: OperatingPoint, corner: number): void {
    const { part, corners, input } = this.model;
    const inrush = this.inrush[(corner >> corners.shift.ambient) & 1];
    if (inrush === undefined) return;
    const exponent = part.gain?.exponent ?? 0;
    const ratio = gainRatio(point.tjDegC, exponent);
    const warm = point.tjDegC > SHEET_DEG_C;
    const mostA = inrush.gainMax * (warm ? ratio : 1) * point.ibA;
    const leastA = inrush.gainMin * (warm ? 1 : ratio) * point.ibA;
    const { icPeakA, icA } = input.transistor.limits;
    const limitA = (icPeakA ?? icA ?? NaN) * input.policy.currentDerating;
    this.worst.note(PEAK, Math.min(inrush.peakA, mostA), limitA, corner);
    this.worst.note(INRUSH, leastA / inrush.peakA, 1, corner);
  }

  private visitInputs(load: LogicInputLoad, point: OperatingPoint, corner: number): void {
    const { drive, policy } = this.model.input;
    const { supplyV, ambientDegC } = point.condition;
    this.worst.note(OUTPUT_LOW, point.vceV + drive.groundShiftV, load.vilV, corner);
    const smallestOhm = load.pullUpOhm * (1 - load.tolerance);
    const ratingW = (load.ratingW ?? NaN) * policy.resistorDerating;
    const limitW = ratingW * resistorShare(ambientDegC);
    this.worst.note(RC_POWER, (supplyV * supplyV) / smallestOhm, limitW, corner);
  }
}

/** 10 to 90 % of an exponential, in time constants. */
const RISE_FACTOR = 2.2;

function inrushAt(model: StageModel, load: LampLoad, ambientDegC: number): Inrush {
  const { gain } = model.part;
  const coldOhm = Math.max(Number.MIN_VALUE, lampColdOhm(load, ambientDegC));
  const peakA = Math.min(Number.MAX_VALUE, model.input.supplyV.max / coldOhm);
  return {
    peakA,
    gainMin: gain === null ? Infinity : minimumGain(gain, peakA),
    gainMax: gain === null ? Infinity : maximumGain(gain, peakA),
  };
}

/** Largest current of a lamp's cold filament, A; 0 for other loads. */
export function largestInrushA({ input }: StageModel): number {
  const { load, ambientDegC, supplyV } = input;
  if (load.kind !== 'lamp') return 0;
  return supplyV.max / Math.max(Number.MIN_VALUE, lampColdOhm(load, ambientDegC.min));
}
