import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Revision } from '../../../shared/contract/revision.ts';
import { choiceWords } from '../../../shared/report/definition-words.ts';
import { Icon } from '../ui/icon.ts';
import { Moment } from '../ui/moment.ts';
import { StateChip } from '../ui/state-chip.ts';
import { StripCell, TitleStrip } from '../ui/title-strip.ts';

/** Title strip of a revision under review. */
@Component({
  selector: 'app-review-strip',
  imports: [Icon, Moment, StateChip, StripCell, TitleStrip],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-title-strip [reference]="definition().reference" [name]="name()">
    <app-strip-cell label="Title" [wide]="true" [strong]="true">{{
      definition().title
    }}</app-strip-cell>
    <app-strip-cell label="Topology">{{ topology() }}</app-strip-cell>
    <app-strip-cell label="Policy">{{ policy() }}</app-strip-cell>
    <app-strip-cell label="Part data">
      <span class="standing" [class.unverified]="unverified() > 0">
        <app-icon [name]="unverified() > 0 ? 'circle-alert' : 'badge-check'" />{{ partData() }}
      </span>
    </app-strip-cell>
    <app-strip-cell label="Revision" [strong]="true">{{ revision().letter }}</app-strip-cell>
    <app-strip-cell label="State"><app-state-chip [state]="revision().state" /></app-strip-cell>
    @if (moved(); as moved) {
      <app-strip-cell [label]="moved.label">
        {{ moved.by }}, <app-moment [atMs]="moved.atMs" />
      </app-strip-cell>
    }
  </app-title-strip>`,
  styles: `
    .standing {
      display: inline-flex;
      gap: 6px;
      align-items: center;
      color: var(--app-ok);
    }

    .unverified {
      color: var(--app-warn);
      font-weight: 600;
    }
  `,
})
export class ReviewStrip {
  readonly revision = input.required<Revision>();
  /** What the page does, for who hears the heading: "check of revision B". */
  readonly does = input.required<string>();

  protected readonly definition = computed(() => this.revision().definition);
  protected readonly name = computed(
    () => `${this.definition().title}, ${this.does()} revision ${this.revision().letter}`,
  );
  protected readonly topology = computed(() => choiceWords(this.definition().topology));
  protected readonly policy = computed(
    () => `${this.definition().policy.name}, v${this.revision().policyVersion}`,
  );
  protected readonly unverified = computed(
    () => this.revision().partStanding.filter(({ verified }) => !verified).length,
  );
  protected readonly partData = computed(() => {
    const parts = this.revision().partStanding.length;
    if (parts === 0) return 'Typed by hand';
    const count = this.unverified();
    return count === 0 ? 'Verified' : `${count} of ${parts} unverified`;
  });
  /** The last move of the revision that has a person and a time. */
  protected readonly moved = computed(() => {
    const { lock, checkedBy, checkedAtMs, submittedBy, submittedAtMs, state } = this.revision();
    if (lock !== null) return { label: 'Locked', by: lock.approver.name, atMs: lock.signedAtMs };
    if (checkedBy !== null && checkedAtMs !== null) {
      return { label: 'Checked', by: checkedBy.name, atMs: checkedAtMs };
    }
    if (state === 'draft' || submittedBy === null || submittedAtMs === null) {
      return { label: 'Saved', by: this.revision().designer.name, atMs: this.revision().savedAtMs };
    }
    return { label: 'Submitted', by: submittedBy.name, atMs: submittedAtMs };
  });
}
