import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  input,
  model,
} from '@angular/core';
import { SymbolText } from './symbol-text.ts';

/** One tab: what it stands for and what it is called. */
export interface Tab {
  readonly key: string;
  readonly text: string;
}

/**
 * A row of tabs (ARIA practice): one tab stop, arrow keys move and select, Home and End jump. The panel that belongs to it
 * carries `role="tabpanel"`, the id `<prefix>-panel` and is named by `<prefix>-tab-<key>`.
 */
@Component({
  selector: 'app-tab-strip',
  imports: [SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'tablist', '[attr.aria-label]': 'label()' },
  template: `@for (tab of tabs(); track tab.key) {
    <button
      type="button"
      role="tab"
      [id]="prefix() + '-tab-' + tab.key"
      [attr.aria-selected]="tab.key === chosen()"
      [attr.aria-controls]="tab.key === chosen() ? prefix() + '-panel' : null"
      [attr.tabindex]="tab.key === chosen() ? 0 : -1"
      (click)="chosen.set(tab.key)"
      (keydown)="key($event)"
    >
      <app-symbol-text [text]="tab.text" />
    </button>
  }`,
  styleUrl: './tab-strip.scss',
})
export class TabStrip {
  readonly tabs = input.required<readonly Tab[]>();
  readonly label = input.required<string>();
  readonly prefix = input.required<string>();
  readonly chosen = model.required<string>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected key(event: KeyboardEvent): void {
    const tabs = this.tabs();
    const now = tabs.findIndex(({ key }) => key === this.chosen());
    const last = tabs.length - 1;
    const to = {
      ArrowLeft: now === 0 ? last : now - 1,
      ArrowRight: now === last ? 0 : now + 1,
      Home: 0,
      End: last,
    }[event.key];
    const next = to === undefined ? undefined : tabs[to];
    if (to === undefined || next === undefined) return;
    event.preventDefault();
    this.chosen.set(next.key);
    this.host.querySelectorAll<HTMLElement>('[role="tab"]')[to]?.focus();
  }
}
