import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import {
  calculationFacts,
  type CalculationHead,
  calculationIdentification,
  calculationOccasion,
} from '../../../shared/report/calculation-facts.ts';
import type { CalculationSheet } from '../../../shared/report/calculation-sheet.ts';
import { BrandMark } from '../ui/brand-mark.ts';
import { PageHeading } from '../ui/page-focus.ts';

/** Head of the sheet: what it is, of what, its number, and the row of facts. */
@Component({
  selector: 'app-calculation-header',
  imports: [BrandMark, PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (head().lock === null) {
      <p class="warning">NOT RELEASED, preview only</p>
    }
    <header>
      <app-brand-mark [size]="36" />
      <div class="what">
        <h1 appPageHeading>Calculation sheet</h1>
        <p>{{ head().reference }} {{ head().title }}: every criterion at its worst corner</p>
      </div>
      <div class="which">
        <p class="mono strong">{{ identification() }}</p>
        <p>{{ occasion() }}</p>
      </div>
    </header>
    <dl>
      @for (fact of facts(); track fact.label) {
        <div>
          <dt>{{ fact.label }}</dt>
          <dd [class.flagged]="fact.flagged && head().lock === null">{{ fact.value }}</dd>
        </div>
      }
    </dl>`,
  styles: `
    .warning {
      margin-bottom: 12px;
      color: var(--app-fail);
      font-weight: 600;
      text-align: center;
    }

    header {
      display: flex;
      flex-wrap: wrap;
      gap: 8px 12px;
      padding-bottom: 12px;
      border-bottom: 1.5px solid var(--app-ink);
    }

    .what {
      flex: 1 1 240px;
    }

    .what p {
      color: var(--mat-sys-on-surface-variant);
    }

    .strong {
      font-size: 16px;
      font-weight: 600;
    }

    dl {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(150px, 1fr));
      gap: 8px 16px;
      margin: 12px 0;
    }

    dt {
      color: var(--mat-sys-on-surface-variant);
      font-size: 12px;
      line-height: 16px;
    }

    dd {
      font-weight: 600;
    }

    .flagged {
      color: var(--app-fail);
    }

    @media (width >= 700px) {
      .which {
        text-align: right;
      }
    }
  `,
})
export class CalculationHeader {
  readonly head = input.required<CalculationHead>();
  readonly evaluation = input.required<Evaluation>();
  readonly sheet = input.required<CalculationSheet | null>();

  protected readonly identification = computed(() => calculationIdentification(this.head()));
  protected readonly occasion = computed(() => calculationOccasion(this.head()));
  protected readonly facts = computed(() =>
    calculationFacts(this.head(), this.evaluation(), this.sheet()),
  );
}
