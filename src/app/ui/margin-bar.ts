import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { CriterionStatus } from '../../../shared/checks/evaluation.ts';
import { marginBarShape, marginOffsetPx } from './margin-scale.ts';

const ROOM_PX = 12;
const ARROW_PX = 6;

/**
 * One margin on the scale all bars of a list share: upright tick at the limit, ticks at 10, 50 and 100 %, pale
 * band up to the marginal limit. The figure stands beside it in text, so the drawing is hidden from readers.
 */
@Component({
  selector: 'app-margin-bar',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<svg
    [attr.viewBox]="viewBox()"
    [attr.width]="widthPx()"
    height="14"
    aria-hidden="true"
    focusable="false"
  >
    @if (status() !== 'stated') {
      @if (bar(); as bar) {
        <rect class="band" x="1" y="2" [attr.width]="bandPx()" height="10" />
        <path class="scale" [attr.d]="scale()" />
        <rect
          class="bar"
          [attr.x]="bar.fromPx + (bar.fromPx < 0 ? -1 : 1)"
          y="4"
          [attr.width]="bar.widthPx"
          height="6"
          [class]="status()"
        />
        @if (bar.arrow) {
          <path class="bar" [class]="status()" [attr.d]="arrow()" />
        }
      } @else {
        <path class="open" [attr.d]="'M1 7H' + fullPx()" />
      }
      <path class="limit" d="M0 0V14" />
    }
  </svg>`,
  styleUrl: './margin-bar.scss',
})
export class MarginBar {
  /** Fraction of the limit, positive when met; null where there is none. */
  readonly margin = input.required<number | null>();
  readonly status = input.required<CriterionStatus>();
  /** Length of 100 %, px: 42 in tables, 94 in the verdict list. */
  readonly fullPx = input(42);
  /** Up to where a met limit counts as marginal, a fraction. */
  readonly marginalBand = input(0.1);

  protected readonly widthPx = computed(() => ROOM_PX + this.fullPx() + ARROW_PX + 2);
  protected readonly viewBox = computed(() => `${-ROOM_PX - 1} 0 ${this.widthPx()} 14`);
  protected readonly bandPx = computed(() => marginOffsetPx(this.marginalBand(), this.fullPx()));
  protected readonly bar = computed(() => {
    const margin = this.margin();
    return margin === null || this.status() === 'open'
      ? null
      : marginBarShape(margin, this.fullPx(), ROOM_PX);
  });
  protected readonly scale = computed(() => {
    const ticks = [0.5, 1].map((share) => `M${marginOffsetPx(share, this.fullPx())} 4V10`);
    return `M1 7H${this.fullPx()}${ticks.join('')}`;
  });
  protected readonly arrow = computed(() =>
    this.bar()?.arrow === 'left'
      ? `M${-ROOM_PX - 1} 7l6 -6v12Z`
      : `M${this.fullPx() + ARROW_PX} 7l-6 -5v10Z`,
  );
}
