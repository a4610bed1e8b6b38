import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { confirmEmailChange } from '../../../shared/contract/account.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { EntryFrame } from './entry-frame.ts';

/** Where the link of an e-mail change leads: one confirmation at the old address, one at the new. */
@Component({
  selector: 'app-confirm-email',
  imports: [EntryFrame, MatButton, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './confirm-email.html',
})
export class ConfirmEmail {
  private readonly api = inject(ApiClient);
  /** Behind the # of the link, where no server and no referrer sees it. */
  private readonly token = inject(ActivatedRoute).snapshot.fragment ?? '';

  protected readonly problem = signal<string | null>(null);
  /** Null until confirmed; then whether both addresses have. */
  protected readonly changed = signal<boolean | null>(null);

  protected async confirm(): Promise<void> {
    try {
      const answer = await this.api.send(confirmEmailChange, { body: { token: this.token } });
      this.changed.set(answer.value.changed);
    } catch (error) {
      this.problem.set(toApiProblem(error).detail);
    }
  }
}
