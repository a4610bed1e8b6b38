import type { Request, Response } from 'express';
import type * as z from 'zod';
import type { Route } from '../../shared/contract/route.ts';
import type { Act, Actor } from '../audit/act.ts';
import type { Access } from './access.ts';
import type { FileAnswer } from './file-answer.ts';
import type { Versioned } from './versioned.ts';

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;

/** One request, parsed and permitted. It is an {@link Act}: hand it to the service as such. */
export interface Call<R extends Route, A extends Access> extends Act<
  A extends 'public' | 'administrator-or-local' ? Actor | null : Actor
> {
  readonly params: R extends { params: infer S } ? Parsed<S> : undefined;
  readonly query: R extends { query: infer S } ? Parsed<S> : undefined;
  readonly body: R extends { body: infer S } ? Parsed<S> : undefined;
  /** What the caller read, of a guarded route: compare it with `expectVersion` inside the transaction. */
  readonly ifMatch: R extends { guarded: true } ? Versioned : null;
  /** For sign-in and its like only. */
  readonly http: { readonly request: Request; readonly response: Response };
}

/** What a handler answers: the reply, and for a mutable resource what its ETag is made from. */
export interface Answer<R extends Route> {
  readonly body: R extends { file: true }
    ? FileAnswer
    : R['reply'] extends z.ZodType
      ? z.input<R['reply']>
      : null;
  readonly etag?: Versioned;
}

export interface Endpoint {
  readonly route: Route;
  readonly access: Access;
  readonly handle: (call: Call<Route, Access>) => Promise<Answer<Route>>;
}

/**
 * Ties a route of the contract to its rule of access and its handler. The handler translates to a service and
 * back; it holds no rules of its own. Whether the caller may touch the object named is the service's to decide.
 */
export function endpoint<const R extends Route, const A extends Access>(
  route: R,
  access: A,
  handle: (call: Call<R, A>) => Promise<Answer<R>>,
): Endpoint {
  // The server parses by the route's own schemas before it calls: mount.ts keeps what the types promise.
  return { route, access, handle: handle };
}
