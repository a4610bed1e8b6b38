import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import { createStage } from '../../../shared/contract/stage.ts';
import type { Project } from '../../../shared/contract/project.ts';
import type { PolicyDifference } from '../../../shared/stage/policy.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { PolicyDifferenceTable } from '../ui/policy-difference-table.ts';
import { counted } from '../ui/time-text.ts';
import { readStageFile, type FileStage } from './read-stage-file.ts';

interface Row extends FileStage {
  readonly outcome: 'waiting' | 'imported' | 'refused';
  /** Why the server refused it. */
  readonly refusal: string | null;
  /** Where the file's policy said something else than the project's. */
  readonly difference: readonly PolicyDifference[];
}

/** Takes stage files, says what is wrong with each by field, and imports those that are right. */
@Component({
  selector: 'app-stage-import',
  imports: [Icon, MatButton, MatDialogModule, NotAllowed, PolicyDifferenceTable],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './stage-import.html',
  styleUrl: './stage-import.scss',
})
export class StageImport {
  private readonly api = inject(ApiClient);
  protected readonly project = inject<Project>(MAT_DIALOG_DATA);

  protected readonly rows = signal<readonly Row[]>([]);
  protected readonly busy = signal(false);
  protected readonly ready = computed(() =>
    this.rows().filter((row) => row.definition !== null && row.outcome !== 'imported'),
  );
  protected readonly refusal = computed(() =>
    this.ready().length > 0
      ? null
      : this.rows().length === 0
        ? 'Choose stage files first.'
        : 'No stage here is left to import.',
  );
  protected readonly act = computed(() =>
    this.ready().length === 0 ? 'Import' : `Import ${counted(this.ready().length, 'stage')}`,
  );

  protected async choose(input: HTMLInputElement): Promise<void> {
    const stages = await Promise.all(
      [...(input.files ?? [])].map(async (file) => readStageFile(file.name, await file.text())),
    );
    this.rows.set(
      stages
        .flat()
        .map((stage) => ({ ...stage, outcome: 'waiting', refusal: null, difference: [] })),
    );
    input.value = '';
  }

  protected async importStages(): Promise<void> {
    this.busy.set(true);
    for (const row of this.ready()) await this.importStage(row);
    this.busy.set(false);
  }

  private async importStage(row: Row): Promise<void> {
    if (row.definition === null) return;
    try {
      const { value } = await this.api.send(createStage, {
        params: { projectId: this.project.id },
        body: { definition: row.definition },
      });
      this.settle(row, { outcome: 'imported', difference: value.policyDifference });
    } catch (error) {
      const { detail, errors } = toApiProblem(error);
      const fields = errors.map(({ pointer, message }) => `${pointer}: ${message}`);
      this.settle(row, { outcome: 'refused', refusal: [detail, ...fields].join(' ') });
    }
  }

  private settle(row: Row, change: Partial<Row>): void {
    this.rows.update((rows) => rows.map((each) => (each === row ? { ...each, ...change } : each)));
  }
}
