import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { CriterionStatus } from '../../../shared/checks/evaluation.ts';
import { Icon } from './icon.ts';
import type { IconName } from './icon-outlines.ts';

/** Word and icon of each status; colour comes on top of them. */
export const STATUS_WORDS: Record<CriterionStatus, string> = {
  pass: 'Pass',
  marginal: 'Marginal',
  fail: 'Fail',
  open: 'Open',
  stated: 'Stated',
};

/** Icon of each status, for a sentence that says the rest. */
export const STATUS_ICONS: Record<CriterionStatus, IconName> = {
  pass: 'circle-check',
  marginal: 'triangle',
  fail: 'octagon',
  open: 'circle-dashed',
  stated: 'info',
};

/** A verdict as icon, word and colour. */
@Component({
  selector: 'app-verdict-mark',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-icon [name]="icon()" [size]="layout() === 'large' ? 30 : 18" />
    <span>{{ word() }}</span>`,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 5px;
      vertical-align: middle;
      font-weight: 600;
      color: var(--mat-sys-on-surface-variant);
      white-space: nowrap;
    }

    :host(.stacked) {
      flex-direction: column;
      align-items: flex-start;
      gap: 3px;
      font-size: 12px;
      line-height: 16px;
    }

    :host(.large) {
      gap: 9px;
      font-size: 26px;
      line-height: 1.2;
    }

    :host(.pass) {
      color: var(--app-ok);
    }

    :host(.marginal) {
      color: var(--app-warn);
    }

    :host(.fail) {
      color: var(--app-fail);
    }

    :host(.open) {
      color: var(--app-info);
    }
  `,
  host: { '[class]': 'classes()' },
})
export class VerdictMark {
  readonly status = input.required<CriterionStatus>();
  /** `stacked`: icon over word, for the verdict list; `large`: the verdict of a sheet. */
  readonly layout = input<'row' | 'stacked' | 'large'>('row');

  protected readonly icon = computed(() => STATUS_ICONS[this.status()]);
  protected readonly word = computed(() => STATUS_WORDS[this.status()]);
  protected readonly classes = computed(() => `${this.status()} ${this.layout()}`);
}
