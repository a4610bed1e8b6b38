import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageModel } from '../stage/stage-model.ts';
import type { FigureBoard } from './figure-board.ts';
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

  constructor(model: StageModel, board: FigureBoard) {
    const { inside, input } = model;
    this.on = new OnStateChecks(model, board);
    this.off = new OffStateChecks(model, board);
    this.load = new LoadChecks(model, board);
    this.input = inside === null ? null : new InputChecks(model, inside, board);
    this.turnOff = new TurnOffChecks(model, board);
    this.switching = new SwitchingChecks(model, board);
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
  probe(point: OperatingPoint): void {
    this.on.visit(point);
    this.input?.visit(point);
  }

  /**
   * Takes in one solved operating point.
   *
   * @param off whether it is one to switch off from: settled, at the highest supply
   */
  visit(point: OperatingPoint, off: boolean): void {
    this.on.visit(point);
    this.turnOff.visit(point);
    this.input?.visit(point);
    if (this.hasOwnLoadChecks) this.load.visit(point);
    if (this.switches) this.switching.visit(point);
    if (off) {
      this.off.visit(point);
      this.input?.visitOff();
    }
  }
}
