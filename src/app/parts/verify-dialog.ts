import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { verifyPart } from '../../../shared/contract/part.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';

export interface VerifyAsked {
  readonly title: string;
  readonly run: (document: string, note: string) => Promise<void>;
}

/** States that the data were read back: against which document, and what was noticed. */
@Component({
  selector: 'app-verify-dialog',
  imports: [MatButton, MatDialogModule, MatFormFieldModule, MatInput, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h2 mat-dialog-title>{{ asked.title }}</h2>
    <form [formGroup]="form" (ngSubmit)="verify()">
      <mat-dialog-content>
        <p>You state that every row was compared with the document named here.</p>
        @if (problem(); as problem) {
          <p class="error-text" role="alert">{{ problem }}</p>
        }
        <div class="field">
          <label for="verify-document">Document, with its issue and pages</label>
          <mat-form-field>
            <input matInput id="verify-document" maxlength="200" formControlName="document" />
            <mat-error>{{ error(form.controls.document) }}</mat-error>
          </mat-form-field>
        </div>
        <div class="field">
          <label for="verify-note">Note</label>
          <mat-form-field>
            <textarea
              matInput
              id="verify-note"
              rows="3"
              maxlength="2000"
              formControlName="note"
            ></textarea>
            <mat-error>{{ error(form.controls.note) }}</mat-error>
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close>Cancel</button>
        <button matButton="filled" type="submit">{{ busy() ? 'Working' : 'Verify' }}</button>
      </mat-dialog-actions>
    </form>`,
  styles: `
    .field {
      margin-top: 12px;
    }
  `,
})
export class VerifyDialog {
  private readonly dialog = inject<MatDialogRef<VerifyDialog>>(MatDialogRef);
  protected readonly asked = inject<VerifyAsked>(MAT_DIALOG_DATA);

  protected readonly form = inject(NonNullableFormBuilder).group({
    document: ['', schemaValidator(verifyPart.body.shape.document)],
    note: ['', schemaValidator(verifyPart.body.shape.note)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly busy = signal(false);
  protected readonly error = fieldError;

  protected async verify(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    const { document, note } = this.form.getRawValue();
    try {
      await this.asked.run(document, note);
      this.dialog.close();
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    } finally {
      this.busy.set(false);
    }
  }
}
