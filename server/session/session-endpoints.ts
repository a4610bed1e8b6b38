import type { Request } from 'express';
import {
  readSession,
  type Session,
  setUp,
  signIn,
  signOut,
} from '../../shared/contract/session.ts';
import type { Act, Actor } from '../audit/act.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { SetupService } from '../users/setup-service.ts';
import type { BrowserSession } from './browser-session.ts';
import { IDLE_MS } from './session-store.ts';
import type { SignOutService } from './sign-out-service.ts';

/** An account of the demo, shown on its sign-in page. */
export type DemoAccount = Session['demoAccounts'][number];

export interface SessionServices {
  readonly setup: SetupService;
  readonly browser: BrowserSession;
  readonly signOuts: SignOutService;
  /** Asks passport's local strategy. */
  readonly authenticate: (request: Request) => Promise<Actor>;
  readonly demo: { readonly on: boolean; readonly accounts: readonly DemoAccount[] };
}

export function sessionEndpoints(services: SessionServices): Endpoint[] {
  const { setup, browser, signOuts } = services;

  async function describe(actor: Actor | null, request: Request, act: Act): Promise<Session> {
    const lastSeenAtMs = request.session.lastSeenAtMs ?? act.atMs;
    const [setupNeeded, workspace] = await Promise.all([setup.isNeeded(), setup.workspaceName()]);
    return {
      person: actor,
      ...{ setupNeeded, workspace, demo: services.demo.on },
      demoAccounts: [...services.demo.accounts],
      idleEndsAtMs: actor ? lastSeenAtMs + IDLE_MS : null,
    };
  }

  return [
    endpoint(readSession, 'public', async (call) => {
      browser.issueToken(call.http.request, call.http.response);
      return { body: await describe(call.actor, call.http.request, call) };
    }),

    endpoint(signIn, 'public', async (call) => {
      const { request, response } = call.http;
      request.body = call.body; // trimmed and lower-cased as the contract has it
      const actor = await services.authenticate(request);
      await browser.start(request, response, actor, call.atMs);
      return { body: await describe(actor, request, call) };
    }),

    endpoint(signOut, 'public', async (call) => {
      const { request, response } = call.http;
      if (call.actor) await signOuts.record(call, call.actor);
      await browser.end(request, response);
      return { body: null };
    }),

    endpoint(setUp, 'public', async (call) => {
      const { request, response } = call.http;
      const actor = await setup.setUp(call, call.body);
      await browser.start(request, response, actor, call.atMs);
      return { body: await describe(actor, request, call) };
    }),
  ];
}
