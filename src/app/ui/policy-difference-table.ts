import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { PolicyDifference } from '../../../shared/stage/policy.ts';
import { limitName, limitText } from './policy-limits.ts';

/** What a stage file's own policy said, and what the project's says in its place. */
@Component({
  selector: 'app-policy-difference-table',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<table>
    <caption>
      The project’s policy was put in:
    </caption>
    <thead>
      <tr>
        <th scope="col">Limit</th>
        <th scope="col" class="right">In the file</th>
        <th scope="col" class="right">{{ adopted() }}</th>
      </tr>
    </thead>
    <tbody>
      @for (line of lines(); track line.key) {
        <tr>
          <th scope="row">{{ limitName(line.key) }}</th>
          <td class="number">{{ limitText(line.key, line.given) }}</td>
          <td class="number">{{ limitText(line.key, line.adopted) }}</td>
        </tr>
      }
    </tbody>
  </table>`,
  styleUrl: './policy-difference-table.scss',
})
export class PolicyDifferenceTable {
  readonly lines = input.required<readonly PolicyDifference[]>();
  /** Name of the project's policy. */
  readonly adopted = input.required<string>();

  protected readonly limitName = limitName;
  protected readonly limitText = limitText;
}
