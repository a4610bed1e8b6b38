import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  resource,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatTabsModule } from '@angular/material/tabs';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { debounceTime, Subject } from 'rxjs';
import type * as z from 'zod';
import { listParts } from '../../../shared/contract/part.ts';
import { PART_KINDS } from '../../../shared/parts/part-record.ts';
import { ApiClient } from '../api/api-client.ts';
import { EmptyState } from '../ui/empty-state.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { KIND_WORDS } from './part-kinds.ts';
import { PartTable } from './part-table.ts';

type Sort = z.output<typeof listParts.query>['sort'];

const TYPING_MS = 250;

/** The part library. Kind, search, filter, sort and page are the query of the address. */
@Component({
  selector: 'app-part-list',
  imports: [
    EmptyState,
    Icon,
    LoadState,
    MatButton,
    MatTabsModule,
    PageHeading,
    PartTable,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './part-list.html',
  styleUrl: './part-list.scss',
  host: { class: 'page' },
})
export class PartList {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  private readonly typed = new Subject<string>();

  readonly kind = input<string>();
  readonly search = input<string>();
  readonly verified = input<string>();
  readonly sort = input<string>();
  readonly direction = input<string>();
  readonly page = input<string>();

  protected readonly tabs = [
    { kind: null, text: 'All' },
    ...PART_KINDS.map((kind) => ({ kind, text: KIND_WORDS[kind].many })),
  ];
  protected readonly standings = [
    { value: null, text: 'All data' },
    { value: 'yes', text: 'Verified' },
    { value: 'no', text: 'Unverified' },
  ] as const;
  /** The address as far as it can be understood; anything else falls back to the default. */
  protected readonly query = computed(() => {
    const fields = listParts.query.shape;
    const read = <T>(schema: z.ZodType<T>, value: string | undefined) => {
      const result = schema.safeParse(value);
      return result.success ? result.data : undefined;
    };
    return {
      kind: read(fields.kind, this.kind()),
      search: read(fields.search, this.search()),
      verified: read(fields.verified, this.verified()),
      sort: read(fields.sort, this.sort()) ?? 'partNumber',
      direction: read(fields.direction, this.direction()) ?? 'asc',
      page: read(fields.page, this.page()) ?? 1,
    };
  });
  protected readonly filtered = computed(() => {
    const { search, verified } = this.query();
    return Boolean(search) || verified !== undefined;
  });
  protected readonly answer = resource({
    params: () => this.query(),
    loader: async ({ params: query }) => (await this.api.send(listParts, { query })).value,
  });
  /** The rows on show stay until the next ones are there. */
  protected readonly list = computed(() =>
    this.answer.hasValue() ? this.answer.value() : undefined,
  );
  protected readonly pages = computed(() =>
    Math.max(
      1,
      Math.ceil((this.list()?.matching ?? 0) / listParts.query.shape.pageSize.parse(undefined)),
    ),
  );

  constructor() {
    this.typed.pipe(debounceTime(TYPING_MS), takeUntilDestroyed()).subscribe((search) => {
      this.narrow({ search: search === '' ? null : search });
    });
  }

  protected type(event: Event): void {
    this.typed.next((event.target as HTMLInputElement).value.trim());
  }

  protected choose(verified: 'yes' | 'no' | null): void {
    this.narrow({ verified });
  }

  protected sortBy(sort: Sort): void {
    const { sort: now, direction } = this.query();
    const turned = now === sort && direction === 'asc' ? 'desc' : null;
    this.narrow({ sort: sort === 'partNumber' ? null : sort, direction: turned });
  }

  protected turnTo(page: number): void {
    this.narrow({ page: page === 1 ? null : page });
  }

  protected clear(): void {
    this.narrow({ search: null, verified: null });
  }

  private narrow(changes: Record<string, string | number | null>): void {
    void this.router.navigate([], {
      relativeTo: this.route,
      queryParams: { page: null, ...changes },
      queryParamsHandling: 'merge',
      replaceUrl: true,
    });
  }
}
