import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  forwardRef,
  input,
  signal,
  viewChild,
} from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { QUANTITY_UNITS, type UnitName } from '../../../shared/units/quantity-unit.ts';
import type { QuantityField as EntryField } from '../../../shared/units/quantity.ts';
import { Icon } from './icon.ts';
import { QuantityEntry } from './quantity-entry.ts';

const ofThis = { useExisting: forwardRef(() => QuantityField), multi: true };

/**
 * A number with its unit. It understands `4k7`, `4.7 kΩ`, `30 mA` and arithmetic with units; what it took stands
 * right-aligned with its unit in a column of its own. Arrow keys step along `steps` where given.
 */
@Component({
  selector: 'app-quantity-field',
  imports: [Icon],
  templateUrl: './quantity-field.html',
  styleUrl: './quantity-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  providers: [
    { provide: NG_VALUE_ACCESSOR, ...ofThis },
    { provide: NG_VALIDATORS, ...ofThis },
  ],
})
export class QuantityField implements ControlValueAccessor, Validator {
  readonly inputId = input.required<string>();
  readonly unit = input.required<UnitName>();
  readonly min = input<number>();
  readonly max = input<number>();
  /** Id of the range or hint that describes the field. */
  readonly describedBy = input<string>('');
  /** Whether the field may be left empty; its value is null then. */
  readonly optional = input(false);
  /** Preferred values, rising, that the arrow keys step along. */
  readonly steps = input<readonly number[]>([]);
  readonly invalid = input(false);

  protected readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');
  protected readonly focused = signal(false);
  protected readonly disabled = signal(false);
  protected readonly field = computed<EntryField>(() => {
    const [min, max] = [this.min(), this.max()];
    return {
      unit: this.unit(),
      ...(min === undefined ? {} : { min }),
      ...(max === undefined ? {} : { max }),
    };
  });
  protected readonly entry = new QuantityEntry(
    () => this.field(),
    () => this.optional(),
    (value) => {
      this.value = value;
      this.report(value);
    },
    () => {
      this.recheck();
    },
  );
  protected readonly shownText = computed(() => this.entry.text(this.focused()));
  protected readonly symbol = computed(() => {
    if (this.focused()) return '';
    return this.entry.unit() === '' ? QUANTITY_UNITS[this.unit()].symbol : this.entry.unit();
  });
  protected readonly description = computed(() =>
    [this.describedBy(), this.entry.message() === null ? '' : `${this.inputId()}-message`]
      .filter((id) => id !== '')
      .join(' '),
  );

  private value: number | null = null;
  private report: (value: number | null) => void = () => undefined;
  private touch: () => void = () => undefined;
  private recheck: () => void = () => undefined;

  writeValue(value: number | null): void {
    this.value = value;
    this.entry.show(value);
  }

  registerOnChange(report: (value: number | null) => void): void {
    this.report = report;
  }

  registerOnTouched(touch: () => void): void {
    this.touch = touch;
  }

  registerOnValidatorChange(recheck: () => void): void {
    this.recheck = recheck;
  }

  setDisabledState(disabled: boolean): void {
    this.disabled.set(disabled);
  }

  validate(): ValidationErrors | null {
    const problem = this.entry.problem();
    if (problem !== null) return { quantity: problem };
    return this.value === null && !this.optional() ? { quantity: 'Enter a value.' } : null;
  }

  protected focus(): void {
    this.focused.set(true);
    // At once, not with the next rendering: that would undo the selection.
    const box = this.box().nativeElement;
    box.value = this.shownText();
    box.select();
  }

  protected blur(): void {
    this.focused.set(false);
    this.entry.leave();
    this.touch();
  }

  protected key(event: KeyboardEvent): void {
    if (event.key === 'Enter') {
      this.entry.commit();
      return;
    }
    const next = this.stepFrom(event.key);
    if (next === null) return;
    event.preventDefault();
    this.entry.step(next);
  }

  /** The next preferred value up or down; a decade with Page Up and Page Down. */
  private stepFrom(key: string): number | null {
    const steps = this.steps();
    const from = this.value;
    if (steps.length === 0 || from === null) return null;
    switch (key) {
      case 'ArrowUp':
        return steps.find((step) => step > from * (1 + 1e-9)) ?? null;
      case 'ArrowDown':
        return steps.findLast((step) => step < from * (1 - 1e-9)) ?? null;
      case 'PageUp':
        return steps.find((step) => step >= from * 10 * (1 - 1e-9)) ?? null;
      case 'PageDown':
        return steps.findLast((step) => step <= (from / 10) * (1 + 1e-9)) ?? null;
      default:
        return null;
    }
  }
}
