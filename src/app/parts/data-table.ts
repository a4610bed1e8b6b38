import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { PartTable } from '../../../shared/parts/part-table.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { CONFIDENCE_WORDS } from './part-kinds.ts';
import { shownColumns } from './shown-table.ts';
import { VerifiedMark } from './verified-mark.ts';

/** One group of data-sheet rows with where they were read. */
@Component({
  selector: 'app-data-table',
  imports: [SymbolText, VerifiedMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './data-table.html',
  styleUrl: './data-table.scss',
})
export class DataTable {
  readonly table = input.required<PartTable>();
  readonly verified = input.required<boolean>();

  protected readonly columns = computed(() => shownColumns(this.table()));
  /** What most rows share stands in the head; a row that differs says so itself. */
  protected readonly source = computed(() => this.table().rows[0]?.source ?? null);
  protected readonly confidence = computed(() => this.table().rows[0]?.confidence ?? 'high');
  protected readonly origin = computed(() =>
    [this.source(), this.confidence() === 'high' ? null : CONFIDENCE_WORDS[this.confidence()]]
      .filter((text) => text !== null)
      .join(', '),
  );
  protected readonly rows = computed(() =>
    this.table().rows.map(({ source, confidence, note }, index) => ({
      cells: this.columns().map(({ cells, numeric }) => ({ text: cells[index] ?? '', numeric })),
      remark: [
        source === this.source() ? null : source,
        confidence === this.confidence() ? null : CONFIDENCE_WORDS[confidence],
        note,
      ]
        .filter((text) => text !== null)
        .join('; '),
    })),
  );
}
