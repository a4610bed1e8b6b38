import * as z from 'zod';
import { Evaluation } from '../checks/evaluation.ts';
import { REVISION_STATES } from '../review/revision-state.ts';
import { StageInput } from '../stage/stage-input.ts';
import {
  answerFindingRequest,
  CheckRecord,
  closeFindingRequest,
  raiseFindingRequest,
  reopenFindingRequest,
  ReviewFinding,
  saveCheckRequest,
} from './check.ts';
import { Id, Password, PersonRef, Prose, TimeMs } from './common-fields.ts';
import { PortVerdict } from './project.ts';
import type { Route } from './route.ts';

const Designator = z
  .string({ error: 'expected a designator such as R30' })
  .trim()
  .regex(/^[A-Z]{1,3}[0-9]{1,5}[A-Z]?$/, 'expected a designator such as R30')
  .nullable();

/** Designators of the parts around the transistor, as the board's drawing has them. */
export const Designators = z.strictObject({
  baseResistor: Designator,
  shuntResistor: Designator,
  pullUp: Designator,
  speedUpCapacitor: Designator,
  load: Designator,
  clamp: Designator,
  clampZener: Designator,
  drive: Designator,
  loadResistor: Designator,
  preDriver: Designator,
  preBaseResistor: Designator,
  preShuntResistor: Designator,
});
export type Designators = z.infer<typeof Designators>;

/** Which library revision a part's figures were filled from; null where typed by hand. */
const PartLink = z
  .strictObject({ partRevisionId: Id, choice: z.record(z.string().max(40), z.string().max(60)) })
  .nullable();
export const PartLinks = z.strictObject({
  transistor: PartLink,
  preDriver: PartLink,
  load: PartLink,
  drive: PartLink,
  clamp: PartLink,
});
export type PartLinks = z.infer<typeof PartLinks>;

/** One linked part as it stands in the library now. */
export const PartStanding = z.object({
  role: z.enum(['transistor', 'preDriver', 'load', 'drive', 'clamp']),
  partId: Id,
  partNumber: z.string(),
  revision: z.int(),
  latestRevision: z.int(),
  verified: z.boolean(),
});
export type PartStanding = z.infer<typeof PartStanding>;

export const ACTIONS = [
  'save',
  'submit',
  'check',
  'close',
  'pass',
  'return',
  'send-back',
  'lock',
  'withdraw',
  'revise',
  'answer',
] as const;
export type Action = (typeof ACTIONS)[number];

/** Whether the person asking may do it, and if not, why, in a sentence for the screen. */
const Permission = z.object({ allowed: z.boolean(), reason: z.string().nullable() });

export const Lock = z.object({
  approver: PersonRef,
  signedAtMs: TimeMs,
  meaning: z.string(),
  /** SHA-256, hex, over the canonical JSON (RFC 8785) of what was locked. */
  hash: z.string(),
  /** Whether the hash recomputed for this reply is still the signed one. */
  intact: z.boolean(),
});
export type Lock = z.infer<typeof Lock>;

/** Who took a revision back, when and why. */
const Reason = z.object({ by: PersonRef, atMs: TimeMs, reason: z.string() });

/** One revision of a stage. The ETag of this resource guards every change to it. */
export const Revision = z
  .object({
    id: Id,
    stageId: Id,
    projectId: Id,
    projectCode: z.string(),
    projectTitle: z.string(),
    letter: z.string(),
    state: z.enum(REVISION_STATES),
    definition: StageInput,
    evaluation: Evaluation,
    designators: Designators,
    parts: PartLinks,
    partStanding: z.array(PartStanding),
    /** The port of the stage's pin with this revision counted among the project's; null where it names none. */
    port: PortVerdict.nullable(),
    policyVersion: z.int(),
    designer: PersonRef,
    authors: z.array(PersonRef),
    createdAtMs: TimeMs,
    savedAtMs: TimeMs,
    submittedAtMs: TimeMs.nullable(),
    submittedBy: PersonRef.nullable(),
    checkedAtMs: TimeMs.nullable(),
    checkedBy: PersonRef.nullable(),
    /** The last return to draft, until it is submitted again. */
    returned: Reason.nullable(),
    withdrawn: Reason.nullable(),
    /** The check of the latest submission. */
    check: CheckRecord.nullable(),
    findings: z.array(ReviewFinding),
    lock: Lock.nullable(),
    /** The revision this one was copied from. */
    previous: z.object({ id: Id, letter: z.string() }).nullable(),
    may: z.object(
      Object.fromEntries(ACTIONS.map((action) => [action, Permission])) as Record<
        Action,
        typeof Permission
      >,
    ),
  })
  .meta({ id: 'Revision' });
export type Revision = z.infer<typeof Revision>;

const params = z.strictObject({ revisionId: Id });

export const readRevision = {
  method: 'GET',
  path: '/api/revisions/:revisionId',
  summary: 'One revision',
  params,
  reply: Revision,
} as const satisfies Route;

/** Definition and result are saved together; the project's policy is put in by the server. */
export const saveRevision = {
  method: 'PUT',
  path: '/api/revisions/:revisionId',
  summary: 'Save a draft',
  params,
  body: z.strictObject({ definition: StageInput, designators: Designators, parts: PartLinks }),
  reply: Revision,
  guarded: true,
} as const satisfies Route;

export const submitRevision = {
  method: 'POST',
  path: '/api/revisions/:revisionId/submission',
  summary: 'Submit a draft for check: definition and part data are frozen',
  params,
  reply: Revision,
  guarded: true,
} as const satisfies Route;

export const passRevision = {
  method: 'POST',
  path: '/api/revisions/:revisionId/pass',
  summary: 'Pass the check',
  params,
  reply: Revision,
  guarded: true,
} as const satisfies Route;

/** From In check by a checker, or from Checked by an approver. */
export const returnRevision = {
  method: 'POST',
  path: '/api/revisions/:revisionId/return',
  summary: 'Return to draft, with the reason',
  params,
  body: z.strictObject({ reason: Prose(2000).min(1, 'expected a reason') }),
  reply: Revision,
  guarded: true,
} as const satisfies Route;

export const withdrawRevision = {
  method: 'POST',
  path: '/api/revisions/:revisionId/withdrawal',
  summary: 'Withdraw a revision that is not locked',
  params,
  body: z.strictObject({ reason: Prose(2000).min(1, 'expected a reason') }),
  reply: Revision,
  guarded: true,
} as const satisfies Route;

/** What will be signed: shown before the password is asked. */
export const LockPreview = z.object({
  meaning: z.string(),
  hash: z.string(),
  recomputed: z.boolean(),
});
export const previewLock = {
  method: 'GET',
  path: '/api/revisions/:revisionId/lock',
  summary: 'Meaning and hash of the signature about to be given',
  params,
  reply: LockPreview,
} as const satisfies Route;

/** The password is the second act of signing; `hash` must be the one that was shown. */
export const lockRevision = {
  method: 'POST',
  path: '/api/revisions/:revisionId/lock',
  summary: 'Sign and lock',
  params,
  body: z.strictObject({ password: Password, hash: z.string().regex(/^[0-9a-f]{64}$/) }),
  reply: Revision,
  guarded: true,
} as const satisfies Route;

export const verifyRevision = {
  method: 'GET',
  path: '/api/revisions/:revisionId/verification',
  summary: 'Recompute hash and result of a locked revision and say what differs',
  params,
  reply: z.object({
    whole: z.boolean(),
    storedHash: z.string(),
    recomputedHash: z.string(),
    differences: z.array(z.string()),
  }),
} as const satisfies Route;

export const checkRoutes = {
  save: { ...saveCheckRequest, reply: Revision },
  raise: { ...raiseFindingRequest, reply: Revision },
  answer: { ...answerFindingRequest, reply: Revision },
  close: { ...closeFindingRequest, reply: Revision },
  reopen: { ...reopenFindingRequest, reply: Revision },
} as const satisfies Record<string, Route>;
