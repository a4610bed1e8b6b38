import { computed, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Router } from '@angular/router';
import type * as z from 'zod';
import {
  readSession,
  setUp,
  signIn,
  signOut,
  type Session,
} from '../../../shared/contract/session.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem, type ApiProblem } from '../api/api-problem.ts';
import { SessionEnd } from '../api/session-end.ts';

/** Who is signed in, for the whole application. */
@Injectable({ providedIn: 'root' })
export class SessionStore {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly state = signal<Session | null>(null);
  private readonly failure = signal<ApiProblem | null>(null);

  readonly session = this.state.asReadonly();
  /** Why the session could not be read; the application shows it in place of a page. */
  readonly problem = this.failure.asReadonly();
  readonly person = computed(() => this.state()?.person ?? null);

  constructor() {
    inject(SessionEnd)
      .events.pipe(takeUntilDestroyed())
      .subscribe(() => {
        this.forget();
      });
  }

  async load(): Promise<void> {
    try {
      this.state.set((await this.api.send(readSession)).value);
      this.failure.set(null);
    } catch (error) {
      this.failure.set(toApiProblem(error));
    }
  }

  async signIn(body: z.input<typeof signIn.body>): Promise<void> {
    this.state.set((await this.api.send(signIn, { body })).value);
  }

  async setUp(body: z.input<typeof setUp.body>): Promise<void> {
    this.state.set((await this.api.send(setUp, { body })).value);
  }

  async signOut(): Promise<void> {
    await this.api.send(signOut);
    await this.load();
    await this.router.navigate(['/sign-in']);
  }

  /** The server ended the session: sign in again and come back to this page. */
  private forget(): void {
    const session = this.state();
    if (!session?.person) return;
    this.state.set({ ...session, person: null, idleEndsAtMs: null });
    void this.load().then(() =>
      this.router.navigate(['/sign-in'], { queryParams: { next: this.router.url } }),
    );
  }
}
