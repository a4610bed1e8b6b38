import {
  ChangeDetectionStrategy,
  Component,
  computed,
  forwardRef,
  input,
  signal,
} from '@angular/core';
import {
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  type ControlValueAccessor,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { QUANTITY_UNITS, type UnitName } from '../../../shared/units/quantity-unit.ts';
import { Icon } from './icon.ts';
import { QuantityEntry } from './quantity-entry.ts';

/** Smallest and largest value; null where an end is not given. */
export interface EnteredSpan {
  readonly min: number | null;
  readonly max: number | null;
}

const ofThis = { useExisting: forwardRef(() => QuantitySpanField), multi: true };
const NOTHING: EnteredSpan = { min: null, max: null };

/** A min…max pair: two boxes in one frame, with one unit column. */
@Component({
  selector: 'app-quantity-span-field',
  imports: [Icon],
  templateUrl: './quantity-span-field.html',
  styleUrl: './quantity-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  providers: [
    { provide: NG_VALUE_ACCESSOR, ...ofThis },
    { provide: NG_VALIDATORS, ...ofThis },
  ],
})
export class QuantitySpanField implements ControlValueAccessor, Validator {
  readonly inputId = input.required<string>();
  readonly label = input.required<string>();
  readonly unit = input.required<UnitName>();
  readonly min = input<number>();
  readonly max = input<number>();
  readonly describedBy = input<string>('');
  readonly invalid = input(false);

  protected readonly focused = signal<'min' | 'max' | null>(null);
  protected readonly disabled = signal(false);
  protected readonly low = this.makeEntry('min');
  protected readonly high = this.makeEntry('max');
  protected readonly ends = [
    { key: 'min', entry: this.low, word: 'smallest' },
    { key: 'max', entry: this.high, word: 'largest' },
  ] as const;
  protected readonly symbol = computed(() => {
    const units = [this.low.unit(), this.high.unit()].filter((unit) => unit !== '');
    return units.at(-1) ?? QUANTITY_UNITS[this.unit()].symbol;
  });
  protected readonly messages = computed(() =>
    [this.low.message(), this.high.message()].filter((message) => message !== null),
  );
  protected readonly wrong = computed(
    () => this.invalid() || this.messages().some(({ kind }) => kind === 'error'),
  );

  private value: EnteredSpan = NOTHING;
  private report: (value: EnteredSpan) => void = () => undefined;
  private touch: () => void = () => undefined;
  private recheck: () => void = () => undefined;

  writeValue(value: EnteredSpan | null): void {
    this.value = value ?? NOTHING;
    this.low.show(this.value.min);
    this.high.show(this.value.max);
  }

  registerOnChange(report: (value: EnteredSpan) => void): void {
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
    const problem = this.low.problem() ?? this.high.problem();
    if (problem !== null) return { quantity: problem };
    const { min, max } = this.value;
    if (min === null || max === null) return { quantity: 'Enter both ends.' };
    return min > max ? { quantity: 'The first value must not be above the second.' } : null;
  }

  /** The figure alone where both ends share a unit, else each with its own; whole while typing. */
  protected text(key: 'min' | 'max', entry: QuantityEntry): string {
    const own = entry.unit() !== '' && entry.unit() !== this.symbol();
    return entry.text(this.focused() === key || own);
  }

  protected focus(key: 'min' | 'max', box: HTMLInputElement): void {
    this.focused.set(key);
    // At once, not with the next rendering: that would undo the selection.
    box.value = this.text(key, key === 'min' ? this.low : this.high);
    box.select();
  }

  protected blur(entry: QuantityEntry): void {
    this.focused.set(null);
    entry.leave();
    this.touch();
  }

  private makeEntry(key: 'min' | 'max'): QuantityEntry {
    return new QuantityEntry(
      () => {
        const [min, max] = [this.min(), this.max()];
        return {
          unit: this.unit(),
          ...(min === undefined ? {} : { min }),
          ...(max === undefined ? {} : { max }),
        };
      },
      () => false,
      (value) => {
        this.value = { ...this.value, [key]: value };
        this.report(this.value);
      },
      () => {
        this.recheck();
      },
    );
  }
}
