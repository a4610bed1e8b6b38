import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { partGroups } from '../../../shared/parts/part-groups.ts';
import { documentTitles } from '../../../shared/parts/provenance.ts';
import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { Moment } from '../ui/moment.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { StateChip } from '../ui/state-chip.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { StripCell, TitleStrip } from '../ui/title-strip.ts';
import { DataTable } from './data-table.ts';
import { PartCurves } from './part-curves.ts';
import { KIND_WORDS } from './part-kinds.ts';
import { PartStore } from './part-store.ts';
import { usableLimits } from './usable-limits.ts';
import { VerifiedMark } from './verified-mark.ts';
import { VerifyDialog, type VerifyAsked } from './verify-dialog.ts';

/** One part: every printed row with its source, limits as printed and as usable, revisions, where it is used. */
@Component({
  selector: 'app-part-page',
  imports: [
    DataTable,
    Icon,
    LoadState,
    MatButton,
    Moment,
    NotAllowed,
    PartCurves,
    RouterLink,
    StateChip,
    StripCell,
    SymbolText,
    TitleStrip,
    VerifiedMark,
  ],
  providers: [PartStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './part-page.html',
  styleUrl: './part-page.scss',
  host: { class: 'page' },
})
export class PartPage {
  protected readonly store = inject(PartStore);
  private readonly dialog = inject(MatDialog);

  readonly partId = input.required<string>();
  /** An earlier revision to look at, from the query. */
  readonly revision = input<string>();

  protected readonly part = this.store.part;
  protected readonly shown = computed(() => {
    const part = this.part();
    if (part === undefined) return undefined;
    const wanted = this.revision();
    if (wanted === undefined || wanted === part.latest.id) return part.latest;
    return this.store.earlier.hasValue() ? this.store.earlier.value() : undefined;
  });
  protected readonly isLatest = computed(() => this.shown()?.id === this.part()?.latest.id);
  protected readonly verified = computed(() => this.shown()?.verification !== null);
  protected readonly limits = computed(() => {
    const record = this.shown()?.record;
    return record?.kind === 'transistor' ? usableLimits(record.limits, GENERAL_PRACTICE) : [];
  });
  /** What has curves to draw. */
  protected readonly transistor = computed(() => {
    const record = this.shown()?.record;
    return record?.kind === 'transistor' ? record : null;
  });
  /** The ratings stand in their own panel, unless several makers' are to be told apart. */
  protected readonly tables = computed(() => {
    const record = this.shown()?.record;
    if (record === undefined) return [];
    const several = record.kind !== 'transistor' || record.alternatives.length > 0;
    return partGroups(record).filter(({ id }) => several || id !== 'limits');
  });
  protected readonly documents = computed(() => {
    const record = this.shown()?.record;
    if (record === undefined) return [];
    return [
      ...new Set(record.sources.flatMap(({ source }) => documentTitles(source, record.documents))),
    ];
  });
  protected readonly policyName = GENERAL_PRACTICE.name;

  constructor() {
    usePageTrail(() => {
      const part = this.part();
      if (part === undefined) return [];
      const { many } = KIND_WORDS[part.kind];
      return [{ text: 'Parts', link: ['/parts'] }, { text: many }, { text: part.partNumber }];
    });
    effect(() => {
      this.store.open(this.partId(), this.revision());
    });
  }

  protected askVerification(): void {
    const part = this.part();
    if (part === undefined) return;
    const { id, number } = part.latest;
    const config = new MatDialogConfig<VerifyAsked>();
    config.ariaLabel = `Verify revision ${number} of ${part.partNumber}`;
    config.data = {
      title: config.ariaLabel,
      run: (document, note) => this.store.verify(id, document, note),
    };
    this.dialog.open(VerifyDialog, config);
  }
}
