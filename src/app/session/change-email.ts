import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { askEmailChange } from '../../../shared/contract/account.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { PasswordField } from '../ui/password-field.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';

/** Asks for another e-mail address: needs the password, and a confirmation at the old and the new one. */
@Component({
  selector: 'app-change-email',
  imports: [MatButton, MatFormFieldModule, MatInput, PasswordField, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './change-email.html',
  styles: `
    :host {
      display: block;
    }

    h2 {
      margin-bottom: 16px;
    }
  `,
})
export class ChangeEmail {
  private readonly api = inject(ApiClient);

  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', schemaValidator(askEmailChange.body.shape.email)],
    password: ['', schemaValidator(askEmailChange.body.shape.password)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly sent = signal(false);
  protected readonly error = fieldError;

  protected async ask(): Promise<void> {
    this.form.markAllAsTouched();
    this.sent.set(false);
    if (this.form.invalid) return;
    try {
      await this.api.send(askEmailChange, { body: this.form.getRawValue() });
      this.form.reset();
      this.problem.set(null);
      this.sent.set(true);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    }
  }
}
