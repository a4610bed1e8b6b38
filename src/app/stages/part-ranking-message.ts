import type { TransistorRecord } from '../../../shared/parts/transistor-record.ts';
import type { JudgedPart } from '../../../shared/sizing/rank-parts.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';

/** A stage and the library parts to judge in it. */
export interface RankingRequest {
  readonly stage: StageInput;
  readonly parts: readonly { readonly key: string; readonly record: TransistorRecord }[];
}

/** One part judged; they come one by one. */
export interface RankingReply {
  readonly key: string;
  readonly part: JudgedPart;
}
