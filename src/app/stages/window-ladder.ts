import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  input,
  linkedSignal,
  output,
  viewChild,
} from '@angular/core';
import { criterionInSentence } from '../../../shared/checks/criterion-in-sentence.ts';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import { formatPercent } from '../../../shared/units/engineering-notation.ts';
import { Icon } from '../ui/icon.ts';
import type { IconName } from '../ui/icon-outlines.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { STATUS_WORDS } from '../ui/verdict-mark.ts';
import { BAND_HEIGHT, ladder, type Rung } from './ladder-model.ts';

const ICONS: Readonly<Record<Rung['verdict'], IconName>> = {
  pass: 'circle-check',
  marginal: 'triangle',
  fail: 'octagon',
  open: 'circle-dashed',
  stated: 'info',
};

function conflictSentence(between: readonly string[]): string {
  const [first = '', second] = between.map(criterionInSentence);
  return second === undefined
    ? `No preferred value meets ${first}.`
    : `No preferred value meets both: ${first} asks for a smaller one, ${second} for a larger.`;
}

/**
 * The window for RB: every preferred value that was judged, as a rung with its smallest margin. A toolbar of
 * buttons (ARIA practice): one tab stop, arrow keys step, Home and End jump, Enter takes the value.
 */
@Component({
  selector: 'app-window-ladder',
  imports: [Icon, SymbolText],
  templateUrl: './window-ladder.html',
  styleUrls: ['./window-ladder.scss', './ladder-rungs.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WindowLadder {
  readonly sizing = input.required<Sizing | null>();
  readonly inUseOhm = input.required<number | null>();
  /** What the verdicts say of the value in use, where it was not sized. */
  readonly evaluation = input.required<Evaluation | null>();
  readonly series = input.required<string>();
  readonly readOnly = input(false);
  readonly taken = output<number>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly scroller = viewChild<ElementRef<HTMLElement>>('scroller');

  protected readonly words = STATUS_WORDS;
  protected readonly bandPercent = BAND_HEIGHT * 100;
  protected readonly view = computed(() => {
    const sizing = this.sizing();
    return sizing === null ? null : ladder(sizing, this.inUseOhm(), this.evaluation());
  });
  protected readonly conflict = computed(() => {
    const conflict = this.sizing()?.conflict ?? null;
    return conflict === null
      ? null
      : { sentence: conflictSentence(conflict.between), ways: conflict.ways };
  });
  /** The one rung in the tab order. */
  protected readonly current = linkedSignal(() => {
    const rungs = this.view()?.rungs ?? [];
    const used = rungs.findIndex(({ inUse }) => inUse);
    return used >= 0
      ? used
      : Math.max(
          0,
          rungs.findIndex(({ recommended }) => recommended),
        );
  });

  constructor() {
    effect(() => {
      const box = this.scroller()?.nativeElement;
      const index = this.current();
      const count = this.view()?.rungs.length ?? 0;
      if (box === undefined || count === 0) return;
      const rungPx = box.scrollWidth / count;
      box.scrollLeft = rungPx * (index + 0.5) - box.clientWidth / 2;
    });
  }

  protected icon(rung: Rung): IconName {
    return ICONS[rung.verdict];
  }

  protected label(rung: Rung): string {
    const margin = rung.margin === null ? 'no margin' : `margin ${formatPercent(rung.margin)}`;
    return [
      rung.text,
      STATUS_WORDS[rung.verdict],
      rung.worst === null ? margin : `${margin}, ${rung.worst}`,
      rung.recommended ? 'recommended' : '',
      rung.inUse ? 'in use' : '',
      rung.standIn ? 'not among the sized values' : '',
    ]
      .filter((word) => word !== '')
      .join(', ');
  }

  protected flag(rung: Rung): string {
    if (rung.standIn) return 'in use';
    if (!rung.recommended) return '';
    return rung.inUse ? 'recommended, in use' : 'recommended';
  }

  protected key(event: KeyboardEvent): void {
    const count = this.view()?.rungs.length ?? 0;
    const next = {
      ArrowLeft: this.current() - 1,
      ArrowRight: this.current() + 1,
      Home: 0,
      End: count - 1,
    }[event.key];
    if (next === undefined || next < 0 || next >= count) return;
    event.preventDefault();
    this.current.set(next);
    this.host.querySelectorAll<HTMLElement>('.rung')[next]?.focus();
  }

  protected take(rung: Rung): void {
    if (!this.readOnly()) this.taken.emit(rung.valueOhm);
  }

  /** By whole values, for fingers and mice. */
  protected scroll(direction: -1 | 1): void {
    const box = this.scroller()?.nativeElement;
    box?.scrollBy({ left: direction * 4 * 35.2, behavior: 'auto' });
  }
}
