import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Desk } from '../../../shared/contract/desk.ts';
import { fixedFigure, marginText } from '../ui/fixed-figure.ts';

/** The month in four figures: how much was checked, and how closely the own figures agreed. */
@Component({
  selector: 'app-desk-month',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<h2>This month</h2>
    <dl>
      @for (line of lines(); track line.name) {
        <div>
          <dt>{{ line.name }}</dt>
          <dd class="number">{{ line.figure }}</dd>
        </div>
      }
    </dl>`,
  styles: `
    h2 {
      margin-bottom: 8px;
      font: 600 16px/1.4 var(--app-text);
    }

    div {
      display: flex;
      justify-content: space-between;
      gap: 8px;
      padding: 5px 0 6px;
      border-top: 1px solid var(--app-line);
    }

    dd {
      font-weight: 600;
    }
  `,
})
export class DeskMonth {
  readonly month = input.required<Desk['month']>();

  protected readonly lines = computed(() => {
    const { checksDone, returned, largestDifference, medianHoursToCheck } = this.month();
    const hours = fixedFigure(medianHoursToCheck, 0);
    return [
      { name: 'Checks done', figure: String(checksDone) },
      { name: 'Returned with findings', figure: String(returned) },
      { name: 'Largest difference of own figure', figure: marginText(largestDifference) || 'none' },
      {
        name: 'Median time to check',
        figure: medianHoursToCheck === null ? 'none' : `${hours}\u00a0h`,
      },
    ];
  });
}
