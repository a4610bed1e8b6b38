import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  resource,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatTableModule } from '@angular/material/table';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { listProjects } from '../../../shared/contract/project.ts';
import { ApiClient } from '../api/api-client.ts';
import { EmptyState } from '../ui/empty-state.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { StateCounts } from './state-counts.ts';
import { countsText } from './state-counts-text.ts';

/** The projects one is a member of; the filter is the query of the address. */
@Component({
  selector: 'app-project-list',
  imports: [
    EmptyState,
    Icon,
    LoadState,
    MatButton,
    MatTableModule,
    PageHeading,
    RouterLink,
    StateCounts,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './project-list.html',
  styleUrl: './project-list.scss',
})
export class ProjectList {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  readonly search = input<string>();

  protected readonly columns = ['code', 'title', 'stages', 'counts', 'policy', 'roles'] as const;
  protected readonly projects = resource({
    loader: async () => (await this.api.send(listProjects)).value.projects,
  });
  protected readonly shown = computed(() => {
    const wanted = this.search()?.toLowerCase() ?? '';
    return (this.projects.hasValue() ? this.projects.value() : []).filter((project) =>
      `${project.code} ${project.title}`.toLowerCase().includes(wanted),
    );
  });
  protected readonly countsText = countsText;

  protected narrow(search: string): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { search: search === '' ? null : search },
      replaceUrl: true,
    });
  }
}
