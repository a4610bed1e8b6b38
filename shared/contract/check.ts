import * as z from 'zod';
import { Id, PersonRef, Prose, TimeMs } from './common-fields.ts';

/** Above this difference between the checker's figure and the tool's, a reason is asked. */
export const DIFFERENCE_NEEDS_REASON = 0.05;

export const CheckMethod = z.enum(['hand', 'bench']);

const CheckFields = {
  /** The independent overdrive factor. */
  overdriveFactor: z
    .number({ error: 'expected an overdrive factor above 0' })
    .gt(0, 'expected an overdrive factor above 0')
    .max(1e6, 'expected an overdrive factor up to 1 000 000')
    .nullable(),
  method: CheckMethod.nullable(),
  /** How the figure was got. */
  note: Prose(4000),
  /** Why it differs by more than 5 %; empty where it does not. */
  reason: Prose(4000),
  /** Criterion id → why a marginal or open one is acceptable. */
  justifications: z.record(z.string().max(60), Prose(4000)),
  /** Criteria the checker has ticked as read. */
  read: z.array(z.string().max(60)).max(200),
};

export const CheckRecord = z.object({
  ...CheckFields,
  checker: PersonRef,
  savedAtMs: TimeMs,
  /** (checker's − tool's)/tool's, signed; null until both exist. */
  difference: z.number().nullable(),
  /** What is still missing before it can pass, as sentences; empty when nothing is. */
  missing: z.array(z.string()),
});
export type CheckRecord = z.infer<typeof CheckRecord>;

export const FindingSubject = z.strictObject({
  kind: z.enum(['criterion', 'field']),
  /** Criterion id, or dotted path into the definition. */
  id: z.string().min(1).max(80),
});

export const FindingEvent = z.object({
  atMs: TimeMs,
  by: PersonRef,
  act: z.enum(['raised', 'answered', 'closed', 'reopened']),
  text: z.string(),
});

/** A numbered finding of the check; numbers run through the stage's revision. */
export const ReviewFinding = z.object({
  id: Id,
  number: z.int(),
  subject: FindingSubject,
  title: z.string(),
  state: z.enum(['open', 'answered', 'closed']),
  history: z.array(FindingEvent),
});
export type ReviewFinding = z.infer<typeof ReviewFinding>;

const params = z.strictObject({ revisionId: Id });
const findingParams = z.strictObject({ revisionId: Id, findingId: Id });

// These answer with the whole revision, which is defined above this file: see checkRoutes in revision.ts.

export const saveCheckRequest = {
  method: 'PUT',
  path: '/api/revisions/:revisionId/check',
  summary: "Save the checker's own figure, justifications and ticks",
  params,
  body: z.strictObject(CheckFields),
  guarded: true,
} as const;

export const raiseFindingRequest = {
  method: 'POST',
  path: '/api/revisions/:revisionId/findings',
  summary: 'Raise a finding',
  params,
  body: z.strictObject({
    subject: FindingSubject,
    title: Prose(120).min(1, 'expected a title'),
    text: Prose(4000),
  }),
  guarded: true,
} as const;

export const answerFindingRequest = {
  method: 'POST',
  path: '/api/revisions/:revisionId/findings/:findingId/answer',
  summary: 'Answer a finding (designer)',
  params: findingParams,
  body: z.strictObject({ text: Prose(4000).min(1, 'expected an answer') }),
  guarded: true,
} as const;

export const closeFindingRequest = {
  method: 'POST',
  path: '/api/revisions/:revisionId/findings/:findingId/closure',
  summary: 'Close a finding (checker)',
  params: findingParams,
  body: z.strictObject({ text: Prose(4000) }),
  guarded: true,
} as const;

export const reopenFindingRequest = {
  method: 'POST',
  path: '/api/revisions/:revisionId/findings/:findingId/reopening',
  summary: 'Keep a finding open (checker)',
  params: findingParams,
  body: z.strictObject({ text: Prose(4000).min(1, 'expected a reason') }),
  guarded: true,
} as const;
