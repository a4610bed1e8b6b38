import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Icon } from '../ui/icon.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';

/** A SHA-256 in eight groups of eight, to be compared by eye, with a copy button. */
@Component({
  selector: 'app-hash-block',
  imports: [Icon],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<div class="head">
      <span class="small">SHA-256 over definition, part snapshot, result, engine</span>
      <button type="button" aria-label="Copy the hash" (click)="copy()">
        <app-icon name="copy" />
      </button>
    </div>
    <p class="groups">
      @for (group of groups(); track $index) {
        <span class="mono">{{ group }}</span>
      }
    </p>
    <ng-content />`,
  styles: `
    :host {
      display: block;
      padding: 12px 16px;
      border: 1px solid var(--mat-sys-outline-variant);
      border-radius: var(--app-radius-field);
      background: var(--app-paper);
    }

    .head {
      display: flex;
      gap: 8px;
      align-items: center;
      justify-content: space-between;
    }

    button {
      display: grid;
      place-items: center;
      width: 28px;
      height: 28px;
      border: 0;
      border-radius: var(--app-radius-field);
      background: none;
      color: var(--mat-sys-on-surface-variant);
      cursor: pointer;

      &:hover {
        background: var(--app-raised);
      }
    }

    .groups {
      display: grid;
      grid-template-columns: repeat(auto-fill, minmax(68px, 1fr));
      gap: 4px 8px;
      margin-block: 4px;
    }
  `,
})
export class HashBlock {
  private readonly clipboard = inject(Clipboard);
  private readonly announcer = inject(StatusAnnouncer);

  /** 64 hexadecimal digits. */
  readonly hash = input.required<string>();

  protected readonly groups = computed(() => this.hash().match(/.{1,8}/g) ?? []);

  protected copy(): void {
    const copied = this.clipboard.copy(this.hash());
    this.announcer.say(copied ? 'Hash copied' : 'The browser did not let the hash be copied');
  }
}
