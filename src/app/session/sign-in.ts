import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { signIn } from '../../../shared/contract/session.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { PasswordField } from '../ui/password-field.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';
import { EntryFrame } from './entry-frame.ts';
import { SessionStore } from './session-store.ts';

/** E-mail and password; back to the page one came for. */
@Component({
  selector: 'app-sign-in',
  imports: [
    EntryFrame,
    MatButton,
    MatFormFieldModule,
    MatInput,
    PasswordField,
    ReactiveFormsModule,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './sign-in.html',
  styleUrl: './sign-in.scss',
})
export class SignIn {
  private readonly session = inject(SessionStore);
  private readonly router = inject(Router);

  /** Page to go to afterwards, from the query. */
  readonly next = input<string>();

  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', schemaValidator(signIn.body.shape.email)],
    password: ['', schemaValidator(signIn.body.shape.password)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly busy = signal(false);
  protected readonly error = fieldError;
  protected readonly where = computed(() => {
    const session = this.session.session();
    return session ? `${session.workspace}${session.demo ? ', demo workspace' : ''}` : '';
  });
  protected readonly accounts = computed(() => this.session.session()?.demoAccounts ?? []);

  protected take(account: { email: string; password: string }): void {
    this.form.setValue({ email: account.email, password: account.password });
    void this.submit();
  }

  protected async submit(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      await this.session.signIn(this.form.getRawValue());
      await this.router.navigateByUrl(insideOnly(this.next()));
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    } finally {
      this.busy.set(false);
    }
  }
}

/** A path of this application; anything else, such as another site, becomes the desk. */
function insideOnly(next: string | undefined): string {
  return next !== undefined && /^\/(?![/\\])/.test(next) ? next : '/desk';
}
