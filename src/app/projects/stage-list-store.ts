import { computed, inject, Injectable, linkedSignal, resource, signal } from '@angular/core';
import type * as z from 'zod';
import { listStages, type StageRow } from '../../../shared/contract/stage.ts';
import { ApiClient } from '../api/api-client.ts';
import { ProjectStore } from './project-store.ts';

export type StageQuery = z.input<typeof listStages.query>;
export type StageRows = z.output<typeof listStages.reply>;

/** The rows of the stages table for the filter in the address, and which of them are chosen. */
@Injectable()
export class StageList {
  private readonly api = inject(ApiClient);
  private readonly project = inject(ProjectStore);
  private readonly query = signal<StageQuery | undefined>(undefined);
  private readonly chosen = signal<ReadonlySet<string>>(new Set());

  readonly answer = resource({
    params: () => {
      const projectId = this.project.projectId();
      const query = this.query();
      return projectId === undefined || query === undefined ? undefined : { projectId, query };
    },
    loader: async ({ params: { projectId, query } }) =>
      (await this.api.send(listStages, { params: { projectId }, query })).value,
  });
  /** The last rows that came; they stay while the next ones load. */
  readonly rows = linkedSignal<StageRows | null, StageRows | null>({
    source: () => (this.answer.hasValue() ? this.answer.value() : null),
    computation: (rows, previous) => rows ?? previous?.value ?? null,
  });
  readonly selected = computed<readonly StageRow[]>(
    () => this.rows()?.stages.filter((row) => this.chosen().has(row.stageId)) ?? [],
  );

  show(query: StageQuery): void {
    this.query.set(query);
  }

  reload(): void {
    this.answer.reload();
  }

  toggle(stageId: string): void {
    this.chosen.update((chosen) => {
      const next = new Set(chosen);
      if (!next.delete(stageId)) next.add(stageId);
      return next;
    });
  }

  /** All rows on show, or none when all are chosen already. */
  toggleAll(): void {
    const rows = this.rows()?.stages ?? [];
    const all = this.selected().length === rows.length;
    this.chosen.set(new Set(all ? [] : rows.map((row) => row.stageId)));
  }

  clearSelection(): void {
    this.chosen.set(new Set());
  }
}
