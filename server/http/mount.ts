import './express-user.ts';
import type { Request, RequestHandler, Response, Router } from 'express';
import type { Actor } from '../audit/act.ts';
import { requireAccess } from './access.ts';
import { ApiError } from './api-error.ts';
import type { Answer, Call, Endpoint } from './endpoint.ts';
import { type FileAnswer, sendFile } from './file-answer.ts';
import { readInput } from './read-input.ts';
import { requestIdOf } from './request-log.ts';
import { readQuery } from './read-query.ts';
import { etagOf, parseIfMatch } from './versioned.ts';
import type { Route } from '../../shared/contract/route.ts';
import type { Access } from './access.ts';

/** What the routes know of where they run. */
export interface Surroundings {
  /** UTC, ms. */
  readonly now: () => number;
  /** Whether the server can be reached from this machine only. */
  readonly local: boolean;
}

const declared = new WeakMap<RequestHandler, Endpoint>();

/** The declaration behind a handler found in a router; undefined for one that was put there by hand. */
export function endpointOf(handler: RequestHandler): Endpoint | undefined {
  return declared.get(handler);
}

/** Registers the endpoints; the only place where routes get into the router. */
export function mount(
  router: Router,
  endpoints: readonly Endpoint[],
  surroundings: Surroundings,
): void {
  for (const item of endpoints) {
    const handler: RequestHandler = async (request, response) => {
      const call = toCall(item, request, response, surroundings);
      send(item.route, response, await item.handle(call));
    };
    declared.set(handler, item);
    const method = item.route.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    router[method](item.route.path, handler);
  }
}

function toCall(
  { route, access }: Endpoint,
  request: Request,
  response: Response,
  surroundings: Surroundings,
): Call<Route, Access> {
  const actor: Actor | null = request.user ?? null;
  requireAccess(access, actor, surroundings.local);
  return {
    ...{ actor, requestId: requestIdOf(request), atMs: surroundings.now() },
    params: readInput(route.params, { ...request.params }, '/params'),
    query: readInput(route.query, readQuery(request.originalUrl), '/query'),
    body: readInput(route.body, bodyOf(route, request), ''),
    ifMatch: route.guarded === true ? parseIfMatch(request.get('If-Match')) : null,
    http: { request, response },
  } as Call<Route, Access>;
}

function bodyOf(route: Route, request: Request): unknown {
  const body: unknown = request.body;
  if (route.body !== undefined && body === undefined) {
    throw new ApiError('unreadable-body', 'The request has no body: send JSON.');
  }
  return body ?? {};
}

function send(route: Route, response: Response, answer: Answer<Route>): void {
  if (answer.etag) response.set('ETag', etagOf(answer.etag));
  if (route.file === true) {
    sendFile(response, answer.body as unknown as FileAnswer); // endpoint.ts has typed the handler
    return;
  }
  if (route.reply === null) {
    response.status(route.status ?? 204).end();
    return;
  }
  // our own mistake here is a 500, not the caller's 422
  response.status(route.status ?? 200).json(route.reply.parse(answer.body));
}
