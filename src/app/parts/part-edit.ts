import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { FormArray, FormGroup, type AbstractControl } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { createPart, revisePart } from '../../../shared/contract/part.ts';
import type { Doubt } from '../../../shared/parts/doubt.ts';
import { plausibilityDoubts } from '../../../shared/parts/plausibility.ts';
import { PART_KINDS, PartRecord, type PartKind } from '../../../shared/parts/part-record.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem, type ApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { KIND_WORDS } from './part-kinds.ts';
import { PartStore } from './part-store.ts';
import { groupOf, placeIssues, valueOf } from './record-form.ts';
import { RecordGroup } from './record-group.ts';
import { outlineOfKind } from './record-schemas.ts';

interface FieldProblem {
  /** Id of the field. */
  readonly at: string;
  readonly text: string;
}

/** A part by form: a new one, or the next revision of one. What is not known stays empty. */
@Component({
  selector: 'app-part-edit',
  imports: [Icon, LoadState, MatButton, PageHeading, RecordGroup, RouterLink],
  providers: [PartStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './part-edit.html',
  styleUrl: './part-edit.scss',
  host: { class: 'page', '(window:beforeunload)': 'holdUnsent($event)' },
})
export class PartEdit {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  protected readonly store = inject(PartStore);
  private readonly summary = viewChild<ElementRef<HTMLElement>>('summary');

  /** The part to revise; without it a new one is entered. */
  readonly partId = input<string>();
  /** Kind of a new part, from the query. */
  readonly kind = input<string>();

  protected readonly kinds = PART_KINDS;
  protected readonly words = KIND_WORDS;
  protected readonly chosenKind = computed<PartKind>(
    () =>
      this.store.part()?.kind ?? PART_KINDS.find((kind) => kind === this.kind()) ?? 'transistor',
  );
  protected readonly outline = computed(() => outlineOfKind(this.chosenKind()));
  /** Part number stays with the part; a new one has none yet. */
  protected readonly form = signal<FormGroup | null>(null);
  protected readonly comment = signal('');
  protected readonly problems = signal<readonly FieldProblem[]>([]);
  protected readonly doubts = signal<readonly Doubt[]>([]);
  protected readonly refusal = signal<ApiProblem | null>(null);
  protected readonly checked = signal(0);
  protected readonly busy = signal(false);
  private saved = false;
  /** Doubts that were shown before; saving again takes them as right. */
  private seenDoubts = '[]';

  constructor() {
    usePageTrail(() => {
      const part = this.store.part();
      const parts = { text: 'Parts', link: ['/parts'] };
      if (this.partId() === undefined) return [parts, { text: 'New part' }];
      if (part === undefined) return [];
      return [
        parts,
        { text: part.partNumber, link: ['/parts', part.id] },
        { text: 'New revision' },
      ];
    });
    effect(() => {
      const partId = this.partId();
      if (partId !== undefined) this.store.open(partId, undefined);
    });
    let begun = '';
    effect(() => {
      const part = this.store.part();
      if (this.partId() !== undefined && part === undefined) return;
      const key = `${part?.id ?? 'new'} ${this.chosenKind()}`;
      if (key === begun) return;
      begun = key;
      const form = groupOf(this.outline(), part?.latest.record);
      if (part !== undefined) form.get('partNumber')?.disable();
      untracked(() => {
        this.form.set(form);
        this.problems.set([]);
      });
    });
  }

  protected choose(event: Event): void {
    const kind = (event.target as HTMLSelectElement).value;
    void this.router.navigate([], { queryParams: { kind }, replaceUrl: true });
  }

  protected write(event: Event): void {
    this.comment.set((event.target as HTMLInputElement).value);
  }

  protected async save(event: Event): Promise<void> {
    event.preventDefault();
    const form = this.form();
    if (form === null || this.busy()) return;
    const record = this.read(form);
    this.checked.update((count) => count + 1);
    if (record === null) {
      setTimeout(() => this.summary()?.nativeElement.focus());
      return;
    }
    if (this.hasNewDoubts()) return;
    this.busy.set(true);
    this.refusal.set(null);
    try {
      const partId = await this.send(record);
      this.saved = true;
      await this.router.navigate(['/parts', partId]);
    } catch (error) {
      this.refuse(form, toApiProblem(error));
    } finally {
      this.busy.set(false);
    }
  }

  /** Somebody else revised the part: take their number of the revision, keep what stands in the form. */
  protected takeNewer(): void {
    this.refusal.set(null);
    this.store.answer.reload();
  }

  protected focusField(event: Event, at: string): void {
    event.preventDefault();
    const field = document.getElementById(at);
    for (
      let group = field?.closest('details');
      group;
      group = group.parentElement?.closest('details')
    ) {
      group.open = true;
    }
    field?.focus();
  }

  protected holdUnsent(event: Event): void {
    if (this.form()?.dirty === true && !this.saved) event.preventDefault();
  }

  mayLeave(): boolean {
    if (this.saved || this.form()?.dirty !== true) return true;
    return confirm('What you entered is not saved. Leave this page and lose it?');
  }

  /** The record as entered, or null with what is wrong placed at the fields. */
  private read(form: FormGroup): PartRecord | null {
    const entered = valueOf({ ...this.outline(), optional: false }, form) as object;
    const parsed = PartRecord.safeParse({ kind: this.chosenKind(), ...entered });
    const issues = parsed.success ? [] : parsed.error.issues;
    this.problems.set(this.place(form, issues));
    this.doubts.set(parsed.success ? plausibilityDoubts(parsed.data) : []);
    return parsed.success && this.problems().length === 0 ? parsed.data : null;
  }

  private hasNewDoubts(): boolean {
    const seen = this.seenDoubts;
    this.seenDoubts = JSON.stringify(this.doubts());
    return this.doubts().length > 0 && seen !== this.seenDoubts;
  }

  private place(form: FormGroup, issues: Parameters<typeof placeIssues>[1]): FieldProblem[] {
    revalidate(form);
    const placed = placeIssues(form, issues);
    const found = placed.map((path, index) => ({
      at: `record.${path}`,
      text: `${path === '' ? 'Record' : path}: ${issues[index]?.message ?? ''}`,
    }));
    const comment = createPart.body.shape.comment.safeParse(this.comment());
    const missing = comment.success
      ? []
      : [{ at: 'comment', text: `Comment: ${comment.error.issues[0]?.message ?? ''}` }];
    return [...found, ...missing];
  }

  private async send(record: PartRecord): Promise<string> {
    const body = { record, comment: this.comment() };
    const partId = this.partId();
    if (partId === undefined) return (await this.api.send(createPart, { body })).value.id;
    const etag = this.store.etag();
    return (await this.api.send(revisePart, { params: { partId }, body, etag })).value.id;
  }

  private refuse(form: FormGroup, problem: ApiProblem): void {
    const issues = problem.errors.map(({ pointer, message }) => ({
      path: pointer.split('/').slice(2),
      message,
    }));
    this.refusal.set(problem);
    this.problems.set(
      placeIssues(form, issues).map((path, index) => ({
        at: `record.${path}`,
        text: `${path}: ${issues[index]?.message ?? ''}`,
      })),
    );
    this.checked.update((count) => count + 1);
  }
}

/** Takes away what an earlier save placed; what was typed wrong is found again. */
function revalidate(control: AbstractControl): void {
  if (control instanceof FormGroup || control instanceof FormArray) {
    Object.values(control.controls as Record<string, AbstractControl>).forEach(revalidate);
    control.setErrors(null);
    return;
  }
  control.markAsTouched();
  control.updateValueAndValidity({ emitEvent: false });
}
