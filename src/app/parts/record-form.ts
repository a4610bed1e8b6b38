import {
  FormArray,
  FormControl,
  FormGroup,
  type AbstractControl,
  type ValidatorFn,
} from '@angular/forms';
import {
  formatNumber,
  formatPercent,
  formatQuantity,
} from '../../../shared/units/engineering-notation.ts';
import { parseQuantity, type QuantityResult } from '../../../shared/units/quantity.ts';
import { QUANTITY_UNITS, type UnitName } from '../../../shared/units/quantity-unit.ts';
import type { Group, Leaf, Outline, Rows } from './record-outline.ts';

/** Enough digits that a value written and read again is the same. */
const ALL_DIGITS = 15;

/** Controls for an outline, filled from a value; numbers stand as text, as a person would type them. */
export function controlOf(outline: Outline, value: unknown): AbstractControl {
  switch (outline.kind) {
    case 'group':
      return groupOf(outline, value);
    case 'rows':
      return new FormArray(asList(value).map((row) => controlOf(outline.row, row)));
    default:
      return leafOf(outline, value);
  }
}

/** An empty row, to be added to a list. */
export function newRow(rows: Rows): AbstractControl {
  return controlOf(rows.row, undefined);
}

export function groupOf(outline: Group, value: unknown): FormGroup {
  const record = isObject(value) ? value : {};
  const entries = outline.fields.map((field) => [field.key, controlOf(field, record[field.key])]);
  return new FormGroup(Object.fromEntries(entries) as Record<string, AbstractControl>);
}

function leafOf(leaf: Leaf, value: unknown): FormControl<string> {
  const text = leafText(leaf, value);
  const validators = leaf.kind === 'number' ? [quantityValidator(leaf.unit, text)] : [];
  return new FormControl(text, { nonNullable: true, validators });
}

function leafText(leaf: Leaf, value: unknown): string {
  if (typeof value === 'number') return numberText(value, leaf.kind === 'number' ? leaf.unit : '1');
  if (typeof value === 'boolean') return String(value);
  return typeof value === 'string' ? value : '';
}

function numberText(value: number, unit: string): string {
  const digits = ALL_DIGITS;
  if (unit === '%') return formatPercent(value, { digits });
  return isKnown(unit) ? formatQuantity(value, unit, { digits }) : formatNumber(value, { digits });
}

const isKnown = (unit: string): unit is UnitName => Object.hasOwn(QUANTITY_UNITS, unit);

/** Reads a number of a field; units the grammar does not know are typed as plain numbers. */
export function readNumber(text: string, unit: string): QuantityResult {
  return parseQuantity(text, { unit: isKnown(unit) ? unit : '1' });
}

/**
 * Says what is wrong with what was typed; an empty field is a figure that is not known. Where two readings
 * are possible it asks once: the same text judged again, at the save, is what was meant.
 *
 * @param filled the text the field began with, which nobody typed
 */
function quantityValidator(unit: string, filled: string): ValidatorFn {
  let asked = filled;
  return (control: AbstractControl<string>) => {
    if (control.value.trim() === '') return null;
    const read = readNumber(control.value, unit);
    if (!read.ok) return { schema: read.problem };
    if (read.confirm === undefined || control.value === asked) return null;
    asked = control.value;
    return { schema: read.confirm };
  };
}

/**
 * What the controls hold, for the schema to judge. An empty figure is left out where the schema has a
 * default or null for it; a group in which nothing is entered is null.
 */
export function valueOf(outline: Outline, control: AbstractControl): unknown {
  switch (outline.kind) {
    case 'group':
      return control instanceof FormGroup ? groupValue(outline, control) : undefined;
    case 'rows':
      return control instanceof FormArray
        ? control.controls.map((row) => valueOf(outline.row, row))
        : undefined;
    default:
      return leafValue(outline, (control as FormControl<string>).value);
  }
}

function groupValue(outline: Group, control: FormGroup): unknown {
  if (outline.optional && isEmpty(control)) return null;
  const entries = outline.fields.map((field) => {
    const inner = control.controls[field.key];
    return [field.key, inner === undefined ? undefined : valueOf(field, inner)];
  });
  return Object.fromEntries(entries.filter(([, value]) => value !== undefined));
}

function leafValue(leaf: Leaf, text: string): unknown {
  if (text.trim() === '') return undefined;
  switch (leaf.kind) {
    case 'number': {
      const read = readNumber(text, leaf.unit);
      return read.ok ? read.value : text;
    }
    case 'flag':
      return text === 'true';
    default:
      return text;
  }
}

/** Whether nothing is entered in a control or anywhere inside it. */
export function isEmpty(control: AbstractControl): boolean {
  if (control instanceof FormGroup) return Object.values(control.controls).every(isEmpty);
  if (control instanceof FormArray) return control.controls.every(isEmpty);
  return control.value === '' || control.value === 'false';
}

const asList = (value: unknown): unknown[] => (Array.isArray(value) ? (value as unknown[]) : []);
const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/**
 * Puts what the schema found at the controls it names. An issue inside a group left empty lands on the
 * nearest control there is.
 *
 * @returns paths of the controls that have an issue, in the order of the issues
 */
export function placeIssues(
  form: AbstractControl,
  issues: readonly { readonly path: readonly PropertyKey[]; readonly message: string }[],
): string[] {
  return issues.map(({ path, message }) => {
    const steps = path.map(String);
    let control = form.get(steps);
    while (control === null && steps.length > 0) {
      steps.pop();
      control = steps.length === 0 ? form : form.get(steps);
    }
    control?.setErrors({ schema: message });
    control?.markAsTouched();
    return steps.join('.');
  });
}
