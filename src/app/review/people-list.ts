import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Revision } from '../../../shared/contract/revision.ts';
import { SessionStore } from '../session/session-store.ts';
import { Moment } from '../ui/moment.ts';

/** The three people of a revision, with when each of them acted. */
@Component({
  selector: 'app-people-list',
  imports: [Moment],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<dl>
    @for (person of people(); track person.role) {
      <div>
        <dt>{{ person.role }}</dt>
        <dd class="name">{{ person.name }}</dd>
        <dd class="small">
          @if (person.atMs; as atMs) {
            <app-moment [atMs]="atMs" form="long" />
          } @else {
            {{ person.remark }}
          }
        </dd>
      </div>
    }
  </dl>`,
  styles: `
    div {
      display: grid;
      grid-template-columns: 76px minmax(0, 1fr) auto;
      gap: 4px;
      align-items: center;
      min-height: 32px;
      padding-inline: 4px;
      border-bottom: 1px solid var(--app-line);
    }

    div:last-child {
      border-bottom: 0;
    }

    dt {
      color: var(--mat-sys-on-surface-variant);
    }

    .name {
      font-weight: 600;
    }
  `,
})
export class PeopleList {
  private readonly session = inject(SessionStore);

  readonly revision = input.required<Revision>();

  protected readonly people = computed(() => {
    const { designer, submittedBy, submittedAtMs, checkedBy, checkedAtMs, lock } = this.revision();
    return [
      this.row('Designer', submittedBy ?? designer, submittedAtMs, 'not submitted'),
      this.row('Checker', checkedBy, checkedAtMs, 'not checked'),
      lock === null
        ? this.row('Approver', this.approver(), null, 'three different people')
        : this.row('Approver', lock.approver, lock.signedAtMs, ''),
    ];
  });

  /** Whoever may sign is the approver to be. */
  private approver() {
    return this.revision().may.lock.allowed ? this.session.person() : null;
  }

  private row(
    role: string,
    person: { readonly id: string; readonly name: string } | null,
    atMs: number | null,
    remark: string,
  ) {
    const you = person !== null && person.id === this.session.person()?.id ? ', you' : '';
    return { role, name: person === null ? 'nobody yet' : person.name + you, atMs, remark };
  }
}
