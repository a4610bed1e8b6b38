import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import { CRITERIA } from './criteria.ts';
import type { Criterion } from './evaluation.ts';
import { largestInrushA } from './load.ts';

/** What a data sheet tests up to a last row, and how a finding names it. */
const QUANTITIES = {
  gain: 'hFE',
  saturation: 'VCE(sat)',
  baseEmitter: 'VBE(sat)',
  pin: 'output current',
} as const;
type Quantity = keyof typeof QUANTITIES;

/** Which quantities were used above their last tested row at some corner. */
export class TestedRange {
  private readonly model: StageModel;
  private gain = false;
  private saturation = false;
  private baseEmitter = false;
  private pin = false;

  constructor(model: StageModel) {
    this.model = model;
  }

  begin(): void {
    const { part, conditions, inside } = this.model;
    const above = (lastA: number) => conditions.some(({ fullA }) => fullA > lastA);
    // A part judged by its input voltage uses no gain figure.
    const usesGain = inside?.byInput !== true;
    const lastGainA = (usesGain ? part.gain?.lastIcA : undefined) ?? Infinity;
    this.gain = above(lastGainA) || largestInrushA(this.model) > lastGainA;
    this.baseEmitter = part.hasVbe && above(part.baseEmitter.lastIcA);
    this.saturation = false;
    this.pin = false;
  }

  visit(point: OperatingPoint): void {
    const { saturation } = this.model.part;
    if (point.beyondPin) this.pin = true;
    if (saturation !== null && point.fullDrop && point.icA > saturation.lastIcA) {
      this.saturation = point.saturated || this.saturation;
    }
  }

  /** Names of the quantities used beyond their rows. */
  exceeded(): string[] {
    const flags: Record<Quantity, boolean> = {
      gain: this.gain,
      saturation: this.saturation,
      baseEmitter: this.baseEmitter,
      pin: this.pin,
    };
    return (Object.keys(flags) as Quantity[])
      .filter((quantity) => flags[quantity])
      .map((quantity) => QUANTITIES[quantity]);
  }

  criterion(): Criterion {
    const count = this.exceeded().length;
    const { relation, unit } = CRITERIA['tested-range'];
    const status = count === 0 ? 'pass' : 'open';
    return {
      id: 'tested-range',
      value: count,
      limit: 0,
      relation,
      unit,
      margin: null,
      status,
      corner: null,
    };
  }
}
