import { HttpErrorResponse } from '@angular/common/http';
import { Problem, type FieldProblem, type ProblemCode } from '../../../shared/contract/problem.ts';

/** `unreachable`: no answer. `unknown-answer`: an answer outside the contract. */
export type ApiProblemCode = ProblemCode | 'unreachable' | 'unknown-answer';

/** A call that did not succeed, in words for the screen. */
export class ApiProblem extends Error {
  constructor(
    readonly code: ApiProblemCode,
    readonly title: string,
    /** What happened and what to do. */
    readonly detail: string,
    readonly errors: readonly FieldProblem[] = [],
    /** Names the request in the server's log; empty where it never got there. */
    readonly reference = '',
  ) {
    super(detail);
    this.name = 'ApiProblem';
  }
}

/** Turns whatever a call threw into an `ApiProblem`. */
export function toApiProblem(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  if (error instanceof HttpErrorResponse) return fromResponse(error);
  return new ApiProblem(
    'unknown-answer',
    'The answer could not be read',
    'The server answered in a way this page does not know. Reload the page.',
  );
}

function fromResponse(response: HttpErrorResponse): ApiProblem {
  if (response.status === 0) {
    return new ApiProblem(
      'unreachable',
      'The server cannot be reached',
      'Check the connection and try again. Nothing was lost.',
    );
  }
  const parsed = Problem.safeParse(readBody(response.error));
  if (parsed.success) {
    const { code, title, detail, errors, reference } = parsed.data;
    return new ApiProblem(code, title, detail, errors ?? [], reference);
  }
  return new ApiProblem(
    'unknown-answer',
    'The request failed',
    `The server answered ${response.status}. Try again.`,
  );
}

/** Problem documents have a media type of their own, which may arrive as text. */
function readBody(body: unknown): unknown {
  if (typeof body !== 'string') return body;
  try {
    return JSON.parse(body) as unknown;
  } catch {
    return null;
  }
}
