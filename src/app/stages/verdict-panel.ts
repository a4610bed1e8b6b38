import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Criterion, Evaluation } from '../../../shared/checks/evaluation.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { MarginBar } from '../ui/margin-bar.ts';
import { MethodLink } from '../ui/method-link.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import {
  cornerText,
  countWords,
  cureText,
  shortCornerText,
  figureText,
  limitText,
  marginText,
  standsFirst,
  verdictGroups,
  verdictSentence,
} from './verdict-words.ts';

/** The verdict with its criteria: value, limit, margin and worst corner in words. */
@Component({
  selector: 'app-verdict-panel',
  imports: [MethodLink, MarginBar, MatButton, SymbolText, VerdictMark],
  templateUrl: './verdict-panel.html',
  styleUrl: './verdict-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictPanel {
  readonly evaluation = input.required<Evaluation>();
  readonly marginalBand = input(0.1);
  /** The form holds something that is no stage: the verdicts are those of the last one that was. */
  readonly stale = input(false);
  /** The criterion whose corner the drawing shows. */
  readonly shownCriterion = input<string | null>(null);
  readonly cornerAsked = output<string>();

  protected readonly all = signal(false);
  protected readonly rest = computed(() =>
    this.evaluation().criteria.filter((criterion) => !standsFirst(criterion)),
  );
  protected readonly groups = computed(() => {
    const { criteria } = this.evaluation();
    return verdictGroups(this.all() ? criteria : criteria.filter(standsFirst));
  });
  protected readonly sentence = computed(() => verdictSentence(this.evaluation()));
  protected readonly restWords = computed(
    () => `${this.rest().length} more: ${countWords(this.rest())}`,
  );

  protected readonly nameOf = ({ id }: Criterion) => criterionName(id);
  protected readonly figure = (criterion: Criterion) => figureText(criterion, criterion.value);
  protected readonly limit = limitText;
  protected readonly margin = ({ margin }: Criterion) => marginText(margin);
  protected readonly corner = shortCornerText;
  protected readonly cure = cureText;
  protected readonly wholeCorner = cornerText;
}
