import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import { Icon } from '../ui/icon.ts';

export interface FilterOption {
  readonly value: string;
  readonly text: string;
}

/** One filter: opens a menu while nothing is chosen, takes the choice back when something is. */
@Component({
  selector: 'app-filter-menu',
  imports: [Icon, MatMenuModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (word(); as word) {
      <button type="button" class="set" (click)="chosen.emit(null)">
        {{ label() }} <b>{{ word }}</b>
        <span class="visually-hidden">, take the filter away</span>
        <app-icon name="x" [size]="16" />
      </button>
    } @else {
      <button type="button" [matMenuTriggerFor]="menu">
        {{ label() }} <b>any</b>
        <app-icon name="chevron-down" [size]="18" />
      </button>
    }
    <mat-menu #menu="matMenu">
      @for (option of options(); track option.value) {
        <button mat-menu-item type="button" (click)="chosen.emit(option.value)">
          {{ option.text }}
        </button>
      } @empty {
        <button mat-menu-item type="button" disabled>Nothing to choose from yet</button>
      }
    </mat-menu>`,
  styles: `
    :host {
      display: inline-flex;
    }

    button:not([mat-menu-item]) {
      display: inline-flex;
      align-items: center;
      gap: 5px;
      height: 36px;
      padding: 0 10px;
      border: 1px solid var(--mat-sys-outline);
      border-radius: var(--app-radius-field);
      background: none;
      color: var(--mat-sys-on-surface-variant);
      cursor: pointer;

      &:hover {
        background: var(--app-raised);
      }
    }

    b {
      font-weight: 600;
      color: var(--mat-sys-on-surface);
    }

    button.set.set {
      border-color: var(--mat-sys-primary);
      background: var(--mat-sys-primary-container);
      color: var(--mat-sys-on-primary-container);

      b {
        color: inherit;
      }
    }
  `,
})
export class FilterMenu {
  readonly label = input.required<string>();
  readonly options = input.required<readonly FilterOption[]>();
  readonly value = input.required<string | undefined>();

  readonly chosen = output<string | null>();

  protected readonly word = computed(() => {
    const value = this.value();
    return value === undefined
      ? null
      : (this.options().find((option) => option.value === value)?.text ?? value);
  });
}
