import type { AbstractControl, ValidatorFn } from '@angular/forms';
import type * as z from 'zod';

/** A validator that is the contract's own field; its message is the error `schema`. */
export function schemaValidator(schema: z.ZodType): ValidatorFn {
  return (control) => {
    const result = schema.safeParse(control.value);
    return result.success
      ? null
      : { schema: result.error.issues[0]?.message ?? 'expected another value' };
  };
}

/** What is wrong with a control, as a sentence; null when nothing is, or when nobody has left it yet. */
export function fieldError(control: AbstractControl): string | null {
  if (control.valid || !control.touched) return null;
  const message: unknown = control.errors?.['schema'] ?? control.errors?.['server'];
  if (typeof message !== 'string' || message === '') return 'Enter another value.';
  const sentence = message.charAt(0).toUpperCase() + message.slice(1);
  return sentence.endsWith('.') ? sentence : `${sentence}.`;
}
