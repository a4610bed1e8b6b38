import { INSIDE_VBE_V } from './internal-resistors.ts';
import { OperatingPoint } from './operating-point.ts';
import type { StageModel } from './stage-model.ts';

/**
 * The on state of a pre-biased part whose sheet prints VI(on): the voltage at its input decides whether it is on, and
 * VO(on) is its VCE(sat). `vbeV` and `ibA` are the terminal figures V_I and I_I.
 */
export class InputDrivenPoint extends OperatingPoint {
  /** Input conductance the sheet tests, A/V; 0 where it prints none. */
  private readonly testedAPerV: number;

  constructor(model: StageModel) {
    super(model);
    const input = model.inside?.input;
    this.testedAPerV =
      input?.currentA == null || input.testV === null ? 0 : input.currentA / input.testV;
  }

  override get inputV(): number {
    return this.vbeV;
  }

  protected override fill(): void {
    const { fullA } = this.condition;
    this.solveInput();
    this.ibA = this.driveA;
    this.gain = Infinity;
    this.saturated = true;
    this.forcedBeta = this.ibA > 0 ? fullA / this.ibA : Infinity;
    this.overdrive = Infinity;
    this.piece = this.condition.piece;
    this.warmSlope();
    if (this.fullDrop && this.model.part.saturation !== null) this.dropAcross(true);
    else {
      this.icA = fullA;
      this.vceV = 0;
    }
    this.sumPower();
  }

  /** V_I behind the output and the outer RB, with the larger of the two input currents the sheet allows. */
  private solveInput(): void {
    const { openV, sourceOhm, testedA, beyondOhm } = this.drive;
    this.inputBehind(openV, sourceOhm + this.outerRbOhm);
    this.beyondPin = this.driveA > testedA * (1 + 1e-12);
    if (this.beyondPin) {
      const bentV = openV + (beyondOhm - sourceOhm) * testedA;
      this.inputBehind(bentV, beyondOhm + this.outerRbOhm);
    }
  }

  private inputBehind(openV: number, ohm: number): void {
    const leastR1Ohm = this.model.inside?.r1Ohm[0] ?? Infinity;
    const byR1V = (openV * leastR1Ohm + INSIDE_VBE_V * ohm) / (leastR1Ohm + ohm);
    const byTestV = openV / (1 + ohm * this.testedAPerV);
    this.vbeV = Math.max(0, Math.min(openV, byR1V, byTestV));
    // Through the part, not through what stands before it: that may be nothing.
    this.driveA = Math.max(
      0,
      (this.vbeV - INSIDE_VBE_V) / leastR1Ohm,
      this.vbeV * this.testedAPerV,
    );
  }
}

/** The operating point that suits a stage's topology. */
export function operatingPoint(model: StageModel): OperatingPoint {
  return model.inside?.byInput === true ? new InputDrivenPoint(model) : new OperatingPoint(model);
}
