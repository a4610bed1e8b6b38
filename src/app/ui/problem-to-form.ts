import type { FormGroup } from '@angular/forms';
import type { ApiProblem } from '../api/api-problem.ts';

/**
 * Puts the server's field problems on the controls they name, by the first step of their pointer.
 *
 * @returns the sentence for above the form, or null when every problem found its field
 */
export function problemToForm(problem: ApiProblem, form: FormGroup): string | null {
  let homeless = problem.errors.length === 0;
  for (const { pointer, message } of problem.errors) {
    const control = form.get(pointer.split('/')[1] ?? '');
    control?.setErrors({ server: message });
    control?.markAsTouched();
    homeless ||= control === null;
  }
  return homeless ? problem.detail : null;
}
