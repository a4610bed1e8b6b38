import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../ui/icon.ts';

/** Whether somebody has read the data back against a document. */
@Component({
  selector: 'app-verified-mark',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-icon [name]="verified() ? 'badge-check' : 'circle-alert'" [size]="17" />
    <span>{{ verified() ? 'Verified' : 'Unverified' }}</span>`,
  styles: `
    :host {
      display: inline-flex;
      gap: 5px;
      align-items: center;
      color: var(--app-ok);
      font-weight: 600;
      font-size: 12px;
      white-space: nowrap;
    }

    :host(.unverified) {
      color: var(--app-warn);
    }
  `,
  host: { '[class.unverified]': '!verified()' },
})
export class VerifiedMark {
  readonly verified = input.required<boolean>();
}
