import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { IssuedNoteRow } from '../../../shared/contract/bom-note.ts';
import { Moment } from '../ui/moment.ts';
import { counted } from '../ui/time-text.ts';

/** The issued notes of a project, newest first. */
@Component({
  selector: 'app-issued-notes',
  imports: [Moment, RouterLink],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `@if (notes().length === 0) {
      <p class="small">No note has been issued yet.</p>
    }
    <ul>
      @for (note of notes(); track note.id) {
        <li>
          <a class="mono" [routerLink]="['/p', projectId(), 'bom-note', note.id]">{{
            note.identification
          }}</a>
          <p class="small">
            <app-moment [atMs]="note.issuedAtMs" form="long" />, {{ note.issuedBy }}.
            {{ counted(note.stages, 'stage') }}, {{ counted(note.lines, 'line') }}
          </p>
        </li>
      }
    </ul>`,
  styles: `
    ul {
      display: grid;
      padding: 0;
      list-style: none;
    }

    li {
      padding: 8px 0;
      border-bottom: 1px solid var(--app-line);
    }
  `,
})
export class IssuedNotes {
  readonly projectId = input.required<string>();
  readonly notes = input.required<readonly IssuedNoteRow[]>();

  protected readonly counted = counted;
}
