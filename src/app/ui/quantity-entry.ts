import { computed, signal } from '@angular/core';
import { formatPercent, formatQuantity } from '../../../shared/units/engineering-notation.ts';
import {
  parseQuantity,
  type QuantityField,
  type QuantityResult,
} from '../../../shared/units/quantity.ts';

/** What stands below the field. */
export interface EntryMessage {
  readonly kind: 'error' | 'question' | 'reading';
  readonly text: string;
}

/** Letters and signs that make an entry arithmetic rather than one quantity. */
const ARITHMETIC = /[*/^()×·÷]|[\d\s%a-zA-ZΩµ]\s*[+\-\u2212]\s*[\d(.]/;

/**
 * One text box for one number: what is typed, what it means, and what has to be said about it. Free of the
 * page, so that single fields and pairs share it.
 */
export class QuantityEntry {
  private readonly shown = signal<number | null>(null);
  private readonly typed = signal<string | null>(null);
  private readonly result = signal<QuantityResult | null>(null);
  private readonly confirmed = signal(false);
  private readonly left = signal(false);
  private reading = 0;

  /** Whether the box holds what somebody is typing rather than the value in figures. */
  readonly editing = computed(() => this.typed() !== null);
  readonly number = computed(() => this.split()[0]);
  readonly unit = computed(() => this.split()[1]);
  /** Set while the text stands for no value: what is wrong, or asked. */
  readonly problem = computed(() => {
    const result = this.result();
    if (result === null) return null;
    if (!result.ok) return result.problem;
    return result.confirm !== undefined && !this.confirmed() ? result.confirm : null;
  });
  readonly message = computed<EntryMessage | null>(() => {
    const result = this.result();
    if (result === null) return null;
    if (!result.ok) return this.left() ? { kind: 'error', text: result.problem } : null;
    if (result.confirm !== undefined && !this.confirmed()) {
      return { kind: 'question', text: `${result.confirm} Press Enter to take it as read.` };
    }
    return result.reading === undefined ? null : { kind: 'reading', text: result.reading };
  });

  constructor(
    private readonly field: () => QuantityField,
    private readonly mayBeEmpty: () => boolean,
    private readonly take: (value: number | null) => void,
    private readonly changed: () => void,
  ) {}

  /** The value comes from outside: an undone step, a picked part. */
  show(value: number | null): void {
    if (this.editing() && this.accepted() === value) return;
    this.shown.set(value);
    this.typed.set(null);
    this.result.set(null);
  }

  /** What the box shows: the text being typed, else the figure; with its unit while it has the focus. */
  text(focused: boolean): string {
    const typed = this.typed();
    if (typed !== null) return typed;
    return focused
      ? this.number() + (this.unit() === '' ? '' : `\u00a0${this.unit()}`)
      : this.number();
  }

  type(text: string): void {
    this.typed.set(text);
    this.confirmed.set(false);
    this.left.set(false);
    this.reading += 1;
    if (text.trim() === '' && this.mayBeEmpty()) {
      this.result.set(null);
      this.accept(null);
      return;
    }
    const plain = parseQuantity(text, this.field());
    if (!plain.ok && ARITHMETIC.test(text)) {
      void this.readArithmetic(text, this.reading);
      return;
    }
    this.settle(plain);
  }

  /** Enter: a question is answered with yes, an understood text turns into its figure. */
  commit(): void {
    const result = this.result();
    if (result?.ok === true && result.confirm !== undefined && !this.confirmed()) {
      this.confirmed.set(true);
      this.accept(result.value);
    }
    this.leave();
  }

  /** Leaving the box: an understood text turns into its figure, a wrong one stays with its message. */
  leave(): void {
    this.left.set(true);
    if (this.problem() === null && this.editing()) {
      this.typed.set(null);
      this.result.update((result) =>
        result?.ok === true && result.reading !== undefined && result.confirm === undefined
          ? result
          : null,
      );
    }
    this.changed();
  }

  /** Puts a value as if it had been typed. */
  step(value: number): void {
    this.typed.set(null);
    this.result.set(null);
    this.accept(value);
  }

  private async readArithmetic(text: string, reading: number): Promise<void> {
    const { parseArithmetic } = await import('./quantity-arithmetic.ts');
    if (reading === this.reading) this.settle(parseArithmetic(text, this.field()));
  }

  private settle(result: QuantityResult): void {
    this.result.set(result);
    if (result.ok && result.confirm === undefined) this.accept(result.value);
    this.changed();
  }

  private accept(value: number | null): void {
    this.shown.set(value);
    this.take(value);
  }

  private accepted(): number | null {
    return this.shown();
  }

  private split(): readonly [string, string] {
    const value = this.shown();
    const { unit } = this.field();
    if (value === null) return ['', ''];
    const options = { digits: 6 };
    const text =
      unit === '%' ? formatPercent(value, options) : formatQuantity(value, unit, options);
    const [number = '', symbol = ''] = text.split('\u00a0');
    return [number, symbol];
  }
}
