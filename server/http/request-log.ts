import './express-user.ts';
import { randomUUID } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import { type Logger, pino } from 'pino';
import { pinoHttp } from 'pino-http';

/** Never logged, wherever it turns up. */
const SECRET_PATHS = [
  ...['password', 'current', 'next', 'token', 'code', 'secret', 'link', 'cookie', 'passwordHash'],
  ...['req.headers.cookie', 'req.headers.authorization', 'req.headers["x-xsrf-token"]'],
  ...['res.headers["set-cookie"]', '*.password', '*.token', '*.cookie'],
];

/** One line of JSON for each event, UTC; JSON escapes control characters, so a value cannot forge a line. */
export function createLogger(level: string, destination?: { write(line: string): void }): Logger {
  const options = {
    level,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
    redact: { paths: SECRET_PATHS, censor: '[redacted]' },
  };
  return destination ? pino(options, destination) : pino(options);
}

/** Names the request in log, trail and problem documents. */
export function requestIdOf(request: Request): string {
  return typeof request.id === 'string' ? request.id : '';
}

/** Gives each request an id of our own making and logs it when it ends: method, path without query, status. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    quietReqLogger: true,
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'error' : 'info'),
    customErrorObject: (_request, _response, _error, line: object) => ({ ...line, err: undefined }),
    customProps: (request) => ({ personId: (request as Request).user?.id }),
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?')[0]?.slice(0, 256),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  }) as RequestHandler;
}
