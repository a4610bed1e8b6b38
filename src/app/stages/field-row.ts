import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ReactiveFormsModule, type FormControl } from '@angular/forms';
import { Icon } from '../ui/icon.ts';
import { QuantityField } from '../ui/quantity-field.ts';
import { QuantitySpanField } from '../ui/quantity-span-field.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import type { ChoiceSpec, FieldSpec } from './field-spec.ts';
import { rangeLine, valueText } from './field-words.ts';
import { fieldSpec, type FieldPath } from './stage-fields.ts';

/** Letters of a choice that fit beside its label. */
const LONGEST_BESIDE = 16;

/** One row of the sheet's form: label and range at the left, the field at the right, faults below both. */
@Component({
  selector: 'app-field-row',
  imports: [Icon, QuantityField, QuantitySpanField, ReactiveFormsModule, SymbolText],
  templateUrl: './field-row.html',
  styleUrl: './field-row.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '[class.selected]': 'selected()',
    '[class.read-only]': 'readOnly()',
    '[class.stacked]': 'stacked()',
  },
})
export class FieldRow {
  readonly path = input.required<FieldPath>();
  readonly control = input.required<FormControl<unknown>>();
  /** Changes with every value, so that read-only text follows. */
  readonly value = input.required<unknown>();
  readonly label = input.required<string>();
  /** Stands behind the label: `RB, R30`. */
  readonly designator = input<string | null>(null);
  readonly selected = input(false);
  readonly readOnly = input(false);
  readonly fault = input<string | null>(null);
  readonly steps = input<readonly number[]>([]);
  /** In place of the choice's own options. */
  readonly options = input<ChoiceSpec['options'] | null>(null);
  /** In place of the field's own range: the policy's bounds for a preferred value. */
  readonly range = input<string | null>(null);

  protected readonly spec = computed<FieldSpec>(() => fieldSpec(this.path()));
  /** Long words of a choice take the whole width, below the label. */
  protected readonly stacked = computed(() => {
    const spec = this.spec();
    if (spec.kind !== 'choice' || this.readOnly()) return false;
    return (this.options() ?? spec.options).some(([, text]) => text.length > LONGEST_BESIDE);
  });
  protected readonly id = computed(() => fieldId(this.path()));
  protected readonly fullLabel = computed(() => {
    const designator = this.designator();
    return designator === null ? this.label() : `${this.label()}, ${designator}`;
  });
  protected readonly hint = computed(() => this.range() ?? rangeLine(this.spec()));
  protected readonly text = computed(() => valueText(this.path(), this.value()));
}

/** The id of a field's control on the page. */
export const fieldId = (path: FieldPath): string => `field-${path.replaceAll('/', '-')}`;
