import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { readRevision, submitRevision } from '../../../shared/contract/revision.ts';
import type { StageRow } from '../../../shared/contract/stage.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { counted } from '../ui/time-text.ts';
import { ProjectStore } from './project-store.ts';
import { saveStageArray, saveStageFiles } from './stage-files.ts';
import { StageList } from './stage-list-store.ts';

/** What can be done with the chosen stages together. */
@Component({
  selector: 'app-stage-selection',
  imports: [Icon, MatButton, MatMenuModule, NotAllowed],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './stage-selection.html',
  styleUrl: './stage-selection.scss',
})
export class StageSelection {
  private readonly api = inject(ApiClient);
  private readonly announcer = inject(StatusAnnouncer);
  private readonly list = inject(StageList);
  private readonly store = inject(ProjectStore);

  protected readonly busy = signal(false);
  protected readonly outcome = signal<string | null>(null);
  protected readonly heading = computed(
    () => `${counted(this.selected().length, 'stage')} selected`,
  );
  protected readonly submitRefusal = computed(() => {
    const others = this.selected().filter((row) => row.state !== 'draft');
    if (this.store.project()?.ownRoles.includes('designer') !== true) {
      return 'Only a designer of the project submits.';
    }
    if (others.length === 0) return null;
    return `Submit needs drafts; ${others.map((row) => row.reference).join(', ')} ${others.length === 1 ? 'is' : 'are'} not.`;
  });

  private readonly selected = this.list.selected;

  /** One after the other, so that a refusal names its stage and leaves the others submitted. */
  protected async submit(): Promise<void> {
    const refused: string[] = [];
    await this.each(async (row) => {
      const params = { revisionId: row.revisionId };
      try {
        const { etag } = await this.api.send(readRevision, { params });
        await this.api.send(submitRevision, { params, etag });
      } catch (error) {
        refused.push(`${row.reference}: ${toApiProblem(error).detail}`);
      }
    });
    this.list.reload();
    this.store.answer.reload();
    if (refused.length === 0) this.list.clearSelection();
    this.tell(refused.length === 0 ? 'Submitted for check' : refused.join(' '));
  }

  protected async exportFiles(way: 'array' | 'single'): Promise<void> {
    const stages: Parameters<typeof saveStageFiles>[0][number][] = [];
    try {
      await this.each(async (row) => {
        const params = { revisionId: row.revisionId };
        const { value } = await this.api.send(readRevision, { params });
        stages.push(value);
      });
    } catch (error) {
      this.tell(toApiProblem(error).detail);
      return;
    }
    if (way === 'array') saveStageArray(stages, Date.now());
    else saveStageFiles(stages, Date.now());
    this.tell(`${counted(stages.length, 'stage')} exported`);
  }

  protected clear(): void {
    this.list.clearSelection();
  }

  private async each(act: (row: StageRow) => Promise<void>): Promise<void> {
    this.busy.set(true);
    try {
      for (const row of this.selected()) await act(row);
    } finally {
      this.busy.set(false);
    }
  }

  private tell(outcome: string): void {
    this.outcome.set(outcome);
    this.announcer.say(outcome);
  }
}
