import { evaluateStage } from '../../shared/checks/evaluate-stage.ts';
import type { Evaluation } from '../../shared/checks/evaluation.ts';
import { judgeStage } from '../../shared/sizing/judge-stage.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';
import type { PolicyEntity } from '../policies/policy-entity.ts';
import { rowFigures, type RowFigures } from './row-figures.ts';

/** A definition with the server's own result, as both are stored: together or not at all. */
export interface Judged extends RowFigures {
  readonly definition: StageInput;
  readonly evaluation: Evaluation;
  readonly policyId: string;
}

/**
 * Judges a definition under a policy of the server's choosing. Pure but not short: call it before the
 * transaction. An open base resistor is judged at the recommended value and stays open.
 */
export function judge(given: StageInput, policy: PolicyEntity): Judged {
  const definition = { ...given, policy: { name: policy.name, ...policy.limits } };
  const evaluation =
    definition.baseResistor.valueOhm === null
      ? judgeStage(definition).evaluation
      : evaluateStage(definition);
  return { ...rowFigures(definition, evaluation), definition, evaluation, policyId: policy.id };
}

/** The columns a result fills. TypeORM's deep-partial type cannot express whole JSON documents. */
export function columnsOf(judged: Judged): object {
  return judged;
}
