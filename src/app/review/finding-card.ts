import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ReviewFinding } from '../../../shared/contract/check.ts';
import { checkRoutes, type Revision } from '../../../shared/contract/revision.ts';
import { toApiProblem, type ApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import type { IconName } from '../ui/icon-outlines.ts';
import { Moment } from '../ui/moment.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { subjectWords } from './finding-subjects.ts';
import { ReviewStore } from './review-store.ts';

type Act = 'answer' | 'close' | 'reopen';

const STATES: Record<ReviewFinding['state'], { word: string; icon: IconName }> = {
  open: { word: 'Open', icon: 'circle-alert' },
  answered: { word: 'Answered', icon: 'message' },
  closed: { word: 'Closed', icon: 'check' },
};

const DONE: Record<Act, string> = { answer: 'answered', close: 'closed', reopen: 'kept open' };

/** One finding with its history and what the person may do about it. */
@Component({
  selector: 'app-finding-card',
  imports: [Icon, MatButton, Moment, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './finding-card.html',
  styleUrl: './finding-card.scss',
  host: { '[class.focused]': 'focused() && finding().state !== "closed"' },
})
export class FindingCard {
  private readonly store = inject(ReviewStore);
  private readonly announcer = inject(StatusAnnouncer);

  readonly finding = input.required<ReviewFinding>();
  readonly revision = input.required<Revision>();
  readonly focused = input(false);

  protected readonly subject = computed(() => subjectWords(this.finding().subject));
  protected readonly state = computed(() => STATES[this.finding().state]);
  protected readonly mayAnswer = computed(
    () => this.revision().may.answer.allowed && this.finding().state === 'open',
  );
  protected readonly mayClose = computed(
    () => this.revision().may.close.allowed && this.finding().state !== 'closed',
  );
  protected readonly mayReopen = computed(
    () => this.revision().may.close.allowed && this.finding().state !== 'open',
  );
  /** Whether the reason for keeping it open is being written. */
  protected readonly reopening = signal(false);
  protected readonly text = signal('');
  protected readonly asked = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);

  protected write(event: Event): void {
    this.text.set((event.target as HTMLTextAreaElement).value);
  }

  /** An answer and a reason need words; a closure does not. */
  protected async say(act: Act): Promise<void> {
    const text = this.text().trim();
    this.asked.set(act !== 'close' && text === '');
    if (this.asked() || this.busy()) return;
    this.busy.set(true);
    this.problem.set(null);
    try {
      const { id, number } = this.finding();
      await this.store.change(checkRoutes[act], { params: { findingId: id }, body: { text } });
      this.text.set('');
      this.reopening.set(false);
      this.announcer.say(`Finding ${number} ${DONE[act]}`);
    } catch (error) {
      this.problem.set(toApiProblem(error));
    } finally {
      this.busy.set(false);
    }
  }

  /** Somebody else changed the revision: take that in, what is written here stays. */
  protected async reload(): Promise<void> {
    try {
      await this.store.refresh();
      this.problem.set(null);
    } catch (error) {
      this.problem.set(toApiProblem(error));
    }
  }
}
