import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import type { BomNote } from '../../../shared/report/bom-note.ts';
import { counted } from '../ui/time-text.ts';

/** Asks once more before a note is issued: what stands on it, and that it stays. Closes with true to issue. */
@Component({
  selector: 'app-issue-dialog',
  imports: [MatButton, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h2 mat-dialog-title>Issue this BOM note?</h2>
    <mat-dialog-content>
      <p>
        It takes the next number of {{ note.titleBlock.projectCode }} and stands on {{ stages }}:
        {{ names }}. An issued note never changes.
      </p>
      @if (note.counts.partsChanged + note.counts.partsUnverified > 0) {
        <p>Part data has changed or is not verified: see the cautions of the note.</p>
      }
    </mat-dialog-content>
    <mat-dialog-actions>
      <button matButton type="button" [mat-dialog-close]="false">Cancel</button>
      <button matButton="filled" type="button" [mat-dialog-close]="true">Issue note</button>
    </mat-dialog-actions>`,
  styles: `
    p + p {
      margin-top: 8px;
    }
  `,
})
export class IssueDialog {
  protected readonly note = inject<BomNote>(MAT_DIALOG_DATA);
  protected readonly stages = counted(this.note.counts.stages, 'locked stage');
  protected readonly names = this.note.revisions
    .map(({ reference, letter }) => `${reference} ${letter}`)
    .join(', ');
}
