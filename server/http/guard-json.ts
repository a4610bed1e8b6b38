import { ApiError } from './api-error.ts';
import { isForbiddenKey } from './forbidden-key.ts';

const DEEPEST = 20;
/** Half of a surrogate pair has no UTF-8, and SQLite's functions take U+0000 for the end of a text. */
const UNSTORABLE = /\0|\p{Surrogate}/u;

/** @throws {ApiError} invalid-input for a document nested too deeply, with a forbidden key, or of text nothing could store */
export function guardJson(value: unknown, path = '', depth = 0): void {
  if (typeof value === 'string' && UNSTORABLE.test(value)) {
    refuse(path, 'holds a character that is none (U+0000 or half of a pair)');
  }
  if (typeof value !== 'object' || value === null) return;
  if (depth >= DEEPEST) refuse(path, `is nested more than ${DEEPEST} levels deep`);
  for (const [key, member] of Object.entries(value)) {
    const pointer = `${path}/${key.slice(0, 80)}`;
    if (isForbiddenKey(key) || UNSTORABLE.test(key)) refuse(pointer, 'is not allowed as a name');
    guardJson(member, pointer, depth + 1);
  }
}

function refuse(pointer: string, message: string): never {
  throw new ApiError('invalid-input', `${pointer} ${message}`, { fields: [{ pointer, message }] });
}
