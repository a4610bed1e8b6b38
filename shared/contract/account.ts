import * as z from 'zod';
import { Email, Id, Password, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';

export const changePassword = {
  method: 'PUT',
  path: '/api/account/password',
  summary: 'Change the own password; ends all other sessions',
  body: z.strictObject({ current: Password, next: Password }),
  reply: null,
} as const satisfies Route;

export const OwnSession = z
  .object({
    id: Id,
    current: z.boolean(),
    startedAtMs: TimeMs,
    lastSeenAtMs: TimeMs,
    /** Browser as it named itself, shortened. */
    agent: z.string(),
  })
  .meta({ id: 'OwnSession' });

export const listOwnSessions = {
  method: 'GET',
  path: '/api/account/sessions',
  summary: 'Where one is signed in',
  reply: z.object({ sessions: z.array(OwnSession) }),
} as const satisfies Route;

export const endOwnSession = {
  method: 'DELETE',
  path: '/api/account/sessions/:sessionId',
  summary: 'End one of the own sessions',
  params: z.strictObject({ sessionId: Id }),
  reply: null,
} as const satisfies Route;

/** Answers alike whether the address is known or not. */
export const askPasswordReset = {
  method: 'POST',
  path: '/api/password-resets',
  summary: 'Mail a link that sets a new password',
  body: z.strictObject({ email: Email }),
  reply: null,
  status: 202,
} as const satisfies Route;

const Token = z.string().regex(/^[A-Za-z0-9_-]{43}$/, 'expected the token of the link');

export const redeemPasswordReset = {
  method: 'POST',
  path: '/api/password-resets/redemption',
  summary: 'Set a new password with the mailed token',
  body: z.strictObject({ token: Token, password: Password }),
  reply: null,
} as const satisfies Route;

export const acceptInvitation = {
  method: 'POST',
  path: '/api/invitations/acceptance',
  summary: 'Take up an invitation by setting a password',
  body: z.strictObject({ token: Token, password: Password }),
  reply: null,
} as const satisfies Route;

export const askEmailChange = {
  method: 'POST',
  path: '/api/account/email-changes',
  summary: 'Mail a confirmation to the old and the new address',
  body: z.strictObject({ password: Password, email: Email }),
  reply: null,
  status: 202,
} as const satisfies Route;

export const confirmEmailChange = {
  method: 'POST',
  path: '/api/account/email-changes/confirmation',
  summary: 'Confirm at one of the two addresses; both make the change',
  body: z.strictObject({ token: Token }),
  reply: z.object({ changed: z.boolean() }),
} as const satisfies Route;

/** Pages of the application that mailed links open, the token behind a `#`: `/reset-password#<token>`. */
export const LINK_PAGES = {
  invitation: 'accept-invitation',
  passwordReset: 'reset-password',
  emailChange: 'confirm-email',
} as const;
