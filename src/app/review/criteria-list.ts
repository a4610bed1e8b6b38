import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  model,
  output,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Criterion } from '../../../shared/checks/evaluation.ts';
import type { ReviewFinding } from '../../../shared/contract/check.ts';
import { cornerWords } from '../../../shared/report/corner-words.ts';
import { criterionName } from '../../../shared/report/criterion-name.ts';
import { Icon } from '../ui/icon.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { CheckEditor } from './check-editor.ts';
import { figureText, type FigureText } from './figure-text.ts';
import { PanelHead } from './panel-head.ts';

interface CriterionRow extends FigureText {
  readonly id: string;
  readonly name: string;
  readonly status: Criterion['status'];
  readonly corner: string;
  readonly read: boolean;
  readonly findings: number;
}

/** Every criterion with value, limit, margin and worst corner, to be ticked as read one by one. */
@Component({
  selector: 'app-criteria-list',
  imports: [Icon, PanelHead, RouterLink, SymbolText, VerdictMark],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './criteria-list.html',
  styleUrl: './criteria-list.scss',
})
export class CriteriaList {
  private readonly editor = inject(CheckEditor);

  readonly criteria = input.required<readonly Criterion[]>();
  readonly findings = input.required<readonly ReviewFinding[]>();
  /** Whether the person may tick. */
  readonly editable = input.required<boolean>();
  readonly selected = model<string | null>(null);
  readonly findingWanted = output<string>();

  protected readonly rows = computed(() => {
    const read = new Set(this.editor.draft().read);
    return this.criteria().map((criterion) =>
      this.row(criterion, read.has(criterion.id), this.findingsOf(criterion.id)),
    );
  });
  protected readonly readCount = computed(() => this.rows().filter(({ read }) => read).length);

  protected tick(id: string, event: Event): void {
    this.editor.tick(id, (event.target as HTMLInputElement).checked);
  }

  private findingsOf(id: string): number {
    return this.findings().filter(
      ({ subject }) => subject.kind === 'criterion' && subject.id === id,
    ).length;
  }

  private row(criterion: Criterion, read: boolean, findings: number): CriterionRow {
    const { id, status, corner } = criterion;
    const words = corner === null ? '' : cornerWords(corner, id);
    return {
      id,
      name: criterionName(id),
      status,
      ...figureText(criterion),
      corner: words,
      read,
      findings,
    };
  }
}
