import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { iconOutline, type IconName } from './icon-outlines.ts';

/** An icon beside a word, hidden from readers; the word is the name. */
@Component({
  selector: 'app-icon',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<svg
    viewBox="0 0 24 24"
    [attr.width]="size()"
    [attr.height]="size()"
    aria-hidden="true"
    focusable="false"
  >
    <path [attr.d]="outline()" />
  </svg>`,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
    }

    path {
      fill: none;
      stroke: currentcolor;
      stroke-width: 2;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
})
export class Icon {
  readonly name = input.required<IconName>();
  /** Edge in px. */
  readonly size = input(18);

  protected readonly outline = computed(() => iconOutline(this.name()));
}
