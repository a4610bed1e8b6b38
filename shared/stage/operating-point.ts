import { SHEET_DEG_C } from '../physics/constants.ts';
import { gainBetween, gainRatio, maximumGain, minimumGain } from '../physics/gain.ts';
import {
  expectedInterceptAtV,
  expectedResistanceRatio,
  forcedBetaStepV,
  interceptAtV,
  resistanceRatio,
  type SaturationLine,
} from '../physics/saturation.ts';
import type { DriveSource } from './drive-source.ts';
import type { InsideModel } from './internal-resistors.ts';
import type { LoadCondition, StageModel } from './stage-model.ts';
import { switchingLossW } from './switching-loss.ts';

/** A junction above this has run away, °C. */
export const RUNAWAY_DEG_C = 400;

/** How near the junction is brought to its fixed point, K; the rule asks for 1 mK. */
const NEAR_K = 1e-7;

const SECANT_STEPS = 12;
const SCAN_STEPS = 64;
const BISECTIONS = 48;

/**
 * The on state of one corner. One object serves all corners of a stage: `place` puts it at a corner,
 * `solve` fills the figures at a junction temperature, `settle` finds the junction first. Nothing is
 * allocated on the way, so a thousand corners cost well under a millisecond.
 */
export class OperatingPoint {
  condition: LoadCondition;
  drive: DriveSource;
  /** RB as chosen, at the corner's end of its tolerance, and with what lies in series inside the part. */
  chosenRbOhm = 0;
  outerRbOhm = 0;
  rbOhm = 0;
  rbeOhm = Infinity;
  /** Figures at the solved junction temperature. */
  tjDegC = 0;
  driveA = 0;
  ibA = 0;
  icA = 0;
  vceV = 0;
  vbeV = 0;
  gain = 0;
  forcedBeta = 0;
  overdrive = 0;
  powerW = 0;
  saturated = false;
  /** Whether the corner takes VCE(sat) max, not 0. */
  fullDrop = false;
  /** Whether the pin gives more than its last tested current. */
  beyondPin = false;
  /** Piece of the saturation line in use. */
  piece = 0;
  rceSatOhm = 0;
  /** Whether no junction temperature below 400 °C balances the dissipation. */
  runaway = false;

  private gain25 = 0;
  private vbe25V = 0;
  private highGain = false;
  /** Temperature the gain ratio was last worked out for: cold starts all share one. */
  private ratioDegC = NaN;
  private ratio = 1;

  private readonly vbeTempco: number;
  private readonly exponent: number;
  /** Temperature moves expected figures both ways, limit figures only to the worse. */
  private readonly bothWays: boolean;
  private readonly saturation: SaturationLine | null;
  private readonly rceTempco: number;
  private readonly switches: boolean;

  readonly model: StageModel;

  constructor(model: StageModel) {
    this.model = model;
    this.condition = model.nominal.condition;
    this.drive = model.nominal.drive;
    this.vbeTempco = model.part.vbeTempcoVPerK;
    this.exponent = model.part.gain?.exponent ?? 0;
    this.bothWays = model.specimen !== null;
    this.saturation = model.part.saturation;
    this.rceTempco = model.input.policy.rceTempcoPerK;
    this.switches = model.input.frequencyHz > 0;
  }

  /** Smallest hFE at another collector current, at the solved junction temperature. */
  leastGainAt(icA: number): number {
    const { gain } = this.model.part;
    if (gain === null) return Infinity;
    const { specimen } = this.model;
    return specimen === null
      ? minimumGain(gain, icA) * this.ratioWhere(this.tjDegC < SHEET_DEG_C)
      : gainBetween(gain, icA, specimen.gain) * this.ratioWhere(true);
  }

  /** Largest hFE at another collector current, at the solved junction temperature. */
  mostGainAt(icA: number): number {
    const { gain } = this.model.part;
    if (gain === null || this.model.specimen !== null) return this.leastGainAt(icA);
    return maximumGain(gain, icA) * this.ratioWhere(this.tjDegC > SHEET_DEG_C);
  }

  /** Puts the point at a numbered corner; `solve` or `settle` then fills the figures. */
  place(corner: number, rbOhm: number): void {
    const { shift } = this.model.corners;
    const { tolerance } = this.model.input.baseResistor;
    const s = (corner >> shift.supply) & 1;
    const a = (corner >> shift.ambient) & 1;
    const d = (corner >> shift.drive) & 1;
    const l = (corner >> shift.load) & 1;
    const t = (corner >> shift.instant) & 1;
    const v = ((corner >> shift.vf) | (corner >> shift.veb)) & 1;
    const sign = ((corner >> shift.rb) & 1) === 0 ? -1 : 1;
    const condition = this.model.conditions[(s << 4) | (a << 3) | (l << 2) | (t << 1) | v];
    const drive = this.model.drives[(s << 2) | (a << 1) | d];
    if (condition === undefined || drive === undefined) return;
    this.condition = condition;
    this.drive = drive;
    this.chosenRbOhm = rbOhm;
    this.outerRbOhm = rbOhm * (1 + sign * tolerance);
    this.rbOhm = this.outerRbOhm;
    this.rbeOhm = this.model.shuntOhm[((corner >> shift.rbe) & 1) as 0 | 1];
    if (this.model.inside !== null) {
      this.placeInside(
        this.model.inside,
        ((corner >> shift.r1) & 1) as 0 | 1,
        ((corner >> shift.ratio) & 1) as 0 | 1,
      );
    }
    this.highGain = ((corner >> shift.gain) & 1) === 1;
    this.gain25 = this.highGain ? condition.gainMax : condition.gainMin;
    this.vbe25V = ((corner >> shift.vbe) & 1) === 1 ? condition.vbeMaxV : condition.vbeMinV;
    this.fullDrop = ((corner >> shift.vceSat) & 1) === 1;
  }

  /** Puts the point at the middle of every tolerance, with minimum gain, maximum VBE and VCE(sat). */
  placeNominal(rbOhm: number): void {
    const { condition, drive } = this.model.nominal;
    this.condition = condition;
    this.drive = drive;
    this.chosenRbOhm = rbOhm;
    this.outerRbOhm = rbOhm;
    this.rbOhm = rbOhm;
    this.rbeOhm = this.model.input.shuntResistor?.valueOhm ?? Infinity;
    const { internal } = this.model.input.transistor;
    if (this.model.inside !== null && internal !== null) {
      this.rbOhm = rbOhm + internal.r1Ohm;
      this.rbeOhm = internal.r2Ohm ?? Infinity;
    }
    this.highGain = false;
    this.gain25 = condition.gainMin;
    this.vbe25V = condition.vbeMaxV;
    this.fullDrop = true;
  }

  /** R1 lies in series with RB, R2 from base to emitter. */
  private placeInside(inside: InsideModel, r1: 0 | 1, ratio: 0 | 1): void {
    const r1Ohm = inside.r1Ohm[r1];
    this.rbOhm = this.outerRbOhm + r1Ohm;
    this.rbeOhm = inside.ratio === null ? Infinity : inside.ratio[ratio] * r1Ohm;
  }

  /** Fills the figures for a junction at `tjDegC`; tells whether the corner is saturated there. */
  solve(tjDegC: number): boolean {
    this.tjDegC = tjDegC;
    this.fill();
    return this.saturated;
  }

  /**
   * Fills the figures for the junction at hand. Its steps neither take nor return a number: between functions that are
   * compiled apart, each would cost an allocation.
   */
  protected fill(): void {
    this.warmJunction();
    this.findDrive();
    this.ibA = Math.max(0, this.driveA - this.vbeV / this.rbeOhm);
    this.piece = this.condition.piece;
    this.warmSlope();
    if (this.ibA <= 0) this.cutOff();
    else this.conduct();
    this.sumPower();
  }

  private warmJunction(): void {
    const warmerK = this.tjDegC - SHEET_DEG_C;
    this.vbeV = Math.max(0, this.vbe25V + this.vbeTempco * warmerK);
    // Minima take the cold penalty, maxima the hot one; neither takes a credit. Specimens take both.
    const penalty = this.highGain ? warmerK > 0 : warmerK < 0;
    this.gain = this.gain25 * this.ratioWhere(penalty || this.bothWays);
  }

  private cutOff(): void {
    const { availableV, supplyV } = this.condition;
    this.saturated = false;
    this.forcedBeta = Infinity;
    this.overdrive = 0;
    this.icA = 0;
    this.vceV = Math.max(0, Math.min(availableV, supplyV));
  }

  private conduct(): void {
    const { fullA, availableV, loadOhm } = this.condition;
    this.forcedBeta = fullA / this.ibA;
    this.overdrive = fullA > 0 ? (this.gain * this.ibA) / fullA : Infinity;
    this.saturated = this.forcedBeta < this.gain;
    if (!this.saturated) {
      this.icA = this.gain * this.ibA;
      this.vceV = Math.max(0, availableV - this.icA * loadOhm);
    } else if (this.fullDrop && this.saturation !== null) {
      this.dropAcross(false);
    } else {
      this.icA = fullA;
      this.vceV = 0;
    }
  }

  /** Voltage at the input of a pre-biased part, before its R1; of any other part that at its base. V. */
  get inputV(): number {
    return this.vbeV + this.driveA * (this.rbOhm - this.outerRbOhm);
  }

  protected sumPower(): void {
    const { inside } = this.model;
    const inputW = inside === null ? this.vbeV * this.ibA : this.inputV * this.driveA;
    const conductionW = this.vceV * this.icA + inputW;
    this.powerW = this.model.conductionShare * conductionW;
    if (this.switches) this.powerW += switchingLossW(this);
  }

  /**
   * Finds the junction temperature TJ = TA + RθJA·P and fills the figures there. Of several that balance, the
   * lowest counts: it is the one a stage switched on at ambient comes to.
   *
   * @param guessDegC where to start a saturated corner, which has one only; the sooner found the nearer
   * @param nearK how near it must be brought
   * @param feedback what the balance is expected to move by with the junction, K per K
   */
  settle(guessDegC: number, nearK = NEAR_K, feedback = 0): void {
    const ambient = this.condition.ambientDegC;
    const rth = this.model.part.rthJaKPerW ?? 0;
    this.runaway = false;
    let t0 = Math.min(Math.max(guessDegC, ambient), Math.max(ambient, RUNAWAY_DEG_C));
    if (!this.solve(t0)) {
      this.scan(ambient, rth);
      return;
    }
    let gap0 = ambient + rth * this.powerW - t0;
    let t1 = t0 + gap0 / (1 - feedback);
    for (let step = 0; step < SECANT_STEPS; step++) {
      if (Math.abs(gap0) < nearK) return;
      if (!(t1 >= ambient && t1 < RUNAWAY_DEG_C)) break;
      if (!this.solve(t1)) break;
      const gap1 = ambient + rth * this.powerW - t1;
      if (Math.abs(gap1) < nearK) return;
      const next = t1 - (gap1 * (t1 - t0)) / (gap1 - gap0);
      t0 = t1;
      gap0 = gap1;
      t1 = next;
    }
    this.scan(ambient, rth);
  }

  /** The slow way where the secant fails: the lowest temperature at which the balance changes sign. */
  private scan(ambient: number, rth: number): void {
    if (ambient >= RUNAWAY_DEG_C) {
      this.solve(ambient);
      this.runaway = this.powerW > 0;
      return;
    }
    this.solve(ambient);
    if (this.powerW <= 0) return;
    let low = ambient;
    for (let step = 1; step <= SCAN_STEPS; step++) {
      const t = ambient + ((RUNAWAY_DEG_C - ambient) * step) / SCAN_STEPS;
      this.solve(t);
      if (ambient + rth * this.powerW <= t) {
        this.bisect(low, t, ambient, rth);
        return;
      }
      low = t;
    }
    this.runaway = true;
  }

  private bisect(from: number, to: number, ambient: number, rth: number): void {
    let low = from;
    let high = to;
    for (let step = 0; step < BISECTIONS && high - low > NEAR_K; step++) {
      const middle = (low + high) / 2;
      this.solve(middle);
      if (ambient + rth * this.powerW <= middle) high = middle;
      else low = middle;
    }
    this.solve(high);
  }

  private ratioWhere(applies: boolean): number {
    if (!applies) return 1;
    if (this.tjDegC !== this.ratioDegC) {
      this.ratioDegC = this.tjDegC;
      this.ratio = gainRatio(this.tjDegC, this.exponent);
    }
    return this.ratio;
  }

  private findDrive(): void {
    const { openV, sourceOhm, testedA, beyondOhm } = this.drive;
    const current = (openV - this.vbeV) / (sourceOhm + this.rbOhm);
    this.beyondPin = current > testedA * (1 + 1e-12);
    if (!this.beyondPin) this.driveA = Math.max(0, current);
    else {
      const bentV = openV + (beyondOhm - sourceOhm) * testedA;
      this.driveA = (bentV - this.vbeV) / (beyondOhm + this.rbOhm);
    }
  }

  /** RCE(sat) of the piece in use at the junction temperature. */
  protected warmSlope(): void {
    const { saturation, rceTempco, tjDegC } = this;
    if (saturation === null) return;
    const ratio = this.bothWays
      ? expectedResistanceRatio(tjDegC, rceTempco)
      : resistanceRatio(tjDegC, rceTempco);
    this.rceSatOhm = (saturation.slopeOhm[this.piece] ?? 0) * ratio;
  }

  /**
   * Load line against the saturation line: piece by piece downwards from the full load current.
   *
   * @param asTested whether the drive is taken for the rows' own
   */
  protected dropAcross(asTested: boolean): void {
    const { saturation, tjDegC } = this;
    const { availableV, loadOhm, fullA } = this.condition;
    if (saturation === null) return;
    let current = 0;
    for (;;) {
      const plainV = this.bothWays
        ? expectedInterceptAtV(saturation, this.piece, tjDegC)
        : interceptAtV(saturation, this.piece, tjDegC);
      const interceptV =
        plainV +
        forcedBetaStepV(
          asTested ? 0 : this.forcedBeta,
          saturation.testBeta[this.piece] ?? 0,
          this.gain,
          saturation.reverseGain,
          tjDegC,
        );
      this.warmSlope();
      current = (availableV - interceptV) / (loadOhm + this.rceSatOhm);
      const lowerA = this.piece > 0 ? (saturation.upToA[this.piece - 1] ?? 0) : 0;
      if (this.piece === 0 || current > lowerA) break;
      this.piece--;
    }
    // Pieces need not meet once hot: between two of them the current is that of the row itself.
    current = Math.min(current, saturation.upToA[this.piece] ?? Infinity, fullA);
    this.icA = Math.max(0, current);
    this.vceV = Math.max(0, availableV - this.icA * loadOhm);
  }
}
