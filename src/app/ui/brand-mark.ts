import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** The mark: a line that rises, bends at the operating point and runs flat; one colour, that of the text. */
@Component({
  selector: 'app-brand-mark',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<svg
    viewBox="0 0 24 24"
    [attr.width]="size()"
    [attr.height]="size()"
    aria-hidden="true"
    focusable="false"
  >
    <path
      fill="currentcolor"
      fill-rule="evenodd"
      d="M2 18h4.38L9.63 10.5H9v-7h7V6h6v2h-6v2.5h-4.12L7.69 20H2ZM11 5.5v3h3v-3Z"
    />
  </svg>`,
  styles: `
    :host {
      display: inline-flex;
      color: var(--mat-sys-primary);
    }
  `,
})
export class BrandMark {
  readonly size = input(30);
}
