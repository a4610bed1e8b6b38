import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import type { FigureSink } from './figure-sink.ts';
import { InputChecks } from './input.ts';
import { LoadChecks } from './load.ts';
import { OffStateChecks } from './off-state.ts';
import { OnStateChecks } from './on-state.ts';
import { SwitchingChecks } from './switching.ts';
import { TurnOffChecks } from './turn-off.ts';

/** All families of criteria of a stage: what applies to it, in one place. */
export class StageChecks {
  readonly off: OffStateChecks;
  readonly input: InputChecks | null;
  readonly switching: SwitchingChecks;
  private readonly on: OnStateChecks;
  private readonly load: LoadChecks;
  private readonly turnOff: TurnOffChecks;
  private readonly hasOwnLoadChecks: boolean;
  private readonly switches: boolean;

  constructor(model: StageModel, sink: FigureSink) {
    const { inside, input } = model;
    this.on = new OnStateChecks(model, sink);
    this.off = new OffStateChecks(model, sink);
    this.load = new LoadChecks(model, sink);
    this.input = inside === null ? null : new InputChecks(model, inside, sink);
    this.turnOff = new TurnOffChecks(model, sink);
    this.switching = new SwitchingChecks(model, sink);
    this.hasOwnLoadChecks = input.load.kind !== 'coil';
    this.switches = input.frequencyHz > 0 || input.load.kind === 'logic-input';
  }

  /** Takes in the figures no operating point moves. */
  begin(): void {
    this.turnOff.begin();
    this.load.begin();
    this.off.begin();
  }

  /** Takes in what RB decides by nature. */
  probe(point: OperatingPoint, corner: number): void {
    this.on.visit(point, corner);
    this.input?.visit(point, corner);
  }

  /**
   * Takes in one solved operating point.
   *
   * @param off whether it is one to switch off from: settled, at the highest supply
   */
  visit(point: OperatingPoint, corner: number, off: boolean): void {
    this.on.visit(point, corner);
    this.turnOff.visit(point, corner);
    this.input?.visit(point, corner);
    if (this.hasOwnLoadChecks) this.load.visit(point, corner);
    if (this.switches) this.switching.visit(point, corner);
    if (off) {
      this.off.visit(point, corner);
      this.input?.visitOff(corner);
    }
  }
}
