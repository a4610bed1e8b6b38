import { computed, inject, Injectable, resource } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute } from '@angular/router';
import { map } from 'rxjs';
import type * as z from 'zod';
import {
  readProject,
  saveMembers,
  saveProject,
  type Project,
} from '../../../shared/contract/project.ts';
import { ApiClient, type Answer } from '../api/api-client.ts';

/** The project on show, for its page and all its tabs. */
@Injectable()
export class ProjectStore {
  private readonly api = inject(ApiClient);

  readonly projectId = toSignal(
    inject(ActivatedRoute).paramMap.pipe(map((params) => params.get('projectId') ?? undefined)),
  );
  readonly answer = resource<Answer<Project>, string | undefined>({
    params: () => this.projectId(),
    loader: ({ params: projectId }) => this.api.send(readProject, { params: { projectId } }),
  });
  readonly project = computed(() => (this.answer.hasValue() ? this.answer.value().value : null));

  /** @throws {ApiProblem} `version-conflict` when somebody saved in the meantime */
  async save(body: z.input<typeof saveProject.body>): Promise<void> {
    const { value, etag } = this.loaded();
    this.answer.set(
      await this.api.send(saveProject, { params: { projectId: value.id }, body, etag }),
    );
  }

  /** @throws {ApiProblem} `version-conflict` when somebody saved in the meantime */
  async saveMembers(members: z.input<typeof saveMembers.body>['members']): Promise<void> {
    const { value, etag } = this.loaded();
    this.answer.set(
      await this.api.send(saveMembers, {
        params: { projectId: value.id },
        body: { members },
        etag,
      }),
    );
  }

  private loaded(): Answer<Project> {
    const answer = this.answer.value();
    if (!answer) throw new Error('the project has not been loaded');
    return answer;
  }
}
