import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Revision } from '../../../shared/contract/revision.ts';
import type { Verdict } from '../../../shared/checks/evaluation.ts';
import { revisionDiff, type ComparedRevision } from '../../../shared/report/revision-diff.ts';
import { STATE_WORDS } from '../../../shared/review/revision-state.ts';
import { LoadState } from '../ui/load-state.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { PanelHead } from './panel-head.ts';
import { ReviewStore } from './review-store.ts';

/** What changed since the revision this one was copied from: definition, part data, results. */
@Component({
  selector: 'app-comparison-panel',
  imports: [LoadState, PanelHead, SymbolText, VerdictMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './comparison-panel.html',
  styleUrl: './comparison-panel.scss',
})
export class ComparisonPanel {
  private readonly store = inject(ReviewStore);

  readonly revision = input.required<Revision>();

  protected readonly previous = this.store.previous;
  protected readonly heading = computed(() => {
    const previous = this.revision().previous;
    return previous === null ? 'First revision' : `Changed since revision ${previous.letter}`;
  });
  protected readonly sides = computed(() => {
    if (!this.previous.hasValue()) return null;
    const { letter, state } = this.previous.value();
    return {
      before: `${letter}, ${STATE_WORDS[state].toLowerCase()}`,
      after: `${this.revision().letter}, this`,
    };
  });
  protected readonly groups = computed(() => {
    if (!this.previous.hasValue()) return [];
    const diff = revisionDiff(compared(this.previous.value()), compared(this.revision()));
    return [
      { name: 'Definition', lines: diff.definition, none: 'No value changed' },
      { name: 'Part data', lines: diff.partData, none: 'No library part in use' },
      { name: 'Results', lines: diff.results, none: 'No result changed' },
    ];
  });
  protected readonly verdicts = computed(() => {
    if (!this.previous.hasValue()) return null;
    const verdictOf = ({ evaluation }: Revision): Verdict => evaluation.verdict;
    return { before: verdictOf(this.previous.value()), after: verdictOf(this.revision()) };
  });
}

function compared({ definition, evaluation, partStanding }: Revision): ComparedRevision {
  return { definition, evaluation, parts: partStanding };
}
