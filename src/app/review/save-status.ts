import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../ui/icon.ts';
import { Moment } from '../ui/moment.ts';
import { CheckEditor } from './check-editor.ts';

/** Whether the server has what the checker entered; and the way on when somebody else saved first. */
@Component({
  selector: 'app-save-status',
  imports: [Icon, MatButton, Moment],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (editor.conflict()) {
      <div class="conflict" role="alert">
        <app-icon name="circle-alert" />
        <p>
          Somebody else changed this revision in the meantime. Nothing you entered is lost: it stays
          on this page until it is saved.
        </p>
        <button matButton="outlined" type="button" (click)="merge()">
          Load the newer version and save mine on top
        </button>
      </div>
    } @else {
      <span class="status small" role="status">
        @if (editor.problem(); as problem) {
          <app-icon name="cloud-off" [size]="16" />
          <span>{{
            problem.code === 'unreachable' ? 'Not saved, retrying' : 'Not saved: ' + problem.detail
          }}</span>
        } @else if (editor.saving() || editor.unsent()) {
          <app-icon name="refresh" [size]="16" /><span>Saving</span>
        } @else if (!editor.figure().ok) {
          <app-icon name="cloud-off" [size]="16" /><span
            >My figure is not saved: it is not understood</span
          >
        } @else if (editor.savedAtMs(); as savedAtMs) {
          <app-icon name="cloud-check" [size]="16" />
          <span>Saved <app-moment [atMs]="savedAtMs" form="clock" /></span>
        }
      </span>
    }`,
  styles: `
    :host {
      display: contents;
    }

    .status {
      display: inline-flex;
      gap: 6px;
      align-items: center;
    }

    .conflict {
      display: flex;
      flex-basis: 100%;
      flex-wrap: wrap;
      gap: 8px 12px;
      align-items: center;
      padding: 8px 12px;
      border-radius: var(--app-radius-field);
      background: var(--app-warn-container);
      color: var(--app-on-warn-container);

      p {
        flex: 1 1 240px;
      }
    }
  `,
})
export class SaveStatus {
  protected readonly editor = inject(CheckEditor);

  protected merge(): void {
    void this.editor.mergeAndSave();
  }
}
