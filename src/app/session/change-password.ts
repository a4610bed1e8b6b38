import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { changePassword } from '../../../shared/contract/account.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { PasswordField } from '../ui/password-field.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { schemaValidator } from '../ui/schema-validator.ts';
import { PASSWORD_HINT } from './password-hint.ts';

/** A new password against the old one; ends all other sessions. */
@Component({
  selector: 'app-change-password',
  imports: [MatButton, PasswordField, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './change-password.html',
  styles: `
    :host {
      display: block;
    }

    h2 {
      margin-bottom: 16px;
    }
  `,
})
export class ChangePassword {
  private readonly api = inject(ApiClient);

  protected readonly hint = PASSWORD_HINT;
  protected readonly form = inject(NonNullableFormBuilder).group({
    current: ['', schemaValidator(changePassword.body.shape.current)],
    next: ['', schemaValidator(changePassword.body.shape.next)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly done = signal(false);

  protected async change(): Promise<void> {
    this.form.markAllAsTouched();
    this.done.set(false);
    if (this.form.invalid) return;
    try {
      await this.api.send(changePassword, { body: this.form.getRawValue() });
      this.form.reset();
      this.problem.set(null);
      this.done.set(true);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    }
  }
}
