import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { usePageTrail } from '../ui/page-title.ts';
import { LockEvidence } from './lock-evidence.ts';
import { PeopleList } from './people-list.ts';
import { ReviewStore } from './review-store.ts';
import { ReviewStrip } from './review-strip.ts';
import { reviewTrail } from './review-trail.ts';
import { SignatureBlock } from './signature-block.ts';
import { SignatureForm } from './signature-form.ts';

/** Approval of a checked revision: the evidence, and the signature that locks it. */
@Component({
  selector: 'app-lock-page',
  imports: [
    Icon,
    LoadState,
    LockEvidence,
    PeopleList,
    ReviewStrip,
    RouterLink,
    SignatureBlock,
    SignatureForm,
  ],
  providers: [ReviewStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './lock-page.html',
  styleUrl: './lock-page.scss',
  host: { class: 'page' },
})
export class LockPage {
  private readonly store = inject(ReviewStore);

  readonly revisionId = input.required<string>();

  protected readonly answer = this.store.answer;
  protected readonly revision = this.store.revision;
  protected readonly checkLink = computed(() => {
    const revision = this.revision();
    if (revision === undefined) return [];
    return ['/p', revision.projectId, 's', revision.stageId, 'r', revision.id, 'check'];
  });

  constructor() {
    usePageTrail(() => reviewTrail(this.revision(), 'Approve'));
    effect(() => {
      this.store.open(this.revisionId());
    });
  }
}
