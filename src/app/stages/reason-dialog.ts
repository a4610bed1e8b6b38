import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';

export interface ReasonQuestion {
  readonly title: string;
  readonly text: string;
  readonly act: string;
}

/** Asks for a reason in words before an act that everybody will see. */
@Component({
  selector: 'app-reason-dialog',
  imports: [MatButton, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h2 mat-dialog-title>{{ question.title }}</h2>
    <mat-dialog-content>
      <p>{{ question.text }}</p>
      <label class="reason-field">
        <span>Reason</span>
        <textarea #box rows="3" maxlength="2000" (input)="reason.set(box.value.trim())"></textarea>
      </label>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton type="button" mat-dialog-close>Cancel</button>
      <button matButton="filled" type="button" [disabled]="reason() === ''" (click)="give()">
        {{ question.act }}
      </button>
    </mat-dialog-actions>`,
  styles: `
    .reason-field {
      display: grid;
      gap: 4px;
      margin-top: 12px;
      font-weight: 600;
    }

    textarea {
      padding: 8px;
      border: 1px solid var(--mat-sys-outline);
      border-radius: var(--app-radius-field);
      background: var(--app-paper);
      font-weight: 400;
      resize: vertical;
    }
  `,
})
export class ReasonDialog {
  private readonly dialog = inject<MatDialogRef<ReasonDialog, string>>(MatDialogRef);
  protected readonly question = inject<ReasonQuestion>(MAT_DIALOG_DATA);
  protected readonly reason = signal('');

  protected give(): void {
    this.dialog.close(this.reason());
  }
}
