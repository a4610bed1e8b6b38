import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { CRITERIA, type CriterionId } from '../../../shared/checks/criteria.ts';
import { FIELD_PROBLEMS } from '../../../shared/method/field-problems.ts';
import { SymbolText } from '../ui/symbol-text.ts';

/** Faults as they are met in the field, each with what shows it here or why the calculation cannot. */
@Component({
  selector: 'app-field-problems',
  imports: [RouterLink, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './field-problems.html',
  styleUrl: './method-page.scss',
})
export class FieldProblems {
  protected readonly problems = FIELD_PROBLEMS.map((problem) => ({
    ...problem,
    shownBy: problem.criteria.map((id) => ({ id, name: CRITERIA[id as CriterionId].name })),
    finding: problem.findings.map(sentence).join('; '),
  }));
}

/** `no-base-emitter-resistor` as words. */
const sentence = (id: string) => id.replaceAll('-', ' ');
