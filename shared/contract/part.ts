import * as z from 'zod';
import { PART_KINDS, PartRecord } from '../parts/part-record.ts';
import { Confidence } from '../parts/provenance.ts';
import { REVISION_STATES } from '../review/revision-state.ts';
import { Id, PersonRef, Prose, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';

export const PartKind = z.enum(PART_KINDS);

/** Somebody other than the author read the data back against a document. */
export const PartVerification = z.object({
  by: PersonRef,
  atMs: TimeMs,
  /** Data sheet or other document, with its issue. */
  document: z.string(),
  note: z.string(),
});
export type PartVerification = z.infer<typeof PartVerification>;

/** One part of the list, by its latest revision. */
export const PartRow = z.object({
  id: Id,
  kind: PartKind,
  partNumber: z.string(),
  /** One line: "NPN, 40 V, 0.2 A". */
  summary: z.string(),
  package: z.string().nullable(),
  /** Of the record, where its kind has them. */
  family: z.string().nullable(),
  polarity: z.string().nullable(),
  confidence: Confidence,
  latestRevisionId: Id,
  revision: z.int(),
  verified: z.boolean(),
  changedAtMs: TimeMs,
});
export type PartRow = z.infer<typeof PartRow>;

export const listParts = {
  method: 'GET',
  path: '/api/parts',
  summary: 'The part library',
  query: z.strictObject({
    kind: PartKind.optional(),
    search: z.string().max(100).optional(),
    verified: z.enum(['yes', 'no']).optional(),
    sort: z.enum(['partNumber', 'summary', 'package', 'changed']).default('partNumber'),
    direction: z.enum(['asc', 'desc']).default('asc'),
    page: z.coerce.number().int().min(1).max(100000).default(1),
    pageSize: z.coerce.number().int().min(1).max(500).default(100),
  }),
  reply: z.object({ parts: z.array(PartRow), matching: z.int(), total: z.int() }),
} as const satisfies Route;

/** A part of the library with its latest data whole: what a ranking over the library reads in one request. */
export const LatestRecord = z.object({
  partId: Id,
  partRevisionId: Id,
  verified: z.boolean(),
  record: PartRecord,
});
export type LatestRecord = z.infer<typeof LatestRecord>;

export const listRecords = {
  method: 'GET',
  path: '/api/part-records',
  summary: 'The latest data of every part of a kind',
  query: z.strictObject({ kind: PartKind }),
  reply: z.object({ parts: z.array(LatestRecord) }),
} as const satisfies Route;

/** A part's data as they stood at one edit; never changed, only followed by a newer revision. */
export const PartRevision = z
  .object({
    id: Id,
    partId: Id,
    number: z.int(),
    record: PartRecord,
    summary: z.string(),
    /** What was changed, and why. */
    comment: z.string(),
    /** null for the library shipped with the product. */
    author: PersonRef.nullable(),
    createdAtMs: TimeMs,
    verification: PartVerification.nullable(),
  })
  .meta({ id: 'PartRevision' });
export type PartRevision = z.infer<typeof PartRevision>;

/** A current stage revision filled from some revision of the part; of own projects only. */
export const PartUse = z.object({
  revisionId: Id,
  projectCode: z.string(),
  reference: z.string(),
  letter: z.string(),
  title: z.string(),
  state: z.enum(REVISION_STATES),
  partRevision: z.int(),
});
export type PartUse = z.infer<typeof PartUse>;

const Permission = z.object({ allowed: z.boolean(), reason: z.string().nullable() });

export const Part = z
  .object({
    id: Id,
    kind: PartKind,
    partNumber: z.string(),
    /** The latest revision, whole. */
    latest: PartRevision,
    /** All revisions, newest first. */
    revisions: z.array(
      PartRevision.pick({
        id: true,
        number: true,
        comment: true,
        author: true,
        createdAtMs: true,
        verification: true,
      }),
    ),
    uses: z.array(PartUse),
    /** Over all projects. */
    usedIn: z.object({ stages: z.int(), projects: z.int() }),
    may: z.object({ revise: Permission, verify: Permission }),
  })
  .meta({ id: 'Part' });
export type Part = z.infer<typeof Part>;

const params = z.strictObject({ partId: Id });
const revisionParams = z.strictObject({ partRevisionId: Id });

export const readPart = {
  method: 'GET',
  path: '/api/parts/:partId',
  summary: 'A part with its latest data and all its revisions',
  params,
  reply: Part,
} as const satisfies Route;

export const readPartRevision = {
  method: 'GET',
  path: '/api/part-revisions/:partRevisionId',
  summary: 'The data of one part revision',
  params: revisionParams,
  reply: PartRevision,
} as const satisfies Route;

const PartFields = z.strictObject({
  record: PartRecord,
  comment: Prose(1000).min(1, 'expected what was entered or changed, and why'),
});

/** Designers of any project and administrators keep the library. */
export const createPart = {
  method: 'POST',
  path: '/api/parts',
  summary: 'Add a part to the library, unverified',
  body: PartFields,
  reply: Part,
  status: 201,
} as const satisfies Route;

/** Kind and part number stay; stages filled from the older data are flagged. */
export const revisePart = {
  method: 'POST',
  path: '/api/parts/:partId/revisions',
  summary: "Change a part's data: a new revision, unverified",
  params,
  body: PartFields,
  reply: Part,
  status: 201,
  guarded: true,
} as const satisfies Route;

/** By a checker of any project or an administrator, other than the author. */
export const verifyPart = {
  method: 'POST',
  path: '/api/part-revisions/:partRevisionId/verification',
  summary: 'State that the data were read back against a document',
  params: revisionParams,
  body: z.strictObject({
    document: Prose(200).min(1, 'expected the document the data were read against'),
    note: Prose(2000),
  }),
  reply: Part,
  status: 201,
} as const satisfies Route;
