import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  resource,
  signal,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import {
  lockRevision,
  previewLock,
  returnRevision,
  type Revision,
} from '../../../shared/contract/revision.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { PasswordField } from '../ui/password-field.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { schemaValidator } from '../ui/schema-validator.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { HashBlock } from './hash-block.ts';
import { PeopleList } from './people-list.ts';
import { ReasonDialog, type ReasonAsked } from '../ui/reason-dialog.ts';
import { ReviewStore } from './review-store.ts';

/** The signature about to be given: its meaning, what it covers, who, and the password as the act. */
@Component({
  selector: 'app-signature-form',
  imports: [HashBlock, Icon, LoadState, MatButton, PasswordField, PeopleList, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './signature-form.html',
  styleUrl: './signature.scss',
})
export class SignatureForm {
  private readonly api = inject(ApiClient);
  private readonly store = inject(ReviewStore);
  private readonly dialog = inject(MatDialog);
  private readonly announcer = inject(StatusAnnouncer);

  readonly revision = input.required<Revision>();

  protected readonly preview = resource({
    params: () => ({ revisionId: this.revision().id, savedAtMs: this.revision().savedAtMs }),
    loader: async ({ params: { revisionId } }) =>
      (await this.api.send(previewLock, { params: { revisionId } })).value,
  });
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: ['', schemaValidator(lockRevision.body.shape.password)],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly busy = signal(false);
  /** The locked revision this one will supersede. */
  protected readonly superseded = computed(() => {
    if (!this.store.previous.hasValue()) return null;
    const { state, letter } = this.store.previous.value();
    return state === 'locked' ? letter : null;
  });

  protected async sign(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy() || !this.preview.hasValue()) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      const { hash } = this.preview.value();
      await this.store.change(lockRevision, { body: { ...this.form.getRawValue(), hash } });
      this.announcer.say('Signed and locked');
    } catch (error) {
      const problem = toApiProblem(error);
      this.problem.set(problemToForm(problem, this.form));
      if (problem.code === 'version-conflict') await this.store.refresh();
    } finally {
      this.busy.set(false);
    }
  }

  protected askReturn(): void {
    const { letter, designer } = this.revision();
    const config = new MatDialogConfig<ReasonAsked>();
    config.ariaLabel = `Return revision ${letter} to draft`;
    config.data = {
      title: config.ariaLabel,
      text: `It goes back to ${designer.name}; the check has to be passed again before it can be locked.`,
      act: 'Return to draft',
      run: async (reason) => {
        await this.store.change(returnRevision, { body: { reason } });
        this.announcer.say('The revision is returned to draft');
      },
    };
    this.dialog.open(ReasonDialog, config);
  }
}
