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
  /**
   * What takes in a point, and what one to switch off from. Called from a list, each is compiled by itself: together they
   * are more than the compiler takes in one piece, and the numbers between the pieces would cost allocations.
   */
  private readonly steps: readonly Step[];
  private readonly offSteps: readonly Step[];

  constructor(model: StageModel, board: FigureBoard) {
    const { inside, input: stage } = model;
    const on = new OnStateChecks(model, board);
    const off = new OffStateChecks(model, board);
    const load = new LoadChecks(model, board);
    const input = inside === null ? null : new InputChecks(model, inside, board);
    const turnOff = new TurnOffChecks(model, board);
    const switching = new SwitchingChecks(model, board);
    const isCoil = stage.load.kind === 'coil';
    const switches = stage.frequencyHz > 0 || stage.load.kind === 'logic-input';
    this.on = on;
    this.off = off;
    this.load = load;
    this.input = input;
    this.turnOff = turnOff;
    this.switching = switching;
    this.steps = [
      (point) => {
        on.visit(point);
      },
      (point) => {
        on.visitResistors(point);
      },
      ...onlyIf(isCoil, (point) => {
        on.visitCoil(point);
      }),
      ...onlyIf(isCoil, (point) => {
        turnOff.visit(point);
      }),
      ...onlyIf(!isCoil, (point) => {
        load.visit(point);
      }),
      ...onlyIf(input !== null, (point) => {
        input?.visit(point);
      }),
      ...onlyIf(switches, (point) => {
        switching.visit(point);
      }),
    ];
    this.offSteps = [
      (point) => {
        off.solve(point);
      },
      (point) => {
        off.visit(point);
      },
      ...onlyIf(input !== null, () => {
        input?.visitOff();
      }),
    ];
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
    this.on.visitResistors(point);
    this.input?.visit(point);
  }

  /**
   * Takes in one solved operating point.
   *
   * @param off whether it is one to switch off from: settled, at the highest supply
   */
  visit(point: OperatingPoint, off: boolean): void {
    for (const step of this.steps) step(point);
    if (off) for (const step of this.offSteps) step(point);
  }
}

type Step = (point: OperatingPoint) => void;

function onlyIf(applies: boolean, step: Step): Step[] {
  return applies ? [step] : [];
}
