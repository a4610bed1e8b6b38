import { computed, inject, Injectable, resource, signal } from '@angular/core';
import {
  readPart,
  readPartRevision,
  verifyPart,
  type Part,
} from '../../../shared/contract/part.ts';
import { ApiClient } from '../api/api-client.ts';

interface Shown {
  readonly value: Part;
  readonly etag: string;
}

/** A part with all its revisions, and the one revision that is looked at. One per page. */
@Injectable()
export class PartStore {
  private readonly api = inject(ApiClient);
  private readonly id = signal<string | undefined>(undefined);
  private readonly revisionId = signal<string | undefined>(undefined);

  readonly answer = resource({
    params: () => this.id(),
    loader: ({ params: partId }): Promise<Shown> => this.api.send(readPart, { params: { partId } }),
  });
  readonly part = computed(() => (this.answer.hasValue() ? this.answer.value().value : undefined));
  readonly etag = computed(() => (this.answer.hasValue() ? this.answer.value().etag : ''));

  /** An earlier revision, when the address asks for one. */
  readonly earlier = resource({
    params: () => {
      const wanted = this.revisionId();
      return wanted === undefined || wanted === this.part()?.latest.id ? undefined : wanted;
    },
    loader: async ({ params: partRevisionId }) =>
      (await this.api.send(readPartRevision, { params: { partRevisionId } })).value,
  });

  open(partId: string, revisionId: string | undefined): void {
    this.id.set(partId);
    this.revisionId.set(revisionId);
  }

  /** @throws {ApiProblem} when refused */
  async verify(partRevisionId: string, document: string, note: string): Promise<void> {
    const request = { params: { partRevisionId }, body: { document, note } };
    this.answer.set(await this.api.send(verifyPart, request));
  }
}
