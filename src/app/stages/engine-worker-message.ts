import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { ShuntSizing } from '../../../shared/sizing/size-shunt.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';

export interface EngineRequest {
  readonly id: number;
  readonly task: 'evaluate' | 'size' | 'shunt';
  readonly input: StageInput;
}

export interface EngineReply {
  readonly id: number;
  readonly result: Evaluation | Sizing | ShuntSizing | null;
}
