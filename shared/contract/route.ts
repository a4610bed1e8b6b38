import type * as z from 'zod';

/**
 * One API route as both sides know it. The server parses `params`, `query` and `body` with these schemas and
 * its own reply with `reply`; the client builds the address with `address` and parses the answer.
 */
export interface Route {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  readonly path: string;
  readonly summary: string;
  readonly params?: z.ZodType;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  /** `null`: 204 without a body, or a file. */
  readonly reply: z.ZodType | null;
  /** Whether it answers with a file to save instead of JSON; `reply` is null then. */
  readonly file?: boolean;
  /** 200, or 204 without a reply, unless named. */
  readonly status?: number;
  /** Whether the caller must send If-Match with the ETag it read: 428 without, 412 when stale. */
  readonly guarded?: boolean;
}

/**
 * The address of a route with its parameters filled in and escaped.
 *
 * @throws {RangeError} if a parameter of the path is missing
 */
export function address(
  path: string,
  params: Readonly<Record<string, string>> = {},
  query: Readonly<Record<string, string | number | boolean | null | undefined>> = {},
): string {
  const filled = path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name];
    if (value === undefined) throw new RangeError(`no value for :${name} in ${path}`);
    return encodeURIComponent(value);
  });
  const search = Object.entries(query)
    .filter(([, value]) => value !== null && value !== undefined && value !== '')
    .map(([key, value]) => `${encodeURIComponent(key)}=${encodeURIComponent(String(value))}`)
    .join('&');
  return search === '' ? filled : `${filled}?${search}`;
}
