import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { createStage } from '../../../shared/contract/stage.ts';
import { needsOf } from '../../../shared/stage/topology-needs.ts';
import { choiceWords } from '../../../shared/report/definition-words.ts';
import { topologyName } from '../../../shared/report/schematic/schematic-name.ts';
import { StageInput, TOPOLOGIES, type Topology } from '../../../shared/stage/stage-input.ts';
import type { PolicyDifference } from '../../../shared/stage/policy.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';
import { startingStage, type NewStageWords } from './sample-stage.ts';
import { readStageText } from './stage-file.ts';

/** What each topology does, beside its name. */
const WHERE: Readonly<Record<Topology, string>> = {
  'low-side-npn': 'load between supply and collector',
  'high-side-pnp': 'load between collector and return',
  'two-transistor-high-side': 'an NPN turns the PNP on',
  'low-side-darlington': 'two transistors in one part',
  'low-side-pre-biased': 'base resistors inside the part',
  'level-translator': 'inverts from one logic rail to another',
};

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
  protected readonly topologies = TOPOLOGIES.map((topology) => ({
    topology,
    text: `${topologyName(topology)}: ${WHERE[topology]}`,
  }));
  private readonly topology = toSignal(this.form.controls.topology.valueChanges, {
    initialValue: this.form.controls.topology.value,
  });
  protected readonly loads = computed(() =>
    needsOf(this.topology()).loads.map((kind) => ({ kind, text: choiceWords(kind) })),
  );
  protected readonly faults = signal<readonly string[]>([]);
  protected readonly busy = signal(false);
  protected readonly fieldError = fieldError;

  constructor() {
    effect(() => {
      const { loadKind } = this.form.controls;
      const kinds = this.loads().map(({ kind }) => kind);
      const [first = 'coil'] = kinds;
      if (!kinds.includes(loadKind.value)) loadKind.setValue(first);
    });
  }

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
