import type { FieldProblem, ProblemCode } from '../../shared/contract/problem.ts';

/** What a refusal may carry besides its code and sentence. */
export interface RefusalDetails {
  /** Fields at fault. */
  readonly fields?: readonly FieldProblem[];
  /** The rule that refused, for the security log. */
  readonly rule?: string;
  /** Seconds after which a repeat may succeed. */
  readonly retryAfterSec?: number;
}

/** A refusal the caller can act on. Anything else thrown is a defect and answers 500. */
export class ApiError extends Error {
  constructor(
    readonly code: ProblemCode,
    message: string,
    readonly details: RefusalDetails = {},
  ) {
    super(message);
  }
}

/** The one answer for what does not exist and for what the caller may not know of. */
export function notFound(): ApiError {
  return new ApiError('not-found', 'There is nothing here, or it is not yours to see.');
}
