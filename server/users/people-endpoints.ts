import {
  changePerson,
  endSessionsOfPerson,
  findColleagues,
  invitePerson,
  invitePersonAgain,
  listMailbox,
  listPeople,
  type Person,
  readPerson,
} from '../../shared/contract/people.ts';
import { notFound } from '../http/api-error.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { MailboxCarrier } from '../mail/mailbox-carrier.ts';
import type { PeopleService } from './people-service.ts';
import type { PersonEntity } from './person-entity.ts';

export interface PeopleServices {
  readonly people: PeopleService;
  /** Null where a mail server takes the mail. */
  readonly mailbox: MailboxCarrier | null;
}

export function peopleEndpoints({ people, mailbox }: PeopleServices): Endpoint[] {
  return [
    endpoint(listPeople, 'administrator', async () => ({
      body: { people: (await people.list()).map(toPerson) },
    })),

    endpoint(findColleagues, 'signed-in', async () => ({
      body: {
        people: (await people.colleagues()).map(({ id, name, email }) => ({ id, name, email })),
      },
    })),

    endpoint(invitePerson, 'administrator', async (call) => {
      const person = await people.invite(call, call.body);
      return { body: toPerson(person), etag: person };
    }),

    endpoint(invitePersonAgain, 'administrator', async (call) => {
      await people.inviteAgain(call, call.params.personId);
      return { body: null };
    }),

    endpoint(readPerson, 'administrator', async (call) => {
      const person = await people.read(call.params.personId);
      return { body: toPerson(person), etag: person };
    }),

    endpoint(changePerson, 'administrator', async (call) => {
      const person = await people.change(call, call.params.personId, call.ifMatch, call.body);
      return { body: toPerson(person), etag: person };
    }),

    endpoint(endSessionsOfPerson, 'administrator', async (call) => {
      await people.endSessionsOf(call, call.params.personId);
      return { body: null };
    }),

    endpoint(listMailbox, 'administrator', async () => {
      if (mailbox === null) throw notFound();
      return { body: { mails: await mailbox.list() } };
    }),
  ];
}

function toPerson(person: PersonEntity): Person {
  const { id, name, email, administrator, state, createdAtMs, lastSignInAtMs } = person;
  return { id, name, email, administrator, state, createdAtMs, lastSignInAtMs };
}
