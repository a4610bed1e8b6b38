import { computed, signal } from '@angular/core';
import type { Draft } from './draft.ts';

const MOST_STEPS = 200;
/** Changes of one field within this time are one step. */
const TOGETHER_MS = 700;

interface Step {
  readonly draft: Draft;
  /** What was changed last, so that typing into one field becomes one step. */
  readonly field: string;
  readonly atMs: number;
}

/** Undo and redo of a sheet. */
export class DraftHistory {
  private readonly past = signal<readonly Step[]>([]);
  private readonly future = signal<readonly Step[]>([]);

  readonly canUndo = computed(() => this.past().length > 1);
  readonly canRedo = computed(() => this.future().length > 0);

  /** Starts anew from a draft. */
  start(draft: Draft): void {
    this.past.set([{ draft, field: '', atMs: 0 }]);
    this.future.set([]);
  }

  /** Remembers a change. */
  record(draft: Draft, field: string, atMs: number): void {
    const last = this.past().at(-1);
    const joins =
      last !== undefined &&
      this.past().length > 1 &&
      field !== '' &&
      last.field === field &&
      atMs - last.atMs < TOGETHER_MS;
    const kept = joins ? this.past().slice(0, -1) : this.past();
    this.past.set([...kept, { draft, field, atMs }].slice(-MOST_STEPS));
    this.future.set([]);
  }

  /** One step back; null where there is none. */
  undo(): Draft | null {
    const steps = this.past();
    const undone = steps.at(-1);
    const before = steps.at(-2);
    if (undone === undefined || before === undefined) return null;
    this.past.set(steps.slice(0, -1));
    this.future.update((future) => [undone, ...future]);
    return before.draft;
  }

  /** One step forth again; null where there is none. */
  redo(): Draft | null {
    const [again, ...rest] = this.future();
    if (again === undefined) return null;
    this.past.update((steps) => [...steps, again]);
    this.future.set(rest);
    return again.draft;
  }
}
