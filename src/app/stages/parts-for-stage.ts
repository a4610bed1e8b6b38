import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  resource,
  signal,
} from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { debounceTime, EMPTY, scan, startWith, switchMap } from 'rxjs';
import { listRecords, type LatestRecord } from '../../../shared/contract/part.ts';
import type { TransistorRecord } from '../../../shared/parts/transistor-record.ts';
import { rankParts, type JudgedPart } from '../../../shared/sizing/rank-parts.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';
import { ApiClient } from '../api/api-client.ts';
import { marginText } from '../ui/fixed-figure.ts';
import { Icon } from '../ui/icon.ts';
import { LoadState } from '../ui/load-state.ts';
import { MarginBar } from '../ui/margin-bar.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { VerdictMark } from '../ui/verdict-mark.ts';
import { judgedParts } from './part-ranking.ts';
import type { PickedPart } from './part-picker.ts';

type LibraryPart = LatestRecord & { readonly record: TransistorRecord };

interface Row extends JudgedPart {
  readonly key: string;
  readonly partNumber: string;
  readonly verified: boolean;
  readonly resistorText: string;
  readonly inUse: boolean;
}

/** A change of the stage is judged again once typing rests. */
const REST_MS = 300;

/** Which transistors of the library can do the stage: all of them judged in it, the widest worst margin first. */
@Component({
  selector: 'app-parts-for-stage',
  imports: [Icon, LoadState, MarginBar, MatButton, NgTemplateOutlet, SymbolText, VerdictMark],
  templateUrl: './parts-for-stage.html',
  styleUrl: './parts-for-stage.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartsForStage {
  readonly stage = input.required<StageInput>();
  readonly readOnly = input(false);
  readonly taken = output<PickedPart>();

  private readonly api = inject(ApiClient);
  protected readonly open = signal(false);
  /** What was judged so far, by part revision, and of which stage. */
  private readonly judged = signal<{
    readonly stage: StageInput | null;
    readonly parts: ReadonlyMap<string, JudgedPart>;
  }>({ stage: null, parts: new Map() });

  protected readonly library = resource({
    params: () => (this.open() ? true : undefined),
    loader: async (): Promise<readonly LibraryPart[]> => {
      const { value } = await this.api.send(listRecords, { query: { kind: 'transistor' } });
      return value.parts.filter((part): part is LibraryPart => part.record.kind === 'transistor');
    },
  });
  private readonly question = computed(() => {
    const parts = this.open() && this.library.hasValue() ? this.library.value() : [];
    return { stage: this.stage(), parts };
  });

  protected readonly stale = computed(() => this.judged().stage !== this.stage());
  protected readonly rows = computed<readonly Row[]>(() => {
    const { parts } = this.judged();
    const library = this.library.hasValue() ? this.library.value() : [];
    const inUse = this.stage().transistor.partNumber;
    const rows = library.flatMap(({ partRevisionId, record, verified }) => {
      const part = parts.get(partRevisionId);
      if (part === undefined) return [];
      const { partNumber } = record;
      const resistorText = resistorWords(part);
      const own = { key: partRevisionId, partNumber, verified, inUse: partNumber === inUse };
      return [{ ...part, ...own, resistorText }];
    });
    return rankParts(rows);
  });
  protected readonly standing = computed(() =>
    this.rows().filter(({ verdict }) => verdict !== null && verdict !== 'fail'),
  );
  protected readonly failing = computed(() =>
    this.rows().filter(({ verdict }) => verdict === 'fail'),
  );
  protected readonly unfit = computed(() => this.rows().filter(({ verdict }) => verdict === null));
  protected readonly progress = computed(() => {
    const total = this.library.hasValue() ? this.library.value().length : 0;
    const done = this.judged().parts.size;
    return done < total ? `${done} of ${total} judged` : `${total} parts judged`;
  });

  protected readonly margin = ({ margin }: Row) => marginText(margin);

  constructor() {
    toObservable(this.question)
      .pipe(
        debounceTime(REST_MS),
        switchMap(({ stage, parts }) => {
          if (parts.length === 0) return EMPTY;
          const asked = parts.map(({ partRevisionId: key, record }) => ({ key, record }));
          const none = { stage, parts: new Map<string, JudgedPart>() };
          return judgedParts({ stage, parts: asked }).pipe(
            scan(
              (sofar, { key, part }) => ({ stage, parts: new Map(sofar.parts).set(key, part) }),
              none,
            ),
            startWith(none),
          );
        }),
        takeUntilDestroyed(),
      )
      .subscribe((judged) => {
        this.judged.set(judged);
      });
  }

  protected take(row: Row): void {
    const { stage, key, verdict } = row;
    if (stage === null || verdict === null || this.stale() || this.readOnly()) return;
    const left = this.stage().baseResistor.valueOhm === null;
    const baseResistor = left ? this.stage().baseResistor : stage.baseResistor;
    this.taken.emit({ definition: { ...stage, baseResistor }, partRevisionId: key, choice: {} });
  }
}

function resistorWords({ baseResistorOhm, sized }: JudgedPart): string {
  if (baseResistorOhm === null) return '';
  if (baseResistorOhm === 0) return 'no RB';
  return sized ? `RB ${formatQuantity(baseResistorOhm, 'Ohm')}` : 'no RB fits';
}
