import * as z from 'zod';
import type { FieldProblem } from '../../shared/contract/problem.ts';
import { ApiError } from './api-error.ts';

const NOTHING = z.strictObject({});
const MOST_FIELDS = 50;

/** Where an input comes from: the start of its JSON pointers. */
export type InputPlace = '' | '/query' | '/params';

/**
 * Parses what the caller sent. A zod error outside of this function is a defect on purpose: our own wrong
 * reply must never look like the caller's mistake.
 *
 * @param schema none: nothing may be sent there
 * @throws {ApiError} invalid-input naming every field at fault
 */
export function readInput(
  schema: z.ZodType | undefined,
  value: unknown,
  place: InputPlace,
): unknown {
  const parsed = (schema ?? NOTHING).safeParse(value);
  if (parsed.success) return parsed.data;
  const fields = parsed.error.issues.flatMap((issue) => fieldProblems(issue, place));
  throw new ApiError('invalid-input', sentence(fields), { fields: fields.slice(0, MOST_FIELDS) });
}

function fieldProblems(issue: z.core.$ZodIssue, place: InputPlace): FieldProblem[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      pointer: pointer(place, [...issue.path, key.slice(0, 80)]),
      message: 'is not known here',
    }));
  }
  return [{ pointer: pointer(place, issue.path), message: issue.message }];
}

function pointer(place: InputPlace, path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, step) => `${text}/${escaped(String(step))}`, place);
}

/** RFC 6901, section 3. */
function escaped(step: string): string {
  return step.replaceAll('~', '~0').replaceAll('/', '~1');
}

function sentence(fields: readonly FieldProblem[]): string {
  const first = fields[0];
  if (first === undefined) return 'Some values are not right.';
  const where = first.pointer === '' ? 'The body' : first.pointer;
  const more = fields.length > 1 ? ` (and ${fields.length - 1} more)` : '';
  return `${where}: ${first.message}${more}`;
}
