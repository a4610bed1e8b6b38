import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { lawRuns } from '../../../shared/method/formula-text.ts';
import { type LawId, LAWS } from '../../../shared/method/laws.ts';
import { FormulaText } from '../ui/formula-text.ts';
import { SymbolText } from '../ui/symbol-text.ts';

/** Laws with formula, where each holds and where it comes from. */
@Component({
  selector: 'app-law-list',
  imports: [FormulaText, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<ul>
    @for (law of shown(); track law.id) {
      <li>
        <app-symbol-text class="name" [text]="law.name" />
        <app-formula-text class="formula" [runs]="law.runs" />
        <span class="note">
          @if (law.validity) {
            <app-symbol-text [text]="law.validity" />
          }
          Source: <app-symbol-text [text]="law.source" />{{
            law.judgement ? ', not measurement' : ''
          }}
        </span>
      </li>
    }
  </ul>`,
  styles: `
    ul {
      display: grid;
      gap: 8px;
      margin: 8px 0 4px;
      padding: 0;
      list-style: none;
    }

    li {
      padding-left: 12px;
      border-left: 1px solid var(--mat-sys-outline-variant);
    }

    .name {
      display: block;
      font-size: 12px;
      line-height: 16px;
    }

    .formula {
      display: block;
      padding: 2px 0;
      font-size: 16px;
      line-height: 26px;
      overflow-wrap: anywhere;
    }

    .note {
      display: block;
      color: var(--mat-sys-on-surface-variant);
      font-size: 12px;
      line-height: 16px;
    }
  `,
})
export class LawList {
  readonly laws = input.required<readonly LawId[]>();

  protected readonly shown = computed(() =>
    this.laws().map((id) => {
      const law = LAWS[id];
      return { ...law, id, runs: lawRuns(law.result, law.formula) };
    }),
  );
}
