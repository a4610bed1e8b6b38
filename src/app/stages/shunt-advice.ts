import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { debounceTime, switchMap } from 'rxjs';
import { criterionInSentence } from '../../../shared/checks/criterion-in-sentence.ts';
import type { ShuntSizing } from '../../../shared/sizing/size-shunt.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { formatPercent, formatQuantity } from '../../../shared/units/engineering-notation.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { BrowserEngine } from './browser-engine.ts';

/** A change of the stage is sized once typing rests. */
const REST_MS = 300;

/** Below the field of RBE: the largest value that keeps the stage off and costs little drive. */
@Component({
  selector: 'app-shunt-advice',
  imports: [SymbolText],
  template: `
    @if (advice(); as text) {
      <p class="small"><app-symbol-text [text]="text" /></p>
      @if (better(); as valueOhm) {
        <button type="button" class="small" (click)="taken.emit(valueOhm)">Take it</button>
      }
    }
  `,
  styleUrl: './shunt-advice.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShuntAdvice {
  readonly stage = input.required<StageInput>();
  readonly readOnly = input(false);
  readonly taken = output<number>();

  private readonly engine = inject(BrowserEngine);
  private readonly sizing = toSignal(
    toObservable(this.stage).pipe(
      debounceTime(REST_MS),
      switchMap((stage) => this.engine.sizeShunt(stage)),
    ),
    { initialValue: null },
  );
  protected readonly advice = computed(() => {
    const sizing = this.sizing();
    return sizing === null ? '' : adviceText(sizing);
  });
  /** The recommended value where it is not the one fitted. */
  protected readonly better = computed(() => {
    const valueOhm = this.sizing()?.recommendedOhm ?? null;
    const fitted = this.stage().shuntResistor?.valueOhm ?? null;
    return this.readOnly() || valueOhm === fitted ? null : valueOhm;
  });
}

/** The recommendation with what sets it, or why there is none. */
export function adviceText(sizing: ShuntSizing): string {
  const { recommendedOhm, largestOhm, setBy, driveShare, floatingAssumed } = sizing;
  const by = setBy === null ? '' : `, set by ${criterionInSentence(setBy)}`;
  const pin = floatingAssumed ? ' with the pin floating' : '';
  if (largestOhm === null) return `No value keeps the stage off${pin}${by}.`;
  const value = formatQuantity(largestOhm, 'Ohm');
  if (recommendedOhm === null) {
    const share =
      driveShare === null || driveShare >= 1
        ? 'all the drive'
        : `${formatPercent(driveShare, { digits: 2 })} of the drive`;
    return `None recommended: off${pin} needs at most ${value}${by}, and that takes ${share}.`;
  }
  return `Recommended ${value}: the largest that keeps the stage off${pin}${by}.`;
}
