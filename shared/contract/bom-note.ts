import * as z from 'zod';
import { BomNote } from '../report/bom-note.ts';
import { REVISION_STATES } from '../review/revision-state.ts';
import { Id, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';

export const DOCUMENT_FORMATS = ['pdf', 'xlsx', 'csv'] as const;
export const DocumentFormat = z.enum(DOCUMENT_FORMATS, { error: 'expected pdf, xlsx or csv' });
export type DocumentFormat = z.infer<typeof DocumentFormat>;

const projectParams = z.strictObject({ projectId: Id });
const noteParams = z.strictObject({ noteId: Id });

/** Decimal mark of the CSV; a comma takes semicolons between the fields. */
const decimalMark = z
  .enum(['point', 'comma'], { error: 'expected point or comma' })
  .default('point');

const ID_LIST = /^[0-9a-f-]{36}(,[0-9a-f-]{36}){0,399}$/i;

const choice = {
  /** `true` takes the current revision of every stage, locked or not; else the locked one where there is one. */
  unlocked: z
    .enum(['true', 'false'], { error: 'expected true or false' })
    .default('false')
    .transform((text) => text === 'true'),
  /** Ids of stages to leave out, separated by commas. */
  without: z
    .string()
    .regex(ID_LIST, 'expected up to 400 ids, separated by commas')
    .optional()
    .transform((text) => text?.toLowerCase().split(',') ?? []),
};

/** A stage of the project, and what the note takes of it. */
export const NoteStage = z.object({
  stageId: Id,
  reference: z.string(),
  title: z.string(),
  /** The revision the note takes; null where it takes none. */
  revisionId: Id.nullable(),
  letter: z.string(),
  state: z.enum(REVISION_STATES),
  chosen: z.boolean(),
  /** Why it cannot be chosen; null where it can. */
  reason: z.string().nullable(),
});
export type NoteStage = z.infer<typeof NoteStage>;

export const previewBomNote = {
  method: 'GET',
  path: '/api/projects/:projectId/bom-note',
  summary: 'What a BOM note of the project would say now',
  params: projectParams,
  query: z.strictObject(choice),
  reply: z.object({
    note: BomNote,
    stages: z.array(NoteStage),
    /** Whether the person asking may issue just this note, and if not, why. */
    issue: z.object({ allowed: z.boolean(), reason: z.string().nullable() }),
  }),
} as const satisfies Route;
export type BomNotePreview = z.infer<typeof previewBomNote.reply>;

export const previewBomNoteFile = {
  method: 'GET',
  path: '/api/projects/:projectId/bom-note/files/:format',
  summary: 'The preview as a file; NOT RELEASED across it where anything is not locked',
  params: z.strictObject({ projectId: Id, format: DocumentFormat }),
  query: z.strictObject({ ...choice, decimalMark }),
  reply: null,
  file: true,
} as const satisfies Route;

export const IssuedNoteRow = z
  .object({
    id: Id,
    identification: z.string(),
    number: z.int(),
    issuedAtMs: TimeMs,
    issuedBy: z.string(),
    stages: z.int(),
    lines: z.int(),
    partsPerBoard: z.int(),
    contentHash: z.string(),
  })
  .meta({ id: 'IssuedNoteRow' });
export type IssuedNoteRow = z.infer<typeof IssuedNoteRow>;

export const listBomNotes = {
  method: 'GET',
  path: '/api/projects/:projectId/bom-notes',
  summary: 'The issued BOM notes of a project, newest first',
  params: projectParams,
  reply: z.object({ notes: z.array(IssuedNoteRow) }),
} as const satisfies Route;

export const IssuedBomNote = z
  .object({
    id: Id,
    projectId: Id,
    note: BomNote,
    /** Whether content and content hash still fit; made again for every reply. */
    intact: z.boolean(),
    /** Whether the person asking may download it, and if not, why. */
    download: z.object({ allowed: z.boolean(), reason: z.string().nullable() }),
  })
  .meta({ id: 'IssuedBomNote' });
export type IssuedBomNote = z.infer<typeof IssuedBomNote>;

/** Names the revisions one has seen: a note of others is refused, as is one of anything not locked. */
export const issueBomNote = {
  method: 'POST',
  path: '/api/projects/:projectId/bom-notes',
  summary: 'Issue a BOM note of locked revisions (exporter)',
  params: projectParams,
  body: z.strictObject({
    revisionIds: z
      .array(Id)
      .min(1, 'expected at least one revision')
      .max(2000, 'expected at most 2000 revisions'),
  }),
  reply: IssuedBomNote,
  status: 201,
} as const satisfies Route;

export const readBomNote = {
  method: 'GET',
  path: '/api/bom-notes/:noteId',
  summary: 'One issued BOM note',
  params: noteParams,
  reply: IssuedBomNote,
} as const satisfies Route;

export const downloadBomNote = {
  method: 'GET',
  path: '/api/bom-notes/:noteId/files/:format',
  summary: 'An issued BOM note as a file (exporter)',
  params: z.strictObject({ noteId: Id, format: DocumentFormat }),
  query: z.strictObject({ decimalMark }),
  reply: null,
  file: true,
} as const satisfies Route;
