import { computed, inject, Injectable, resource, signal } from '@angular/core';
import { readRevision, type Revision } from '../../../shared/contract/revision.ts';
import type { Route } from '../../../shared/contract/route.ts';
import { ApiClient } from '../api/api-client.ts';

/** A route that answers with the revision it changed. */
type RevisionRoute = Route & { readonly reply: typeof readRevision.reply; readonly guarded: true };

interface Shown {
  readonly value: Revision;
  readonly etag: string;
}

interface ChangeRequest {
  readonly params?: Record<string, string>;
  readonly body?: unknown;
}

/** The revision under review with its ETag, and the one it was copied from. One per page. */
@Injectable()
export class ReviewStore {
  private readonly api = inject(ApiClient);
  private readonly id = signal<string | undefined>(undefined);

  readonly answer = resource({
    params: () => this.id(),
    loader: ({ params: revisionId }): Promise<Shown> =>
      this.api.send(readRevision, { params: { revisionId } }),
  });
  readonly revision = computed(() =>
    this.answer.hasValue() ? this.answer.value().value : undefined,
  );
  /** Changes run one after the other, so that each carries the ETag the one before it got. */
  private last: Promise<unknown> = Promise.resolve();

  /** The revision to compare with; without a value while there is none. */
  readonly previous = resource({
    params: () => this.revision()?.previous?.id,
    loader: async ({ params: revisionId }) =>
      (await this.api.send(readRevision, { params: { revisionId } })).value,
  });

  open(revisionId: string): void {
    this.id.set(revisionId);
  }

  /**
   * Changes the revision under its ETag and adopts the reply.
   *
   * @throws {ApiProblem} when refused; the revision on show stays as it is
   */
  change(route: RevisionRoute, request: ChangeRequest = {}): Promise<Revision> {
    const turn = this.last.then(() => this.send(route, request));
    this.last = turn.catch(() => undefined);
    return turn;
  }

  /** Takes what the server holds now, after somebody else changed it. */
  async refresh(): Promise<Revision> {
    const params = { revisionId: this.shown().value.id };
    const answer = await this.api.send(readRevision, { params });
    this.answer.set(answer);
    return answer.value;
  }

  private async send(route: RevisionRoute, { params, body }: ChangeRequest): Promise<Revision> {
    const { value, etag } = this.shown();
    const request = { params: { revisionId: value.id, ...params }, body, etag };
    const answer: Shown = await this.api.send<RevisionRoute>(route, request);
    this.answer.set(answer);
    return answer.value;
  }

  private shown(): Shown {
    if (!this.answer.hasValue()) throw new RangeError('no revision on show');
    return this.answer.value();
  }
}
