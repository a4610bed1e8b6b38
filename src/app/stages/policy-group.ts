import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Policy } from '../../../shared/stage/policy.ts';
import { formatNumber, formatPercent } from '../../../shared/units/engineering-notation.ts';

/** The project's limits as the stage is judged by them; read-only, they are the project's. */
@Component({
  selector: 'app-policy-group',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<section aria-labelledby="group-policy">
    <h2 class="head" id="group-policy">
      <span>Policy</span>
      <span class="line" aria-hidden="true"></span>
      <span class="small figure">{{ policy().name }}, v{{ version() }}</span>
    </h2>
    <details>
      <summary>Limits in force</summary>
      @for (row of rows(); track row.name) {
        <div class="row">
          <span>{{ row.name }}</span>
          <span class="mono">{{ row.value }}</span>
        </div>
      }
      <p class="small">Set in the project, for all its stages.</p>
    </details>
  </section>`,
  styleUrl: './policy-group.scss',
})
export class PolicyGroup {
  readonly policy = input.required<Policy>();
  readonly version = input.required<number>();

  protected readonly rows = computed(() => {
    const policy = this.policy();
    return [
      { name: 'Overdrive factor', value: `≥ ${formatNumber(policy.overdriveFactor)}` },
      { name: 'Forced β', value: `≤ ${formatNumber(policy.forcedBeta)}` },
      { name: 'Guaranteed β only', value: policy.guaranteedOnly ? 'Yes' : 'No' },
      { name: 'Marginal under', value: formatPercent(policy.marginalBand) },
      { name: 'Voltage', value: formatPercent(policy.voltageDerating) },
      { name: 'Current', value: formatPercent(policy.currentDerating) },
      { name: 'Power', value: formatPercent(policy.powerDerating) },
      { name: 'Junction', value: formatPercent(policy.junctionDerating) },
      { name: 'Resistors', value: formatPercent(policy.resistorDerating) },
      { name: 'Pins', value: formatPercent(policy.driveDerating) },
      { name: 'Series', value: policy.series },
    ];
  });
}
