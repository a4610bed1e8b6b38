import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { PortVerdict } from '../../../shared/contract/project.ts';
import type { RevisionSummary } from '../../../shared/contract/stage.ts';
import { portSentence } from '../../../shared/report/port-sentence.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { Icon } from '../ui/icon.ts';
import { StateChip } from '../ui/state-chip.ts';
import { STATUS_ICONS, STATUS_WORDS } from '../ui/verdict-mark.ts';

/** At the foot of the sheet: cautions that go with every figure, and the stage's other revisions. */
@Component({
  selector: 'app-sheet-notes',
  imports: [Icon, RouterLink, StateChip],
  templateUrl: './sheet-notes.html',
  styleUrl: './sheet-notes.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetNotes {
  readonly stage = input.required<StageInput>();
  readonly revisions = input.required<readonly RevisionSummary[]>();
  readonly projectId = input.required<string>();
  readonly stageId = input.required<string>();
  readonly revisionId = input.required<string>();
  readonly unverified = input.required<boolean>();

  readonly port = input.required<PortVerdict | null>();

  protected readonly words = STATUS_WORDS;
  protected readonly icons = STATUS_ICONS;
  protected readonly portText = computed(() => {
    const port = this.port();
    return port === null ? '' : portSentence(port);
  });
  protected readonly newestFirst = computed(() => [...this.revisions()].reverse());
  protected readonly cautions = computed(() => [
    'Figures are no substitute for the current data sheet, measurement and a qualified person’s judgement.',
    'Mains, safety functions, medical, vehicles: the applicable standards and local codes govern, and a licensed practitioner decides.',
    ...(this.stage().load.kind === 'coil'
      ? ['Inductive loads store energy: the clamp decides what the transistor sees at turn-off.']
      : []),
    ...(this.unverified()
      ? ['Part data of this stage is unverified: nobody has read it back against a document yet.']
      : []),
  ]);
}
