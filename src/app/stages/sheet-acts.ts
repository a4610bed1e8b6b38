import { inject, Injectable, signal } from '@angular/core';
import type { ComponentType } from '@angular/cdk/overlay';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { Router } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { Revision } from '../../../shared/contract/revision.ts';
import { toApiProblem } from '../api/api-problem.ts';
import type { PartRole } from '../../../shared/parts/part-fit.ts';
import { policyDifference, type PolicyDifference } from '../../../shared/stage/policy.ts';
import { ReasonDialog, type ReasonAsked } from '../ui/reason-dialog.ts';
import { linked } from './apply-part.ts';
import { CompareDialog, comparedRevision, type ComparedPair } from './compare-dialog.ts';
import { ConflictDialog, type ConflictData } from './conflict-dialog.ts';
import { draftOf, type Draft } from './draft.ts';
import { PartPicker, type PartPickerData, type PickedPart } from './part-picker.ts';
import { downloadStageFile, readStageText } from './stage-file.ts';
import { StageStore } from './stage-store.ts';

/** What can be done with a sheet besides typing: its dialogs, its moves and its file. */
@Injectable()
export class SheetActs {
  private readonly store = inject(StageStore);
  private readonly dialogs = inject(MatDialog);
  private readonly router = inject(Router);

  readonly busy = signal(false);
  /** Why the last act was refused. */
  readonly refusal = signal<string | null>(null);
  /** Why the last file could not be taken over, field by field. */
  readonly importFaults = signal<readonly string[]>([]);

  takeValue(valueOhm: number): void {
    const definition = this.store.draft()?.definition;
    if (definition === undefined || !this.store.editable()) return;
    this.store.replace({
      definition: { ...definition, baseResistor: { ...definition.baseResistor, valueOhm } },
    });
  }

  async pickPart(role: PartRole): Promise<void> {
    const draft = this.store.draft();
    if (draft === null) return;
    const picked = await this.ask<PickedPart>(PartPicker, {
      role,
      stage: draft.definition,
    } satisfies PartPickerData);
    if (picked !== undefined) this.takePart(role, picked);
  }

  /** Puts a part of the library in its place, with the link to the data it was filled from. */
  takePart(role: PartRole, { definition, partRevisionId, choice }: PickedPart): void {
    const draft = this.store.draft();
    if (draft === null || !this.store.editable()) return;
    const parts = linked(draft.parts, role, partRevisionId, choice);
    // A load of another kind leaves its clamp behind.
    const clampKept = definition.clamp.kind === draft.definition.clamp.kind || role === 'clamp';
    this.store.replace({ definition, parts: clampKept ? parts : { ...parts, clamp: null } });
  }

  takeShunt(valueOhm: number): void {
    const definition = this.store.draft()?.definition;
    if (definition?.shuntResistor == null || !this.store.editable()) return;
    const shuntResistor = { ...definition.shuntResistor, valueOhm };
    this.store.replace({ definition: { ...definition, shuntResistor } });
  }

  submit(): Promise<void> {
    return this.act(() => this.store.submit());
  }

  async withdraw(): Promise<void> {
    await this.ask<undefined>(ReasonDialog, {
      title: 'Withdraw this revision',
      text: 'A withdrawn revision stays in the history and takes no further part in the project.',
      act: 'Withdraw',
      run: (reason) => this.store.withdraw(reason),
    } satisfies ReasonAsked);
  }

  revise(): Promise<void> {
    return this.act(async () => {
      const next = await this.store.revise();
      await this.router.navigate(['/p', next.projectId, 's', next.stageId, 'r', next.id]);
    });
  }

  /** What changed since the revision this one was copied from, unsaved changes included. */
  async compare(revision: Revision): Promise<void> {
    const [draft, evaluation] = [this.store.draft(), this.store.evaluation()];
    if (revision.previous === null || draft === null || evaluation === null) return;
    await this.ask<undefined>(CompareDialog, {
      after: { ...comparedRevision(revision), definition: draft.definition, evaluation },
      afterLetter: revision.letter,
      previous: revision.previous,
    } satisfies ComparedPair);
  }

  download(revision: Revision): void {
    const draft = this.store.draft();
    if (draft !== null) downloadStageFile(revision, draft.definition, new Date());
  }

  /** What the policy of the file taken over said otherwise than the project's. */
  readonly policyDifference = signal<readonly PolicyDifference[]>(
    (this.router.currentNavigation()?.extras.state?.['policyDifference'] as
      PolicyDifference[] | undefined) ?? [],
  );

  /** Takes over a stage file; the project's policy stays, and parts count as typed by hand. */
  async importFile(files: HTMLInputElement): Promise<void> {
    const file = files.files?.[0];
    const draft = this.store.draft();
    if (file === undefined || draft === null) return;
    const reading = readStageText(await file.text());
    files.value = '';
    this.importFaults.set(reading.ok ? [] : reading.faults.slice(0, 8));
    if (!reading.ok) return;
    this.policyDifference.set(policyDifference(reading.stage.policy, draft.definition.policy));
    this.store.replace({
      definition: { ...reading.stage, policy: draft.definition.policy },
      parts: { transistor: null, preDriver: null, load: null, drive: null, clamp: null },
    });
  }

  /** Somebody else saved: yours, theirs and the result, field by field. */
  async resolve(): Promise<void> {
    const [base, yours] = [this.store.saving.base, this.store.draft()];
    if (base === null || yours === null) return;
    await this.act(async () => {
      const { revision: theirs, etag } = await this.store.readTheirs();
      const result = await this.ask<Draft>(ConflictDialog, {
        base,
        yours,
        theirs: draftOf(theirs),
        savedBy: theirs.authors.at(-1)?.name ?? 'Somebody',
      } satisfies ConflictData);
      if (result !== undefined) await this.store.resolve(theirs, etag, result);
    });
  }

  private async act(work: () => Promise<void>): Promise<void> {
    this.busy.set(true);
    this.refusal.set(null);
    try {
      await work();
    } catch (error) {
      this.refusal.set(toApiProblem(error).detail);
    } finally {
      this.busy.set(false);
    }
  }

  private ask<Answer>(dialog: ComponentType<unknown>, data: unknown): Promise<Answer | undefined> {
    const config = new MatDialogConfig<unknown>();
    config.data = data;
    config.width = '720px';
    config.maxWidth = '96vw';
    return firstValueFrom(
      this.dialogs.open<unknown, unknown, Answer>(dialog, config).afterClosed(),
    );
  }
}
