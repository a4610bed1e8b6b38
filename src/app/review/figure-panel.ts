import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButtonToggleModule } from '@angular/material/button-toggle';
import type * as z from 'zod';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import { DIFFERENCE_NEEDS_REASON, type CheckMethod } from '../../../shared/contract/check.ts';
import { figureDifference } from '../../../shared/review/pass-conditions.ts';
import { formatNumber, formatPercent } from '../../../shared/units/engineering-notation.ts';
import { Icon } from '../ui/icon.ts';
import { CheckEditor } from './check-editor.ts';
import { DifferenceScale } from './difference-scale.ts';
import { PanelHead } from './panel-head.ts';

type Method = z.infer<typeof CheckMethod>;

const METHOD_WORDS: Record<Method, string> = { hand: 'By hand', bench: 'Bench reading' };

/** The checker's own overdrive factor beside the tool's, with how it was found and why it differs. */
@Component({
  selector: 'app-figure-panel',
  imports: [DifferenceScale, Icon, MatButtonToggleModule, PanelHead],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './figure-panel.html',
  styleUrl: './figure-panel.scss',
})
export class FigurePanel {
  protected readonly editor = inject(CheckEditor);

  readonly evaluation = input.required<Evaluation>();
  readonly editable = input.required<boolean>();

  protected readonly methods = Object.entries(METHOD_WORDS) as [Method, string][];
  protected readonly methodWords = METHOD_WORDS;
  protected readonly allowed = DIFFERENCE_NEEDS_REASON;
  /** A figure is judged when the field is left, not while it is typed. */
  protected readonly left = signal(false);
  protected readonly draft = this.editor.draft;
  protected readonly tool = computed(
    () => this.evaluation().criteria.find(({ id }) => id === 'overdrive-factor')?.value ?? null,
  );
  protected readonly difference = computed(() =>
    figureDifference(this.draft(), this.evaluation().criteria),
  );
  protected readonly differs = computed(() => {
    const difference = this.difference();
    return difference !== null && Math.abs(difference) > DIFFERENCE_NEEDS_REASON;
  });
  protected readonly differenceText = computed(() => {
    const difference = this.difference();
    return difference === null ? '' : formatPercent(Math.abs(difference), { digits: 2 });
  });
  protected readonly problem = computed(() => (this.left() ? this.editor.figure().problem : null));

  protected figureWords(): string {
    return formatNumber(this.draft().overdriveFactor, { digits: 4 });
  }

  protected textOf(event: Event): string {
    return (event.target as HTMLInputElement | HTMLTextAreaElement).value;
  }
}
