import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { FormulaRun } from '../../../shared/method/formula-text.ts';

/** A formula or symbol set in plain text with its subscripts and powers. */
@Component({
  selector: 'app-formula-text',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@for (run of set(); track $index) {
    @switch (run.level) {
      @case ('sub') {
        <sub>{{ run.text }}</sub>
      }
      @case ('sup') {
        <sup>{{ run.text }}</sup>
      }
      @default {
        <span>{{ run.text }}</span>
      }
    }
  }`,
  styles: `
    sup {
      font-size: 0.74em;
      line-height: 0;
      vertical-align: 0.42em;
    }
  `,
})
export class FormulaText {
  readonly runs = input.required<readonly FormulaRun[]>();

  /** A fraction or product may go on in the next line, a number and its unit may not. */
  protected readonly set = computed(() =>
    this.runs().map(({ text, level }) => ({ level, text: text.replaceAll('·', '·\u200b') })),
  );
}
