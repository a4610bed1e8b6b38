import { csrfSync } from 'csrf-sync';
import type { Request, RequestHandler, Response } from 'express';
import { isLoopbackName } from '../config.ts';
import { ApiError } from '../http/api-error.ts';

const READING = new Set(['GET', 'HEAD', 'OPTIONS']);

/** Refuses writes that another site had the browser send. */
export class Csrf {
  readonly #sync = csrfSync({ getTokenFromRequest: (request) => request.get('X-XSRF-TOKEN') });

  constructor(
    private readonly origin: string,
    private readonly secure: boolean,
  ) {}

  /** Session token into the cookie that Angular reads. */
  issue(request: Request, response: Response): void {
    const token = this.#sync.generateToken(request);
    response.cookie('XSRF-TOKEN', token, { sameSite: 'strict', secure: this.secure, path: '/' });
  }

  readonly protect: RequestHandler = (request, _response, next) => {
    if (READING.has(request.method)) {
      next();
      return;
    }
    const site = request.get('Sec-Fetch-Site');
    if (site !== undefined && site !== 'same-origin' && site !== 'none') forged('fetch-site');
    const origin = request.get('Origin');
    if (origin !== undefined && !this.#isOwn(origin, request.get('Host'))) forged('origin');
    if (!this.#sync.isRequestValid(request)) forged('token');
    next();
  };

  /** On loopback people use any of its names, and a development server's port: the names must agree. */
  #isOwn(origin: string, host: string | undefined): boolean {
    if (origin === this.origin) return true;
    if (this.secure || host === undefined || !URL.canParse(`http://${host}`)) return false;
    return isLoopbackName(new URL(`http://${host}`).hostname) && origin === `http://${host}`;
  }
}

function forged(rule: string): never {
  throw new ApiError('request-forged', 'Reload the page and try again.', { rule: `csrf-${rule}` });
}
