import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { askPasswordReset } from '../../../shared/contract/account.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';
import { EntryFrame } from './entry-frame.ts';

/** Asks for a link by mail; answers alike whether the address is known or not. */
@Component({
  selector: 'app-ask-reset',
  imports: [EntryFrame, MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './ask-reset.html',
})
export class AskReset {
  private readonly api = inject(ApiClient);

  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', schemaValidator(askPasswordReset.body.shape.email)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly sent = signal(false);
  protected readonly error = fieldError;

  protected async submit(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    try {
      await this.api.send(askPasswordReset, { body: this.form.getRawValue() });
      this.sent.set(true);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    }
  }
}
