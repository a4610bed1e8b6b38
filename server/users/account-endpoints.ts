import {
  acceptInvitation,
  askEmailChange,
  askPasswordReset,
  changePassword,
  confirmEmailChange,
  endOwnSession,
  listOwnSessions,
  redeemPasswordReset,
} from '../../shared/contract/account.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { BrowserSession } from '../session/browser-session.ts';
import { hashOf } from '../session/session-store.ts';
import type { AccountService } from './account-service.ts';
import type { LinkMailLimit } from './link-mail-limit.ts';
import type { RecoveryService } from './recovery-service.ts';

export interface AccountServices {
  readonly account: AccountService;
  readonly recovery: RecoveryService;
  readonly browser: BrowserSession;
  readonly linkMails: LinkMailLimit;
}

export function accountEndpoints(services: AccountServices): Endpoint[] {
  return [...ownAccount(services), ...recovery(services)];
}

function ownAccount({ account, browser, linkMails }: AccountServices): Endpoint[] {
  return [
    endpoint(changePassword, 'signed-in', async (call) => {
      const { request, response } = call.http;
      await account.changePassword(call, call.body, request.ip ?? '', hashOf(request.sessionID));
      await browser.start(request, response, call.actor, call.atMs);
      return { body: null };
    }),

    endpoint(listOwnSessions, 'signed-in', async (call) => {
      const currentHash = hashOf(call.http.request.sessionID);
      const rows = await account.listSessions(call);
      const sessions = rows.map(({ publicId, idHash, startedAtMs, lastSeenAtMs, agent }) => ({
        ...{ id: publicId, current: idHash === currentHash, startedAtMs, lastSeenAtMs, agent },
      }));
      return { body: { sessions } };
    }),

    endpoint(endOwnSession, 'signed-in', async (call) => {
      await account.endSession(call, call.params.sessionId);
      return { body: null };
    }),

    endpoint(askEmailChange, 'signed-in', async (call) => {
      const address = call.http.request.ip ?? '';
      await linkMails.count(address);
      await account.askEmailChange(call, call.body, address);
      return { body: null };
    }),
  ];
}

function recovery({ account, recovery, linkMails }: AccountServices): Endpoint[] {
  return [
    endpoint(confirmEmailChange, 'public', async (call) => ({
      body: { changed: await account.confirmEmailChange(call, call.body.token) },
    })),

    endpoint(askPasswordReset, 'public', async (call) => {
      await linkMails.count(call.http.request.ip ?? '');
      await recovery.askReset(call, call.body.email);
      return { body: null };
    }),

    endpoint(redeemPasswordReset, 'public', async (call) => {
      await recovery.reset(call, call.body.token, call.body.password);
      return { body: null };
    }),

    endpoint(acceptInvitation, 'public', async (call) => {
      await recovery.acceptInvitation(call, call.body.token, call.body.password);
      return { body: null };
    }),
  ];
}
