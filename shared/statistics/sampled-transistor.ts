import type { Criterion } from '../checks/evaluation.ts';
import type { PRE } from '../checks/criteria.ts';
import { failsByItself } from '../checks/own-faults.ts';
import { StageChecks } from '../checks/stage-checks.ts';
import { type ClampVoltages, setClampVoltages } from '../stage/clamp-voltages.ts';
import { expectedForwardV } from '../stage/collector-path.ts';
import { type DriveSource, isHighSide, setDriveSource } from '../stage/drive-source.ts';
import { drawSpecimen } from '../physics/saturation.ts';
import { operatingPoint } from '../stage/input-driven-point.ts';
import { type OperatingPoint, RUNAWAY_DEG_C } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import {
  type LoadCondition,
  setLoadCondition,
  type StageModel,
  stageModel,
  type Surroundings,
} from '../stage/stage-model.ts';
import type { Writable } from '../stage/writable.ts';
import type { Draws } from './quantities.ts';
import { SampleTally } from './sample-tally.ts';
import { at, SettledBlock } from './settled-block.ts';

/** How near a sample's junction is brought to its balance, K. */
const NEAR_K = 1e-3;

/**
 * One transistor of a stage, put into one sample after another. A sample is the same stage without any tolerance: every
 * resistor, supply and temperature has the one value drawn for it, written into a copy of the stage, and the point judged
 * is its nominal one. So all rules are those of the corners; nothing is allocated from sample to sample.
 */
export class SampledTransistor {
  readonly point: OperatingPoint;
  readonly checks: StageChecks;
  readonly tally: SampleTally;
  /** Voltage in series with the load, V. */
  seriesV = 0;
  /** What lies between the base resistor and the other end of the supply, V; null behind a logic output. */
  dropV: number | null = null;

  private readonly given: StageInput;
  private readonly stage: StageInput;
  private readonly model: StageModel;
  private readonly specimen = { gain: 0, vbe: 0, vceSat: 0 };
  private readonly condition: Writable<LoadCondition>;
  private readonly source: Writable<DriveSource>;
  private readonly clamp: Writable<ClampVoltages> | null;
  private readonly ends = { ambientDegC: 0, settled: true, sign: 0, forwardSign: 0 };
  /** Rise of the junction at the stage's own nominal point, and how it answers to the junction itself: where to look first. */
  private readonly usualRiseK: number;
  private readonly usualFeedback: number;
  private block: SettledBlock | null = null;

  /**
   * @param given the stage with its tolerances
   * @param criteria of the whole stage at its corners
   * @param prefix of this transistor's criteria among them
   */
  constructor(
    given: StageInput,
    criteria: readonly Criterion[],
    readonly prefix: '' | typeof PRE,
    around: Surroundings = {},
  ) {
    this.given = given;
    this.stage = JSON.parse(JSON.stringify(given)) as StageInput;
    this.model = stageModel(this.stage, around, this.specimen);
    this.condition = this.model.nominal.condition;
    this.source = this.model.nominal.drive;
    this.clamp = this.model.clamp;
    this.point = operatingPoint(this.model);
    this.usualRiseK = this.riseK(0);
    this.usualFeedback = Math.min(0.5, Math.max(-0.5, this.riseK(1) - this.usualRiseK));
    this.tally = new SampleTally(criteria, prefix);
    this.checks = new StageChecks(this.model, this.tally);
    this.withoutTolerances();
  }

  /** What the nominal point would heat its junction by, were it that much warmer than the surroundings. */
  private riseK(warmerK: number): number {
    const { point, model } = this;
    point.placeNominal(this.stage.baseResistor.valueOhm ?? Infinity);
    point.solve(point.condition.ambientDegC + warmerK);
    const riseK = (model.part.rthJaKPerW ?? 0) * point.powerW;
    return Number.isFinite(riseK) ? riseK : 0;
  }

  private withoutTolerances(): void {
    const { stage } = this;
    stage.baseResistor.tolerance = 0;
    if (stage.shuntResistor !== null) stage.shuntResistor.tolerance = 0;
    if (stage.drive.pullUp !== null) stage.drive.pullUp.tolerance = 0;
    if (stage.load.kind !== 'lamp') stage.load.tolerance = 0;
  }

  /** Puts the transistor into sample k of the drawn columns and settles its junction. */
  settleAt(draws: Draws, k: number): void {
    this.place(draws, k);
    this.settle();
  }

  /** Finds the samples of a block of drawn columns together, where the stage's kind allows it; `goTo` then has less to do. */
  take(draws: Draws): void {
    this.block ??= SettledBlock.of(this.given, this.model, draws.supply.length, {
      riseK: this.usualRiseK,
      feedback: this.usualFeedback,
      nearK: NEAR_K,
      belowDegC: RUNAWAY_DEG_C,
    });
    this.block?.settle(draws);
  }

  /** How many samples of the columns it took were found together; null where the stage's kind does not allow it. */
  get foundTogether(): number | null {
    return this.block?.found.reduce((sum, found) => sum + found, 0) ?? null;
  }

  /** Puts the transistor into sample k of the columns it took. */
  goTo(draws: Draws, k: number): void {
    if (this.block?.found[k] === 1) this.copy(this.block, k, draws.gain);
    else this.settleAt(draws, k);
  }

  /** Writes what the block found for a sample: everything the checks read. */
  private copy({ columns, piece }: SettledBlock, k: number, gain: Float64Array): void {
    const { stage, condition, point, specimen, clamp } = this;
    const supplyV = at(columns.supplyV, k);
    stage.supplyV.min = supplyV;
    stage.supplyV.max = supplyV;
    const railV = at(columns.railV, k);
    stage.drive.railV.min = railV;
    stage.drive.railV.max = railV;
    if (clamp !== null) setClampVoltages(clamp, stage);
    condition.supplyV = supplyV;
    condition.availableV = supplyV;
    condition.ambientDegC = at(columns.ambientDegC, k);
    condition.coilDegC = at(columns.loadDegC, k);
    condition.loadOhm = at(columns.loadOhm, k);
    condition.fullA = at(columns.fullA, k);
    specimen.gain = at(gain, k);
    const rbOhm = at(columns.rbOhm, k);
    point.chosenRbOhm = rbOhm;
    point.outerRbOhm = rbOhm;
    point.rbOhm = rbOhm;
    point.rbeOhm = at(columns.rbeOhm, k);
    point.tjDegC = at(columns.tjDegC, k);
    point.vbeV = at(columns.vbeV, k);
    point.gain = at(columns.gain, k);
    point.driveA = at(columns.driveA, k);
    point.ibA = at(columns.ibA, k);
    point.forcedBeta = at(columns.forcedBeta, k);
    point.overdrive = at(columns.overdrive, k);
    point.rceSatOhm = at(columns.rceSatOhm, k);
    point.icA = at(columns.icA, k);
    point.vceV = at(columns.vceV, k);
    point.powerW = at(columns.powerW, k);
    point.piece = piece[k] ?? 0;
    point.saturated = true;
    point.beyondPin = false;
    point.runaway = false;
  }

  /** Puts the transistor into sample k of the drawn columns; `settle` or `judge` then make use of it. */
  place(draws: Draws, k: number): void {
    this.drawSurroundings(draws, k);
    // In front of another transistor, that one's base resistor is the load.
    const load = this.prefix === '' ? draws.load : draws.baseResistor;
    this.drawLoad(load[k] ?? 0, draws.forwardV[k] ?? 0);
    this.drawResistors(draws, k);
    this.drawPart(draws, k);
    const { stage, model, condition, ends, specimen, point } = this;
    setLoadCondition(condition, stage, model.part, specimen, stage.supplyV.max, ends, this.seriesV);
    if (this.dropV !== null) this.source.openV = stage.supplyV.max - this.dropV;
    else {
      setDriveSource(this.source, stage, stage.supplyV.max, stage.drive.railV.max, false, 0);
    }
    if (this.clamp !== null) setClampVoltages(this.clamp, stage);
    point.placeNominal(stage.baseResistor.valueOhm ?? Infinity);
  }

  /** Finds the junction temperature of the sample it was put into. */
  settle(): void {
    this.point.settle(this.ends.ambientDegC + this.usualRiseK, NEAR_K, this.usualFeedback);
  }

  /** Judges the sample it stands at; tells whether it meets everything. */
  judge(): boolean {
    this.checks.begin();
    this.checks.visit(this.point, true);
    return this.tally.judge() && !this.point.runaway && !failsByItself(this.model);
  }

  /** Current the transistor still lets through when off, A; needs `judge` first. */
  get offA(): number {
    return this.checks.off.largestA;
  }

  /** Leakage of what holds the base off, A. */
  set holdingLeakA(leakA: number) {
    this.stage.drive.leakageA = leakA;
  }

  private drawSurroundings(draws: Draws, k: number): void {
    const { given, stage, ends } = this;
    const { supplyV, ambientDegC, drive } = given;
    const supply = supplyV.min + (draws.supply[k] ?? 0) * (supplyV.max - supplyV.min);
    stage.supplyV.min = supply;
    stage.supplyV.max = supply;
    const ambient = ambientDegC.min + (draws.ambient[k] ?? 0) * (ambientDegC.max - ambientDegC.min);
    stage.ambientDegC.min = ambient;
    stage.ambientDegC.max = ambient;
    ends.ambientDegC = ambient;
    const rail = drive.railV.min + (draws.rail[k] ?? 0) * (drive.railV.max - drive.railV.min);
    stage.drive.railV.min = rail;
    stage.drive.railV.max = rail;
    const source = draws.source[k] ?? 0;
    if (isHighSide(given)) stage.drive.low.levelV = source * drive.low.levelV;
    else if (drive.high !== null && stage.drive.high !== null) {
      const { dropV, unloadedDropV } = drive.high;
      stage.drive.high.dropV = unloadedDropV + source * (dropV - unloadedDropV);
    }
    if (drive.pullUp !== null && stage.drive.pullUp !== null) {
      stage.drive.pullUp.valueOhm = drawn(drive.pullUp, draws.pullUp[k] ?? 0);
    }
  }

  private drawLoad(share: number, forward: number): void {
    const given = this.given.load;
    const { load } = this.stage;
    if (given.kind === 'lamp' || load.kind === 'lamp') return;
    if (given.kind === 'logic-input') {
      if (load.kind === 'logic-input')
        load.pullUpOhm = given.pullUpOhm * (1 + share * given.tolerance);
      return;
    }
    if (load.kind === 'logic-input') return;
    load.resistanceOhm = given.resistanceOhm * (1 + share * given.tolerance);
    if (given.kind === 'led-string' && load.kind === 'led-string') {
      const { min, max } = given.forwardV;
      const sheetV = (min + max + forward * (max - min)) / 2;
      const forwardV = expectedForwardV(sheetV, this.ends.ambientDegC);
      load.forwardV.min = forwardV;
      load.forwardV.max = forwardV;
    }
  }

  private drawResistors(draws: Draws, k: number): void {
    const { given, stage, model } = this;
    const front = this.prefix !== '';
    const base = front ? draws.preBaseResistor : draws.baseResistor;
    const shunt = front ? draws.preShuntResistor : draws.shuntResistor;
    const { valueOhm, tolerance } = given.baseResistor;
    stage.baseResistor.valueOhm = (valueOhm ?? Infinity) * (1 + (base[k] ?? 0) * tolerance);
    if (given.shuntResistor !== null && stage.shuntResistor !== null) {
      const shuntOhm = drawn(given.shuntResistor, shunt[k] ?? 0);
      stage.shuntResistor.valueOhm = shuntOhm;
      const ends = model.shuntOhm as [number, number];
      ends[0] = shuntOhm;
      ends[1] = shuntOhm;
    }
    if (model.inside !== null) this.drawInside(draws.r1[k] ?? 0, draws.ratio[k] ?? 0);
  }

  private drawInside(r1: number, ratio: number): void {
    const { inside } = this.model;
    const given = this.given.transistor.internal;
    const { internal } = this.stage.transistor;
    if (inside === null || given === null || internal === null) return;
    const r1Ohm = given.r1Ohm * (1 + r1 * given.r1Tolerance);
    internal.r1Ohm = r1Ohm;
    const ends = inside.r1Ohm as [number, number];
    ends[0] = r1Ohm;
    ends[1] = r1Ohm;
    if (given.r2Ohm === null || inside.ratio === null) return;
    const share = (given.r2Ohm / given.r1Ohm) * (1 + ratio * given.ratioTolerance);
    internal.r2Ohm = share * r1Ohm;
    const ratios = inside.ratio as [number, number];
    ratios[0] = share;
    ratios[1] = share;
  }

  private drawPart(draws: Draws, k: number): void {
    const { specimen, model } = this;
    const front = this.prefix !== '';
    specimen.gain = (front ? draws.preGain : draws.gain)[k] ?? 0;
    specimen.vbe = (front ? draws.preVbe : draws.vbe)[k] ?? 0;
    specimen.vceSat = (front ? draws.preVceSat : draws.vceSat)[k] ?? 0;
    if (model.part.saturation !== null) drawSpecimen(model.part.saturation, specimen.vceSat);
  }
}

function drawn(
  { valueOhm, tolerance }: { valueOhm: number; tolerance: number },
  share: number,
): number {
  return valueOhm * (1 + share * tolerance);
}
