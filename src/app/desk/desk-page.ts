import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  resource,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggleModule } from '@angular/material/button-toggle';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { readDesk } from '../../../shared/contract/desk.ts';
import { ApiClient } from '../api/api-client.ts';
import { SessionStore } from '../session/session-store.ts';
import { ActivityList } from '../ui/activity-list.ts';
import { EmptyState } from '../ui/empty-state.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { DeskGroup } from './desk-group.ts';
import { deskHeadline } from './desk-headline.ts';
import { OTHERS_GROUP, GROUPS, type ShownGroup } from './desk-groups.ts';
import { DeskMonth } from './desk-month.ts';

const VIEWS = ['mine', 'others', 'all'] as const;

/** The one list of work that waits for the signed-in person, and what has happened around it. */
@Component({
  selector: 'app-desk-page',
  imports: [
    ActivityList,
    DeskGroup,
    DeskMonth,
    EmptyState,
    LoadState,
    MatButton,
    MatButtonToggleModule,
    PageHeading,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './desk-page.html',
  styleUrl: './desk-page.scss',
})
export class DeskPage {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  private readonly person = inject(SessionStore).person;

  readonly view = input<string>();

  protected readonly ownId = computed(() => this.person()?.id ?? null);
  protected readonly nowMs = Date.now();
  protected readonly desk = resource({
    loader: async () => (await this.api.send(readDesk)).value,
  });
  protected readonly shownView = computed(
    () => VIEWS.find((view) => view === this.view()) ?? 'mine',
  );
  private readonly mine = computed(() =>
    this.desk.hasValue() ? this.desk.value().groups.filter((group) => group.items.length > 0) : [],
  );
  protected readonly headline = computed(() =>
    deskHeadline(
      this.mine().flatMap((group) => group.items),
      this.nowMs,
    ),
  );
  protected readonly groups = computed<readonly ShownGroup[]>(() => {
    if (!this.desk.hasValue()) return [];
    const mine = this.mine().map(({ kind, items }) => ({ ...GROUPS[kind], items }));
    const waiting = this.desk.value().waitingForOthers;
    const others = waiting.length > 0 ? [{ ...OTHERS_GROUP, items: waiting }] : [];
    return { mine, others, all: [...mine, ...others] }[this.shownView()];
  });
  /** The one filled button of the page: the first act of the first group. */
  protected readonly firstId = computed(() => this.groups()[0]?.items[0]?.revisionId);

  protected show(view: string): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { view: view === 'mine' ? null : view },
    });
  }
}
