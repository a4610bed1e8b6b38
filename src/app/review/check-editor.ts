import { computed, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { debounceTime, Subject } from 'rxjs';
import { checkRoutes, type Revision } from '../../../shared/contract/revision.ts';
import { formatNumber } from '../../../shared/units/engineering-notation.ts';
import { toApiProblem, type ApiProblem } from '../api/api-problem.ts';
import { draftOf, EMPTY_CHECK, mergeDrafts, sameDraft, type CheckDraft } from './check-draft.ts';
import { readFigure } from './read-figure.ts';
import { ReviewStore } from './review-store.ts';

const SAVE_AFTER_MS = 800;
const RETRY_AFTER_MS = 5000;

/** What the checker enters, saved by itself shortly after the last change. One per page. */
@Injectable()
export class CheckEditor {
  private readonly store = inject(ReviewStore);
  private readonly edits = new Subject<void>();
  /** As the server has it. */
  private readonly base = signal<CheckDraft>(EMPTY_CHECK);
  private readonly entered = signal<CheckDraft>(EMPTY_CHECK);
  private retry: ReturnType<typeof setTimeout> | undefined;

  readonly draft = this.entered.asReadonly();
  readonly figureText = signal('');
  readonly figure = computed(() => readFigure(this.figureText()));
  readonly saving = signal(false);
  readonly savedAtMs = signal<number | null>(null);
  /** Why the last save did not succeed. */
  readonly problem = signal<ApiProblem | null>(null);
  readonly conflict = computed(() => this.problem()?.code === 'version-conflict');
  readonly unsent = computed(() => !sameDraft(this.base(), this.entered()));

  constructor() {
    this.edits.pipe(debounceTime(SAVE_AFTER_MS), takeUntilDestroyed()).subscribe(() => {
      void this.save();
    });
  }

  /** Begins with what the server holds. */
  begin(revision: Revision): void {
    const draft = draftOf(revision.check);
    this.base.set(draft);
    this.show(draft);
    this.savedAtMs.set(revision.check?.savedAtMs ?? null);
    this.problem.set(null);
  }

  change(changes: Partial<CheckDraft>): void {
    this.entered.update((draft) => ({ ...draft, ...changes }));
    this.edits.next();
  }

  enterFigure(text: string): void {
    this.figureText.set(text);
    const figure = this.figure();
    if (figure.ok) this.change({ overdriveFactor: figure.value });
  }

  justify(criterionId: string, text: string): void {
    this.change({ justifications: { ...this.entered().justifications, [criterionId]: text } });
  }

  tick(criterionId: string, read: boolean): void {
    const others = this.entered().read.filter((id) => id !== criterionId);
    this.change({ read: read ? [...others, criterionId] : others });
  }

  /** Sends what is unsent. Returns whether the server now holds everything entered. */
  async save(): Promise<boolean> {
    clearTimeout(this.retry);
    if (!this.unsent()) return true;
    if (this.saving() || this.conflict()) return false;
    const sent = this.entered();
    this.saving.set(true);
    try {
      const revision = await this.store.change(checkRoutes.save, { body: written(sent) });
      this.base.set(sent);
      this.problem.set(null);
      this.savedAtMs.set(revision.check?.savedAtMs ?? null);
    } catch (error) {
      this.fail(toApiProblem(error));
    } finally {
      this.saving.set(false);
    }
    if (this.problem() !== null) return false;
    return this.unsent() ? this.save() : true;
  }

  /** After a conflict: what the server holds now, with one's own edits on top, and saved so. */
  async mergeAndSave(): Promise<boolean> {
    const theirs = draftOf((await this.store.refresh()).check);
    const merged = mergeDrafts(this.base(), this.entered(), theirs);
    this.base.set(theirs);
    this.show(merged);
    this.problem.set(null);
    return this.save();
  }

  private fail(problem: ApiProblem): void {
    this.problem.set(problem);
    if (problem.code !== 'unreachable') return;
    this.retry = setTimeout(() => void this.save(), RETRY_AFTER_MS);
  }

  private show(draft: CheckDraft): void {
    this.entered.set(draft);
    const { overdriveFactor } = draft;
    if (this.figure().ok && this.figure().value === overdriveFactor) return;
    this.figureText.set(
      overdriveFactor === null ? '' : formatNumber(overdriveFactor, { digits: 6 }),
    );
  }
}

/** Empty justifications are not sent: the server would keep them as written. */
function written(draft: CheckDraft): CheckDraft {
  const justifications = Object.entries(draft.justifications).filter(([, text]) => text.trim());
  return { ...draft, justifications: Object.fromEntries(justifications) };
}
