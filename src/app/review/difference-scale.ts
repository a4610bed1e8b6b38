import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { formatNumber, formatPercent } from '../../../shared/units/engineering-notation.ts';

/** The scale reaches this far to each side of the tool's figure; farther off, the mark stands at its end. */
const REACH = 0.12;

const place = (difference: number) =>
  50 + (50 * Math.max(-REACH, Math.min(REACH, difference))) / REACH;

/** How far the checker's figure lies from the tool's, drawn on a scale in per cent of the tool's. */
@Component({
  selector: 'app-difference-scale',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<svg role="img" [attr.aria-label]="name()" width="100%" height="58">
    <rect class="above" x="0" y="18" width="100%" height="15" />
    <rect
      class="within"
      [attr.x]="within().from"
      y="18"
      [attr.width]="within().width"
      height="15"
    />
    <line class="axis" x1="0" y1="33.5" x2="100%" y2="33.5" />
    @for (tick of ticks; track tick.text) {
      <line class="axis" [attr.x1]="tick.at" y1="33" [attr.x2]="tick.at" y2="38" />
      <text class="tick" [attr.x]="tick.at" y="53" text-anchor="middle">{{ tick.text }}</text>
    }
    <line class="tool" x1="50%" y1="14" x2="50%" y2="33" />
    <text
      class="mono"
      x="50%"
      y="11"
      [attr.dx]="below() ? 5 : -5"
      [attr.text-anchor]="below() ? 'start' : 'end'"
    >
      tool {{ toolText() }}
    </text>
    @if (own() !== null) {
      <line class="own" [attr.x1]="mark()" y1="14" [attr.x2]="mark()" y2="33" />
      <svg [attr.x]="mark()" y="20" overflow="visible">
        <rect class="square" x="-4.5" y="1" width="9" height="9" />
      </svg>
      <text
        class="mono yours"
        [attr.x]="mark()"
        y="11"
        [attr.dx]="below() ? -4 : 4"
        [attr.text-anchor]="anchor()"
      >
        yours {{ ownText() }}
      </text>
    }
  </svg>`,
  styleUrl: './difference-scale.scss',
})
export class DifferenceScale {
  readonly tool = input.required<number>();
  readonly own = input.required<number | null>();
  /** (own − tool)/tool; null while there is no own figure. */
  readonly difference = input.required<number | null>();
  /** Up to where no reason is asked. */
  readonly allowed = input.required<number>();

  protected readonly within = computed(() => {
    const from = place(-this.allowed());
    return { from: `${from}%`, width: `${100 - 2 * from}%` };
  });
  protected readonly ticks = [-0.1, -0.05, 0, 0.05, 0.1].map((share) => ({
    at: `${place(share)}%`,
    text: `${share > 0 ? '+' : ''}${formatNumber(share * 100)}${share === 0.1 ? '\u00a0%' : ''}`,
  }));
  protected readonly below = computed(() => (this.difference() ?? -1) < 0);
  protected readonly mark = computed(() => `${place(this.difference() ?? 0)}%`);
  /** Beside the tool's figure, unless that would run over the edge. */
  protected readonly anchor = computed(() => {
    const difference = this.difference() ?? 0;
    if (Math.abs(difference) > 0.07) return this.below() ? 'start' : 'end';
    return this.below() ? 'end' : 'start';
  });
  protected readonly toolText = computed(() => formatNumber(this.tool(), { pad: true }));
  protected readonly ownText = computed(() => formatNumber(this.own(), { digits: 4 }));
  protected readonly name = computed(() => {
    const difference = this.difference();
    if (difference === null) return `Tool ${this.toolText()}, no figure of your own yet`;
    return `Yours ${this.ownText()}, tool ${this.toolText()}, difference ${formatPercent(difference, { digits: 2 })}`;
  });
}
