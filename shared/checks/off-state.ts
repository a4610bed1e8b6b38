import { SHEET_DEG_C } from '../physics/constants.ts';
import { isHighSide } from '../stage/drive-source.ts';
import { OffState } from '../stage/off-state.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { criterionNumber } from './criteria.ts';
import type { FigureBoard } from './figure-board.ts';

const BASE = criterionNumber('off-base-voltage');
const CURRENT = criterionNumber('off-collector-current');
const VOLTAGE = criterionNumber('off-collector-voltage');
const RESET = criterionNumber('reset-off');
const RESET_CURRENT = criterionNumber('reset-off-current');
const REVERSE = criterionNumber('reverse-base-voltage');
const OUTPUT_HIGH = criterionNumber('output-high');
const DRIVE_MAXIMUM = criterionNumber('drive-maximum');

/** Share of the release current a switched-off coil may still carry. */
const RELEASE_SHARE = 0.1;

/** Share of the load current a switched-off resistor or lamp may still carry. */
const LOAD_SHARE = 0.001;

/** The criteria of the off state; `visit` takes in a settled corner at the highest supply. */
export class OffStateChecks {
  private readonly model: StageModel;
  private readonly worst: FigureBoard;
  private readonly off: OffState;
  private readonly drivesOpenDrain: boolean;
  private readonly coilLimitA: number;

  constructor(model: StageModel, worst: FigureBoard) {
    this.model = model;
    this.worst = worst;
    this.off = new OffState(model);
    const { drive, load } = model.input;
    this.drivesOpenDrain = isHighSide(model.input) && drive.kind === 'open-collector';
    this.coilLimitA =
      load.kind === 'coil' && load.releaseV !== null
        ? (RELEASE_SHARE * load.releaseV) / load.resistanceOhm
        : NaN;
    if (this.off.resetOpen) worst.measureIn('reset-off', 'A');
  }

  /** Whether nothing but leakage reaches the base while off. */
  get baseOpen(): boolean {
    return this.off.baseOpen;
  }

  /** Largest collector current since `begin`, A. */
  largestA = 0;

  begin(): void {
    this.largestA = 0;
  }

  /** Finds the off state after a point; `visit` then takes it in. */
  solve(point: OperatingPoint): void {
    this.off.solve(point);
  }

  visit(point: OperatingPoint): void {
    const { worst, off } = this;
    const { policy, transistor, drive } = this.model.input;
    this.largestA = Math.max(this.largestA, off.collectorA);
    const vbeLimitV =
      policy.offBaseV * this.model.part.junctions +
      this.model.part.vbeTempcoVPerK * (point.tjDegC - SHEET_DEG_C);
    const currentLimitA = this.currentLimitA(point);
    if (!off.baseOpen && this.model.inside === null) worst.note(BASE, off.vbeV, vbeLimitV);
    worst.note(CURRENT, off.collectorA, currentLimitA);
    this.visitOutput();
    const { vceoV } = transistor.limits;
    const vceLimitV = vceoV === null ? NaN : vceoV * policy.voltageDerating;
    worst.note(VOLTAGE, point.condition.supplyV, vceLimitV);
    worst.note(REVERSE, off.reverseV, transistor.limits.veboV ?? NaN);
    if (this.drivesOpenDrain) {
      const limitV = drive.maximumV === null ? NaN : point.condition.supplyV;
      worst.note(DRIVE_MAXIMUM, drive.maximumV ?? NaN, limitV);
    }
    if (drive.reset !== null && !isHighSide(this.model.input)) {
      if (off.resetOpen) worst.note(RESET, off.resetCollectorA, currentLimitA);
      else {
        worst.note(RESET, off.resetVbeV, vbeLimitV);
        worst.note(RESET_CURRENT, off.resetCollectorA, currentLimitA);
      }
    }
  }

  /** The high level the next inputs see: what leaks through the collector and into them drops across RC. */
  private visitOutput(): void {
    const { load, supplyV } = this.model.input;
    if (load.kind !== 'logic-input') return;
    const largestOhm = load.pullUpOhm * (1 + load.tolerance);
    const leakA = this.off.collectorA + load.count * load.leakageA;
    this.worst.note(OUTPUT_HIGH, supplyV.min - largestOhm * leakA, load.vihV);
  }

  private currentLimitA(point: OperatingPoint): number {
    const { load, policy } = this.model.input;
    if (load.kind === 'coil') return this.coilLimitA;
    if (load.kind === 'led-string' || load.kind === 'logic-input') return policy.offCurrentA;
    return Math.max(policy.offCurrentA, LOAD_SHARE * point.icA);
  }
}
