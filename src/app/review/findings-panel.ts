import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  input,
  model,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { Revision } from '../../../shared/contract/revision.ts';
import { Icon } from '../ui/icon.ts';
import { FindingCard } from './finding-card.ts';
import { FindingForm } from './finding-form.ts';
import { PanelHead } from './panel-head.ts';

/** The findings of a revision, and the form that raises the next one. */
@Component({
  selector: 'app-findings-panel',
  imports: [FindingCard, FindingForm, Icon, MatButton, PanelHead],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-panel-head heading="Findings" headingId="findings-heading" icon="message">
      @if (revision().may.check.allowed && !raising()) {
        <button matButton type="button" class="new" (click)="raising.set(true)">
          <app-icon name="plus" [size]="16" />New finding
        </button>
      }
    </app-panel-head>
    <div class="body">
      @if (raising()) {
        <app-finding-form [revision]="revision()" [about]="about()" (done)="finish()" />
      }
      @for (finding of revision().findings; track finding.id) {
        <app-finding-card
          [finding]="finding"
          [revision]="revision()"
          [focused]="finding.id === focused()"
        />
      } @empty {
        @if (!raising()) {
          <p class="small">No finding has been raised.</p>
        }
      }
    </div>`,
  styles: `
    .new {
      margin-left: auto;
    }

    .body {
      display: grid;
      gap: 10px;
      padding: 12px 20px;
    }
  `,
})
export class FindingsPanel {
  readonly revision = input.required<Revision>();
  /** Criterion chosen in the list; its findings stand in focus. */
  readonly selected = input<string | null>(null);
  /** Criterion a new finding is to be about; set to open the form. */
  readonly about = model<string | null>(null);

  protected readonly raising = signal(false);
  /** The finding that waits: of the chosen criterion, else the last one still to be dealt with. */
  protected readonly focused = computed(() => {
    const { findings } = this.revision();
    const chosen = findings.find(({ subject }) => subject.id === this.selected());
    return (chosen ?? findings.findLast(({ state }) => state !== 'closed'))?.id ?? null;
  });

  constructor() {
    effect(() => {
      if (this.about() !== null) this.raising.set(true);
    });
  }

  protected finish(): void {
    this.raising.set(false);
    this.about.set(null);
  }
}
