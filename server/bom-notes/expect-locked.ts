import { listed } from '../../shared/report/word-lists.ts';
import { revisionLetter, STATE_WORDS } from '../../shared/review/revision-state.ts';
import { ApiError } from '../http/api-error.ts';
import type { RevisionLine } from '../revisions/revision-line.ts';

/**
 * Refuses to issue a note of anything but locked revisions of the project, one of each stage.
 *
 * @param lines all revisions of the project
 * @throws {ApiError} invalid-input for a revision that is not the project's or a stage named twice; conflict,
 *   naming each, where a revision is not locked or has been superseded
 */
export function expectLocked(lines: readonly RevisionLine[], revisionIds: readonly string[]): void {
  const known = new Map(lines.map((line) => [line.id, line]));
  const chosen = revisionIds.map((id, index) => known.get(id) ?? foreign(index));
  const stages = new Set<string>();
  for (const [index, line] of chosen.entries()) {
    if (stages.has(line.stageId)) {
      throw fault(index, `expected each stage once, ${line.reference} is named twice`);
    }
    stages.add(line.stageId);
  }
  const open = chosen.filter(({ state }) => state !== 'locked');
  if (open.length > 0) {
    throw new ApiError(
      'conflict',
      `A note is issued of locked revisions only: ${listed(open.map(nameAndState))}.`,
    );
  }
}

const nameAndState = ({ number, reference, state }: RevisionLine) =>
  `${reference} ${revisionLetter(number)} is ${STATE_WORDS[state].toLowerCase()}`;

function foreign(index: number): never {
  throw fault(index, 'expected a revision of this project');
}

function fault(index: number, message: string): ApiError {
  return new ApiError('invalid-input', 'The revisions do not make a note.', {
    fields: [{ pointer: `/revisionIds/${index}`, message }],
  });
}
