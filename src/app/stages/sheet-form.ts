import { DestroyRef, effect, inject, Injectable, signal, untracked } from '@angular/core';
import type { Subscription } from 'rxjs';
import { needsOf } from '../../../shared/stage/topology-needs.ts';
import { TOPOLOGIES, type StageInput } from '../../../shared/stage/stage-input.ts';
import { withLoad, withTopology } from './change-kind.ts';
import { formToStage } from './form-to-stage.ts';
import { FIELD_PATHS, type StageFormValue } from './stage-fields.ts';
import { stageForm, type StageForm } from './stage-form.ts';
import { StageStore } from './stage-store.ts';
import { stageToForm } from './stage-to-form.ts';

/** Keeps the form and the draft of the store the same, each following the other. */
@Injectable()
export class SheetForm {
  private readonly store = inject(StageStore);
  private readonly made = signal<StageForm | null>(null);
  private changes: Subscription | null = null;

  readonly form = this.made.asReadonly();

  constructor() {
    effect(() => {
      this.store.replaced();
      untracked(() => {
        this.fill();
      });
    });
    inject(DestroyRef).onDestroy(() => this.changes?.unsubscribe());
  }

  private fill(): void {
    const draft = this.store.draft();
    if (draft === null) return;
    const value = stageToForm(draft.definition);
    const form = this.made();
    if (form !== null) {
      form.reset(value, { emitEvent: false });
      return;
    }
    const made = stageForm(value);
    this.changes = made.valueChanges.subscribe(() => {
      this.read(made);
    });
    this.made.set(made);
  }

  private read(form: StageForm): void {
    const base = this.store.draft()?.definition;
    if (base === undefined || !this.store.editable()) return;
    const value = form.getRawValue();
    if (this.changeKind(value, base)) return;
    const wrong = FIELD_PATHS.filter((path) => form.controls[path].invalid);
    if (wrong.length > 0) {
      // Each of these fields says itself what is wrong with it.
      this.store.fault(wrong.map((path) => ({ path, message: '' })));
      return;
    }
    const before = stageToForm(base);
    const field = FIELD_PATHS.find((path) => differs(value[path], before[path]));
    const reading = formToStage(value, base);
    if (!reading.ok) this.store.fault(reading.faults);
    else if (field === undefined) this.store.fault([]);
    else this.store.changeDefinition(reading.stage, field);
  }

  /** Another topology or load is another stage: one step of its own, whatever else the form holds. */
  private changeKind(value: StageFormValue, base: StageInput): boolean {
    const draft = this.store.draft();
    if (draft === null) return false;
    const topology = TOPOLOGIES.find((each) => each === value.topology);
    const kind = needsOf(base.topology).loads.find((each) => each === value['load/kind']);
    if (topology !== undefined && topology !== base.topology) {
      this.store.replace(withTopology(draft, topology));
      return true;
    }
    if (kind === undefined || kind === base.load.kind) return false;
    this.store.replace(withLoad(draft, kind));
    return true;
  }
}

const differs = (a: unknown, b: unknown) => JSON.stringify(a) !== JSON.stringify(b);
