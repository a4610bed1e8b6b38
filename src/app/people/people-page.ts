import { ChangeDetectionStrategy, Component, inject, resource, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatTableModule } from '@angular/material/table';
import {
  changePerson,
  endSessionsOfPerson,
  invitePersonAgain,
  listPeople,
  readPerson,
  type Person,
} from '../../../shared/contract/people.ts';
import type * as z from 'zod';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { SessionStore } from '../session/session-store.ts';
import { LoadState } from '../ui/load-state.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { dateAndTime } from '../ui/time-text.ts';
import { InvitePerson } from './invite-person.ts';

type Change = z.input<typeof changePerson.body>;

const STATES = { invited: 'Invited', active: 'Active', disabled: 'Disabled' } as const;

/** All accounts: invite, make administrator, disable, end sessions. Roles belong to the members of each project. */
@Component({
  selector: 'app-people-page',
  imports: [InvitePerson, LoadState, MatButton, MatTableModule, NotAllowed, PageHeading],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './people-page.html',
  styleUrl: './people-page.scss',
})
export class PeoplePage {
  private readonly api = inject(ApiClient);
  private readonly announcer = inject(StatusAnnouncer);

  protected readonly columns = ['name', 'email', 'state', 'lastSignIn', 'acts'] as const;
  protected readonly own = inject(SessionStore).person;
  protected readonly people = resource({
    loader: async () => (await this.api.send(listPeople)).value.people,
  });
  protected readonly message = signal<string | null>(null);
  protected readonly dateAndTime = dateAndTime;

  /** Nobody takes the administration from themselves: the server would be left without. */
  protected ownRefusal(person: Person): string | null {
    return person.id === this.own()?.id ? 'Another administrator can change your account.' : null;
  }

  protected stateWord(person: Person): string {
    return STATES[person.state];
  }

  protected add(person: Person): void {
    this.people.update((people) => [...(people ?? []), person]);
    this.tell(`${person.name} is invited; the link in the mail lives 24 h.`);
  }

  protected async change(person: Person, body: Change, done: string): Promise<void> {
    const params = { personId: person.id };
    try {
      const { etag } = await this.api.send(readPerson, { params });
      const { value } = await this.api.send(changePerson, { params, body, etag });
      this.people.update((people) => people?.map((each) => (each.id === value.id ? value : each)));
      this.tell(done);
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    }
  }

  protected async inviteAgain(person: Person): Promise<void> {
    try {
      await this.api.send(invitePersonAgain, { params: { personId: person.id } });
      this.tell(`A new link is on its way to ${person.email}; it lives 24 h.`);
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    }
  }

  protected async endSessions(person: Person): Promise<void> {
    try {
      await this.api.send(endSessionsOfPerson, { params: { personId: person.id } });
      this.tell(`Every session of ${person.name} has ended.`);
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    }
  }

  private tell(message: string): void {
    this.message.set(message);
    this.announcer.say(message);
  }
}
