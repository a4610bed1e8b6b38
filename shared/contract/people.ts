import * as z from 'zod';
import { Email, Id, PersonName, TimeMs } from './common-fields.ts';
import type { Route } from './route.ts';

/** Everybody's account as the administrator sees it. */
export const Person = z
  .object({
    id: Id,
    name: z.string(),
    email: z.string(),
    administrator: z.boolean(),
    state: z.enum(['invited', 'active', 'disabled']),
    createdAtMs: TimeMs,
    lastSignInAtMs: TimeMs.nullable(),
  })
  .meta({ id: 'Person' });
export type Person = z.infer<typeof Person>;

export const listPeople = {
  method: 'GET',
  path: '/api/people',
  summary: 'All accounts (administrator)',
  reply: z.object({ people: z.array(Person) }),
} as const satisfies Route;

/** Names only: whom one may put on a project. */
export const findColleagues = {
  method: 'GET',
  path: '/api/colleagues',
  summary: 'Names of all active people',
  reply: z.object({ people: z.array(z.object({ id: Id, name: z.string(), email: z.string() })) }),
} as const satisfies Route;

export const invitePerson = {
  method: 'POST',
  path: '/api/people',
  summary: 'Invite a person by e-mail (administrator); the link lives 24 h',
  body: z.strictObject({ name: PersonName, email: Email, administrator: z.boolean() }),
  reply: Person,
  status: 201,
} as const satisfies Route;

/** For whoever let the 24 h pass; refused once the invitation was taken up. */
export const invitePersonAgain = {
  method: 'POST',
  path: '/api/people/:personId/invitation',
  summary: 'Mail an invited person a new link that lives 24 h (administrator)',
  params: z.strictObject({ personId: Id }),
  reply: null,
  status: 202,
} as const satisfies Route;

export const readPerson = {
  method: 'GET',
  path: '/api/people/:personId',
  summary: 'One account (administrator)',
  params: z.strictObject({ personId: Id }),
  reply: Person,
} as const satisfies Route;

export const changePerson = {
  method: 'PATCH',
  path: '/api/people/:personId',
  summary: 'Rename, disable, enable or make administrator (administrator)',
  params: z.strictObject({ personId: Id }),
  body: z.strictObject({
    name: PersonName.optional(),
    administrator: z.boolean().optional(),
    disabled: z.boolean().optional(),
  }),
  reply: Person,
  guarded: true,
} as const satisfies Route;

export const endSessionsOfPerson = {
  method: 'DELETE',
  path: '/api/people/:personId/sessions',
  summary: 'End every session of a person (administrator)',
  params: z.strictObject({ personId: Id }),
  reply: null,
} as const satisfies Route;

/** Mail that the local fake took in place of a mail server (administrator, demo and development). */
export const listMailbox = {
  method: 'GET',
  path: '/api/mailbox',
  summary: 'Mail kept by the local fake',
  reply: z.object({
    mails: z.array(
      z.object({ atMs: TimeMs, to: z.string(), subject: z.string(), text: z.string() }),
    ),
  }),
} as const satisfies Route;
