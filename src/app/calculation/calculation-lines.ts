import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { lineText } from '../../../shared/report/calculation-text.ts';
import type { SheetLine } from '../../../shared/report/calculation/worksheet.ts';
import { FormulaText } from '../ui/formula-text.ts';
import { Icon } from '../ui/icon.ts';
import { SymbolText } from '../ui/symbol-text.ts';

/** Worked lines as a table: figure, formula with the numbers put in, result, and where each number comes from. */
@Component({
  selector: 'app-calculation-lines',
  imports: [FormulaText, Icon, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './calculation-lines.html',
  styleUrl: './calculation-lines.scss',
})
export class CalculationLines {
  readonly lines = input.required<readonly SheetLine[]>();
  /** Id of the heading the table belongs to. */
  readonly headingId = input.required<string>();

  protected readonly rows = computed(() => this.lines().map(lineText));
}
