import { cutOffCurrentA, leakageA } from '../physics/leakage.ts';
import { isHighSide } from './drive-source.ts';
import type { OperatingPoint } from './operating-point.ts';
import type { StageModel } from './stage-model.ts';

/** Drop a high output is counted with at least when it turns a PNP off, V. */
const LEAST_HIGH_DROP_V = 0.1;

/**
 * The off state right after switching off, at the highest supply and the junction still hot: what stands at
 * the base, and what the collector lets through. `solve` fills the figures for a settled operating point.
 */
export class OffState {
  /** Base–emitter voltage, V; NaN with the base open. */
  vbeV = 0;
  collectorA = 0;
  /** The same while the controller is in reset; NaN where the stage states no reset. */
  resetVbeV = NaN;
  resetCollectorA = NaN;
  /** Reverse base–emitter voltage, V. */
  reverseV = 0;

  /** Whether the base hangs on nothing but leakage while off. */
  readonly baseOpen: boolean;
  /** The same in reset: the pin is no hold, and no RBE is fitted. */
  readonly resetOpen: boolean;

  private readonly model: StageModel;
  private readonly highSide: boolean;

  constructor(model: StageModel) {
    const { drive } = model.input;
    const held = model.inside === null ? model.input.shuntResistor : model.inside.ratio;
    const shunted = held !== null;
    this.model = model;
    this.highSide = isHighSide(model.input);
    this.baseOpen = this.highSide && drive.kind === 'open-collector' && !shunted;
    const driven = drive.reset === null || drive.reset.kind === 'driven-low';
    this.resetOpen = !this.highSide && !driven && !shunted;
  }

  solve(point: OperatingPoint): void {
    const { part, input } = this.model;
    // A Darlington's rows are collector figures: its own resistors keep the leakage off the base.
    const leakA = part.leakage === null ? 0 : leakageA(part.leakage, point.tjDegC);
    const icboA = part.junctions > 1 ? 0 : leakA;
    if (this.baseOpen) {
      this.vbeV = NaN;
      this.collectorA = this.openBaseA(point, icboA + input.drive.leakageA, leakA - icboA);
    } else {
      this.vbeV = this.heldVbeV(point, icboA);
      this.collectorA = this.heldA(point, leakA, this.vbeV);
    }
    this.solveReset(point, icboA, leakA);
    this.reverseV = this.reverse(point);
  }

  /** Base–emitter voltage with the output (or RBE alone) holding the base off. */
  private heldVbeV(point: OperatingPoint, icboA: number): number {
    const { drive } = this.model.input;
    const { rbOhm, rbeOhm } = point;
    if (this.highSide && drive.kind === 'open-collector') {
      return (icboA + drive.leakageA) * rbeOhm;
    }
    const parallelOhm = rbeOhm === Infinity ? rbOhm : (rbOhm * rbeOhm) / (rbOhm + rbeOhm);
    return (this.pullingV(point) / rbOhm + icboA) * parallelOhm;
  }

  /** What still pulls at the base through RB, V: towards on where positive. */
  private pullingV(point: OperatingPoint): number {
    const { drive } = this.model.input;
    if (!this.highSide) return (drive.low.unloadedV ?? drive.low.levelV) + drive.groundShiftV;
    const { supplyV } = point.condition;
    const railV = drive.railTracksSupply ? supplyV : drive.railV.min;
    return supplyV - (railV - Math.max(drive.high?.unloadedDropV ?? 0, LEAST_HIGH_DROP_V));
  }

  private solveReset(point: OperatingPoint, icboA: number, leakA: number): void {
    const { drive } = this.model.input;
    if (this.highSide || drive.reset === null) return;
    if (drive.reset.kind === 'driven-low') {
      this.resetVbeV = this.vbeV;
      this.resetCollectorA = this.collectorA;
      return;
    }
    const pinA = this.resetPinA(point);
    if (this.resetOpen) {
      this.resetVbeV = NaN;
      this.resetCollectorA = this.openBaseA(point, icboA + pinA, leakA - icboA);
    } else {
      this.resetVbeV = (icboA + pinA) * point.rbeOhm;
      this.resetCollectorA = this.heldA(point, leakA, this.resetVbeV);
    }
  }

  /** Current out of the pin in reset: its leakage, or what its pull-up delivers. */
  private resetPinA(point: OperatingPoint): number {
    const { drive } = this.model.input;
    if (drive.reset === null) return 0;
    if (drive.reset.kind !== 'pull-up') return drive.reset.leakageA;
    const railV = drive.railTracksSupply ? point.condition.supplyV : drive.railV.max;
    const shuntOhm = point.rbeOhm === Infinity ? 0 : point.rbeOhm;
    return railV / ((drive.reset.pullUpOhm ?? 0) + point.rbOhm + shuntOhm);
  }

  private heldA(point: OperatingPoint, leakA: number, vbeV: number): number {
    const { anchor, vbeTempcoVPerK, junctions } = this.model.part;
    const throughA =
      anchor === null ? 0 : cutOffCurrentA(anchor, vbeV, point.tjDegC, vbeTempcoVPerK, junctions);
    return Math.min(leakA + throughA, point.condition.fullA);
  }

  /** Leakage into an open base comes out amplified; what the collector leaks besides adds to it. */
  private openBaseA(point: OperatingPoint, baseA: number, besidesA: number): number {
    if (this.model.part.gain === null) return point.condition.fullA;
    const gainMax = point.mostGainAt(baseA);
    return Math.min((1 + gainMax) * baseA + besidesA, point.condition.fullA);
  }

  /** Voltage that pulls the base beyond its emitter, a speed-up capacitor's swing included, V. */
  private reverse(point: OperatingPoint): number {
    const { drive, speedUpCapacitorF } = this.model.input;
    const { rbOhm, rbeOhm } = point;
    const backV = this.highSide
      ? drive.railTracksSupply
        ? 0
        : drive.railV.max - this.model.input.supplyV.min
      : -drive.groundShiftV;
    const share = rbeOhm === Infinity ? 1 : rbeOhm / (rbOhm + rbeOhm);
    const driven = !(this.highSide && drive.kind === 'open-collector');
    const swingV = (speedUpCapacitorF ?? 0) > 0 && driven ? point.driveA * rbOhm + backV : 0;
    return Math.max(0, backV * share, swingV);
  }
}
