import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  resource,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { listParts, readPart, type Part } from '../../../shared/contract/part.ts';
import { fitText, KIND_OF_ROLE, partFits, type PartRole } from '../../../shared/parts/part-fit.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { ApiClient } from '../api/api-client.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { applyPart, type Choice } from './apply-part.ts';
import { partChoices } from './part-choices.ts';

export interface PartPickerData {
  readonly role: PartRole;
  readonly stage: StageInput;
}

/** What the dialog closes with: the stage with the part in its place. */
export interface PickedPart {
  readonly definition: StageInput;
  readonly partRevisionId: string;
  readonly choice: Choice;
}

const TITLES: Readonly<Record<PartRole, string>> = {
  transistor: 'Choose a transistor',
  preDriver: 'Choose the pre-driver',
  load: 'Choose a load',
  drive: 'Choose a logic output',
  clamp: 'Choose a clamp',
};

/** Picks a part of the library and says what it will put into the stage before it does. */
@Component({
  selector: 'app-part-picker',
  imports: [Icon, LoadState, MatButton, MatDialogModule],
  templateUrl: './part-picker.html',
  styleUrl: './part-picker.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartPicker {
  private readonly api = inject(ApiClient);
  private readonly dialog = inject<MatDialogRef<PartPicker, PickedPart>>(MatDialogRef);
  protected readonly data = inject<PartPickerData>(MAT_DIALOG_DATA);

  protected readonly title = TITLES[this.data.role];
  protected readonly search = signal('');
  protected readonly partId = signal<string | null>(null);
  protected readonly choice = signal<Choice>({});
  protected readonly list = resource({
    params: () => ({ search: this.search() }),
    loader: async ({ params }) => {
      const query = { kind: KIND_OF_ROLE[this.data.role], pageSize: 500, ...params };
      return (await this.api.send(listParts, { query })).value.parts;
    },
  });
  /** What the place is made for; how many of the parts found are not. */
  protected readonly fitting = computed(() => {
    const { role, stage } = this.data;
    const found = this.list.hasValue() ? this.list.value() : [];
    const parts = found.filter((part) => partFits(role, stage.topology, part));
    return { parts, others: found.length - parts.length, what: fitText(role, stage.topology) };
  });
  protected readonly part = resource({
    params: () => this.partId() ?? undefined,
    loader: async ({ params: partId }): Promise<Part> =>
      (await this.api.send(readPart, { params: { partId } })).value,
  });
  protected readonly choices = computed(() => {
    const part = this.part.hasValue() ? this.part.value() : null;
    return part === null ? [] : partChoices(part.latest.record);
  });
  protected readonly outcome = computed(() => {
    if (!this.part.hasValue()) return null;
    const { record } = this.part.value().latest;
    const first = Object.fromEntries(
      this.choices().map(({ key, options }) => [key, options[0]?.value ?? '']),
    );
    return applyPart(this.data.stage, this.data.role, record, { ...first, ...this.choice() });
  });

  protected pick(partId: string): void {
    this.choice.set({});
    this.partId.set(partId);
  }

  protected choose(key: string, value: string): void {
    this.choice.update((choice) => ({ ...choice, [key]: value }));
  }

  protected take(): void {
    const outcome = this.outcome();
    if (outcome?.ok !== true || !this.part.hasValue()) return;
    const given = Object.entries(this.choice()).filter(([, value]) => value !== '');
    this.dialog.close({
      definition: outcome.data,
      partRevisionId: this.part.value().latest.id,
      choice: Object.fromEntries(given),
    });
  }
}
