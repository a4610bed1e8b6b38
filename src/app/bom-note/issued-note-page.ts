import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  resource,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import {
  downloadBomNote,
  readBomNote,
  type DocumentFormat,
} from '../../../shared/contract/bom-note.ts';
import { address } from '../../../shared/contract/route.ts';
import { ApiClient } from '../api/api-client.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { BomNoteSheet } from './bom-note-sheet.ts';
import { NoteDownloads } from './note-downloads.ts';
import { noteTrail } from './note-trail.ts';

/** One issued note: the sheet, whether it still fits its hash, and its files. */
@Component({
  selector: 'app-issued-note-page',
  imports: [BomNoteSheet, Icon, LoadState, NoteDownloads, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './issued-note-page.html',
  styleUrl: './bom-note-page.scss',
})
export class IssuedNotePage {
  private readonly api = inject(ApiClient);

  readonly projectId = input.required<string>();
  readonly noteId = input.required<string>();

  protected readonly answer = resource({
    params: () => this.noteId(),
    loader: async ({ params: noteId }) =>
      (await this.api.send(readBomNote, { params: { noteId } })).value,
  });
  protected readonly issued = computed(() => (this.answer.hasValue() ? this.answer.value() : null));
  protected readonly name = computed(() => this.issued()?.note.issue?.identification ?? '');
  protected readonly refusal = computed(() => {
    const issued = this.issued();
    if (issued === null) return null;
    if (!issued.intact) return 'The note no longer fits its content hash: nothing is handed out.';
    return issued.download.reason;
  });
  protected readonly fileAddress = computed(() => {
    const noteId = this.noteId();
    return (format: DocumentFormat) => address(downloadBomNote.path, { noteId, format });
  });

  constructor() {
    usePageTrail(() => noteTrail(this.projectId(), this.issued()?.note, this.name()));
  }
}
