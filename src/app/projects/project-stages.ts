import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ActivatedRoute, Router } from '@angular/router';
import { VERDICTS } from '../../../shared/checks/evaluation.ts';
import { listStages } from '../../../shared/contract/stage.ts';
import { REVISION_STATES, STATE_WORDS } from '../../../shared/review/revision-state.ts';
import { EmptyState } from '../ui/empty-state.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { STATUS_WORDS } from '../ui/verdict-mark.ts';
import { FilterMenu, type FilterOption } from './filter-menu.ts';
import { projectTrail } from './project-trail.ts';
import { ProjectStore } from './project-store.ts';
import { StageList } from './stage-list-store.ts';
import { stageQuery, type StageFilter } from './stage-query.ts';
import { StageSelection } from './stage-selection.ts';
import { StageTable } from './stage-table.ts';

/** The server's default. */
const PAGE_SIZE = listStages.query.shape.pageSize.parse(undefined);

/** The stages of a project: filters, selection and table. Filter and sort are the query of the address. */
@Component({
  selector: 'app-project-stages',
  imports: [EmptyState, FilterMenu, Icon, LoadState, MatButton, StageSelection, StageTable],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './project-stages.html',
  styleUrl: './project-stages.scss',
})
export class ProjectStages {
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  private readonly project = inject(ProjectStore).project;
  protected readonly list = inject(StageList);

  readonly search = input<string>();
  readonly state = input<string>();
  readonly verdict = input<string>();
  readonly load = input<string>();
  readonly transistor = input<string>();
  readonly sort = input<string>();
  readonly direction = input<string>();
  readonly page = input<string>();

  protected readonly query = computed(() =>
    stageQuery({
      search: this.search(),
      state: this.state(),
      verdict: this.verdict(),
      load: this.load(),
      transistor: this.transistor(),
      sort: this.sort(),
      direction: this.direction(),
      page: this.page(),
    }),
  );
  protected readonly filtered = computed(() => {
    const { search, state, verdict, load, transistor } = this.query();
    return [search, state, verdict, load, transistor].some((each) => each !== undefined);
  });
  protected readonly states = REVISION_STATES.filter((state) => state !== 'superseded').map(
    (state): FilterOption => ({ value: state, text: STATE_WORDS[state] }),
  );
  protected readonly verdicts = VERDICTS.map((verdict): FilterOption => ({
    value: verdict,
    text: STATUS_WORDS[verdict],
  }));
  protected readonly loads = computed(() => this.list.rows()?.loads.map(plainOption) ?? []);
  protected readonly transistors = computed(
    () => this.list.rows()?.transistors.map(plainOption) ?? [],
  );
  /** Rows whose part data the library has changed since. */
  protected readonly changed = computed(() =>
    (this.list.rows()?.stages ?? [])
      .filter((row) => row.partDataChanged)
      .map((row) => `${row.reference}, ${row.transistor}`)
      .join('; '),
  );
  protected readonly pageNumber = computed(() => Number(this.query().page ?? 1));
  protected readonly pages = computed(() =>
    Math.ceil((this.list.rows()?.matching ?? 0) / PAGE_SIZE),
  );
  protected readonly footer = computed(() => {
    const rows = this.list.rows();
    if (!rows) return '';
    const hidden = rows.superseded > 0 ? `, ${rows.superseded} superseded hidden` : '';
    return `${rows.matching} of ${rows.total} current revisions${hidden}`;
  });

  constructor() {
    usePageTrail(() => projectTrail(this.project(), 'Stages'));
    effect(() => {
      this.list.show(this.query());
    });
  }

  /** Changes the query of the address; the rows follow it. */
  protected narrow(filter: StageFilter): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { page: null, ...filter },
      queryParamsHandling: 'merge',
      replaceUrl: 'search' in filter,
    });
  }

  protected clearFilters(): void {
    this.narrow({ search: null, state: null, verdict: null, load: null, transistor: null });
  }
}

function plainOption(text: string): FilterOption {
  return { value: text, text };
}
