import { CAUTIONS } from '../method/cautions.ts';
import type { BomCaution } from './bom-note.ts';
import type { MergedLine } from './bom-note-lines.ts';
import { changedParts, type NoteSource, sourceName } from './bom-note-source.ts';
import { clampCautions } from './clamp-cautions.ts';
import type { FittedPart } from './fitted-part.ts';
import { listed, numbered } from './word-lists.ts';

const STANDING = CAUTIONS.filter(({ id }) => id === 'judgement' || id === 'governed-fields');

/** What a reader must know before buying or building: first about these revisions, then what always holds. */
export function noteCautions(
  sources: readonly NoteSource[],
  lines: readonly MergedLine[],
): BomCaution[] {
  const own = [
    ...notReleased(sources),
    ...sources.flatMap(dataChanged),
    ...sources.flatMap(beingReplaced),
    ...unverified(lines),
    ...unnamed(lines),
    ...namedTwice(lines),
  ];
  const standing = [
    ...STANDING.map(({ short }) => short),
    ...clampCautions(lines),
    ...replacement(lines),
  ];
  return [
    ...own.map((text) => ({ text, flagged: true })),
    ...standing.map((text) => ({ text, flagged: false })),
  ];
}

function notReleased(sources: readonly NoteSource[]): string[] {
  const open = sources.filter((source) => source.lock === null);
  if (open.length === 0) return [];
  const each = open.map((source) => {
    const { verdict } = source.evaluation;
    const standing = verdict === 'fail' ? ' and fails' : verdict === 'open' ? ' and is open' : '';
    const state = source.stateWord === 'Draft' ? 'a draft' : source.stateWord.toLowerCase();
    return `${sourceName(source)} is ${state}${standing}`;
  });
  return [`${each.join(', ')}. Nothing may be bought or built from this sheet.`];
}

function dataChanged(source: NoteSource): string[] {
  const since = source.lock === null ? 'was filled in' : 'was locked';
  return changedParts(source).map(
    (part) =>
      `${part.partNumber}: data changed after ${sourceName(source)} ${since} ` +
      `(part revision ${part.revision}, now ${part.latestRevision}); a re-check is due.`,
  );
}

function beingReplaced(source: NoteSource): string[] {
  const { successor } = source;
  if (successor === null) return [];
  const next = `${source.definition.reference} ${successor.letter}`;
  return [`${next} (${successor.stateWord}) is under way and will replace ${sourceName(source)}.`];
}

function unverified(lines: readonly MergedLine[]): string[] {
  const numbers = lines.filter(({ line }) => line.unverified).map(({ line }) => line.line);
  return numbers.length === 0 ? [] : [`Part data not verified: ${numbered('line', numbers)}.`];
}

function unnamed(lines: readonly MergedLine[]): string[] {
  const parts = lines.flatMap(({ parts }) => parts).filter((part) => part.designator === null);
  if (parts.length === 0) return [];
  return [`No designator is given for ${listed(parts.map(placeOf))}.`];
}

function namedTwice(lines: readonly MergedLine[]): string[] {
  const byName = new Map<string, FittedPart[]>();
  for (const part of lines.flatMap(({ parts }) => parts)) {
    const name = part.designator;
    if (name !== null) byName.set(name, [...(byName.get(name) ?? []), part]);
  }
  return [...byName]
    .filter(([, parts]) => parts.length > 1)
    .map(([name, parts]) => `${name} names more than one part: ${listed(parts.map(placeOf))}.`);
}

const placeOf = (part: FittedPart) => `${part.place} of ${part.source.definition.reference}`;

function replacement(lines: readonly MergedLine[]): string[] {
  const numbers = lines
    .filter(({ parts }) => parts[0].family === 'transistor')
    .map(({ line }) => line.line);
  if (numbers.length === 0) return [];
  return [`Replacing a part in ${numbered('line', numbers)} needs a new revision of its stages.`];
}
