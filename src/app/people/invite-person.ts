import { ChangeDetectionStrategy, Component, inject, output, signal } from '@angular/core';
import {
  type FormGroupDirective,
  NonNullableFormBuilder,
  ReactiveFormsModule,
} from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { invitePerson, type Person } from '../../../shared/contract/people.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';

const fields = invitePerson.body.shape;

/** Invites a person by mail. */
@Component({
  selector: 'app-invite-person',
  imports: [MatButton, MatCheckbox, MatFormFieldModule, MatInput, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './invite-person.html',
  styles: `
    :host {
      display: block;
    }

    h2 {
      margin-bottom: 16px;
    }
  `,
})
export class InvitePerson {
  private readonly api = inject(ApiClient);

  readonly invited = output<Person>();

  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', schemaValidator(fields.name)],
    email: ['', schemaValidator(fields.email)],
    administrator: [false],
  });
  protected readonly problem = signal<string | null>(null);
  /** Whom the last mail went to. */
  protected readonly done = signal<string | null>(null);
  protected readonly error = fieldError;

  protected async invite(entry: FormGroupDirective): Promise<void> {
    this.done.set(null);
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    try {
      const { value } = await this.api.send(invitePerson, { body: this.form.getRawValue() });
      entry.resetForm();
      this.done.set(`The mail to ${value.email} is on its way.`);
      this.problem.set(null);
      this.invited.emit(value);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    }
  }
}
