import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';

/** A figure in mono with its unit in a column of its own, so that numbers and units of a list stand in line. */
@Component({
  selector: 'app-quantity',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<span>{{ parts()[0] }}</span
    ><span class="unit">&nbsp;{{ parts()[1] }}</span>`,
  styles: `
    :host {
      display: inline-flex;
      font-family: var(--app-mono);
      white-space: nowrap;
      word-spacing: -0.32em;
    }

    .unit {
      min-width: var(--unit-width, 0);
      text-align: left;
      color: var(--mat-sys-on-surface-variant);
    }
  `,
})
export class QuantityText {
  /** SI value; null where there is no figure. */
  readonly value = input.required<number | null>();
  readonly unit = input.required<string>();
  readonly digits = input(3);
  /** Fill up to `digits`: for results, not for values a person chose. */
  readonly pad = input(false);

  protected readonly parts = computed(() => {
    const text = formatQuantity(this.value(), this.unit(), {
      digits: this.digits(),
      pad: this.pad(),
    });
    const [number = '', unit = ''] = text.split('\u00a0');
    return [number, unit] as const;
  });
}
