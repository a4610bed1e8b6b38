import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Criterion, Evaluation } from '../../../shared/checks/evaluation.ts';
import { cornerWords } from '../../../shared/report/corner-words.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { MarginBar } from '../ui/margin-bar.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { STATUS_WORDS, VerdictMark } from '../ui/verdict-mark.ts';
import { figureText } from './figure-text.ts';

const SHOWN = 5;
const COUNTED = ['pass', 'marginal', 'fail', 'open', 'stated'] as const;

/** The verdict, how many criteria stand behind it, and those closest to their limit. */
@Component({
  selector: 'app-least-margins',
  imports: [MarginBar, SymbolText, VerdictMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './least-margins.html',
  styleUrl: './least-margins.scss',
})
export class LeastMargins {
  readonly evaluation = input.required<Evaluation>();
  readonly marginalBand = input.required<number>();

  protected readonly words = STATUS_WORDS;
  protected readonly counts = computed(() =>
    COUNTED.map((status) => ({
      status,
      count: this.evaluation().criteria.filter((each) => each.status === status).length,
    })),
  );
  protected readonly present = computed(() => this.counts().filter(({ count }) => count > 0));
  protected readonly absent = computed(() =>
    this.counts()
      .filter(({ count }) => count === 0)
      .map(({ status }, index) => (index === 0 ? STATUS_WORDS[status] : status))
      .join(', '),
  );
  /** Open ones first: nobody knows their margin. */
  protected readonly rows = computed(() =>
    this.evaluation()
      .criteria.filter(decides)
      .sort((a, b) => order(a) - order(b))
      .slice(0, SHOWN)
      .map((criterion) => rowOf(criterion)),
  );
}

/** Stated ones and counts that are met have no margin to be short of. */
const decides = ({ status, margin }: Criterion) =>
  status !== 'stated' && !(status === 'pass' && margin === null);

const order = ({ margin, status }: Criterion) => (status === 'open' ? -Infinity : (margin ?? -1));

function rowOf(criterion: Criterion) {
  const { id, status, margin, corner } = criterion;
  const { value, limit, margin: percent } = figureText(criterion);
  return {
    id,
    status,
    margin,
    value,
    name: criterionName(id),
    corner: corner === null ? '' : cornerWords(corner, id),
    limit: limit ?? 'no limit',
    marginText: status === 'open' || percent === '' ? '' : `${percent}\u00a0%`,
  };
}
