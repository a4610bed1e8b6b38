import { evaluateStage } from '../checks/evaluate-stage.ts';
import type { Evaluation } from '../checks/evaluation.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { sizeStage } from './size-stage.ts';
import type { Sizing } from './sizing.ts';

/** A stage judged and sized; its base resistor is the one judged. */
export interface JudgedStage {
  readonly input: StageInput;
  readonly evaluation: Evaluation;
  readonly sizing: Sizing;
}

/**
 * Judges and sizes a stage. A base resistor left open (`valueOhm` null) is judged at the recommended value;
 * without one the verdict is `fail`.
 */
export function judgeStage(input: StageInput): JudgedStage {
  const sizing = sizeStage(input);
  const valueOhm = input.baseResistor.valueOhm ?? sizing.recommendedOhm;
  const judged = { ...input, baseResistor: { ...input.baseResistor, valueOhm } };
  return { input: judged, evaluation: evaluateStage(judged), sizing };
}
