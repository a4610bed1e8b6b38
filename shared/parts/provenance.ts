import * as z from 'zod';
import { line, optional } from '../stage/ranges.ts';

/**
 * How sure a figure is: `high`, read in the maker's table or in two makers' that agree; `medium`, from a
 * related document; `memory`, not confirmed.
 */
export const Confidence = z.enum(['high', 'medium', 'memory'], {
  error: 'expected "high", "medium" or "memory"',
});
export type Confidence = z.infer<typeof Confidence>;

/** Where a row comes from; null takes the record's own. `source` names documents by their id. */
export const provenance = {
  source: optional(line(200)),
  confidence: optional(Confidence),
  note: optional(line(300)),
};

/** The part of a row that says where it comes from. */
export interface Provenance {
  readonly source: string | null;
  readonly confidence: Confidence | null;
  readonly note: string | null;
}

/** A data sheet or other publication: maker, title, issue and pages. */
export const SourceDocument = z.strictObject({ id: line(40), title: line(400) });
export type SourceDocument = z.infer<typeof SourceDocument>;

/** What a source was used for; `all` covers every figure that names no other. */
export const SOURCE_USES = [
  'all',
  'limits',
  'electrical',
  'thermal',
  'alternative',
  'cross-check',
  'row-order',
] as const;

const SourceUse = z.strictObject({
  of: z.enum(SOURCE_USES, { error: `expected one of ${SOURCE_USES.join(', ')}` }),
  source: line(400),
});
export type SourceUse = z.infer<typeof SourceUse>;

/** What every record has, whatever the kind of part. */
export const partHead = {
  partNumber: line(60),
  aliases: z.array(line(60)).max(20).default([]),
  description: optional(line(200)),
  package: optional(line(60)),
  confidence: Confidence,
  sources: z.array(SourceUse).min(1, 'expected at least one source').max(20),
  documents: z.array(SourceDocument).max(40).default([]),
  notes: z.array(line(600)).max(40).default([]),
};

/**
 * The source behind rows of a group that name none themselves.
 *
 * @returns text of document ids, or null where the record names none for the group
 */
export function sourceOf(
  sources: readonly SourceUse[],
  group: 'limits' | 'electrical',
): string | null {
  const found = sources.find(({ of }) => of === group) ?? sources.find(({ of }) => of === 'all');
  return found?.source ?? null;
}

/** Titles of the documents a source text names, in the order of the record; the text itself if none. */
export function documentTitles(source: string, documents: readonly SourceDocument[]): string[] {
  const named = documents.filter(({ id }) => source.split(/[\s,;:()]+/).includes(id));
  return named.length === 0 ? [source] : named.map(({ title }) => title);
}
