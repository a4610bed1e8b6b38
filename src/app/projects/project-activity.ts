import { ChangeDetectionStrategy, Component, computed, inject, resource } from '@angular/core';
import { projectActivity } from '../../../shared/contract/audit.ts';
import { ApiClient } from '../api/api-client.ts';
import { SessionStore } from '../session/session-store.ts';
import { ActivityList } from '../ui/activity-list.ts';
import { LoadState } from '../ui/load-state.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { projectTrail } from './project-trail.ts';
import { ProjectStore } from './project-store.ts';

/** The audit lines of a project, for its members. */
@Component({
  selector: 'app-project-activity',
  imports: [ActivityList, LoadState],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (lines.hasValue()) {
      <div class="reading">
        <app-activity-list [lines]="lines.value()" [ownId]="ownId()" />
      </div>
    } @else {
      <app-load-state [resource]="lines" what="The activity" />
    }`,
})
export class ProjectActivity {
  private readonly api = inject(ApiClient);
  private readonly store = inject(ProjectStore);
  private readonly person = inject(SessionStore).person;

  protected readonly ownId = computed(() => this.person()?.id ?? null);

  protected readonly lines = resource({
    params: () => this.store.projectId(),
    loader: async ({ params: projectId }) =>
      (await this.api.send(projectActivity, { params: { projectId }, query: { limit: 200 } })).value
        .lines,
  });

  constructor() {
    usePageTrail(() => projectTrail(this.store.project(), 'Activity'));
  }
}
