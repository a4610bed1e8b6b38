import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { DOCUMENT_FORMATS, type DocumentFormat } from '../../../shared/contract/bom-note.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { FileDownload } from '../api/file-download.ts';
import { Icon } from '../ui/icon.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';

/** One button for each format of a document; the reason beside them where they may not be pressed. */
@Component({
  selector: 'app-note-downloads',
  imports: [Icon, MatButton, NotAllowed],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<div class="actions" role="group" [attr.aria-label]="'Download ' + what()">
      @for (format of formats; track format) {
        <button
          matButton="outlined"
          type="button"
          [reasonId]="reasonId()"
          [appNotAllowed]="refusal() ?? (busy() ? 'A file is being made.' : null)"
          (click)="download(format)"
        >
          <app-icon name="file-down" /> {{ format.toUpperCase() }}
        </button>
      }
    </div>
    <p class="reason" [id]="reasonId()">{{ refusal() ?? outcome() }}</p>`,
})
export class NoteDownloads {
  private readonly files = inject(FileDownload);
  private readonly announcer = inject(StatusAnnouncer);

  /** Address of a format's file. */
  readonly address = input.required<(format: DocumentFormat) => string>();
  /** What is downloaded, for the group's name. */
  readonly what = input.required<string>();
  readonly reasonId = input.required<string>();
  /** Why it cannot be downloaded; null where it can. */
  readonly refusal = input<string | null>(null);

  protected readonly formats = DOCUMENT_FORMATS;
  protected readonly busy = signal(false);
  protected readonly outcome = signal('');

  protected async download(format: DocumentFormat): Promise<void> {
    this.busy.set(true);
    this.outcome.set('');
    try {
      this.tell(`Saved ${await this.files.save(this.address()(format))}.`);
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }

  private tell(message: string): void {
    this.outcome.set(message);
    this.announcer.say(message);
  }
}
