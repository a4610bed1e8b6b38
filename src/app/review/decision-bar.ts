import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { passRevision, returnRevision, type Revision } from '../../../shared/contract/revision.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { SessionStore } from '../session/session-store.ts';
import { Icon } from '../ui/icon.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { CheckEditor } from './check-editor.ts';
import { passReason, type PassItem } from './pass-items.ts';
import { ReasonDialog, type ReasonAsked } from '../ui/reason-dialog.ts';
import { ReviewStore } from './review-store.ts';
import { SaveStatus } from './save-status.ts';

/** Foot of the check page: who acts, whether it is saved, and pass or return with the reason where it is not allowed. */
@Component({
  selector: 'app-decision-bar',
  imports: [Icon, MatButton, NotAllowed, RouterLink, SaveStatus],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './decision-bar.html',
  styleUrl: './decision-bar.scss',
})
export class DecisionBar {
  private readonly store = inject(ReviewStore);
  private readonly editor = inject(CheckEditor);
  private readonly dialog = inject(MatDialog);
  private readonly announcer = inject(StatusAnnouncer);
  private readonly session = inject(SessionStore);

  readonly revision = input.required<Revision>();
  readonly items = input.required<readonly PassItem[]>();

  protected readonly busy = signal(false);
  protected readonly problem = signal<string | null>(null);
  protected readonly inCheck = computed(() => this.revision().state === 'in-check');
  protected readonly mayCheck = computed(() => this.revision().may.check);
  protected readonly who = computed(() => {
    const name = this.session.person()?.name ?? '';
    const { allowed, reason } = this.mayCheck();
    if (!this.inCheck()) return name;
    return allowed ? `${name}, not the designer of this revision` : `${name}: ${reason ?? ''}`;
  });
  /** What the page knows rules over what the server knew at the last save: it is newer. */
  protected readonly passRefusal = computed(() =>
    this.mayCheck().allowed ? passReason(this.items()) : this.revision().may.pass.reason,
  );
  protected readonly returnRefusal = computed(() => this.revision().may.return.reason);
  protected readonly stageLink = computed(() => {
    const { projectId, stageId, id } = this.revision();
    return ['/p', projectId, 's', stageId, 'r', id];
  });
  protected readonly calculationLink = computed(() => [...this.stageLink(), 'calculation']);
  protected readonly lockLink = computed(() => [...this.stageLink(), 'lock']);

  protected async pass(): Promise<void> {
    if (this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      if (!(await this.editor.save())) return;
      await this.store.change(passRevision);
      this.announcer.say('The check is passed');
    } catch (error) {
      this.problem.set(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }

  protected askReturn(): void {
    const { letter, findings, designer } = this.revision();
    const open = findings.filter(({ state }) => state === 'open').length;
    const config = new MatDialogConfig<ReasonAsked>();
    config.ariaLabel = `Return revision ${letter}`;
    config.data = {
      title: config.ariaLabel,
      text:
        `It goes back to draft, to ${designer.name}. ` +
        (open === 0
          ? 'No finding is open: the reason alone says what is to be done.'
          : `${open} open finding${open === 1 ? '' : 's'} go with it.`),
      act: 'Return to draft',
      run: (reason) => this.sendBack(reason),
    };
    this.dialog.open(ReasonDialog, config);
  }

  private async sendBack(reason: string): Promise<void> {
    await this.editor.save();
    await this.store.change(returnRevision, { body: { reason } });
    this.announcer.say('The revision is returned to draft');
  }
}
