import './express-user.ts';
import type { ErrorRequestHandler, Request } from 'express';
import { type Problem, type ProblemCode, PROBLEMS } from '../../shared/contract/problem.ts';
import { ApiError } from './api-error.ts';
import { requestIdOf } from './request-log.ts';

/** Turns every rejection into RFC 9457 problem details; registered after all routes. */
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const refusal = toRefusal(error);
  log(request, refusal, error);
  const { retryAfterSec } = refusal.details;
  if (retryAfterSec !== undefined) response.set('Retry-After', String(Math.ceil(retryAfterSec)));
  response
    .status(PROBLEMS[refusal.code].status)
    .type('application/problem+json')
    .send(JSON.stringify(toProblem(refusal, requestIdOf(request))));
};

function toProblem(refusal: ApiError, reference: string): Problem {
  const { code, message, details } = refusal;
  return {
    type: `urn:sinkwell:problem:${code}`,
    ...PROBLEMS[code],
    ...{ code, detail: message, reference },
    ...(details.fields && { errors: [...details.fields] }),
  };
}

/** Refusals of Express and its body parser, by the `type` or status they carry. */
const LIBRARY_REFUSALS: Record<string, [ProblemCode, string]> = {
  'entity.too.large': ['body-too-large', 'The body is larger than 256 KiB.'],
  'encoding.unsupported': ['unsupported-type', 'The content encoding is not supported.'],
  'charset.unsupported': ['unsupported-type', 'The character set is not supported.'],
  'entity.parse.failed': ['unreadable-body', 'The body is not valid JSON.'],
  'request.size.invalid': ['unreadable-body', 'The body is not as long as announced.'],
  'request.aborted': ['unreadable-body', 'The request ended early.'],
};

function toRefusal(error: unknown): ApiError {
  if (error instanceof ApiError) return error;
  if (error instanceof URIError) return unreadable('The address is not valid.');
  if (error instanceof Error) {
    const { type, status, code } = error as Error & Record<'type' | 'status' | 'code', unknown>;
    const known = typeof type === 'string' ? LIBRARY_REFUSALS[type] : undefined;
    if (known) return new ApiError(...known);
    if (status === 400) return unreadable('The request could not be read.');
    if (code === 'SQLITE_BUSY') {
      return new ApiError('busy', 'The database is busy.', { retryAfterSec: 2 });
    }
  }
  return new ApiError('internal', 'It is logged under the reference given here.');
}

function unreadable(message: string): ApiError {
  return new ApiError('unreadable-body', message);
}

/** Defects whole; refused access and input as security events (who and where, never the values sent). */
function log(request: Request, { code, message, details }: ApiError, error: unknown): void {
  if (code === 'internal') {
    request.log.error({ event: 'defect', err: error }, 'unexpected error');
    return;
  }
  request.log.warn(
    {
      ...{ event: 'refused', problem: code, rule: details.rule, personId: request.user?.id },
      route: `${request.method} ${request.path.slice(0, 256)}`,
      fields: details.fields?.map(({ pointer }) => pointer),
    },
    message.slice(0, 256),
  );
}
