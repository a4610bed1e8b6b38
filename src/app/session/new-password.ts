import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { acceptInvitation, redeemPasswordReset } from '../../../shared/contract/account.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { PasswordField } from '../ui/password-field.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { schemaValidator } from '../ui/schema-validator.ts';
import { EntryFrame } from './entry-frame.ts';
import { PASSWORD_HINT } from './password-hint.ts';

/** Where a mailed link leads: sets the password of an invited person, or a new one after a reset. */
@Component({
  selector: 'app-new-password',
  imports: [EntryFrame, MatButton, PasswordField, ReactiveFormsModule, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './new-password.html',
})
export class NewPassword {
  private readonly api = inject(ApiClient);
  /** Behind the # of the link, where no server and no referrer sees it. */
  private readonly token = inject(ActivatedRoute).snapshot.fragment ?? '';

  /** Of the route: which link it was. */
  readonly purpose = input.required<'invitation' | 'reset'>();

  protected readonly hint = PASSWORD_HINT;
  protected readonly heading = computed(() =>
    this.purpose() === 'invitation' ? 'Take up the invitation' : 'Set a new password',
  );
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: ['', schemaValidator(acceptInvitation.body.shape.password)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly done = signal(false);

  protected async submit(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const route = this.purpose() === 'invitation' ? acceptInvitation : redeemPasswordReset;
    try {
      await this.api.send(route, { body: { token: this.token, ...this.form.getRawValue() } });
      this.done.set(true);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    }
  }
}
