import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatButtonToggleModule } from '@angular/material/button-toggle';
import { scan } from 'rxjs';
import type { Evaluation } from '../../../../shared/checks/evaluation.ts';
import { LARGEST_SEED, type SampleSpread } from '../../../../shared/statistics/monte-carlo.ts';
import type { Sensitivity } from '../../../../shared/statistics/sensitivity.ts';
import { SPREAD_FIGURES, type SpreadFigure } from '../../../../shared/statistics/spread-figures.ts';
import type { StageInput } from '../../../../shared/stage/stage-input.ts';
import { formatQuantity } from '../../../../shared/units/engineering-notation.ts';
import { Chart } from '../../charts/chart.ts';
import { criterionInSentence } from '../../../../shared/checks/criterion-in-sentence.ts';
import { fixedFigure } from '../../ui/fixed-figure.ts';
import { SymbolText } from '../../ui/symbol-text.ts';
import { BrowserSampler } from './browser-sampler.ts';
import { FIGURE_WORDS, PERCENTILE_WORDS, sensitivityChart, spreadChart } from './spread-charts.ts';
import { samplings, type Sampling, type SpreadTask } from './spread-stream.ts';

/** How many samples may be asked for; the first is what the sheet draws by itself. */
const SAMPLES = [100_000, 1_000_000, 10_000] as const;
const FIRST_SEED = 1;

/** What the panel shows: the last whole spread, while the next one is on its way. */
interface Shown {
  readonly spread: SampleSpread | null;
  readonly sensitivity: Sensitivity | null;
  /** Share of the samples judged; null when nothing runs. */
  readonly progress: number | null;
}

/** Monte-Carlo and sensitivity of the stage on the sheet; both trail the edits. */
@Component({
  selector: 'app-spread-panel',
  imports: [Chart, MatButtonToggleModule, SymbolText],
  providers: [BrowserSampler],
  templateUrl: './spread-panel.html',
  styleUrl: './spread-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpreadPanel {
  readonly stage = input.required<StageInput>();
  readonly evaluation = input.required<Evaluation>();

  protected readonly figures = SPREAD_FIGURES.map((key) => ({ key, ...FIGURE_WORDS[key] }));
  protected readonly figure = signal<SpreadFigure>('overdriveFactor');
  protected readonly choices = [...SAMPLES].sort((a, b) => a - b);
  protected readonly samples = signal<number>(SAMPLES[0]);
  protected readonly seed = signal(FIRST_SEED);
  /** Set by the button; the next change of anything starts again. */
  protected readonly stopped = signal<SpreadTask | null>(null);

  private readonly inUseOhm = computed(
    () => this.stage().baseResistor.valueOhm ?? this.evaluation().baseResistorOhm,
  );
  private readonly task = computed<SpreadTask>(() => {
    const stage = this.stage();
    const baseResistor = { ...stage.baseResistor, valueOhm: this.inUseOhm() };
    return {
      input: { ...stage, baseResistor },
      request: { samples: this.samples(), seed: this.seed() },
    };
  });
  private readonly wanted = computed(() => {
    const task = this.task();
    return this.stopped() === task ? null : task;
  });
  protected readonly shown = toSignal(
    samplings(toObservable(this.wanted), inject(BrowserSampler)).pipe(
      scan(nextShown, NOTHING),
      takeUntilDestroyed(),
    ),
    { initialValue: NOTHING },
  );

  protected readonly words = computed(() => FIGURE_WORDS[this.figure()]);
  protected readonly criterion = computed(() =>
    this.evaluation().criteria.find(({ id }) => id === this.words().criterion),
  );
  protected readonly chart = computed(() => {
    const { spread } = this.shown();
    return spread === null ? null : spreadChart(spread, this.figure(), this.criterion());
  });
  protected readonly bars = computed(() => {
    const { sensitivity } = this.shown();
    return sensitivity === null ? null : sensitivityChart(sensitivity, this.figure());
  });
  protected readonly percentiles = computed(() => {
    const values = this.shown().spread?.percentiles[this.figure()] ?? [];
    const { unit } = this.words();
    return PERCENTILE_WORDS.map((name, k) => ({
      name,
      text: formatQuantity(values[k] ?? null, unit, { digits: 3, pad: true }),
    }));
  });
  protected readonly yieldText = computed(() => {
    const share = this.shown().spread?.yield ?? null;
    return share === null ? null : `${sharePercent(share)}\u00a0%`;
  });
  /** The criteria missed most, at most three. */
  protected readonly missed = computed(() =>
    Object.entries(this.shown().spread?.missed ?? {})
      .sort(([, a], [, b]) => b - a)
      .slice(0, 3)
      .map(([id, share]) => `${criterionInSentence(id)} ${sharePercent(share)}\u00a0%`),
  );
  protected readonly progressText = computed(() => {
    const { progress } = this.shown();
    return progress === null ? '' : `Judging samples, ${fixedFigure(progress, 0, 100)}\u00a0%`;
  });

  protected grouped(count: number): string {
    return String(count).replace(/\B(?=(\d{3})+$)/g, '\u00a0');
  }

  /** Takes a seed that was typed; what is none leaves the old one standing. */
  protected takeSeed(field: HTMLInputElement): void {
    const text = field.value.trim();
    const seed = /^\d{1,16}$/.test(text) ? Number(text) : NaN;
    if (seed <= LARGEST_SEED) this.seed.set(seed);
    field.value = String(this.seed());
  }

  protected stop(): void {
    this.stopped.set(this.task());
  }

  protected restart(): void {
    this.stopped.set(null);
  }
}

const NOTHING: Shown = { spread: null, sensitivity: null, progress: null };

function nextShown(before: Shown, sampling: Sampling | null): Shown {
  if (sampling === null) return { ...before, progress: null };
  const { task, report } = sampling;
  if (report === null) return { ...before, progress: 0 };
  const { spread, sensitivity, samples } = report;
  return spread === null
    ? { ...before, sensitivity, progress: samples / task.request.samples }
    : { spread, sensitivity, progress: null };
}

/** As many decimals as tell a share from nothing and from all, up to four. */
function sharePercent(share: number): string {
  const rest = Math.min(share, 1 - share);
  const decimals = rest <= 0 ? 0 : Math.min(4, Math.max(1, 1 - Math.floor(Math.log10(rest * 100))));
  return fixedFigure(share, decimals, 100);
}
