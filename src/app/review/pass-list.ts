import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../ui/icon.ts';
import type { PassItem } from './pass-items.ts';

/** What must hold before the check can pass, and how far it is. */
@Component({
  selector: 'app-pass-list',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h2 id="pass-list-heading">Before it can pass</h2>
    <ul aria-labelledby="pass-list-heading">
      @for (item of items(); track $index) {
        <li [class.done]="item.done">
          <app-icon [name]="item.done ? 'circle-check' : 'circle'" />
          <span class="text">{{ item.text }}</span>
          <span class="state">{{ item.done ? 'done' : 'to do' }}</span>
        </li>
      }
    </ul>`,
  styles: `
    :host {
      display: block;
      margin: 16px 16px 0;
      padding: 12px 0 16px;
      border-top: 1px solid var(--mat-sys-outline-variant);
    }

    h2 {
      font: 600 14px/20px var(--app-text);
    }

    ul {
      padding: 0;
      list-style: none;
    }

    li {
      display: flex;
      gap: 8px;
      min-height: 28px;
      align-items: center;
      font-weight: 600;
    }

    .text {
      flex: 1;
    }

    .state {
      color: var(--mat-sys-secondary);
      font-size: 12px;
      white-space: nowrap;
    }

    .done {
      font-weight: 400;

      app-icon {
        color: var(--app-ok);
      }

      .state {
        color: var(--mat-sys-on-surface-variant);
      }
    }
  `,
})
export class PassList {
  readonly items = input.required<readonly PassItem[]>();
}
