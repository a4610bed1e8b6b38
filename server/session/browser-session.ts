import { promisify } from 'node:util';
import type { Request, Response } from 'express';
import type { Actor } from '../audit/act.ts';
import type { Csrf } from './csrf.ts';

const LONGEST_AGENT = 120;

/** Starts and ends the session behind a cookie. */
export class BrowserSession {
  constructor(private readonly csrf: Csrf) {}

  /** A new session id, so that one planted before sign-in is worth nothing. */
  async start(request: Request, response: Response, actor: Actor, atMs: number): Promise<void> {
    await promisify((done: (error?: unknown) => void) => {
      request.logIn(actor, done);
    })();
    request.session.agent = (request.get('User-Agent') ?? '').slice(0, LONGEST_AGENT);
    request.session.authenticatedAtMs = atMs;
    this.csrf.issue(request, response);
  }

  /** Removes the record; the cookie that is left behind opens nothing. */
  async end(request: Request, response: Response): Promise<void> {
    await promisify((done: (error?: unknown) => void) => request.session.destroy(done))();
    response.set('Clear-Site-Data', '"cache", "storage"');
  }

  /** Hands out the token that every later write must send back. */
  issueToken(request: Request, response: Response): void {
    this.csrf.issue(request, response);
  }
}
