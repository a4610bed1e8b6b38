import * as z from 'zod';

/** Every refusal the server can give, with its HTTP status (RFC 9457 problem details). */
export const PROBLEMS = {
  'unreadable-body': { status: 400, title: 'The request could not be read' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'wrong-credentials': { status: 401, title: 'E-mail or password is not right' },
  'not-permitted': { status: 403, title: 'Not permitted' },
  'request-forged': { status: 403, title: 'The request did not come from this application' },
  'not-found': { status: 404, title: 'Not found' },
  conflict: { status: 409, title: 'Not possible in this state' },
  'revision-locked': { status: 409, title: 'The revision is locked' },
  'version-conflict': { status: 412, title: 'Somebody else saved in the meantime' },
  'body-too-large': { status: 413, title: 'Too large' },
  'unsupported-type': { status: 415, title: 'Content type is not supported' },
  'invalid-input': { status: 422, title: 'Some values are not right' },
  'version-required': { status: 428, title: 'If-Match is missing' },
  'too-many-requests': { status: 429, title: 'Too many requests' },
  internal: { status: 500, title: 'Something went wrong on the server' },
  busy: { status: 503, title: 'The server is busy' },
} as const satisfies Record<string, { status: number; title: string }>;
export type ProblemCode = keyof typeof PROBLEMS;

/** One field at fault: a JSON pointer into the body (or `/query/…`, `/params/…`) and what was expected. */
export const FieldProblem = z.object({ pointer: z.string(), message: z.string() });
export type FieldProblem = z.infer<typeof FieldProblem>;

export const Problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    code: z.enum(Object.keys(PROBLEMS) as [ProblemCode, ...ProblemCode[]]),
    detail: z.string(),
    /** Names the request in the server's log. */
    reference: z.string(),
    errors: z.array(FieldProblem).optional(),
  })
  .meta({ id: 'Problem' });
export type Problem = z.infer<typeof Problem>;
