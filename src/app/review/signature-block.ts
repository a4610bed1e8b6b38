import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import type * as z from 'zod';
import { verifyRevision, type Lock, type Revision } from '../../../shared/contract/revision.ts';
import { startRevision } from '../../../shared/contract/stage.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { HashBlock } from './hash-block.ts';
import { PeopleList } from './people-list.ts';

type Verification = z.output<typeof verifyRevision.reply>;

/** The signature of a locked revision, to be verified by anybody who can read it. */
@Component({
  selector: 'app-signature-block',
  imports: [HashBlock, Icon, MatButton, PeopleList],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './signature-block.html',
  styleUrl: './signature.scss',
})
export class SignatureBlock {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);

  readonly revision = input.required<Revision>();
  readonly lock = input.required<Lock>();

  protected readonly verification = signal<Verification | null>(null);
  protected readonly busy = signal(false);
  protected readonly problem = signal<string | null>(null);

  protected verify(): Promise<void> {
    return this.attempt(async () => {
      const params = { revisionId: this.revision().id };
      this.verification.set((await this.api.send(verifyRevision, { params })).value);
    });
  }

  /** A locked revision is never edited: the next one is. */
  protected startNext(): Promise<void> {
    return this.attempt(async () => {
      const { projectId, stageId } = this.revision();
      const { value } = await this.api.send(startRevision, { params: { stageId } });
      await this.router.navigate(['/p', projectId, 's', stageId, 'r', value.id]);
    });
  }

  private async attempt(act: () => Promise<void>): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      await act();
    } catch (error) {
      this.problem.set(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }
}
