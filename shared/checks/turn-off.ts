import { clampChargeC, releaseTimeSec } from '../physics/coil.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { FigureBoard } from './figure-board.ts';

const PEAK = criterionNumber('peak-collector-voltage');
const SURGE = criterionNumber('surge-voltage');
const HOLDING = criterionNumber('holding-voltage');
const RELEASE = criterionNumber('release-time');
const CLAMP_CURRENT = criterionNumber('clamp-current');
const CLAMP_POWER = criterionNumber('clamp-power');

/** The criteria of turning a coil off, and of the supply's surge and dip. */
export class TurnOffChecks {
  private readonly model: StageModel;
  private readonly worst: FigureBoard;
  private readonly clampLimitA: number;
  private readonly clampLimitW: number;
  private readonly releaseA: number;

  constructor(model: StageModel, worst: FigureBoard) {
    this.model = model;
    this.worst = worst;
    const { clamp, policy, load } = model.input;
    const { currentRatingA, powerRatingW } = clamp;
    this.clampLimitA = currentRatingA === null ? NaN : currentRatingA * policy.currentDerating;
    this.clampLimitW = powerRatingW === null ? NaN : powerRatingW * policy.powerDerating;
    this.releaseA =
      load.kind === 'coil' && load.releaseV !== null ? load.releaseV / load.resistanceOhm : NaN;
  }

  /** The figures no corner moves, or only the supply. */
  begin(): void {
    const { input, clamp, corners } = this.model;
    const { transistor, policy, supplyV, load } = input;
    const { vceoV } = transistor.limits;
    const highSupply = 1 << corners.shift.supply;
    if (load.kind === 'coil') {
      const limitV = vceoV === null ? NaN : vceoV * policy.voltageDerating;
      this.worst.noteAt(PEAK, clamp?.peakV ?? Infinity, limitV, highSupply);
      if (supplyV.dip !== null) {
        this.worst.note(HOLDING, supplyV.dip, load.holdV ?? NaN);
      }
    }
    if (supplyV.surge !== null) {
      const standOffV = clamp?.standOffV ?? Infinity;
      const limitV = Math.min(vceoV ?? NaN, standOffV);
      const aboveV = clamp?.standOffV === null ? clamp.largestV : 0;
      this.worst.note(SURGE, supplyV.surge + aboveV, limitV);
    }
  }

  visit(point: OperatingPoint): void {
    const { input, clamp } = this.model;
    const { load } = input;
    if (load.kind !== 'coil' || clamp === null) return;
    const { loadOhm } = point.condition;
    this.worst.note(CLAMP_CURRENT, point.icA, this.clampLimitA);
    if (load.inductanceH === null) return;
    if (load.releaseV !== null) {
      const { smallestV } = clamp;
      const timeSec = releaseTimeSec(
        load.inductanceH,
        loadOhm,
        point.icA,
        this.releaseA,
        smallestV,
      );
      this.worst.note(RELEASE, timeSec, load.releaseTimeLimitSec ?? NaN);
    }
    if (input.frequencyHz > 0) {
      const powerW = this.clampPowerW(load.inductanceH, loadOhm, point.icA);
      this.worst.note(CLAMP_POWER, powerW, this.clampLimitW);
    }
  }

  /** Mean power of the clamp: the coil's run-down at every cycle, or the current that never runs down. */
  private clampPowerW(inductanceH: number, loadOhm: number, startA: number): number {
    const { input, clamp } = this.model;
    if (clamp === null) return 0;
    const across = clamp.standOffV !== null;
    const chargeC = clampChargeC(inductanceH, loadOhm, startA, clamp.largestV);
    const energyJ = (across ? clamp.ownV : clamp.largestV) * chargeC;
    return Math.min(input.frequencyHz * energyJ, clamp.ownV * startA * (1 - input.duty));
  }
}
