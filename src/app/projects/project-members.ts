import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  resource,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatOption, MatSelect, type MatSelectChange } from '@angular/material/select';
import { findColleagues } from '../../../shared/contract/people.ts';
import type { Member } from '../../../shared/contract/project.ts';
import { PROJECT_ROLES, type ProjectRole } from '../../../shared/review/revision-state.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { Icon } from '../ui/icon.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { projectTrail } from './project-trail.ts';
import { ProjectStore } from './project-store.ts';

const ROLE_TEXTS: Record<ProjectRole, string> = {
  designer: 'Sizes stages and submits them',
  checker: 'Verifies the overdrive margin, passes or returns',
  approver: 'Signs and locks',
  exporter: 'Issues BOM notes',
};

/** Who works on the project, in which roles. On one revision designer, checker and approver are three people. */
@Component({
  selector: 'app-project-members',
  imports: [Icon, MatButton, MatCheckbox, MatFormFieldModule, MatOption, MatSelect, NotAllowed],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './project-members.html',
  styleUrl: './project-members.scss',
})
export class ProjectMembers {
  private readonly api = inject(ApiClient);
  private readonly announcer = inject(StatusAnnouncer);
  private readonly store = inject(ProjectStore);

  protected readonly roles = PROJECT_ROLES;
  protected readonly roleTexts = ROLE_TEXTS;
  protected readonly project = this.store.project;
  protected readonly mayManage = computed(() => this.project()?.mayManage === true);
  protected readonly members = linkedSignal<readonly Member[]>(() => this.project()?.members ?? []);
  protected readonly message = signal<string | null>(null);

  private readonly people = resource({
    params: () => (this.mayManage() ? true : undefined),
    loader: async () => (await this.api.send(findColleagues)).value.people,
  });
  protected readonly others = computed(() => {
    const here = new Set(this.members().map((member) => member.person.id));
    return (this.people.hasValue() ? this.people.value() : []).filter(
      (person) => !here.has(person.id),
    );
  });
  protected readonly refusal = computed(() => {
    const without = this.members().find((member) => member.roles.length === 0);
    if (without) return `Give ${without.person.name} a role, or take the name off.`;
    return this.members() === this.project()?.members ? 'Nothing has been changed.' : null;
  });

  constructor() {
    usePageTrail(() => projectTrail(this.project(), 'Members'));
  }

  protected add(choice: MatSelectChange<string>): void {
    const person = this.others().find((each) => each.id === choice.value);
    if (person) {
      const { id, name } = person;
      this.members.update((members) => [...members, { person: { id, name }, roles: [] }]);
    }
    choice.source.value = undefined as never;
  }

  protected remove(personId: string): void {
    this.members.update((members) => members.filter((member) => member.person.id !== personId));
  }

  protected toggle(personId: string, role: ProjectRole): void {
    this.members.update((members) =>
      members.map((member) =>
        member.person.id === personId ? { ...member, roles: toggled(member.roles, role) } : member,
      ),
    );
  }

  protected async save(): Promise<void> {
    try {
      await this.store.saveMembers(
        this.members().map(({ person, roles }) => ({ personId: person.id, roles })),
      );
      this.tell('Saved.');
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    }
  }

  private tell(message: string): void {
    this.message.set(message);
    this.announcer.say(message);
  }
}

function toggled(roles: readonly ProjectRole[], role: ProjectRole): ProjectRole[] {
  return PROJECT_ROLES.filter((each) => roles.includes(each) !== (each === role));
}
