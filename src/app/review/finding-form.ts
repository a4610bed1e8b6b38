import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { raiseFindingRequest } from '../../../shared/contract/check.ts';
import { checkRoutes, type Revision } from '../../../shared/contract/revision.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { subjectChoices } from './finding-subjects.ts';
import { ReviewStore } from './review-store.ts';

/** Raises a finding on a criterion or a field of the definition. */
@Component({
  selector: 'app-finding-form',
  imports: [Icon, MatButton],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './finding-form.html',
  styles: `
    @use '../../theme/entry';

    form {
      display: grid;
      gap: 8px;
      padding: 12px;
      border: 1px solid var(--mat-sys-secondary);
      border-radius: var(--app-radius-field);
    }
  `,
})
export class FindingForm {
  private readonly store = inject(ReviewStore);
  private readonly announcer = inject(StatusAnnouncer);

  readonly revision = input.required<Revision>();
  /** Criterion chosen beforehand. */
  readonly about = input<string | null>(null);
  readonly done = output();

  protected readonly choices = computed(() =>
    subjectChoices(this.revision().evaluation, this.revision().definition),
  );
  /** `kind id`, as the list carries it. */
  protected readonly subject = linkedSignal(() => {
    const about = this.about();
    return about === null ? '' : `criterion ${about}`;
  });
  protected readonly title = signal('');
  protected readonly text = signal('');
  protected readonly tried = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<string | null>(null);
  protected readonly subjectProblem = computed(() =>
    this.tried() && this.subject() === '' ? 'Choose what the finding is about.' : null,
  );
  protected readonly titleProblem = computed(() => {
    const { success } = raiseFindingRequest.body.shape.title.safeParse(this.title());
    return this.tried() && !success ? 'Enter a title, such as Rating missing.' : null;
  });

  protected valueOf(event: Event): string {
    return (event.target as HTMLInputElement).value;
  }

  protected async raise(event: Event): Promise<void> {
    event.preventDefault();
    this.tried.set(true);
    if (this.subjectProblem() !== null || this.titleProblem() !== null || this.busy()) return;
    const [kind = '', id = ''] = this.subject().split(' ');
    const body = { subject: { kind, id }, title: this.title(), text: this.text() };
    this.busy.set(true);
    try {
      const { findings } = await this.store.change(checkRoutes.raise, { body });
      this.announcer.say(`Finding ${findings.length} raised`);
      this.done.emit();
    } catch (error) {
      this.problem.set(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }
}
