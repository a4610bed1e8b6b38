import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, input, signal } from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import type { Evaluation } from '../../../../shared/checks/evaluation.ts';
import {
  leastMargins,
  marginOverTemperature,
  type MarginsAtTemperature,
} from '../../../../shared/checks/margin-over-temperature.ts';
import { curvesAtCorner, saturationAtCorner } from '../../../../shared/checks/stage-curves.ts';
import type { BaseDrive } from '../../../../shared/physics/device-model.ts';
import type { StageInput } from '../../../../shared/stage/stage-input.ts';
import { Chart } from '../../charts/chart.ts';
import { SymbolText } from '../../ui/symbol-text.ts';
import { TabStrip, type Tab } from '../../ui/tab-strip.ts';
import { SpreadPanel } from '../spread/spread-panel.ts';
import { hasFigures, judgedStage, shownCorner } from '../shown-corner.ts';
import { afterPaint } from './after-paint.ts';
import { marginChart, marginCount } from './margin-chart.ts';
import { kneeChart, outputChart, outputWords } from './output-charts.ts';
import { gainOfStage, gainOverTemperatureOfStage, saturationOfStage } from './part-charts.ts';

const TABS: readonly Tab[] = [
  { key: 'output', text: 'Output curves' },
  { key: 'saturation', text: 'VCE(sat)' },
  { key: 'gain', text: 'Gain' },
  { key: 'temperature', text: 'Temperature' },
  { key: 'spread', text: 'Spread' },
];

/** Margins over temperature are followed for so many criteria, those with the least. */
const FOLLOWED = 3;

/** What was on the sheet when the charts were last drawn. */
interface Drawn {
  readonly stage: StageInput;
  readonly evaluation: Evaluation;
  readonly at: string;
}

/**
 * The curves of a stage at the corner on show, and the spread of its samples. They follow the verdicts: a change is drawn once the frame with its verdicts
 * is on the screen, and of several changes in between only the last.
 */
@Component({
  selector: 'app-curves-panel',
  imports: [
    Chart,
    MatButtonToggle,
    MatButtonToggleGroup,
    NgTemplateOutlet,
    SpreadPanel,
    SymbolText,
    TabStrip,
  ],
  templateUrl: './curves-panel.html',
  styleUrl: './curves-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CurvesPanel {
  readonly stage = input.required<StageInput>();
  readonly evaluation = input.required<Evaluation>();
  /** The criterion whose worst corner is shown, or `nominal`. */
  readonly at = input.required<string>();

  private readonly drawn = signal<Drawn | null>(null);
  private readonly margins = signal<readonly MarginsAtTemperature[]>([]);

  protected readonly tabs = TABS;
  protected readonly tab = signal('output');
  protected readonly held = signal<BaseDrive['kind']>('current');

  private readonly curves = computed(() => {
    const drawn = this.drawn();
    if (drawn === null || !hasFigures(drawn.stage, drawn.evaluation)) return null;
    return curvesAtCorner(drawn.stage, shownCorner(drawn.evaluation, drawn.at));
  });
  private readonly saturation = computed(() => {
    const curves = this.curves();
    return curves === null ? null : saturationAtCorner(curves);
  });
  protected readonly waiting = computed(() => this.drawn() === null);
  protected readonly output = computed(() => {
    const curves = this.curves();
    if (curves === null) return null;
    return {
      chart: outputChart(curves, this.held()),
      knee: kneeChart(curves, this.saturation()),
      words: outputWords(curves),
    };
  });
  protected readonly saturationChart = computed(() => {
    const [curves, saturation] = [this.curves(), this.saturation()];
    if (curves === null || saturation === null) return null;
    const criteria = this.drawn()?.evaluation.criteria ?? [];
    const budget = criteria.find(({ id }) => id === 'saturation-voltage')?.limit ?? null;
    return saturationOfStage(curves, saturation, budget);
  });
  protected readonly gain = computed(() => {
    const curves = this.curves();
    if (curves === null) return null;
    const [overCurrent, overTemperature] = [
      gainOfStage(curves),
      gainOverTemperatureOfStage(curves),
    ];
    return overCurrent === null || overTemperature === null
      ? null
      : { overCurrent, overTemperature };
  });
  private readonly followed = computed(() =>
    leastMargins(this.drawn()?.evaluation.criteria ?? [], FOLLOWED).map(({ id }) => id),
  );
  protected readonly temperature = computed(() => {
    const [points, drawn] = [this.margins(), this.drawn()];
    if (points.length === 0 || drawn === null) return null;
    const { criteria } = drawn.evaluation;
    const judged = criteria.filter(({ margin }) => margin !== null).length;
    return {
      chart: marginChart(points, this.followed(), drawn.stage.policy.marginalBand),
      count: marginCount(this.followed().length, judged),
    };
  });

  constructor() {
    effect((onCleanup) => {
      const [stage, evaluation, at] = [this.stage(), this.evaluation(), this.at()];
      onCleanup(
        afterPaint(() => {
          this.drawn.set({ stage: judgedStage(stage, evaluation), evaluation, at });
        }),
      );
    });
    effect((onCleanup) => {
      const drawn = this.drawn();
      if (this.tab() !== 'temperature' || drawn === null) return;
      onCleanup(this.follow(drawn));
    });
  }

  /** Judges the stage at one temperature after another, a frame in between; what was drawn stays until all are there. */
  private follow({ stage, evaluation }: Drawn): () => void {
    if (!hasFigures(stage, evaluation)) {
      this.margins.set([]);
      return () => undefined;
    }
    const steps = marginOverTemperature(stage, this.followed());
    const points: MarginsAtTemperature[] = [];
    let cancel: () => void = () => undefined;
    const step = () => {
      const next = steps.next();
      if (next.done === true) {
        this.margins.set(points);
        return;
      }
      points.push(next.value);
      cancel = afterPaint(step);
    };
    step();
    return () => {
      cancel();
    };
  }
}
