import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { usePageTrail } from '../ui/page-title.ts';
import { Moment } from '../ui/moment.ts';
import { LoadState } from '../ui/load-state.ts';
import { CheckEditor } from './check-editor.ts';
import { ComparisonPanel } from './comparison-panel.ts';
import { CriteriaList } from './criteria-list.ts';
import { DecisionBar } from './decision-bar.ts';
import { FigurePanel } from './figure-panel.ts';
import { FindingsPanel } from './findings-panel.ts';
import { JustificationsPanel } from './justifications-panel.ts';
import { PassList } from './pass-list.ts';
import { passItems } from './pass-items.ts';
import { reviewTrail } from './review-trail.ts';
import { ReviewStore } from './review-store.ts';
import { ReviewStrip } from './review-strip.ts';

/** Check of a revision: every criterion read, an independent figure, findings, and pass or return. */
@Component({
  selector: 'app-check-page',
  imports: [
    ComparisonPanel,
    CriteriaList,
    DecisionBar,
    FigurePanel,
    FindingsPanel,
    JustificationsPanel,
    LoadState,
    Moment,
    PassList,
    ReviewStrip,
  ],
  providers: [ReviewStore, CheckEditor],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './check-page.html',
  styleUrl: './check-page.scss',
  host: { class: 'page', '(window:beforeunload)': 'holdUnsent($event)' },
})
export class CheckPage {
  private readonly store = inject(ReviewStore);
  private readonly editor = inject(CheckEditor);

  readonly revisionId = input.required<string>();

  protected readonly answer = this.store.answer;
  protected readonly revision = this.store.revision;
  protected readonly selected = signal<string | null>(null);
  protected readonly about = signal<string | null>(null);
  protected readonly editable = computed(() => this.revision()?.may.check.allowed ?? false);
  protected readonly items = computed(() => {
    const revision = this.revision();
    return revision === undefined
      ? []
      : passItems(this.editor.draft(), revision.evaluation, revision.findings);
  });

  constructor() {
    usePageTrail(() => reviewTrail(this.revision(), 'Check'));
    effect(() => {
      this.store.open(this.revisionId());
    });
    let begun = '';
    effect(() => {
      const revision = this.revision();
      if (revision === undefined || revision.id === begun) return;
      begun = revision.id;
      untracked(() => {
        this.editor.begin(revision);
      });
    });
  }

  /** Sends what is unsent before the page is left; asks where that does not succeed. */
  async mayLeave(): Promise<boolean> {
    if (!this.editable() || (await this.editor.save())) return true;
    return confirm('Some of what you entered is not saved. Leave this page and lose it?');
  }

  protected holdUnsent(event: Event): void {
    if (this.editable() && this.editor.unsent()) event.preventDefault();
  }
}
