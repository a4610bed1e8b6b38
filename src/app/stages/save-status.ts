import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { Icon } from '../ui/icon.ts';
import type { IconName } from '../ui/icon-outlines.ts';
import type { SaveState } from './save-queue.ts';

interface Standing {
  readonly icon: IconName;
  readonly text: string;
  readonly time: string;
}

/** Where the draft stands, truthfully: saved and when, saving, not saved and why. */
@Component({
  selector: 'app-save-status',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<span class="line" role="status">
      <app-icon [name]="standing().icon" [size]="16" />
      <span>{{ standing().text }}</span>&ngsp;
      @if (standing().time) {
        <span class="mono">{{ standing().time }}</span>
      }
    </span>
    @if (state().kind === 'conflict') {
      <button type="button" (click)="resolveAsked.emit()">Resolve</button>
    }`,
  styles: `
    :host {
      display: flex;
      align-items: center;
      gap: 8px;
    }

    .line {
      display: inline-flex;
      align-items: center;
      gap: 5px;
      white-space: nowrap;
    }

    :host(.unsaved) .line {
      color: var(--app-fail);
      white-space: normal;
    }

    button {
      min-height: 24px;
      padding: 0 8px;
      border: 1px solid var(--mat-sys-outline);
      border-radius: 6px;
      background: var(--app-paper);
      font-weight: 600;
      cursor: pointer;
    }
  `,
  host: { '[class.unsaved]': 'unsaved()' },
})
export class SaveStatus {
  readonly state = input.required<SaveState>();
  /** Fields that keep the draft from being saved. */
  readonly faulty = input(0);
  readonly resolveAsked = output();

  protected readonly unsaved = computed(
    () => this.faulty() > 0 || ['retrying', 'conflict', 'refused'].includes(this.state().kind),
  );
  protected readonly standing = computed<Standing>(() => {
    if (this.faulty() > 0) {
      const fields = this.faulty() === 1 ? '1 field' : `${this.faulty()} fields`;
      return { icon: 'cloud-off', text: `Not saved: ${fields} to correct`, time: '' };
    }
    const state = this.state();
    switch (state.kind) {
      case 'saved':
        return { icon: 'cloud-check', text: 'Saved', time: clock(state.atMs) };
      case 'waiting':
        return { icon: 'wait', text: 'Changed', time: '' };
      case 'saving':
        return { icon: 'wait', text: 'Saving', time: '' };
      case 'retrying':
        return { icon: 'cloud-off', text: 'Not saved, retrying', time: '' };
      case 'conflict':
        return { icon: 'cloud-off', text: 'Not saved: changed by somebody else', time: '' };
      case 'refused':
        return { icon: 'cloud-off', text: `Not saved: ${state.problem.detail}`, time: '' };
    }
  });
}

/** `14:02:11` in the viewer's zone. */
function clock(atMs: number): string {
  return atMs === 0 ? '' : new Intl.DateTimeFormat('en-GB', { timeStyle: 'medium' }).format(atMs);
}
