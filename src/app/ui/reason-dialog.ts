import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from './icon.ts';

export interface ReasonAsked {
  readonly title: string;
  /** What happens, in a sentence or two. */
  readonly text: string;
  readonly act: string;
  /** Does it; the dialog stays open, with what was written, when it is refused. */
  readonly run: (reason: string) => Promise<void>;
}

/** Asks for a reason in words and acts on it. */
@Component({
  selector: 'app-reason-dialog',
  imports: [Icon, MatButton, MatDialogModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h2 mat-dialog-title>{{ asked.title }}</h2>
    <mat-dialog-content>
      <p>{{ asked.text }}</p>
      @if (problem(); as problem) {
        <p class="error-text" role="alert">{{ problem }}</p>
      }
      <div class="field">
        <label for="reason">Reason</label>
        <textarea
          id="reason"
          class="box"
          rows="4"
          maxlength="2000"
          [value]="reason()"
          [attr.aria-invalid]="empty()"
          aria-describedby="reason-problem"
          (input)="write($event)"
        ></textarea>
        <p id="reason-problem" class="error-text">
          @if (empty()) {
            <app-icon name="circle-alert" [size]="16" />Give a reason, such as Finding 2 needs a new
            base resistor.
          }
        </p>
      </div>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton type="button" mat-dialog-close>Cancel</button>
      <button matButton="filled" type="button" (click)="act()">
        {{ busy() ? 'Working' : asked.act }}
      </button>
    </mat-dialog-actions>`,
  styles: `
    @use '../../theme/entry';

    .field {
      margin-top: 12px;
    }
  `,
})
export class ReasonDialog {
  private readonly dialog = inject<MatDialogRef<ReasonDialog>>(MatDialogRef);
  protected readonly asked = inject<ReasonAsked>(MAT_DIALOG_DATA);

  protected readonly reason = signal('');
  protected readonly empty = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<string | null>(null);

  protected write(event: Event): void {
    this.reason.set((event.target as HTMLTextAreaElement).value);
    this.empty.set(false);
  }

  protected async act(): Promise<void> {
    const reason = this.reason().trim();
    this.empty.set(reason === '');
    if (reason === '' || this.busy()) return;
    this.busy.set(true);
    try {
      await this.asked.run(reason);
      this.dialog.close();
    } catch (error) {
      this.problem.set(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }
}
