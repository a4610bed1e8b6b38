import { copperRatio } from '../physics/coil.ts';
import { powerShare, resistorShare } from '../physics/thermal.ts';
import { isHighSide } from '../stage/drive-source.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { FigureBoard } from './figure-board.ts';

const OVERDRIVE = criterionNumber('overdrive-factor');
const FORCED_BETA = criterionNumber('forced-beta');
const SATURATION = criterionNumber('saturation-voltage');
const LOAD = criterionNumber('load-voltage');
const OVERVOLTAGE = criterionNumber('load-overvoltage');
const COLLECTOR = criterionNumber('collector-current');
const PEAK = criterionNumber('peak-current');
const BASE = criterionNumber('base-current');
const DRIVE = criterionNumber('drive-current');
const POWER = criterionNumber('dissipation');
const JUNCTION = criterionNumber('junction-temperature');
const RB_POWER = criterionNumber('rb-dissipation');
const RBE_POWER = criterionNumber('rbe-dissipation');
const PULL_UP_POWER = criterionNumber('pull-up-dissipation');

/** A limit times its derating; NaN where none is printed. */
const derated = (limit: number | null, derating: number) =>
  limit === null ? NaN : limit * derating;

/** The criteria of the on state; limits are worked out once, `visit` takes in one corner. */
export class OnStateChecks {
  private readonly model: StageModel;
  private readonly worst: FigureBoard;
  private readonly collectorLimitA: number;
  private readonly peakLimitA: number;
  private readonly baseLimitA: number;
  private readonly driveLimitA: number;
  private readonly powerLimitW: number;
  private readonly junctionLimitDegC: number;
  private readonly rbLimitW: number;
  private readonly rbeLimitW: number;
  private readonly pullUpLimitW: number;
  private readonly pullUpFeedsBase: boolean;
  /** Whether a base current turns the part on, not a printed input voltage. */
  private readonly byBaseCurrent: boolean;

  constructor(model: StageModel, worst: FigureBoard) {
    this.model = model;
    this.worst = worst;
    const { policy, transistor, drive, baseResistor, shuntResistor } = model.input;
    const { limits } = transistor;
    const openCollector = drive.kind === 'open-collector';
    this.byBaseCurrent = model.inside?.byInput !== true;
    this.pullUpFeedsBase = openCollector && !isHighSide(model.input);
    this.collectorLimitA = derated(limits.icA, policy.currentDerating);
    this.peakLimitA = derated(limits.icPeakA ?? limits.icA, policy.currentDerating);
    this.baseLimitA = derated(limits.ibA, policy.currentDerating);
    const pinLimitA =
      isHighSide(model.input) || openCollector ? drive.sinkLimitA : drive.sourceLimitA;
    this.driveLimitA = derated(pinLimitA, policy.driveDerating);
    this.powerLimitW = derated(limits.powerW, policy.powerDerating);
    this.junctionLimitDegC = limits.tjMaxDegC * policy.junctionDerating;
    this.rbLimitW = derated(baseResistor.ratingW, policy.resistorDerating);
    this.rbeLimitW = derated(shuntResistor?.ratingW ?? null, policy.resistorDerating);
    this.pullUpLimitW = derated(drive.pullUp?.ratingW ?? null, policy.resistorDerating);
  }

  visit(point: OperatingPoint): void {
    const { policy, transistor } = this.model.input;
    const { worst } = this;
    const { ambientDegC } = point.condition;
    if (this.byBaseCurrent) {
      worst.note(OVERDRIVE, point.overdrive, policy.overdriveFactor);
      worst.note(FORCED_BETA, point.forcedBeta, this.forcedBetaLimit(point));
    }
    worst.note(BASE, point.ibA, this.baseLimitA);
    worst.note(SATURATION, point.vceV, this.model.input.saturationLimitV ?? NaN);
    worst.note(COLLECTOR, point.icA, this.collectorLimitA);
    if (this.model.input.load.kind !== 'lamp') {
      worst.note(PEAK, point.icA, this.peakLimitA);
    }
    const share = powerShare(ambientDegC, transistor.limits.tjMaxDegC);
    worst.note(POWER, point.powerW, this.powerLimitW * share);
    worst.note(JUNCTION, point.tjDegC, this.junctionLimitDegC);
  }

  /** A Darlington is held to the IC/IB of its rows: a policy's forced β is one for single transistors. */
  private forcedBetaLimit(point: OperatingPoint): number {
    const { policy } = this.model.input;
    const { saturation, junctions } = this.model.part;
    if (saturation === null) return policy.forcedBeta;
    const testBeta = saturation.testBeta[point.piece] ?? Infinity;
    if (junctions > 1) return testBeta;
    return policy.guaranteedOnly ? Math.min(policy.forcedBeta, testBeta) : policy.forcedBeta;
  }

  visitResistors(point: OperatingPoint): void {
    const { worst } = this;
    const { drive, shuntResistor } = this.model.input;
    const share = resistorShare(point.condition.ambientDegC);
    const railV = drive.railTracksSupply ? point.condition.supplyV : drive.railV.max;
    const pullUpOhm = (drive.pullUp?.valueOhm ?? NaN) * (1 - (drive.pullUp?.tolerance ?? 0));
    const driveA = this.pullUpFeedsBase ? railV / pullUpOhm : point.driveA;
    worst.note(DRIVE, driveA, this.driveLimitA);
    if (point.outerRbOhm > 0) {
      const rbW = point.driveA * point.driveA * point.outerRbOhm;
      worst.note(RB_POWER, rbW, this.rbLimitW * share);
    }
    if (shuntResistor !== null && this.model.inside === null) {
      const powerW = (point.vbeV * point.vbeV) / point.rbeOhm;
      worst.note(RBE_POWER, powerW, this.rbeLimitW * share);
    }
    if (drive.kind === 'open-collector') {
      const powerW = (railV * railV) / pullUpOhm;
      worst.note(PULL_UP_POWER, powerW, this.pullUpLimitW * share);
    }
  }

  visitCoil(point: OperatingPoint): void {
    const { load, frequencyHz, duty } = this.model.input;
    if (load.kind !== 'coil') return;
    const { supplyV, ambientDegC, coilDegC } = point.condition;
    const coilV = point.condition.availableV - point.vceV;
    if (frequencyHz > 0) this.worst.note(LOAD, duty * supplyV, load.holdV ?? NaN);
    else {
      const operateDegC = load.operateReferenceDegC ?? load.referenceDegC;
      const rise = Math.max(1, copperRatio(coilDegC, operateDegC));
      this.worst.note(LOAD, coilV, (load.operateV ?? NaN) * rise);
    }
    this.worst.note(OVERVOLTAGE, coilV, this.overvoltageLimitV(ambientDegC));
  }

  /** What the coil may carry at an ambient: less where there is less room to its own limit. */
  private overvoltageLimitV(ambientDegC: number): number {
    const { load } = this.model.input;
    if (load.kind !== 'coil' || load.maximumV === null) return NaN;
    if (load.coilMaxDegC === null) return load.maximumV;
    const room = load.coilMaxDegC - ambientDegC;
    const referenceRoom = load.coilMaxDegC - (load.maximumReferenceDegC ?? load.referenceDegC);
    if (room <= 0) return 0;
    return referenceRoom <= 0
      ? load.maximumV
      : load.maximumV * Math.min(1, Math.sqrt(room / referenceRoom));
  }
}
