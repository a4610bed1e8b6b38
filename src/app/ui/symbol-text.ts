import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { symbolParts } from './symbol-parts.ts';

/** Text in which letter symbols carry their subscripts: VCE(sat), RB, hFE. */
@Component({
  selector: 'app-symbol-text',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@for (part of parts(); track $index) {
    @if (part.sub) {
      <sub>{{ part.text }}</sub>
    } @else {
      <span>{{ part.text }}</span>
    }
  }`,
})
export class SymbolText {
  readonly text = input.required<string>();

  protected readonly parts = computed(() => symbolParts(this.text()));
}
