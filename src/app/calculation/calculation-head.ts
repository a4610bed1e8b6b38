import type { Project } from '../../../shared/contract/project.ts';
import type { Revision } from '../../../shared/contract/revision.ts';
import type { CalculationHead } from '../../../shared/report/calculation-facts.ts';
import { STATE_WORDS } from '../../../shared/review/revision-state.ts';

/** What the sheet’s title block is filled from; a lock whose hash no longer fits counts as none. */
export function headOf(revision: Revision, project: Project): CalculationHead {
  const { lock, state, definition } = revision;
  const whole = lock?.intact === true ? lock : null;
  const changed = lock !== null && whole === null;
  return {
    projectCode: project.code,
    projectTitle: project.title,
    legalOwner: project.legalOwner,
    department: project.department,
    reference: definition.reference,
    title: definition.title,
    letter: revision.letter,
    stateWord: changed ? `${STATE_WORDS[state]}, changed since` : STATE_WORDS[state],
    designer: revision.designer.name,
    checker: revision.checkedBy?.name ?? null,
    lock: whole && {
      approver: whole.approver.name,
      signedAtMs: whole.signedAtMs,
      hash: whole.hash,
    },
    savedAtMs: revision.savedAtMs,
  };
}
