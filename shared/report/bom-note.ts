import * as z from 'zod';

export const BOM_NOTE_FORMAT = 'sinkwell-bom-note/1';

/** Units of values and ratings; keys of `QUANTITY_UNITS`. */
export const BomUnit = z.enum(['Ohm', 'V', 'A', 'W', 'F', '°C']);
export type BomUnit = z.infer<typeof BomUnit>;

const Text = z.string().nullable();

/** Equal parts of all stages on one line. */
export const BomLine = z.object({
  line: z.int(),
  quantity: z.int(),
  /** Naturally sorted; `flagged` where the revision is not locked or its part data changed since. */
  designators: z.array(z.object({ text: z.string(), flagged: z.boolean() })),
  description: z.string(),
  /** One value has min equal to max; a Zener voltage is a span. */
  value: z.object({ min: z.number(), max: z.number(), unit: BomUnit }).nullable(),
  tolerance: z.number().nullable(),
  ratings: z.array(z.object({ value: z.number(), unit: BomUnit })),
  package: Text,
  partNumber: Text,
  /** Empty where the library names none. */
  approvedSources: z.array(z.string()),
  partRevision: z.int().nullable(),
  /** Whether it rests on an unverified part revision, or on transistor figures typed by hand. */
  unverified: z.boolean(),
});
export type BomLine = z.infer<typeof BomLine>;

/** A revision the note stands on. */
export const BomRevision = z.object({
  revisionId: z.string(),
  stageId: z.string(),
  reference: z.string(),
  letter: z.string(),
  title: z.string(),
  quantity: z.int(),
  /** In words, such as `Locked` or `Locked, data changed`. */
  state: z.string(),
  locked: z.boolean(),
  partDataChanged: z.boolean(),
  verdict: z.string(),
  designer: z.string(),
  checker: Text,
  approver: Text,
  signedAtMs: z.int().nullable(),
  /** SHA-256 of the lock, hex. */
  hash: Text,
});
export type BomRevision = z.infer<typeof BomRevision>;

/** The data fields of ISO 7200 a note can fill; people are those of its revisions, without repeats. */
export const BomTitleBlock = z.object({
  projectCode: z.string(),
  legalOwner: z.string(),
  department: Text,
  title: z.string(),
  supplementaryTitle: Text,
  creators: z.array(z.string()),
  checkers: z.array(z.string()),
  /** Empty on what is not released: nobody approves that. */
  approvers: z.array(z.string()),
  documentType: z.string(),
  language: z.string(),
});
export type BomTitleBlock = z.infer<typeof BomTitleBlock>;

/** `flagged`: about this note's revisions; the others are the standing cautions. */
export const BomCaution = z.object({ text: z.string(), flagged: z.boolean() });
export type BomCaution = z.infer<typeof BomCaution>;

/** What purchasing and production get: a snapshot that every document of the note is made from. */
export const BomNote = z
  .object({
    format: z.literal(BOM_NOTE_FORMAT),
    /** Whether every revision is locked; else each sheet says NOT RELEASED. */
    released: z.boolean(),
    /** Of the issue, or of the preview. */
    atMs: z.int(),
    /** null on a preview. */
    issue: z
      .object({ identification: z.string(), number: z.int(), issuedBy: z.string() })
      .nullable(),
    titleBlock: BomTitleBlock,
    counts: z.object({
      stages: z.int(),
      locked: z.int(),
      lines: z.int(),
      partsPerBoard: z.int(),
      partsChanged: z.int(),
      partsUnverified: z.int(),
    }),
    lines: z.array(BomLine),
    revisions: z.array(BomRevision),
    cautions: z.array(BomCaution),
    /** Version of the program that made the note. */
    program: z.string(),
    /** SHA-256, hex, over the canonical JSON (RFC 8785) of all of the above; null on a preview. */
    contentHash: z.string().nullable(),
  })
  .meta({ id: 'BomNote' });
export type BomNote = z.infer<typeof BomNote>;
