import { ChangeDetectionStrategy, Component, inject, resource, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import { createProject, listPolicies } from '../../../shared/contract/project.ts';
import { ApiClient } from '../api/api-client.ts';
import { toApiProblem } from '../api/api-problem.ts';
import { SessionStore } from '../session/session-store.ts';
import { LoadState } from '../ui/load-state.ts';
import { PageHeading } from '../ui/page-focus.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { problemToForm } from '../ui/problem-to-form.ts';
import { fieldError, schemaValidator } from '../ui/schema-validator.ts';

const fields = createProject.body.shape;

/** A new project; whoever creates it becomes its designer and manages it. */
@Component({
  selector: 'app-new-project',
  imports: [
    LoadState,
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    MatOption,
    MatSelect,
    PageHeading,
    ReactiveFormsModule,
    RouterLink,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './new-project.html',
})
export class NewProject {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);

  protected readonly form = inject(NonNullableFormBuilder).group({
    code: ['', schemaValidator(fields.code)],
    title: ['', schemaValidator(fields.title)],
    supplementaryTitle: [''],
    legalOwner: [
      inject(SessionStore).session()?.workspace ?? '',
      schemaValidator(fields.legalOwner),
    ],
    department: [''],
    policyId: ['', schemaValidator(fields.policyId)],
    unverifiedBlocksLock: [false],
  });
  protected readonly texts = [
    { key: 'code', label: 'Code', hint: 'Up to 12 capitals, digits or hyphens, such as CR-40' },
    { key: 'title', label: 'Title', hint: '' },
    { key: 'supplementaryTitle', label: 'Supplementary title', hint: 'May stay empty' },
    {
      key: 'legalOwner',
      label: 'Legal owner',
      hint: 'Stands in the title block of every document',
    },
    { key: 'department', label: 'Responsible department', hint: 'May stay empty' },
  ] as const;
  protected readonly policies = resource({
    loader: async () => {
      const { policies } = (await this.api.send(listPolicies)).value;
      this.form.controls.policyId.setValue(policies[0]?.id ?? '');
      return policies;
    },
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly busy = signal(false);
  protected readonly error = fieldError;

  constructor() {
    usePageTrail(() => [{ text: 'Projects', link: ['/projects'] }, { text: 'New project' }]);
  }

  protected async create(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    const { supplementaryTitle, department, ...rest } = this.form.getRawValue();
    try {
      const { value } = await this.api.send(createProject, {
        body: {
          ...rest,
          supplementaryTitle: emptyAsNull(supplementaryTitle),
          department: emptyAsNull(department),
        },
      });
      await this.router.navigate(['/p', value.id]);
    } catch (error) {
      this.problem.set(problemToForm(toApiProblem(error), this.form));
    } finally {
      this.busy.set(false);
    }
  }
}

function emptyAsNull(text: string): string | null {
  return text.trim() === '' ? null : text;
}
