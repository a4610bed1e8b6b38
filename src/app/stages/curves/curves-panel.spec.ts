import {
  ChangeDetectionStrategy,
  Component,
  provideZonelessChangeDetection,
  signal,
} from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { evaluateStage } from '../../../../shared/checks/evaluate-stage.ts';
import type { StageInput } from '../../../../shared/stage/stage-input.ts';
import { startingStage } from '../sample-stage.ts';
import { relaySample } from '../testing/relay-sample.ts';
import { CurvesPanel } from './curves-panel.ts';

@Component({
  imports: [CurvesPanel],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-curves-panel [stage]="stage()" [evaluation]="evaluation()" [at]="at()" />`,
})
class Host {
  readonly stage = signal(relaySample());
  readonly evaluation = signal(evaluateStage(relaySample()));
  readonly at = signal('overdrive-factor');

  show(stage: StageInput): void {
    this.stage.set(stage);
    this.evaluation.set(evaluateStage(stage));
  }
}

/** jsdom has no layout: every container has one size. */
class FixedSize {
  constructor(private readonly changed: () => void) {}
  observe(element: HTMLElement): void {
    Object.defineProperty(element, 'clientWidth', { value: 400 });
    Object.defineProperty(element, 'clientHeight', { value: 230 });
    this.changed();
  }
  disconnect(): void {
    expect(this.changed).toBeTypeOf('function');
  }
}

describe('CurvesPanel', () => {
  let fixture: ComponentFixture<Host>;
  const page = () => fixture.nativeElement as HTMLElement;
  const names = () =>
    [...page().querySelectorAll('[role="slider"]')].map((plot) => plot.getAttribute('aria-label'));
  /** The charts come in a task after the frame, and Temperature a frame at each of its steps. */
  const drawn = async (name: string) => {
    await vi.waitFor(() => {
      expect(names()).toContain(name);
    });
    await fixture.whenStable();
  };
  const choose = async (text: RegExp) => {
    const tabs = [...page().querySelectorAll<HTMLElement>('[role="tab"]')];
    tabs.find((tab) => text.test(tab.textContent))!.click();
    await fixture.whenStable();
  };

  beforeEach(async () => {
    vi.stubGlobal('ResizeObserver', FixedSize);
    TestBed.configureTestingModule({ providers: [provideZonelessChangeDetection()] });
    fixture = TestBed.createComponent(Host);
    document.body.append(page());
    await fixture.whenStable();
  });
  afterEach(() => {
    fixture.destroy();
    page().remove();
    vi.unstubAllGlobals();
  });

  it('draws after the frame, not in the rendering of the verdicts', async () => {
    expect(names()).toEqual([]);
    await drawn('Output characteristics and load line');
    expect(page().textContent).toContain('Expected on this load line');
  });

  it('follows the corner shown and a change of the stage', async () => {
    await drawn('Output characteristics and load line');
    expect(page().textContent).toContain('0.235\u00a0V, 24.0\u00a0mA');
    fixture.componentInstance.at.set('nominal');
    await vi.waitFor(() => {
      expect(page().textContent).not.toContain('24.0\u00a0mA');
    });
    fixture.componentInstance.show(
      relaySample({ supplyV: { min: 11, max: 13, surge: null, dip: null } }),
    );
    await vi.waitFor(() => {
      expect(page().querySelector('text.mark')?.textContent).toMatch(/7\.\d+\u00a0mA/);
    });
  });

  it('has a tab for each kind of curve', async () => {
    await choose(/CE\(sat\)/);
    await drawn('Saturation voltage over collector current');
    await choose(/Gain/);
    await drawn('Gain over collector current');
    await choose(/Temperature/);
    await drawn('Margin over ambient temperature');
    expect(page().textContent).toContain('three least of');
  });

  it('says so where there is nothing to draw', async () => {
    const words = {
      reference: 'Q1',
      title: 'New',
      topology: 'low-side-npn',
      loadKind: 'coil',
    } as const;
    fixture.componentInstance.show(startingStage(words));
    await vi.waitFor(() => {
      expect(page().textContent).toContain('Nothing to draw');
    });
  });
});
