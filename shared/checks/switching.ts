import { SHEET_DEG_C } from '../physics/constants.ts';
import { minimumGain } from '../physics/gain.ts';
import { storageConstantSec, storageTimeSec } from '../physics/storage-time.ts';
import { isHighSide } from '../stage/drive-source.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { FigureBoard } from './figure-board.ts';
import { riseConstantSec } from './load.ts';

const STORAGE = criterionNumber('storage-time');
const DELAY = criterionNumber('low-to-high-delay');

/** Judgement, not measurement: how storage time grows with the junction temperature, per K above 25 °C. */
const STORAGE_TEMPCO_PER_K = 0.005;

/** Share of the shorter part of a period that storage and fall may take where no limit is set. */
const PERIOD_SHARE = 0.1;

/** Storage and fall time at a switching frequency, and how late a logic input sees the end; `visit` takes in one corner. */
export class SwitchingChecks {
  private readonly model: StageModel;
  private readonly worst: FigureBoard;
  private readonly constantSec: number | null;
  private readonly fallSec: number;
  private readonly limitSec: number;
  /** Largest time constant at a logic input, s; null for other loads, or without its capacitance. */
  private readonly riseConstantSec: number | null;

  constructor(model: StageModel, worst: FigureBoard) {
    this.model = model;
    this.worst = worst;
    const { frequencyHz, duty, storageTimeLimitSec, transistor } = model.input;
    this.limitSec = storageTimeLimitSec ?? (PERIOD_SHARE * Math.min(duty, 1 - duty)) / frequencyHz;
    this.fallSec = transistor.switching?.tfSec ?? NaN;
    this.constantSec = constantSec(model);
    this.riseConstantSec = riseConstantSec(model.input);
  }

  /** Whether the part prints what storage time is computed from. */
  get known(): boolean {
    return this.constantSec !== null && !Number.isNaN(this.fallSec);
  }

  visit(point: OperatingPoint): void {
    const storeSec = this.storeSec(point);
    if (storeSec === null) return;
    if (this.model.input.frequencyHz > 0) {
      this.worst.note(STORAGE, storeSec + this.fallSec, this.limitSec);
    }
    this.visitDelay(point, storeSec);
  }

  /** ts + RC·C·ln[(V2 − VOL)/(V2 − VIH)] */
  private visitDelay(point: OperatingPoint, storeSec: number): void {
    const { load, drive } = this.model.input;
    if (load.kind !== 'logic-input' || this.riseConstantSec === null) return;
    const { supplyV } = point.condition;
    const lowV = point.vceV + drive.groundShiftV;
    const reaches = supplyV > load.vihV;
    const span = (supplyV - lowV) / (supplyV - load.vihV);
    const riseSec = this.riseConstantSec * Math.log(Math.max(1, span));
    this.worst.note(DELAY, reaches ? storeSec + riseSec : Infinity, NaN);
  }

  /** Storage time of a corner, s; null where the part does not print what it is computed from. */
  private storeSec(point: OperatingPoint): number | null {
    if (this.constantSec === null) return null;
    const warm = point.tjDegC > SHEET_DEG_C;
    const gainMax = point.mostGainAt(point.icA);
    const offA = this.offCurrentA(point);
    const slower = warm ? 1 + STORAGE_TEMPCO_PER_K * (point.tjDegC - SHEET_DEG_C) : 1;
    return slower * storageTimeSec(this.constantSec, point.ibA, offA, point.icA, gainMax);
  }

  /** Current that leaves the base at turn-off: through RB into the output, and through RBE. */
  private offCurrentA(point: OperatingPoint): number {
    const { input, part, shuntOhm } = this.model;
    const { drive, baseResistor } = input;
    const vbeMinV = Math.max(
      0,
      point.condition.vbeMinV + part.vbeTempcoVPerK * (point.tjDegC - SHEET_DEG_C),
    );
    const shuntA = vbeMinV / shuntOhm[1];
    const largestOhm = point.chosenRbOhm * (1 + baseResistor.tolerance);
    if (isHighSide(input)) {
      if (drive.kind === 'open-collector') return shuntA;
      const { dropV, unloadedDropV, currentA } = drive.high;
      const railV = drive.railTracksSupply ? point.condition.supplyV : drive.railV.min;
      const leftV = vbeMinV - (point.condition.supplyV - railV + unloadedDropV);
      const sourceOhm = Math.max(0, dropV - unloadedDropV) / currentA;
      return Math.max(0, leftV) / (largestOhm + sourceOhm) + shuntA;
    }
    const { levelV, unloadedV, currentA } = drive.low;
    const leftV = vbeMinV - (unloadedV ?? levelV) - drive.groundShiftV;
    return Math.max(0, leftV) / (largestOhm + levelV / currentA) + shuntA;
  }
}

/** τs from the part's printed row with its guaranteed gain there. */
function constantSec(model: StageModel): number | null {
  const row = model.input.transistor.switching;
  const { gain } = model.part;
  if (gain === null || row?.tsSec == null || row.icA === null) return null;
  if (row.ib1A === null || row.ib2A === null) return null;
  const { tsSec, icA, ib1A, ib2A } = row;
  return storageConstantSec({ tsSec, icA, ib1A, ib2A }, minimumGain(gain, icA));
}
