import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  forwardRef,
  inject,
  input,
  signal,
} from '@angular/core';
import { FormArray, type AbstractControl } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Icon } from '../ui/icon.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { isEmpty, newRow } from './record-form.ts';
import { RecordLeaf } from './record-leaf.ts';
import { columnsOf, isFlat, type Column, type Outline, type Rows } from './record-outline.ts';

// A group may hold lists and a list's row may be a group: the two need each other, so they share this file.

/** The fields of a group side by side; groups and lists inside it follow as parts of their own. */
@Component({
  selector: 'app-record-group',
  imports: [RecordLeaf, forwardRef(() => RecordRows), SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './record-group.html',
  styleUrl: './record-group.scss',
})
export class RecordGroup {
  readonly fields = input.required<readonly Outline[]>();
  readonly control = input.required<AbstractControl>();
  /** Id of the group's place in the page; fields hang their keys behind it. */
  readonly at = input.required<string>();
  readonly checked = input.required<number>();

  protected inner(key: string): AbstractControl {
    const control = this.control().get(key);
    if (control === null) throw new RangeError(`no control ${key} at ${this.at()}`);
    return control;
  }

  /** A group that may be left out stays closed until it holds something. */
  protected isFilled(field: Outline): boolean {
    return !field.optional || !isEmpty(this.inner(field.key));
  }

  protected unitOf(field: Outline): string {
    if (field.kind !== 'number' || field.unit === '1') return '';
    return field.unit === 'Ohm' ? 'Ω' : field.unit;
  }
}

/** A list of rows, each to be edited and taken away; flat rows stand as the lines of a table. */
@Component({
  selector: 'app-record-rows',
  imports: [Icon, MatButton, RecordGroup, RecordLeaf, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './record-rows.html',
  styleUrl: './record-rows.scss',
})
export class RecordRows {
  private readonly announcer = inject(StatusAnnouncer);
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly rows = input.required<Rows>();
  readonly control = input.required<AbstractControl>();
  readonly at = input.required<string>();
  readonly checked = input.required<number>();

  /** Counts changes of the list, which no signal tells. */
  private readonly changes = signal(0);
  protected readonly list = computed(() => {
    const control = this.control();
    if (control instanceof FormArray) return control;
    throw new RangeError(`${this.at()} holds no rows`);
  });
  protected readonly lines = computed(() => {
    this.changes();
    return [...this.list().controls];
  });
  protected readonly flat = computed(() => isFlat(this.rows().row));
  protected readonly columns = computed(() => columnsOf(this.rows().row));
  protected readonly fields = computed(() => {
    const { row } = this.rows();
    return row.kind === 'group' ? row.fields : [];
  });

  protected idOf(index: number, column: Column): string {
    return [this.at(), index, ...column.path].join('.');
  }

  protected controlAt(line: AbstractControl, column: Column): AbstractControl {
    const control = column.path.length === 0 ? line : line.get([...column.path]);
    if (control === null) throw new RangeError(`no control ${column.path.join('.')}`);
    return control;
  }

  protected unitOf({ leaf }: Column): string {
    if (leaf.kind !== 'number' || leaf.unit === '1') return '';
    return leaf.unit === 'Ohm' ? 'Ω' : leaf.unit;
  }

  /** The new row's first field takes the focus, so that typing goes on. */
  protected add(): void {
    this.list().push(newRow(this.rows()));
    this.list().markAsDirty();
    this.changes.update((count) => count + 1);
    this.announcer.say(`Row ${this.list().length} added`);
    setTimeout(() => {
      const rows = this.element.querySelectorAll<HTMLElement>('[data-row]');
      rows
        .item(rows.length - 1)
        .querySelector<HTMLElement>('input, select')
        ?.focus();
    });
  }

  protected remove(index: number): void {
    this.list().removeAt(index);
    this.list().markAsDirty();
    this.changes.update((count) => count + 1);
    this.announcer.say(`Row ${index + 1} removed`);
    this.element.querySelector<HTMLElement>('[data-add]')?.focus();
  }
}
