import type { Criterion, Evaluation } from '../checks/evaluation.ts';
import type { JudgedStage } from './judge-stage.ts';
import type { Sizing } from './sizing.ts';

export const RESULT_FORMAT = 'sinkwell-result/1';

/** What the command line prints for a stage file. */
export interface StageResult {
  readonly format: typeof RESULT_FORMAT;
  readonly reference: string;
  readonly verdict: Evaluation['verdict'];
  readonly engine: string;
  readonly corners: number;
  readonly criteria: readonly Criterion[];
  readonly nominal: Evaluation['nominal'];
  readonly sizing: Omit<Sizing, 'conflict'>;
  readonly findings: Evaluation['findings'];
}

/** The `sinkwell-result/1` document of a judged stage, keys in the format's order. */
export function stageResult({ evaluation, sizing }: JudgedStage): StageResult {
  const { reference, verdict, engine, corners, criteria, nominal, findings } = evaluation;
  const { rbMinOhm, rbMaxOhm, setBy, recommendedOhm, candidates } = sizing;
  return {
    format: RESULT_FORMAT,
    reference,
    verdict,
    engine,
    corners,
    criteria,
    nominal,
    sizing: { rbMinOhm, rbMaxOhm, setBy, recommendedOhm, candidates },
    findings,
  };
}
