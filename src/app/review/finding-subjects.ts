import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { FindingSubject } from '../../../shared/contract/check.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { DEFINITION_WORDS, TRANSISTOR_WORDS } from '../../../shared/report/definition-words.ts';
import { definitionLeaves } from '../../../shared/report/definition-leaves.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import type * as z from 'zod';

export type Subject = z.infer<typeof FindingSubject>;

export interface SubjectChoice {
  readonly subject: Subject;
  readonly text: string;
}

/** "Criterion drive current", "Field RBE rating". */
export function subjectWords({ kind, id }: Subject): string {
  if (kind === 'criterion') return `Criterion ${criterionName(id)}`;
  const partPath = id.replace(/^(preDriver\.)?transistor\./, '');
  return `Field ${DEFINITION_WORDS[id] ?? TRANSISTOR_WORDS[partPath] ?? id}`;
}

/** Everything a finding can be tied to: the criteria judged, then the fields of the definition. */
export function subjectChoices(evaluation: Evaluation, definition: StageInput) {
  const criteria = evaluation.criteria.map(({ id }) => choice('criterion', id, criterionName(id)));
  const fields = definitionLeaves(definition)
    .filter(({ path }) => !path.includes('[') && path.length <= 80)
    .map(({ path, label }) => choice('field', path, label));
  return { criteria, fields };
}

function choice(kind: Subject['kind'], id: string, text: string): SubjectChoice {
  return { subject: { kind, id }, text };
}
