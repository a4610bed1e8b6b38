import type { StageInput } from '../stage/stage-input.ts';

/** Keys a stage names its parts by, apart from the transistor, whose designator is the stage's reference. */
export type PartPlace =
  | 'baseResistor'
  | 'shuntResistor'
  | 'pullUp'
  | 'speedUpCapacitor'
  | 'load'
  | 'loadResistor'
  | 'clamp'
  | 'clampZener'
  | 'preDriver'
  | 'preBaseResistor'
  | 'preShuntResistor';

/** A linked library part as it stands now. */
export interface LinkedPart {
  readonly role: string;
  readonly partNumber: string;
  readonly revision: number;
  readonly latestRevision: number;
  readonly verified: boolean;
}

/** One revision as the note needs it: what was designed, by whom, and how far it has come. */
export interface NoteSource {
  readonly revisionId: string;
  readonly stageId: string;
  readonly letter: string;
  /** The state in words, such as `In check`. */
  readonly stateWord: string;
  readonly definition: StageInput;
  readonly designators: Readonly<Record<PartPlace, string | null>>;
  readonly evaluation: { readonly verdict: string; readonly baseResistorOhm: number | null };
  readonly parts: readonly LinkedPart[];
  readonly designer: string;
  readonly checker: string | null;
  readonly lock: {
    readonly approver: string;
    readonly signedAtMs: number;
    readonly hash: string;
  } | null;
  /** A later revision under way that will take this one's place. */
  readonly successor: { readonly letter: string; readonly stateWord: string } | null;
}

/** `Q12 B` */
export function sourceName(source: NoteSource): string {
  return `${source.definition.reference} ${source.letter}`;
}

/** The linked parts whose library data moved on after the revision took them. */
export function changedParts(source: NoteSource): readonly LinkedPart[] {
  return source.parts.filter((part) => part.latestRevision > part.revision);
}

/** Whether the note must point at this revision: not locked, or locked on data that changed since. */
export function isFlagged(source: NoteSource): boolean {
  return source.lock === null || changedParts(source).length > 0;
}
