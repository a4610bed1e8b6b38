import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatSortModule, type Sort, type SortDirection } from '@angular/material/sort';
import { MatTableModule } from '@angular/material/table';
import { RouterLink } from '@angular/router';
import type { StageRow } from '../../../shared/contract/stage.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { fixedFigure, marginText } from '../ui/fixed-figure.ts';
import { Icon } from '../ui/icon.ts';
import { MarginBar } from '../ui/margin-bar.ts';
import { QuantityText } from '../ui/quantity-text.ts';
import { StateChip } from '../ui/state-chip.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { ProjectStore } from './project-store.ts';
import { StageList } from './stage-list-store.ts';
import type { StageFilter } from './stage-query.ts';

/** The stages table; every margin bar has its tick at the same place, so the column reads as one chart. */
@Component({
  selector: 'app-stage-table',
  imports: [
    Icon,
    MarginBar,
    MatCheckbox,
    MatSortModule,
    MatTableModule,
    QuantityText,
    RouterLink,
    StateChip,
    SymbolText,
    VerdictMark,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './stage-table.html',
  styleUrl: './stage-table.scss',
})
export class StageTable {
  protected readonly list = inject(StageList);
  protected readonly projectId = inject(ProjectStore).projectId;

  readonly rows = input.required<StageRow[]>();
  readonly sort = input.required<string>();
  readonly direction = input.required<SortDirection>();

  readonly sorted = output<StageFilter>();

  protected readonly columns = [
    'select',
    'reference',
    'title',
    'load',
    'transistor',
    'baseResistor',
    'overdriveFactor',
    'vceSat',
    'power',
    'verdict',
    'margin',
    'state',
    'letter',
  ] as const;
  protected readonly chosen = computed(
    () => new Set(this.list.selected().map((row) => row.stageId)),
  );
  protected readonly fixedFigure = fixedFigure;
  protected readonly marginText = marginText;
  protected readonly criterionName = criterionName;

  protected order(sort: Sort): void {
    this.sorted.emit({ sort: sort.active, direction: sort.direction || 'asc' });
  }
}
