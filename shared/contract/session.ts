import * as z from 'zod';
import { Email, Id, Password, PersonName, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';

export const SignedInPerson = z
  .object({ id: Id, name: z.string(), email: z.string(), administrator: z.boolean() })
  .meta({ id: 'SignedInPerson' });
export type SignedInPerson = z.infer<typeof SignedInPerson>;

export const Session = z
  .object({
    person: SignedInPerson.nullable(),
    /** Whether the first administrator is still to be made. */
    setupNeeded: z.boolean(),
    /** Legal owner shown on the sign-in page and in title blocks. */
    workspace: z.string(),
    demo: z.boolean(),
    /** The demo's accounts, shown on its sign-in page; empty otherwise. */
    demoAccounts: z.array(z.object({ email: z.string(), password: z.string(), does: z.string() })),
    /** When the session ends without a further request; null when signed out. */
    idleEndsAtMs: TimeMs.nullable(),
  })
  .meta({ id: 'Session' });
export type Session = z.infer<typeof Session>;

/** Also issues the XSRF-TOKEN cookie that every later write sends back as X-XSRF-TOKEN. */
export const readSession = {
  method: 'GET',
  path: '/api/session',
  summary: 'Who is signed in',
  reply: Session,
} as const satisfies Route;

export const signIn = {
  method: 'POST',
  path: '/api/session',
  summary: 'Sign in',
  body: z.strictObject({ email: Email, password: Password }),
  reply: Session,
} as const satisfies Route;

export const signOut = {
  method: 'DELETE',
  path: '/api/session',
  summary: 'Sign out',
  reply: null,
} as const satisfies Route;

/** The code is printed once by the server at its first start. */
export const setUp = {
  method: 'POST',
  path: '/api/setup',
  summary: 'Make the first administrator',
  body: z.strictObject({
    code: z.string().trim().min(1, 'expected the code printed by the server').max(100),
    workspace: PersonName,
    name: PersonName,
    email: Email,
    password: Password,
  }),
  reply: Session,
} as const satisfies Route;
