import compression from 'compression';
import express, { type Express, type RequestHandler, Router } from 'express';
import type { Logger } from 'pino';
import { notFound } from './http/api-error.ts';
import { apiRateLimit } from './http/api-rate-limit.ts';
import { browserDefences, violationReports } from './http/browser-defences.ts';
import { guardJson } from './http/guard-json.ts';
import { mount } from './http/mount.ts';
import { problemHandler } from './http/problem-handler.ts';
import { requestLog } from './http/request-log.ts';
import { requireJson } from './http/require-json.ts';
import { webClient } from './http/web-client.ts';
import { allEndpoints } from './routers.ts';
import { openApiEndpoint } from './openapi-endpoint.ts';
import type { Services } from './services.ts';
import { sessions } from './session/sessions.ts';

const LARGEST_BODY = '256kb';

export interface App {
  readonly express: Express;
  /** The API's routes alone: the suites enumerate them. */
  readonly router: Router;
}

/** The whole application over an open database; it does not listen by itself. */
export function createApp(services: Services, secrets: readonly string[], logger: Logger): App {
  const { config } = services;
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false); // ETags are versions of resources, set by mount
  app.set('query parser', false); // read-query.ts
  app.set('trust proxy', config.trustProxy);
  app.use(requestLog(logger), services.health.routes());
  app.use(browserDefences(config.secure), compression(), violationReports());

  const router = Router({ caseSensitive: true });
  const endpoints = allEndpoints(services);
  mount(router, [...endpoints, openApiEndpoint(endpoints)], {
    now: config.now,
    local: !config.secure, // plain http listens on loopback only
  });
  app.use('/api', beforeApi(services, secrets));
  app.use(router);
  app.use('/api', () => {
    throw notFound();
  });
  app.use(webClient(config.webFolder), () => {
    throw notFound();
  });
  app.use(problemHandler);
  return { express: app, router };
}

/** What every API request passes, cheapest refusal first. */
function beforeApi(services: Services, secrets: readonly string[]): RequestHandler[] {
  const { config, database, sessions: store, authenticator, csrf } = services;
  return [
    (_request, response, next) => {
      response.set('Cache-Control', 'no-store');
      next();
    },
    requireJson,
    express.json({ limit: LARGEST_BODY, strict: true, type: 'application/json' }),
    (request, _response, next) => {
      guardJson(request.body);
      next();
    },
    ...sessions(config, secrets, database, store, authenticator),
    apiRateLimit(config.limits.apiPerMinute),
    csrf.protect,
  ];
}
