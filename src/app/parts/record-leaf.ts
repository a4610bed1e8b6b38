import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ReactiveFormsModule, type AbstractControl, type FormControl } from '@angular/forms';
import { QUANTITY_UNITS, type UnitName } from '../../../shared/units/quantity-unit.ts';
import { fieldError } from '../ui/schema-validator.ts';
import type { Leaf } from './record-outline.ts';

/** One value of a record: typed or chosen, with its unit and what is wrong with it. */
@Component({
  selector: 'app-record-leaf',
  imports: [ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './record-leaf.html',
  styleUrl: './record-leaf.scss',
})
export class RecordLeaf {
  readonly shape = input.required<Leaf>();
  readonly control = input.required<AbstractControl>();
  readonly fieldId = input.required<string>();
  /** The name for readers, where no label stands beside the field. */
  readonly name = input<string | null>(null);
  /** Bumped by the page after it placed errors, which no signal tells. */
  readonly checked = input(0);

  protected readonly text = computed(() => this.control() as FormControl<string>);
  protected readonly hint = computed(() => {
    const leaf = this.shape();
    if (leaf.kind !== 'number' || !Object.hasOwn(QUANTITY_UNITS, leaf.unit)) return '';
    return `such as ${QUANTITY_UNITS[leaf.unit as UnitName].example}`;
  });
  protected readonly unit = computed(() => {
    const leaf = this.shape();
    if (leaf.kind !== 'number') return '';
    return Object.hasOwn(QUANTITY_UNITS, leaf.unit)
      ? QUANTITY_UNITS[leaf.unit as UnitName].symbol
      : leaf.unit;
  });

  protected problem(): string | null {
    this.checked();
    return fieldError(this.text());
  }
}
