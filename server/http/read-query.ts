import { ApiError } from './api-error.ts';
import { isForbiddenKey } from './forbidden-key.ts';

/**
 * The query of an address as a plain object, each key once.
 *
 * @throws {ApiError} invalid-input for a repeated or a forbidden key
 */
export function readQuery(originalUrl: string): Record<string, string> {
  const start = originalUrl.indexOf('?');
  const query: Record<string, string> = {};
  if (start < 0) return query;
  for (const [key, value] of new URLSearchParams(originalUrl.slice(start + 1))) {
    if (isForbiddenKey(key)) refuse(key, 'is not allowed as a name');
    if (Object.hasOwn(query, key)) refuse(key, 'must stand only once');
    query[key] = value;
  }
  return query;
}

function refuse(key: string, message: string): never {
  const pointer = `/query/${key.slice(0, 80)}`;
  throw new ApiError('invalid-input', `${pointer} ${message}`, { fields: [{ pointer, message }] });
}
