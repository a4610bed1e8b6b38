import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import type { TransistorRecord } from '../../../shared/parts/transistor-record.ts';
import { currentSteps, expectedSaturationV } from '../../../shared/physics/curves.ts';
import type { DeviceModel, FigureOrigin } from '../../../shared/physics/device-fit.ts';
import { SHEET_DEG_C } from '../../../shared/physics/constants.ts';
import {
  deviceOfPart,
  gainOverCurrent,
  SATURATION_STEPS,
  sheetSaturation,
} from '../../../shared/stage/part-curves.ts';
import { partModel, type PartModel } from '../../../shared/stage/part-model.ts';
import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { formatNumber, formatQuantity } from '../../../shared/units/engineering-notation.ts';
import type { PlotModel } from '../charts/chart-model.ts';
import { series } from '../charts/chart-model.ts';
import { Chart } from '../charts/chart.ts';
import { gainChart, saturationChart } from '../charts/transistor-charts.ts';
import { SymbolText } from '../ui/symbol-text.ts';

/** A cold junction for the second line of guaranteed gain, °C: the lower end of industrial equipment. */
const COLD_DEG_C = -40;
/** Decades below the rated collector current that a part without a printed row further down is drawn over. */
const BELOW = 1e-3;
const USUAL_IC_MAX_A = 0.1;
/** How far above its last row a VCE(sat) line is drawn. */
const AHEAD = 1.2;

const ORIGIN_WORDS: Readonly<Record<FigureOrigin, string>> = {
  part: 'model figure of the part',
  rows: 'fitted to the rows',
  usual: 'usual figure',
};

/** Guaranteed gain and saturation line of a transistor, drawn from its printed rows. */
@Component({
  selector: 'app-part-curves',
  imports: [Chart, SymbolText],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<section aria-labelledby="gain-curves">
      <h2 class="group-head" id="gain-curves">Gain over collector current</h2>
      @if (gain(); as chart) {
        <app-chart [chart]="chart" />
      } @else {
        <p class="small">No gain row at 25 °C is printed, so there is nothing to draw.</p>
      }
    </section>
    <section aria-labelledby="saturation-curves">
      <h2 class="group-head" id="saturation-curves">Saturation line and its slope</h2>
      @if (saturation(); as chart) {
        <app-chart [chart]="chart" />
      } @else {
        <p class="small">
          No largest <app-symbol-text text="VCE(sat)" /> is printed, so there is nothing to draw.
        </p>
      }
    </section>
    @if (device().length > 0) {
      <section aria-labelledby="expected-device">
        <h2 class="group-head" id="expected-device">Expected device</h2>
        <dl>
          @for (figure of device(); track figure.name) {
            <div>
              <dt><app-symbol-text [text]="figure.name" /></dt>
              <dd class="value">{{ figure.value }}</dd>
              <dd class="small">{{ figure.origin }}</dd>
            </div>
          }
        </dl>
        <p class="small">Draws expected curves; it decides no verdict.</p>
      </section>
    }`,
  styles: `
    :host {
      --chart-height: 270px;

      display: block;
      min-width: 0;
    }

    section {
      padding: 14px 18px;
      border-bottom: 1px solid var(--mat-sys-outline-variant);
    }

    app-chart {
      display: block;
      margin-top: 8px;
    }

    dl {
      margin: 6px 0;
    }

    dl > div {
      display: grid;
      grid-template-columns: 48px 88px 1fr;
      gap: 8px;
      align-items: baseline;
      padding: 3px 0;
    }

    .value {
      text-align: right;
      font-family: var(--app-mono);
      font-weight: 600;
      word-spacing: -0.32em;
      white-space: nowrap;
    }
  `,
})
export class PartCurves {
  readonly record = input.required<TransistorRecord>();

  private readonly part = computed(() => {
    const record = this.record();
    // An array is drawn by the figures of one of its transistors.
    const family = record.family === 'darlington-array' ? 'darlington' : record.family;
    const derived = deriveTransistor({ ...record, family });
    if (!derived.ok) return null;
    return { data: derived.data, model: partModel(derived.data, GENERAL_PRACTICE) };
  });
  protected readonly gain = computed(() => {
    const part = this.part();
    return part === null ? null : gainOf(part.model, part.data);
  });
  protected readonly saturation = computed(() => {
    const part = this.part();
    return part === null ? null : saturationOf(part.model, part.data);
  });
  protected readonly device = computed(() => {
    const part = this.part();
    return part === null ? [] : figuresOf(deviceOfPart(part.model, part.data));
  });
}

function gainOf({ gain }: PartModel, data: TransistorData): PlotModel | null {
  if (gain === null) return null;
  const icMaxA = data.limits.icA ?? USUAL_IC_MAX_A;
  const rows = data.gain.map(({ icA }) => icA);
  const span = [Math.min(BELOW * icMaxA, ...rows), Math.max(icMaxA, ...rows)] as const;
  return gainChart(gainOverCurrent(gain, data, span, COLD_DEG_C), span, COLD_DEG_C);
}

function saturationOf(model: PartModel, data: TransistorData): PlotModel | null {
  const line = model.saturation;
  if (line === null) return null;
  const { rceTempcoPerK } = GENERAL_PRACTICE;
  const toA = AHEAD * line.lastIcA;
  const sheet = sheetSaturation(line, data, rceTempcoPerK, toA);
  const device = deviceOfPart(model, data);
  const at = { tjDegC: SHEET_DEG_C, rceTempcoPerK, forcedBeta: sheet.testBeta };
  const expected = currentSteps([0, toA], [], SATURATION_STEPS, 'equal')
    .slice(1)
    .map((icA) => [icA, expectedSaturationV(device, icA, at)] as const);
  return saturationChart(sheet, {
    series: [series('expected', expected, { tone: 2, dash: 'dashed' })],
  });
}

function figuresOf({ earlyV, reverseGain, collectorOhm, origin }: DeviceModel) {
  return [
    { name: 'VA', value: formatQuantity(earlyV, 'V'), origin: ORIGIN_WORDS[origin.earlyV] },
    {
      name: 'RC',
      value: formatQuantity(collectorOhm, 'Ohm'),
      origin: ORIGIN_WORDS[origin.collectorOhm],
    },
    { name: 'βR', value: formatNumber(reverseGain), origin: ORIGIN_WORDS[origin.reverseGain] },
  ];
}
