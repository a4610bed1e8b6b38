import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../ui/icon.ts';
import type { IconName } from '../ui/icon-outlines.ts';
import { SymbolText } from '../ui/symbol-text.ts';

/** Head of a panel on the check page: icon, name, and what stands at its right end. */
@Component({
  selector: 'app-panel-head',
  imports: [Icon, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (icon(); as icon) {
      <app-icon [name]="icon" [class]="tone()" />
    }
    <h2 [id]="headingId()"><app-symbol-text [text]="heading()" /></h2>
    <ng-content />`,
  styles: `
    :host {
      display: flex;
      align-items: center;
      gap: 10px;
      min-height: 40px;
      padding: 0 20px 0 16px;
      border-bottom: 1px solid var(--mat-sys-outline-variant);
      background: var(--app-desk);
    }

    h2 {
      font: 600 14px/20px var(--app-text);
    }

    .warn {
      color: var(--app-warn);
    }

    .info {
      color: var(--app-info);
    }
  `,
})
export class PanelHead {
  readonly heading = input.required<string>();
  readonly headingId = input.required<string>();
  readonly icon = input<IconName | null>(null);
  readonly tone = input<'' | 'warn' | 'info'>('');
}
