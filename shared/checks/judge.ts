import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';
import type { Criterion } from './evaluation.ts';
import { type CornerTraits, StageJudge } from './stage-judge.ts';
import { TwoTransistorJudge } from './two-transistor-judge.ts';

/** What judges a stage for one base resistor after another. */
export interface Judge {
  /** The output transistor's model and operating point. */
  readonly model: StageModel;
  readonly point: OperatingPoint;
  readonly cornerCount: number;
  /** The transistor in front after a run, where there is one. */
  readonly preJudge?: StageJudge | null;
  criteria(rbOhm: number): Criterion[];
  traits(): CornerTraits;
  probeMargin(rbOhm: number): number;
}

/** The judge that suits a stage's topology. */
export function judgeFor(input: StageInput): Judge {
  return input.topology === 'two-transistor-high-side' && input.preDriver !== null
    ? new TwoTransistorJudge(input, input.preDriver)
    : new StageJudge(input);
}
