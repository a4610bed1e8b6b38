import { OffState } from '../stage/off-state.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { cornerNumber } from '../stage/corners.ts';
import { obstacleTo } from './applicability.ts';
import { PRE } from './criteria.ts';
import type { Corner, Criterion } from './evaluation.ts';
import { type Judge, judgeFor } from './judge.ts';

/** One transistor of a stage at one corner, solved once more. */
export interface StudiedCorner {
  /** Filled until the next corner is studied. */
  readonly point: OperatingPoint;
  /** Off state of that corner, where it is one to switch off from. */
  readonly off: OffState;
}

/**
 * Goes back to single corners after a run over all of them, for whoever needs the figures between: each is solved as
 * the run solved it, from the same start.
 */
export class CornerStudy {
  readonly criteria: readonly Criterion[];
  private readonly judge: Judge;
  private readonly rbOhm: number;
  private readonly frontOhm: number;

  private constructor(input: StageInput, rbOhm: number) {
    this.judge = judgeFor(input);
    this.rbOhm = rbOhm;
    this.frontOhm = input.preDriver?.baseResistor.valueOhm ?? 0;
    this.criteria = this.judge.criteria(rbOhm);
  }

  /** @returns null where the stage cannot be judged at all */
  static of(input: StageInput, rbOhm: number): CornerStudy | null {
    return obstacleTo(input) === null ? new CornerStudy(input, rbOhm) : null;
  }

  /** Names of the quantities a criterion's transistor was used beyond its rows with. */
  beyondRows(criterionId: string): readonly string[] {
    return this.sideOf(criterionId).traits().beyondRows;
  }

  /**
   * @param criterionId decides which of two transistors is meant
   * @param corner as the criterion reports it; null: the first
   */
  at(criterionId: string, corner: Corner | null): StudiedCorner {
    const { point } = this.sideOf(criterionId);
    const { corners, part } = point.model;
    const number = cornerNumber(corners, corner ?? {});
    const rbOhm = this.isFront(criterionId) ? this.frontOhm : this.rbOhm;
    const instant = 1 << corners.shift.instant;
    point.place(number & ~instant, rbOhm);
    const { ambientDegC } = point.condition;
    point.solve(ambientDegC);
    if ((number & instant) !== 0) {
      const startW = point.powerW;
      point.place(number, rbOhm);
      point.settle(ambientDegC + (part.rthJaKPerW ?? 0) * startW);
    }
    const off = new OffState(point.model);
    off.solve(point);
    return { point, off };
  }

  private isFront(criterionId: string): boolean {
    return criterionId.startsWith(PRE);
  }

  private sideOf(criterionId: string): Judge {
    return (this.isFront(criterionId) ? this.judge.preJudge : null) ?? this.judge;
  }
}
