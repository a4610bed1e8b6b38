import { computed, inject, Injectable, resource } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router } from '@angular/router';
import { filter } from 'rxjs';
import { countDesk } from '../../../shared/contract/desk.ts';
import { ApiClient } from '../api/api-client.ts';
import { SessionStore } from './session-store.ts';

/** How many things wait for the signed-in person: the badge of the rail. Counted again after each change of page. */
@Injectable({ providedIn: 'root' })
export class DeskCount {
  private readonly api = inject(ApiClient);
  private readonly session = inject(SessionStore);

  private readonly count = resource({
    params: () => this.session.person()?.id,
    loader: async () => (await this.api.send(countDesk)).value.waiting,
  });

  readonly waiting = computed(() => (this.count.hasValue() ? this.count.value() : 0));

  constructor() {
    inject(Router)
      .events.pipe(
        filter((event) => event instanceof NavigationEnd),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.count.reload());
  }
}
