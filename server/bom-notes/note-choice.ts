import type { NoteStage } from '../../shared/contract/bom-note.ts';
import { naturalOrder } from '../../shared/report/natural-order.ts';
import { revisionLetter, STATE_WORDS } from '../../shared/review/revision-state.ts';
import type { RevisionLine } from '../revisions/revision-line.ts';

/** Which revisions a preview takes. */
export interface NoteChoice {
  /** The current revision of every stage, locked or not; else the locked ones only. */
  readonly unlocked: boolean;
  /** Ids of stages to leave out. */
  readonly without: readonly string[];
}

/**
 * The stages of a project in natural order, each with the revision a note takes of it. A withdrawn stage is
 * never built; one without a locked revision is left out unless asked for.
 *
 * @param lines all revisions of the project
 */
export function noteStages(lines: readonly RevisionLine[], choice: NoteChoice): NoteStage[] {
  const currents = lines.filter(({ current }) => current);
  return currents
    .map((current) => {
      const locked = lines.find(
        (line) => line.stageId === current.stageId && line.state === 'locked',
      );
      return noteStage(current, locked, choice);
    })
    .sort((a, b) => naturalOrder(a.reference, b.reference));
}

function noteStage(
  current: RevisionLine,
  locked: RevisionLine | undefined,
  { unlocked, without }: NoteChoice,
): NoteStage {
  const withdrawn = current.state === 'withdrawn' && locked === undefined;
  const taken = withdrawn
    ? undefined
    : unlocked && current.state !== 'withdrawn'
      ? current
      : locked;
  const shown = taken ?? current;
  return {
    stageId: current.stageId,
    reference: current.reference,
    title: shown.title,
    revisionId: taken?.id ?? null,
    letter: revisionLetter(shown.number),
    state: shown.state,
    chosen: taken !== undefined && !without.includes(current.stageId),
    reason: taken ? null : reasonAgainst(current),
  };
}

function reasonAgainst({ number, reference, state }: RevisionLine): string {
  const name = `${reference} ${revisionLetter(number)}`;
  if (state === 'withdrawn') return `${name} is withdrawn.`;
  return `No revision of ${reference} is locked; ${name} is in state ${STATE_WORDS[state]}.`;
}
