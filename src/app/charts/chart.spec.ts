import {
  ChangeDetectionStrategy,
  Component,
  provideZonelessChangeDetection,
  signal,
} from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { axis, series, type ChartModel } from './chart-model.ts';
import { chartXml, fileName } from './chart-export.ts';
import { Chart } from './chart.ts';

const CHART: ChartModel = {
  kind: 'plot',
  name: 'Saturation line',
  x: axis('IC', 'A', [0, 0.05]),
  y: axis('VCE(sat)', 'V', [0, 0.4]),
  series: [
    series('limit', [
      [0, 0.09],
      [0.01, 0.2],
      [0.05, 0.3],
    ]),
  ],
  points: [{ x: 0.011, y: 0.2025, label: 'operating point 0.203\u00a0V', shape: 'square' }],
};

@Component({
  imports: [Chart],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-chart [chart]="chart()" [(asTable)]="asTable" />`,
})
class Host {
  readonly chart = signal(CHART);
  readonly asTable = signal(false);
}

/** jsdom has no layout: a container of a fixed size. */
class FixedSize {
  constructor(private changed: () => void) {}
  observe(element: HTMLElement): void {
    Object.defineProperty(element, 'clientWidth', { value: 320 });
    Object.defineProperty(element, 'clientHeight', { value: 240 });
    this.changed();
  }
  disconnect(): void {
    this.changed = () => undefined;
  }
}

describe('Chart', () => {
  let fixture: ComponentFixture<Host>;
  const page = () => fixture.nativeElement as HTMLElement;
  const plot = () => page().querySelector<HTMLElement>('[role="slider"]')!;
  const press = async (key: string) => {
    plot().dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
    await fixture.whenStable();
  };
  const reading = () => plot().getAttribute('aria-valuetext');

  beforeEach(async () => {
    vi.stubGlobal('ResizeObserver', FixedSize);
    TestBed.configureTestingModule({ providers: [provideZonelessChangeDetection()] });
    fixture = TestBed.createComponent(Host);
    document.body.append(page());
    await fixture.whenStable();
  });
  afterEach(() => {
    page().remove();
    vi.unstubAllGlobals();
  });

  it('draws to the size of its container, without a style attribute', () => {
    const svg = plot().querySelector('svg')!;
    expect(svg.getAttribute('viewBox')).toBe('0 0 320 240');
    expect(svg.querySelectorAll('.series, .square')).toHaveLength(2);
    expect(page().querySelectorAll('svg[style], svg [style]')).toHaveLength(0);
  });

  it('has a name and reads figures at the arrow keys, starting at what is marked', async () => {
    expect(plot().getAttribute('aria-label')).toBe('Saturation line');
    plot().focus();
    await fixture.whenStable();
    expect(reading()).toBe('IC 10.0\u00a0mA, limit 0.200\u00a0V');
    await press('ArrowRight');
    expect(reading()).toBe('IC 50.0\u00a0mA, limit 0.300\u00a0V');
    await press('ArrowRight');
    expect(reading()).toBe('IC 50.0\u00a0mA, limit 0.300\u00a0V');
    await press('Home');
    expect(reading()).toBe('IC 0.0\u00a0mA, limit 0.090\u00a0V');
    expect(page().querySelectorAll('.cursor-dot')).toHaveLength(1);
    await press('Escape');
    expect(page().querySelector('.cursor')).toBeNull();
  });

  it('shows the figures the cursor reads as a table', async () => {
    fixture.componentInstance.asTable.set(true);
    await fixture.whenStable();
    const cells = [...page().querySelectorAll('tbody')[0]!.querySelectorAll('td')];
    expect(cells.map((cell) => cell.textContent)).toEqual([
      '0.0',
      '0.090',
      '10.0',
      '0.200',
      '50.0',
      '0.300',
    ]);
    expect(plot().hidden).toBe(true);
    expect(page().textContent).toContain('operating point');
  });

  it('follows its data', async () => {
    fixture.componentInstance.chart.set({ ...CHART, name: 'Another', points: [] });
    await fixture.whenStable();
    expect(plot().getAttribute('aria-label')).toBe('Another');
    expect(page().querySelectorAll('svg')).toHaveLength(2);
    expect(plot().querySelectorAll('.square')).toHaveLength(0);
  });

  it('leaves as a file that needs no style sheet and is well-formed XML', () => {
    const text = chartXml(plot(), 'Saturation line');
    const file = new DOMParser().parseFromString(text, 'image/svg+xml');
    expect(file.querySelector('parsererror')).toBeNull();
    expect(file.documentElement.getAttribute('aria-label')).toBe('Saturation line');
    expect(file.querySelectorAll('[class]')).toHaveLength(0);
    expect(file.querySelectorAll('path').length).toBeGreaterThan(3);
    expect(text).not.toContain('&nbsp;');
    expect(plot().querySelectorAll('svg .axis')).toHaveLength(1);
    expect(fileName('VCE(sat) over IC, Q12')).toBe('vce-sat-over-ic-q12');
  });
});
