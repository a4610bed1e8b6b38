import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { createStage, type PolicyDifference } from '../../../shared/contract/stage.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';
import { startingStage, type NewStageWords } from './sample-stage.ts';
import { readStageText } from './stage-file.ts';

/** A new stage: a few words first, then the sheet; or a stage file, which brings everything. */
@Component({
  selector: 'app-new-stage',
  imports: [Icon, MatButton, PageHeading, ReactiveFormsModule, RouterLink],
  templateUrl: './new-stage.html',
  styleUrl: './new-stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewStage {
  readonly projectId = input.required<string>();

  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({
    reference: ['', schemaValidator(StageInput.shape.reference)],
    title: ['', schemaValidator(StageInput.shape.title)],
    topology: this.builder.control<NewStageWords['topology']>('low-side-npn'),
    loadKind: this.builder.control<NewStageWords['loadKind']>('coil'),
  });
  protected readonly faults = signal<readonly string[]>([]);
  protected readonly busy = signal(false);
  protected readonly fieldError = fieldError;

  protected async create(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid) {
      const first = this.form.controls.reference.invalid ? 'new-reference' : 'new-title';
      document.getElementById(first)?.focus();
      return;
    }
    await this.send(startingStage(this.form.getRawValue()));
  }

  protected async importFile(files: HTMLInputElement): Promise<void> {
    const file = files.files?.[0];
    if (file === undefined) return;
    const reading = readStageText(await file.text());
    files.value = '';
    this.faults.set(reading.ok ? [] : reading.faults);
    if (reading.ok) await this.send(reading.stage);
  }

  private async send(definition: StageInput): Promise<void> {
    this.busy.set(true);
    try {
      const { value } = await this.api.send(createStage, {
        params: { projectId: this.projectId() },
        body: { definition },
      });
      const { stageId, id } = value.revision;
      await this.router.navigate(['/p', this.projectId(), 's', stageId, 'r', id], {
        state: { policyDifference: value.policyDifference satisfies PolicyDifference[] },
      });
    } catch (error) {
      const { detail, errors } = toApiProblem(error);
      this.faults.set([detail, ...errors.map(({ pointer, message }) => `${pointer}: ${message}`)]);
    } finally {
      this.busy.set(false);
    }
  }
}
