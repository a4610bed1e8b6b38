import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../ui/icon.ts';
import type { IconName } from '../ui/icon-outlines.ts';

/** Head of a part of the evidence: icon and name in verdigris, a remark at the right end. */
@Component({
  selector: 'app-section-head',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-icon [name]="icon()" />
    <h2 class="group-head" [id]="headingId()">{{ heading() }}</h2>
    <ng-content />`,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 8px;
      align-items: center;
      margin-bottom: 8px;
      color: var(--mat-sys-primary);
    }

    h2 {
      flex: 1;
    }
  `,
})
export class SectionHead {
  readonly heading = input.required<string>();
  readonly headingId = input.required<string>();
  readonly icon = input.required<IconName>();
}
