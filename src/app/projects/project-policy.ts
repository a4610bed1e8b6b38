import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  resource,
  signal,
} from '@angular/core';
import { FormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelect, MatOption } from '@angular/material/select';
import { MatCheckbox } from '@angular/material/checkbox';
import { listPolicies } from '../../../shared/contract/project.ts';
import type { PolicyLimits } from '../../../shared/stage/policy.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { NotAllowed } from '../ui/not-allowed.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { limitText, POLICY_LIMITS } from '../ui/policy-limits.ts';
import { projectTrail } from './project-trail.ts';
import { ProjectStore } from './project-store.ts';

/** The limits a project has adopted; whoever manages it can adopt another released version. */
@Component({
  selector: 'app-project-policy',
  imports: [
    FormsModule,
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatOption,
    MatSelect,
    NotAllowed,
    SymbolText,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './project-policy.html',
  styleUrl: './project-policy.scss',
})
export class ProjectPolicy {
  private readonly api = inject(ApiClient);
  private readonly announcer = inject(StatusAnnouncer);
  private readonly store = inject(ProjectStore);

  protected readonly project = this.store.project;
  protected readonly policies = resource({
    loader: async () => (await this.api.send(listPolicies)).value.policies,
  });
  protected readonly policyId = linkedSignal(() => this.project()?.policy.id ?? '');
  protected readonly blocks = linkedSignal(() => this.project()?.unverifiedBlocksLock ?? false);
  protected readonly message = signal<string | null>(null);

  /** The adopted limits beside those looked at. */
  protected readonly lines = computed(() => {
    const adopted = this.project()?.policy.limits;
    const policies = this.policies.hasValue() ? this.policies.value() : [];
    const looked = policies.find((policy) => policy.id === this.policyId())?.limits ?? adopted;
    if (!adopted || !looked) return [];
    return (Object.keys(POLICY_LIMITS) as (keyof PolicyLimits)[]).map((key) => ({
      key,
      name: POLICY_LIMITS[key].name,
      adopted: limitText(key, adopted[key]),
      looked: limitText(key, looked[key]),
    }));
  });
  protected readonly other = computed(() => this.policyId() !== this.project()?.policy.id);
  protected readonly refusal = computed(() => {
    const project = this.project();
    if (project?.mayManage !== true) return 'Only who manages the project changes its policy.';
    return this.other() || this.blocks() !== project.unverifiedBlocksLock
      ? null
      : 'This policy is adopted already.';
  });

  constructor() {
    usePageTrail(() => projectTrail(this.project(), 'Policy'));
  }

  protected async adopt(): Promise<void> {
    const project = this.project();
    if (!project) return;
    const { code, title, supplementaryTitle, legalOwner, department } = project;
    try {
      await this.store.save({
        code,
        title,
        supplementaryTitle,
        legalOwner,
        department,
        policyId: this.policyId(),
        unverifiedBlocksLock: this.blocks(),
      });
      this.tell('Adopted. Every draft has been evaluated again.');
    } catch (error) {
      this.tell(toApiProblem(error).detail);
    }
  }

  private tell(message: string): void {
    this.message.set(message);
    this.announcer.say(message);
  }
}
