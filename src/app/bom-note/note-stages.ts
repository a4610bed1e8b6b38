import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import type { NoteStage } from '../../../shared/contract/bom-note.ts';
import { StateChip } from '../ui/state-chip.ts';

/** The stages of the project: which of them the note takes, and why some cannot be taken. */
@Component({
  selector: 'app-note-stages',
  imports: [MatCheckbox, StateChip],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<ul>
    @for (stage of stages(); track stage.stageId) {
      <li>
        <mat-checkbox
          [checked]="stage.chosen"
          [disabled]="stage.reason !== null"
          (change)="toggled.emit(stage)"
        >
          <span class="mono">{{ stage.reference }} {{ stage.letter }}</span> {{ stage.title }}
        </mat-checkbox>
        <app-state-chip [state]="stage.state" />
        @if (stage.reason) {
          <p class="reason">{{ stage.reason }}</p>
        }
      </li>
    }
  </ul>`,
  styles: `
    :host {
      --mat-checkbox-disabled-label-color: var(--mat-sys-on-surface-variant);
    }

    ul {
      display: grid;
      padding: 0;
      list-style: none;
    }

    li {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto;
      align-items: center;
      gap: 0 8px;
      border-bottom: 1px solid var(--app-line);
    }

    .reason {
      grid-column: 1 / -1;
      padding-bottom: 6px;
    }
  `,
})
export class NoteStages {
  readonly stages = input.required<readonly NoteStage[]>();
  readonly toggled = output<NoteStage>();
}
