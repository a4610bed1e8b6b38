import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  effect,
  ElementRef,
  inject,
  input,
  linkedSignal,
  model,
  signal,
  viewChild,
  ViewEncapsulation,
} from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';
import type { Svg } from '@svgdotjs/svg.js';
import { Icon } from '../ui/icon.ts';
import { StatusAnnouncer } from '../ui/status-announcer.ts';
import { SymbolText } from '../ui/symbol-text.ts';
import { saveChartPng, saveChartSvg } from './chart-export.ts';
import { chartLayout } from './chart-layout.ts';
import type { ChartModel } from './chart-model.ts';
import { chartTable } from './chart-table.ts';
import { paintChart, paintCursor } from './paint-chart.ts';

const PAGE_STEPS = 10;

/**
 * One chart, drawn from plain data to the size of its container. Mouse, finger or arrow keys move a cursor that
 * reads the figures; the same figures stand in the table. The plot is a slider to assistive technology, so that
 * its value text is what the cursor reads.
 */
@Component({
  selector: 'app-chart',
  imports: [Icon, MatMenuModule, SymbolText],
  templateUrl: './chart.html',
  styleUrl: './chart.scss',
  encapsulation: ViewEncapsulation.None,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Chart {
  readonly chart = input.required<ChartModel>();
  readonly asTable = model(false);

  private readonly announcer = inject(StatusAnnouncer);
  private readonly canvas = viewChild.required<ElementRef<HTMLElement>>('canvas');
  private readonly size = signal({ width: 0, height: 0 });
  private readonly painted = signal<Svg | null>(null);

  protected readonly table = computed(() => chartTable(this.chart()));
  private readonly scene = computed(() => {
    const { width, height } = this.size();
    return width === 0 || height === 0 ? null : chartLayout(this.chart(), width, height);
  });
  /** Row of the table under the cursor; null while nothing is read. */
  protected readonly at = linkedSignal<number, number | null>({
    source: () => this.table().rows.length,
    computation: (rows, before) => {
      const index = before?.value ?? null;
      return index !== null && index < rows ? index : null;
    },
  });
  protected readonly reading = computed(() => {
    const index = this.at();
    const row = index === null ? undefined : this.table().rows[index];
    if (row === undefined) return null;
    return this.table().columns.map(({ label, unit }, k) => {
      const figure = row.cells[k] ?? '';
      return { label, figure: unit === '' ? figure : `${figure}\u00a0${unit}` };
    });
  });
  protected readonly valueText = computed(
    () =>
      this.reading()
        ?.filter(({ figure }) => !figure.startsWith('–'))
        .map(({ label, figure }) => `${label} ${figure}`)
        .join(', ') ?? 'Arrow keys read the values',
  );
  /** Read once on entering: what is marked in the chart. */
  protected readonly summary = computed(() =>
    this.table()
      .marks.map(({ label }) => label)
      .join('; '),
  );
  /** Where the read-out stands: on the side away from the cursor. */
  protected readonly readOutLeft = computed(() => {
    const [scene, index] = [this.scene(), this.at()];
    const row = index === null ? undefined : this.table().rows[index];
    if (scene === null || row === undefined || scene.upright) return false;
    return scene.stopPx(row.at) > (scene.plot.left + scene.plot.right) / 2;
  });

  constructor() {
    const destroyed = inject(DestroyRef);
    effect((onCleanup) => {
      const host = this.canvas().nativeElement;
      const observer = new ResizeObserver(() => {
        this.size.set({ width: host.clientWidth, height: host.clientHeight });
      });
      observer.observe(host);
      onCleanup(() => {
        observer.disconnect();
      });
    });
    effect(() => {
      const scene = this.scene();
      if (scene !== null) this.painted.set(paintChart(this.canvas().nativeElement, scene));
    });
    effect(() => {
      const [svg, scene, index] = [this.painted(), this.scene(), this.at()];
      const row = index === null ? undefined : this.table().rows[index];
      if (svg !== null && scene !== null) paintCursor(svg, scene, row?.at ?? null);
    });
    destroyed.onDestroy(() => this.painted()?.remove());
  }

  protected point(event: PointerEvent): void {
    const scene = this.scene();
    if (scene === null) return;
    const box = this.canvas().nativeElement.getBoundingClientRect();
    const atPx = scene.upright ? event.clientY - box.top : event.clientX - box.left;
    this.at.set(this.nearest((at) => scene.stopPx(at), atPx));
  }

  protected leave(): void {
    if (document.activeElement !== this.canvas().nativeElement) this.at.set(null);
  }

  /** Entering by keyboard, the cursor starts at what is marked, else in the middle. */
  protected enter(): void {
    if (this.at() !== null) return;
    const chart = this.chart();
    const marked = chart.kind === 'plot' ? chart.points?.[0] : undefined;
    const middle = Math.floor(this.table().rows.length / 2);
    this.at.set(marked === undefined ? middle : this.nearest((at) => at, marked.x));
  }

  protected key(event: KeyboardEvent): void {
    const last = this.table().rows.length - 1;
    const index = this.at() ?? 0;
    const forward = this.scene()?.upright === true ? 'ArrowDown' : 'ArrowUp';
    const to = {
      ArrowRight: index + 1,
      ArrowLeft: index - 1,
      ArrowUp: index + (forward === 'ArrowUp' ? 1 : -1),
      ArrowDown: index + (forward === 'ArrowDown' ? 1 : -1),
      PageUp: index + PAGE_STEPS,
      PageDown: index - PAGE_STEPS,
      Home: 0,
      End: last,
    }[event.key];
    if (event.key === 'Escape') this.at.set(null);
    if (to === undefined || last < 0) return;
    event.preventDefault();
    this.at.set(Math.min(last, Math.max(0, to)));
  }

  protected saveSvg(): void {
    saveChartSvg(this.canvas().nativeElement, this.chart().name);
  }

  protected savePng(): void {
    saveChartPng(this.canvas().nativeElement, this.chart().name).catch((error: unknown) => {
      this.announcer.alert(error instanceof Error ? error.message : String(error));
    });
  }

  private nearest(place: (at: number) => number, wanted: number): number {
    const { rows } = this.table();
    let best = 0;
    rows.forEach(({ at }, k) => {
      const so = Math.abs(place(rows[best]?.at ?? at) - wanted);
      if (Math.abs(place(at) - wanted) < so) best = k;
    });
    return best;
  }
}
