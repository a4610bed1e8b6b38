import type { BomNote } from './bom-note.ts';
import { dataText, stagesText } from './bom-note-text.ts';

export const NOT_ISSUED = 'not issued';
const MOST_NAMES = 3;

/** One figure of the row below the heading; `flagged` ones are red on what is not released. */
export interface NoteFact {
  readonly label: string;
  readonly value: string;
  readonly flagged: boolean;
}

/** How many stages, lines and parts, and how their data stands. */
export function noteFacts(note: BomNote): NoteFact[] {
  const { counts } = note;
  const data = dataText(note);
  return [
    { label: 'Stages', value: stagesText(note), flagged: counts.locked < counts.stages },
    { label: 'Lines', value: `${counts.lines}, merged over stages`, flagged: false },
    { label: 'Parts per board', value: String(counts.partsPerBoard), flagged: false },
    { ...data, flagged: counts.partsChanged > 0 },
  ];
}

/** Many names would burst the block; the revisions carry all of them. */
export function peopleText(names: readonly string[]): string {
  if (names.length === 0) return 'none';
  if (names.length <= MOST_NAMES) return names.join(', ');
  const shown = names.slice(0, MOST_NAMES - 1);
  return `${shown.join(', ')} and ${names.length - shown.length} more`;
}

/** What vouches for the content, shortened for the foot of a sheet and in full. */
export function contentText({ contentHash, released }: BomNote): { short: string; full: string } {
  if (contentHash === null) {
    const text = `No content hash: ${released ? NOT_ISSUED : 'not released'}`;
    return { short: text, full: text };
  }
  const first = (contentHash.slice(0, 16).match(/.{4}/g) ?? []).join(' ');
  return { short: `Content SHA-256 ${first}`, full: `SHA-256 ${contentHash}` };
}
