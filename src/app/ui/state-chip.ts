import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { STATE_WORDS, type RevisionState } from '../../../shared/review/revision-state.ts';
import { Icon } from './icon.ts';
import type { IconName } from './icon-outlines.ts';

const ICONS: Record<RevisionState, IconName> = {
  draft: 'pen',
  'in-check': 'search-check',
  checked: 'check-check',
  locked: 'lock',
  superseded: 'history',
  withdrawn: 'ban',
};

/** The state of a revision; the only pill there is. */
@Component({
  selector: 'app-state-chip',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-icon [name]="icon()" [size]="16" /><span>{{ word() }}</span>`,
  styleUrl: './state-chip.scss',
  host: { '[class]': 'state()' },
})
export class StateChip {
  readonly state = input.required<RevisionState>();

  protected readonly icon = computed(() => ICONS[this.state()]);
  protected readonly word = computed(() => STATE_WORDS[this.state()]);
}
