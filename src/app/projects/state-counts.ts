import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { COUNTED_STATES, stageCount, type Counts } from './state-counts-text.ts';

/** The share of each state as one bar; the words with the numbers stand above it. */
@Component({
  selector: 'app-state-counts',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@for (part of parts(); track part.state) {
    <span [class]="part.state" [style.flex-grow]="part.count"></span>
  }`,
  styles: `
    :host {
      display: flex;
      width: 150px;
      height: 8px;
    }

    span {
      flex: 1 1 0;
    }

    .locked {
      background: var(--mat-sys-primary);
    }

    .checked {
      background: color-mix(in srgb, var(--mat-sys-primary) 55%, var(--app-paper));
    }

    .in-check {
      background: color-mix(in srgb, var(--app-info) 60%, var(--app-paper));
    }

    .draft {
      border: 1px dashed var(--mat-sys-outline);
    }

    .withdrawn {
      background: var(--mat-sys-outline-variant);
    }
  `,
  host: { 'aria-hidden': 'true' },
})
export class StateCounts {
  readonly counts = input.required<Counts>();

  protected readonly parts = computed(() => {
    const counts = this.counts();
    const total = stageCount(counts);
    return COUNTED_STATES.map((state) => ({ state, count: counts[state] / total })).filter(
      (part) => part.count > 0,
    );
  });
}
