import { computed, inject, signal, type Signal } from '@angular/core';
import { saveRevision, type Revision } from '../../../shared/contract/revision.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem, type ApiProblem } from '../api/api-problem.ts';
import { sameDraft, type Draft } from './draft.ts';

export const AUTOSAVE_MS = 800;
export const RETRY_MS = 5000;

export type SaveState =
  | { readonly kind: 'saved'; readonly atMs: number }
  | { readonly kind: 'waiting' }
  | { readonly kind: 'saving' }
  | { readonly kind: 'retrying'; readonly problem: ApiProblem }
  | { readonly kind: 'conflict' }
  | { readonly kind: 'refused'; readonly problem: ApiProblem };

interface Saved {
  readonly revisionId: string;
  readonly etag: string;
  readonly draft: Draft;
}

/**
 * Saves a draft 800 ms after its last change, one request at a time, and says truthfully where it stands. A
 * lost connection is tried again; somebody else's save stops the queue until the conflict is resolved.
 */
export class SaveQueue {
  private readonly api = inject(ApiClient);
  private readonly status = signal<SaveState>({ kind: 'saved', atMs: 0 });
  private saved: Saved | null = null;
  private wanted: Draft | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private running: Promise<void> | null = null;

  readonly state: Signal<SaveState> = this.status.asReadonly();
  /** Whether something typed is not on the server yet. */
  readonly unsent = computed(() => this.status().kind !== 'saved');

  constructor(private readonly adopt: (revision: Revision, etag: string) => void) {}

  /** What the server holds now. */
  start(revisionId: string, etag: string, draft: Draft, savedAtMs: number): void {
    clearTimeout(this.timer);
    this.saved = { revisionId, etag, draft };
    this.wanted = null;
    this.status.set({ kind: 'saved', atMs: savedAtMs });
  }

  get etag(): string {
    return this.saved?.etag ?? '';
  }

  /** The draft as last saved, which conflicts are measured against. */
  get base(): Draft | null {
    return this.saved?.draft ?? null;
  }

  /** Asks for a draft to be saved; a later one takes its place. */
  request(draft: Draft): void {
    this.wanted = draft;
    if (this.status().kind === 'conflict') return;
    this.status.set({ kind: 'waiting' });
    this.wait(AUTOSAVE_MS);
  }

  /** Saves at once what still waits. */
  async flush(): Promise<void> {
    clearTimeout(this.timer);
    await this.running;
    if (this.wanted !== null && this.status().kind !== 'conflict') await this.run();
  }

  /** The conflict is resolved on top of what the server holds: save the result over it. */
  async resolve(etag: string, theirs: Draft, result: Draft): Promise<void> {
    if (this.saved === null) return;
    this.saved = { ...this.saved, etag, draft: theirs };
    this.wanted = result;
    this.status.set({ kind: 'waiting' });
    await this.flush();
  }

  stop(): void {
    clearTimeout(this.timer);
  }

  private wait(ms: number): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.run(), ms);
  }

  private async run(): Promise<void> {
    if (this.running !== null) return;
    this.running = this.send();
    await this.running;
    this.running = null;
    if (this.wanted !== null && this.status().kind === 'waiting') this.wait(AUTOSAVE_MS);
  }

  private async send(): Promise<void> {
    const [saved, draft] = [this.saved, this.wanted];
    if (saved === null || draft === null) return;
    if (sameDraft(draft, saved.draft)) {
      this.wanted = null;
      this.status.set({ kind: 'saved', atMs: Date.now() });
      return;
    }
    this.status.set({ kind: 'saving' });
    try {
      const { value, etag } = await this.api.send(saveRevision, {
        params: { revisionId: saved.revisionId },
        body: draft,
        etag: saved.etag,
      });
      this.saved = { ...saved, etag, draft };
      if (this.wanted === draft) {
        this.wanted = null;
        this.status.set({ kind: 'saved', atMs: value.savedAtMs });
      } else {
        this.status.set({ kind: 'waiting' });
      }
      this.adopt(value, etag);
    } catch (error) {
      this.fail(toApiProblem(error));
    }
  }

  private fail(problem: ApiProblem): void {
    if (problem.code === 'version-conflict') {
      this.status.set({ kind: 'conflict' });
      return;
    }
    const passing = ['unreachable', 'busy', 'too-many-requests', 'internal'].includes(problem.code);
    this.status.set({ kind: passing ? 'retrying' : 'refused', problem });
    if (passing) this.timer = setTimeout(() => void this.run(), RETRY_MS);
  }
}
