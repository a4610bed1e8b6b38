import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterOutlet } from '@angular/router';
import { SessionStore } from './session/session-store.ts';

/** The page, or why there is none: nothing works before the session is known. */
@Component({
  selector: 'app-root',
  imports: [MatButton, RouterOutlet],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (session.problem(); as problem) {
      <main class="page" role="alert">
        <h1>{{ problem.title }}</h1>
        <p>{{ problem.detail }}</p>
        <button matButton="outlined" type="button" (click)="reload()">Try again</button>
      </main>
    } @else {
      <router-outlet />
    }`,
})
export class App {
  protected readonly session = inject(SessionStore);

  protected reload(): void {
    location.reload();
  }
}
