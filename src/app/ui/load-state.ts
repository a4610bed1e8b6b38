import { ChangeDetectionStrategy, Component, computed, input, type Resource } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from './icon.ts';

/** What stands in place of a page's content until it has loaded, or when it could not be. */
@Component({
  selector: 'app-load-state',
  imports: [Icon, MatButton, MatProgressBar],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (problem(); as problem) {
      <div class="failed" role="alert">
        <app-icon name="circle-alert" [size]="24" />
        <p class="heading">{{ what() }} could not be loaded</p>
        <p>{{ problem.detail }}</p>
        @if (problem.reference) {
          <p class="small">
            Reference <span class="mono">{{ problem.reference }}</span>
          </p>
        }
        <button matButton="outlined" type="button" (click)="resource().reload()">Try again</button>
      </div>
    } @else {
      <mat-progress-bar mode="indeterminate" [attr.aria-label]="'Loading ' + what()" />
      <p class="busy">Loading</p>
    }`,
  styleUrl: './load-state.scss',
})
export class LoadState {
  readonly resource = input.required<Pick<Resource<unknown>, 'error'> & { reload(): boolean }>();
  /** Subject of the sentence: "The project". */
  readonly what = input.required<string>();

  protected readonly problem = computed(() => {
    const error = this.resource().error();
    if (!error) return null;
    return toApiProblem(error.cause ?? error);
  });
}
