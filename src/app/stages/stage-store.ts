import {
  afterNextRender,
  computed,
  DestroyRef,
  effect,
  inject,
  Injectable,
  Injector,
  signal,
  untracked,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Subject } from 'rxjs';
import { readProject, type Project } from '../../../shared/contract/project.ts';
import {
  readRevision,
  submitRevision,
  withdrawRevision,
  type Designators,
  type PartLinks,
  type Revision,
} from '../../../shared/contract/revision.ts';
import { readStage, startRevision, type RevisionSummary } from '../../../shared/contract/stage.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { ApiClient } from '../api/api-client.ts';
import { BrowserEngine } from './browser-engine.ts';
import { draftOf, type Draft } from './draft.ts';
import { DraftHistory } from './draft-history.ts';
import type { FieldFault } from './form-to-stage.ts';
import { judgements, type Judgement } from './judgement-stream.ts';
import { SaveQueue } from './save-queue.ts';
import type { FieldPath } from './stage-fields.ts';

/** One revision on the sheet: what the server holds, what was changed, and what the engine says about it. */
@Injectable()
export class StageStore {
  private readonly api = inject(ApiClient);
  private readonly engine = inject(BrowserEngine);
  private readonly injector = inject(Injector);
  private readonly inputs = new Subject<StageInput>();
  private changedAtMs: number | null = null;
  private readonly held = signal<Revision | null>(null);
  private readonly current = signal<Draft | null>(null);
  private readonly judged = signal<Judgement | null>(null);
  private readonly wrong = signal<readonly FieldFault[]>([]);

  readonly history = new DraftHistory();
  readonly saving = new SaveQueue((revision) => {
    this.held.set(revision);
  });
  readonly revision = this.held.asReadonly();
  readonly draft = this.current.asReadonly();
  readonly judgement = this.judged.asReadonly();
  /** What keeps the form from being a stage; the verdicts then still belong to the state before. */
  readonly faults = this.wrong.asReadonly();
  readonly project = signal<Project | null>(null);
  readonly revisions = signal<readonly RevisionSummary[]>([]);
  /** Counts up when the form has to take over the draft: loading, undo, a picked part, a resolved conflict. */
  readonly replaced = signal(0);

  readonly editable = computed(() => this.held()?.may.save.allowed ?? false);
  readonly evaluation = computed(
    () => this.judged()?.evaluation ?? this.held()?.evaluation ?? null,
  );
  /** The window belongs to the draft as judged last, so the ladder stands still while it is recomputed. */
  readonly sizing = signal<Judgement['sizing']>(null);

  constructor() {
    judgements(this.inputs, this.engine)
      .pipe(takeUntilDestroyed())
      .subscribe((judgement) => {
        this.judged.set(judgement);
        this.measure();
        if (judgement.sizing !== null) this.sizing.set(judgement.sizing);
      });
    effect(() => {
      const draft = this.current();
      if (draft !== null)
        untracked(() => {
          this.inputs.next(draft.definition);
        });
    });
    inject(DestroyRef).onDestroy(() => {
      this.saving.stop();
    });
  }

  /** Reads a revision with its stage and project. */
  async load(revisionId: string): Promise<void> {
    const { value, etag } = await this.api.send(readRevision, { params: { revisionId } });
    this.adopt(value, etag);
    const [stage, project] = await Promise.all([
      this.api.send(readStage, { params: { stageId: value.stageId } }),
      this.api.send(readProject, { params: { projectId: value.projectId } }),
    ]);
    this.revisions.set(stage.value.revisions);
    this.project.set(project.value);
  }

  /** A change made in the form; `field` joins keystrokes of one field into one step of undo. */
  changeDefinition(definition: StageInput, field: FieldPath): void {
    const draft = this.current();
    if (draft !== null) this.change({ ...draft, definition }, field);
  }

  changeDesignators(designators: Designators, field: string): void {
    const draft = this.current();
    if (draft !== null) this.change({ ...draft, designators }, `designators.${field}`);
  }

  /** A part taken from the library, a value taken from the ladder, an imported file: the form follows. */
  replace(change: { definition?: StageInput; parts?: PartLinks; designators?: Designators }): void {
    const draft = this.current();
    if (draft === null) return;
    this.change({ ...draft, ...change }, '');
    this.replaced.update((count) => count + 1);
  }

  fault(faults: readonly FieldFault[]): void {
    this.wrong.set(faults);
  }

  undo(): void {
    this.step(this.history.undo());
  }

  redo(): void {
    this.step(this.history.redo());
  }

  /** Hands the draft over for checking; what still waits is saved first. */
  async submit(): Promise<void> {
    await this.saving.flush();
    if (this.saving.unsent()) return;
    const revisionId = this.heldId();
    const { value, etag } = await this.api.send(submitRevision, {
      params: { revisionId },
      etag: this.saving.etag,
    });
    this.adopt(value, etag);
  }

  async withdraw(reason: string): Promise<void> {
    await this.saving.flush();
    const { value, etag } = await this.api.send(withdrawRevision, {
      params: { revisionId: this.heldId() },
      body: { reason },
      etag: this.saving.etag,
    });
    this.adopt(value, etag);
  }

  /** @returns the next revision, a draft */
  async revise(): Promise<Revision> {
    const stageId = this.held()?.stageId ?? '';
    return (await this.api.send(startRevision, { params: { stageId } })).value;
  }

  /** What somebody else saved in the meantime. */
  async readTheirs(): Promise<{ revision: Revision; etag: string }> {
    const { value, etag } = await this.api.send(readRevision, {
      params: { revisionId: this.heldId() },
    });
    return { revision: value, etag };
  }

  async resolve(theirs: Revision, etag: string, result: Draft): Promise<void> {
    this.replace(result);
    await this.saving.resolve(etag, draftOf(theirs), result);
  }

  private adopt(revision: Revision, etag: string): void {
    const draft = draftOf(revision);
    this.held.set(revision);
    this.saving.start(revision.id, etag, draft, revision.savedAtMs);
    this.history.start(draft);
    this.current.set(draft);
    this.wrong.set([]);
    this.replaced.update((count) => count + 1);
  }

  /** From the change to verdicts on the screen; shows up in the browser's performance tools. */
  private measure(): void {
    const start = this.changedAtMs;
    this.changedAtMs = null;
    if (start === null) return;
    afterNextRender(() => performance.measure('change to verdicts', { start }), {
      injector: this.injector,
    });
  }

  private change(draft: Draft, field: string): void {
    this.changedAtMs = performance.now();
    this.current.set(draft);
    this.wrong.set([]);
    this.history.record(draft, field, Date.now());
    this.saving.request(draft);
  }

  private step(draft: Draft | null): void {
    if (draft === null) return;
    this.current.set(draft);
    this.wrong.set([]);
    this.saving.request(draft);
    this.replaced.update((count) => count + 1);
  }

  private heldId(): string {
    return this.held()?.id ?? '';
  }
}
