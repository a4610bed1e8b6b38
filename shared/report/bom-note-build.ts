import { BOM_NOTE_FORMAT, type BomNote, type BomRevision, type BomTitleBlock } from './bom-note.ts';
import { noteCautions } from './bom-note-cautions.ts';
import { mergeLines } from './bom-note-lines.ts';
import { changedParts, type NoteSource } from './bom-note-source.ts';
import { fittedParts } from './fitted-parts.ts';
import { naturalOrder } from './natural-order.ts';

/** What the title block takes from the project. */
export interface NoteProject {
  readonly code: string;
  readonly title: string;
  readonly supplementaryTitle: string | null;
  readonly legalOwner: string;
  readonly department: string | null;
}

/** When and as what the note is made. */
export interface NoteOccasion {
  /** UTC, ms since 1970; of the issue, or of the preview. */
  readonly atMs: number;
  /** null for a preview. */
  readonly issue: { readonly number: number; readonly issuedBy: string } | null;
  /** Name and version of the program. */
  readonly program: string;
}

/**
 * The BOM note of a project's revisions: lines merged over the stages, what it stands on, and the cautions.
 * Any revision that is not locked makes the whole note not released. `contentHash` is left null: hashing is
 * the business of whoever issues it.
 *
 * @throws {RangeError} if an issue is asked for with a revision that is not locked, or with none at all
 */
export function buildBomNote(
  project: NoteProject,
  given: readonly NoteSource[],
  { atMs, issue, program }: NoteOccasion,
): BomNote {
  const sources = [...given].sort((a, b) =>
    naturalOrder(a.definition.reference, b.definition.reference),
  );
  const locked = sources.filter((source) => source.lock !== null).length;
  const released = sources.length > 0 && locked === sources.length;
  if (issue !== null && !released)
    throw new RangeError('a note is issued of locked revisions only');
  const merged = mergeLines(sources.flatMap(fittedParts));
  const lines = merged.map(({ line }) => line);
  return {
    format: BOM_NOTE_FORMAT,
    released,
    atMs,
    issue: issue && { ...issue, identification: noteIdentification(project.code, issue.number) },
    titleBlock: titleBlock(project, sources, released),
    counts: {
      stages: sources.length,
      locked,
      lines: lines.length,
      partsPerBoard: lines.reduce((sum, line) => sum + line.quantity, 0),
      partsChanged: new Set(sources.flatMap(changedParts).map((part) => part.partNumber)).size,
      partsUnverified: lines.filter((line) => line.unverified).length,
    },
    lines,
    revisions: sources.map(revision),
    cautions: noteCautions(sources, merged),
    program,
    contentHash: null,
  };
}

/** `CR-40-BOM-0007` */
export function noteIdentification(projectCode: string, number: number): string {
  return `${projectCode}-BOM-${String(number).padStart(4, '0')}`;
}

function revision(source: NoteSource): BomRevision {
  const { definition, lock } = source;
  const partDataChanged = changedParts(source).length > 0;
  return {
    revisionId: source.revisionId,
    stageId: source.stageId,
    reference: definition.reference,
    letter: source.letter,
    title: definition.title,
    quantity: definition.quantity,
    state: source.stateWord + (partDataChanged ? ', data changed' : ''),
    locked: lock !== null,
    partDataChanged,
    verdict: source.evaluation.verdict,
    designer: source.designer,
    checker: source.checker,
    approver: lock?.approver ?? null,
    signedAtMs: lock?.signedAtMs ?? null,
    hash: lock?.hash ?? null,
  };
}

function titleBlock(
  project: NoteProject,
  sources: readonly NoteSource[],
  released: boolean,
): BomTitleBlock {
  return {
    projectCode: project.code,
    legalOwner: project.legalOwner,
    department: project.department,
    title: project.title,
    supplementaryTitle: project.supplementaryTitle,
    creators: names(sources.map((source) => source.designer)),
    checkers: names(sources.map((source) => source.checker)),
    approvers: released ? names(sources.map((source) => source.lock?.approver ?? null)) : [],
    documentType: 'BOM note',
    language: 'en',
  };
}

function names(people: readonly (string | null)[]): string[] {
  return [...new Set(people.filter((person) => person !== null))];
}
