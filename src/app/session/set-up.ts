import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import { setUp } from '../../../shared/contract/session.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { PasswordField } from '../ui/password-field.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';
import { EntryFrame } from './entry-frame.ts';
import { PASSWORD_HINT } from './password-hint.ts';
import { SessionStore } from './session-store.ts';

const fields = setUp.body.shape;

/** First start: makes the administrator, against the code the server has printed. */
@Component({
  selector: 'app-set-up',
  imports: [
    EntryFrame,
    MatButton,
    MatFormFieldModule,
    MatInput,
    PasswordField,
    ReactiveFormsModule,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './set-up.html',
})
export class SetUp {
  private readonly session = inject(SessionStore);
  private readonly router = inject(Router);

  protected readonly hint = PASSWORD_HINT;
  protected readonly form = inject(NonNullableFormBuilder).group({
    code: ['', schemaValidator(fields.code)],
    workspace: ['', schemaValidator(fields.workspace)],
    name: ['', schemaValidator(fields.name)],
    email: ['', schemaValidator(fields.email)],
    password: ['', schemaValidator(fields.password)],
  });
  protected readonly texts = [
    {
      key: 'code',
      label: 'Set-up code',
      autocomplete: 'one-time-code',
      hint: 'Printed by the server when it started',
    },
    {
      key: 'workspace',
      label: 'Legal owner',
      autocomplete: 'organization',
      hint: 'Stands in the title block of every document',
    },
    { key: 'name', label: 'Your name', autocomplete: 'name', hint: '' },
    { key: 'email', label: 'E-mail', autocomplete: 'username', hint: '' },
  ] as const;
  protected readonly problem = signal<string | null>(null);
  protected readonly busy = signal(false);
  protected readonly error = fieldError;

  protected async submit(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    try {
      await this.session.setUp(this.form.getRawValue());
      await this.router.navigate(['/desk']);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    } finally {
      this.busy.set(false);
    }
  }
}
