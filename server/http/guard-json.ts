import { ApiError } from './api-error.ts';
import { isForbiddenKey } from './forbidden-key.ts';

const DEEPEST = 20;

/** @throws {ApiError} invalid-input for a document nested too deeply or with a forbidden key */
export function guardJson(value: unknown, path = '', depth = 0): void {
  if (typeof value !== 'object' || value === null) return;
  if (depth >= DEEPEST) refuse(path, `is nested more than ${DEEPEST} levels deep`);
  for (const [key, member] of Object.entries(value)) {
    const pointer = `${path}/${key.slice(0, 80)}`;
    if (isForbiddenKey(key)) refuse(pointer, 'is not allowed as a name');
    guardJson(member, pointer, depth + 1);
  }
}

function refuse(pointer: string, message: string): never {
  throw new ApiError('invalid-input', `${pointer} ${message}`, { fields: [{ pointer, message }] });
}
