import * as z from 'zod';
import { Id, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';

/** One line of the hash-chained audit trail. */
export const AuditLine = z
  .object({
    sequence: z.int(),
    atMs: TimeMs,
    /** Real name at that time; null for the server itself. */
    who: z.string().nullable(),
    whoId: Id.nullable(),
    /** For example `revision.submitted`. */
    action: z.string(),
    objectKind: z.string(),
    objectId: z.string(),
    /** What a reader calls the object: `Q12 B`, `CR-40`, an address. */
    objectName: z.string(),
    projectId: Id.nullable(),
    /** A sentence for people, without the name in front: "submitted Q12 B for check". */
    summary: z.string(),
    /** Old and new values, reasons, hashes; for the administrator. */
    detail: z.record(z.string(), z.unknown()),
    hash: z.string(),
  })
  .meta({ id: 'AuditLine' });
export type AuditLine = z.infer<typeof AuditLine>;

export const Activity = AuditLine.pick({
  sequence: true,
  atMs: true,
  who: true,
  whoId: true,
  action: true,
  objectKind: true,
  objectId: true,
  objectName: true,
  summary: true,
});
export type Activity = z.infer<typeof Activity>;

export const listAudit = {
  method: 'GET',
  path: '/api/audit',
  summary: 'The audit trail, newest first (administrator)',
  query: z.strictObject({
    before: z.coerce.number().int().min(1).optional(),
    limit: z.coerce.number().int().min(1).max(200).default(100),
    search: z.string().max(100).optional(),
  }),
  reply: z.object({ lines: z.array(AuditLine), total: z.int() }),
} as const satisfies Route;

export const verifyAudit = {
  method: 'GET',
  path: '/api/audit/verification',
  summary: 'Recompute the whole chain (administrator)',
  reply: z.object({
    whole: z.boolean(),
    lines: z.int(),
    head: z.string(),
    /** What does not fit, first faults first. */
    faults: z.array(z.object({ sequence: z.int(), problem: z.string() })),
  }),
} as const satisfies Route;

export const projectActivity = {
  method: 'GET',
  path: '/api/projects/:projectId/activity',
  summary: 'What happened in a project, newest first (members)',
  params: z.strictObject({ projectId: Id }),
  query: z.strictObject({ limit: z.coerce.number().int().min(1).max(200).default(50) }),
  reply: z.object({ lines: z.array(Activity) }),
} as const satisfies Route;
