import { ChangeDetectionStrategy, Component, inject, resource, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { endOwnSession, listOwnSessions } from '../../../shared/contract/account.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { LoadState } from '../ui/load-state.ts';
import { dateAndTime } from '../ui/time-text.ts';

/** Where one is signed in; any other session can be ended from here. */
@Component({
  selector: 'app-own-sessions',
  imports: [LoadState, MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './own-sessions.html',
  styles: `
    :host {
      display: block;
    }

    h2 {
      margin-bottom: 8px;
    }

    li {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      justify-content: space-between;
      gap: 4px 16px;
      min-height: 52px;
      border-top: 1px solid var(--app-line);
    }

    ul {
      padding: 0;
      list-style: none;
    }

    b {
      font-weight: 600;
    }

    .small {
      display: block;
    }
  `,
})
export class OwnSessions {
  private readonly api = inject(ApiClient);

  protected readonly sessions = resource({
    loader: async () => (await this.api.send(listOwnSessions)).value.sessions,
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly dateAndTime = dateAndTime;

  protected async end(sessionId: string): Promise<void> {
    try {
      await this.api.send(endOwnSession, { params: { sessionId } });
      this.problem.set(null);
      this.sessions.reload();
    } catch (error) {
      this.problem.set(toApiProblem(error).detail);
    }
  }
}
