import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from './icon.ts';
import type { IconName } from './icon-outlines.ts';

/** Nothing here: a sentence on what belongs here, and the acts put inside. */
@Component({
  selector: 'app-empty-state',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-icon [name]="icon()" [size]="24" />
    <p class="heading">{{ heading() }}</p>
    <p class="text">{{ text() }}</p>
    <div class="acts"><ng-content /></div>`,
  styles: `
    :host {
      display: grid;
      justify-items: center;
      gap: 8px;
      padding: 40px 16px;
      text-align: center;
      color: var(--mat-sys-on-surface-variant);
    }

    .heading {
      font: 600 16px/1.4 var(--app-text);
      color: var(--mat-sys-on-surface);
    }

    .text {
      max-width: 52ch;
    }

    .acts {
      display: flex;
      flex-wrap: wrap;
      justify-content: center;
      gap: 8px;
      margin-top: 8px;
    }
  `,
})
export class EmptyState {
  readonly icon = input.required<IconName>();
  readonly heading = input.required<string>();
  readonly text = input('');
}
