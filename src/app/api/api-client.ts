import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type * as z from 'zod';
import { address, type Route } from '../../../shared/contract/route.ts';
import { toApiProblem } from './api-problem.ts';

/** Whether a request needs the part: given with its schema's input, left out where the route has none. */
type Given<Key extends string, Schema> = Schema extends z.ZodType
  ? Readonly<Record<Key, z.input<Schema>>>
  : unknown;

/** What a call of the route must carry, read off the route itself. */
export type RequestOf<R extends Route> = (R extends { params: infer P }
  ? Given<'params', P>
  : unknown) &
  (R extends { query: infer Q } ? Partial<Given<'query', Q>> : unknown) &
  (R extends { body: infer B } ? Given<'body', B> : unknown) &
  (R extends { guarded: true } ? { readonly etag: string } : unknown);

/** The route's reply after parsing; null where it has none. */
export type ReplyOf<R extends Route> = R['reply'] extends z.ZodType ? z.output<R['reply']> : null;

/** A parsed reply with its version. */
export interface Answer<Value> {
  readonly value: Value;
  /** Hand it back as `etag` of the next guarded call; empty where the resource has none. */
  readonly etag: string;
}

interface LooseRequest {
  readonly params?: Record<string, string>;
  readonly query?: Record<string, string | number | boolean | null | undefined>;
  readonly body?: unknown;
  readonly etag?: string;
}

/** Calls the routes of `shared/contract`: builds the address, parses the reply, names the refusal. */
@Injectable({ providedIn: 'root' })
export class ApiClient {
  private readonly http = inject(HttpClient);

  /**
   * One call of a route.
   *
   * @throws {ApiProblem} when the server refuses, cannot be reached, or answers what the contract does not know
   */
  async send<R extends Route>(
    route: R,
    ...[request]: LooseRequest extends RequestOf<R> ? [RequestOf<R>?] : [RequestOf<R>]
  ): Promise<Answer<ReplyOf<R>>> {
    const { params, query, body, etag } = (request ?? {}) as LooseRequest;
    try {
      const response = await firstValueFrom(
        this.http.request<unknown>(route.method, address(route.path, params, query), {
          body,
          observe: 'response',
          headers: etag ? { 'If-Match': etag } : {},
        }),
      );
      const value = (route.reply === null ? null : route.reply.parse(response.body)) as ReplyOf<R>;
      return { value, etag: response.headers.get('ETag') ?? '' };
    } catch (error) {
      throw toApiProblem(error);
    }
  }
}
