import express, { type Express, Router } from 'express';
import type { Logger } from 'pino';
import { notFound } from './http/api-error.ts';
import { guardJson } from './http/guard-json.ts';
import { mount } from './http/mount.ts';
import { problemHandler } from './http/problem-handler.ts';
import { requestLog } from './http/request-log.ts';
import { requireJson } from './http/require-json.ts';
import { allEndpoints } from './routers.ts';
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
  const { config, database } = services;
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false); // ETags are versions of resources, set by mount
  app.set('query parser', false); // read-query.ts
  app.set('trust proxy', config.trustProxy);
  app.use(requestLog(logger));

  const router = Router({ caseSensitive: true });
  mount(router, allEndpoints(services), config.now);
  app.use(
    '/api',
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
    ...sessions(config, secrets, database, services.sessions, services.authenticator),
    services.csrf.protect,
  );
  app.use(router);
  app.use('/api', () => {
    throw notFound();
  });
  app.use(problemHandler);
  return { express: app, router };
}
