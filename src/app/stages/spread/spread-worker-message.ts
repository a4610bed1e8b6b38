import type { SampleRequest, SampleSpread } from '../../../../shared/statistics/monte-carlo.ts';
import type { Sensitivity } from '../../../../shared/statistics/sensitivity.ts';
import type { StageInput } from '../../../../shared/stage/stage-input.ts';

/** Starts the samples of a stage, and with them ends those of an older request. */
export interface SpreadStart {
  readonly id: number;
  readonly input: StageInput;
  readonly request: SampleRequest;
}

/** Ends a request that is still running. */
export interface SpreadStop {
  readonly id: number;
  readonly input: null;
}

export type SpreadOrder = SpreadStart | SpreadStop;

/** How far the worker is; at the end with the spread. */
export interface SpreadReport {
  readonly id: number;
  readonly samples: number;
  readonly sensitivity: Sensitivity;
  readonly spread: SampleSpread | null;
}
