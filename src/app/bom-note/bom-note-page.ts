import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  resource,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { MatSlideToggle } from '@angular/material/slide-toggle';
import { Router } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import {
  issueBomNote,
  listBomNotes,
  previewBomNote,
  previewBomNoteFile,
  type BomNotePreview,
  type DocumentFormat,
  type NoteStage,
} from '../../../shared/contract/bom-note.ts';
import { address } from '../../../shared/contract/route.ts';
import type { BomNote } from '../../../shared/report/bom-note.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { BomNoteSheet } from './bom-note-sheet.ts';
import { IssueDialog } from './issue-dialog.ts';
import { IssuedNotes } from './issued-notes.ts';
import { NoteDownloads } from './note-downloads.ts';
import { NoteStages } from './note-stages.ts';
import { noteTrail } from './note-trail.ts';

/** A project's BOM note: which stages it takes, what it would say, its issue, and the notes issued before. */
@Component({
  selector: 'app-bom-note-page',
  imports: [
    BomNoteSheet,
    Icon,
    IssuedNotes,
    LoadState,
    MatButton,
    MatSlideToggle,
    NotAllowed,
    NoteDownloads,
    NoteStages,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './bom-note-page.html',
  styleUrl: './bom-note-page.scss',
})
export class BomNotePage {
  private readonly announcer = inject(StatusAnnouncer);
  private readonly api = inject(ApiClient);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);

  readonly projectId = input.required<string>();

  protected readonly unlocked = signal(false);
  private readonly without = signal<readonly string[]>([]);
  private readonly choice = computed(() => ({
    unlocked: this.unlocked() ? ('true' as const) : ('false' as const),
    without: this.without().join(',') || undefined,
  }));

  protected readonly answer = resource({
    params: () => ({ projectId: this.projectId(), query: this.choice() }),
    loader: async ({ params: { projectId, query } }) =>
      (await this.api.send(previewBomNote, { params: { projectId }, query })).value,
  });
  /** The last preview stays on show while the next one loads. */
  protected readonly preview = linkedSignal<BomNotePreview | undefined, BomNotePreview | null>({
    source: () => (this.answer.hasValue() ? this.answer.value() : undefined),
    computation: (loaded, before) => loaded ?? before?.value ?? null,
  });
  protected readonly issued = resource({
    params: () => this.projectId(),
    loader: async ({ params: projectId }) =>
      (await this.api.send(listBomNotes, { params: { projectId } })).value.notes,
  });
  protected readonly busy = signal(false);
  protected readonly problem = signal<string | null>(null);
  protected readonly refusal = computed(() => {
    if (this.busy()) return 'The note is being issued.';
    return this.preview()?.issue.reason ?? null;
  });
  protected readonly fileAddress = computed(() => {
    const [projectId, query] = [this.projectId(), this.choice()];
    return (format: DocumentFormat) =>
      address(previewBomNoteFile.path, { projectId, format }, query);
  });

  constructor() {
    usePageTrail(() => noteTrail(this.projectId(), this.preview()?.note, 'BOM note'));
  }

  protected toggle({ stageId, chosen }: NoteStage): void {
    this.without.update((ids) => (chosen ? [...ids, stageId] : ids.filter((id) => id !== stageId)));
  }

  /** Issues just the revisions on show: what changed since is refused by the server. */
  protected async issue(note: BomNote): Promise<void> {
    const config = Object.assign(new MatDialogConfig<BomNote>(), { data: note });
    const opened = this.dialog.open<IssueDialog, BomNote, boolean>(IssueDialog, config);
    if ((await firstValueFrom(opened.afterClosed())) !== true) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      const projectId = this.projectId();
      const revisionIds = note.revisions.map(({ revisionId }) => revisionId);
      const request = { params: { projectId }, body: { revisionIds } };
      const { value } = await this.api.send(issueBomNote, request);
      this.announcer.say(`${value.note.issue?.identification ?? 'The note'} is issued.`);
      await this.router.navigate(['/p', projectId, 'bom-note', value.id]);
    } catch (error) {
      const { detail } = toApiProblem(error);
      this.problem.set(detail);
      this.announcer.alert(detail);
      this.answer.reload();
    } finally {
      this.busy.set(false);
    }
  }
}
