import {
  ChangeDetectionStrategy,
  Component,
  provideZonelessChangeDetection,
  signal,
} from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import { relaySample } from './testing/relay-sample.ts';
import { WindowLadder } from './window-ladder.ts';

const candidate = (valueOhm: number, margin: number, verdict: 'pass' | 'marginal' | 'fail') => ({
  valueOhm,
  margin,
  verdict,
  worst: 'forced-beta',
});
const SIZING: Sizing = {
  rbMinOhm: 560,
  rbMaxOhm: 680,
  setBy: { min: 'tested-range', max: 'forced-beta' },
  recommendedOhm: 620,
  candidates: [
    candidate(510, -0.1, 'fail'),
    candidate(560, 0.2, 'pass'),
    candidate(620, 0.11, 'pass'),
    candidate(680, 0.02, 'marginal'),
    candidate(750, -0.06, 'fail'),
  ],
  conflict: null,
};

@Component({
  imports: [WindowLadder],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-window-ladder
    series="E24"
    [sizing]="sizing()"
    [inUseOhm]="inUse()"
    [evaluation]="evaluation()"
    [readOnly]="readOnly()"
    (taken)="inUse.set($event)"
  />`,
})
class Host {
  readonly sizing = signal<Sizing | null>(SIZING);
  readonly inUse = signal<number | null>(680);
  readonly readOnly = signal(false);
  readonly evaluation = signal<Evaluation | null>(null);
}

describe('WindowLadder', () => {
  let fixture: ComponentFixture<Host>;
  const page = () => fixture.nativeElement as HTMLElement;
  const rungs = () => [...page().querySelectorAll<HTMLButtonElement>('.rung')];
  const stop = () => rungs().filter((rung) => rung.tabIndex === 0);
  const press = async (key: string) => {
    document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true }));
    await fixture.whenStable();
  };

  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideZonelessChangeDetection()] });
    fixture = TestBed.createComponent(Host);
    document.body.append(page());
    await fixture.whenStable();
  });
  afterEach(() => {
    page().remove();
  });

  it('names every value with its verdict, margin and place', () => {
    expect(rungs().map((rung) => rung.getAttribute('aria-label'))).toEqual([
      expect.stringMatching(/^510.Ω, Fail/),
      expect.stringMatching(/^560.Ω, Pass/),
      expect.stringMatching(/^620.Ω, Pass, margin 11.%, Forced β, recommended$/),
      expect.stringMatching(/^680.Ω, Marginal.*in use$/),
      expect.stringMatching(/^750.Ω, Fail/),
    ]);
  });

  it('has one tab stop, at the value in use', () => {
    expect(stop().map((rung) => rung.textContent)).toEqual([expect.stringContaining('680')]);
  });

  it('steps by arrow keys, jumps to the ends and takes a value by click', async () => {
    stop()[0]!.focus();
    await press('ArrowLeft');
    expect(document.activeElement?.textContent).toContain('620');
    (document.activeElement as HTMLButtonElement).click();
    await fixture.whenStable();
    expect(fixture.componentInstance.inUse()).toBe(620);
    await press('Home');
    expect(document.activeElement?.textContent).toContain('510');
    await press('ArrowLeft');
    expect(document.activeElement?.textContent).toContain('510');
    await press('End');
    expect(document.activeElement?.textContent).toContain('750');
  });

  it('names the criteria that end the window', () => {
    const ends = [...page().querySelectorAll('.end')].map((end) => end.textContent);
    expect(ends).toEqual([
      expect.stringContaining('Lower end'),
      expect.stringContaining('forced β'),
    ]);
  });

  it('takes nothing while the revision is no draft', async () => {
    fixture.componentInstance.readOnly.set(true);
    await fixture.whenStable();
    rungs()[1]!.click();
    expect(fixture.componentInstance.inUse()).toBe(680);
  });

  it('says what stands against what when the window is empty', async () => {
    fixture.componentInstance.sizing.set({
      ...SIZING,
      rbMinOhm: null,
      rbMaxOhm: null,
      conflict: { between: ['forced-beta', 'drive-current'], ways: ['More gain opens it.'] },
    });
    await fixture.whenStable();
    expect(page().textContent).toContain(
      'forced β asks for a smaller one, drive current for a larger',
    );
    expect(page().textContent).toContain('More gain opens it.');
  });

  it.each([
    [1000, 5],
    [650, 3],
  ])('lets %d Ω stand in at its place while it is in use without being sized', async (ohm, at) => {
    const baseResistor = { ...relaySample().baseResistor, valueOhm: ohm };
    fixture.componentInstance.inUse.set(ohm);
    fixture.componentInstance.evaluation.set(evaluateStage(relaySample({ baseResistor })));
    await fixture.whenStable();
    expect(rungs()).toHaveLength(6);
    expect(rungs()[at]!.classList).toContain('stand-in');
    expect(rungs()[at]!.getAttribute('aria-label')).toMatch(
      ohm === 1000
        ? /^1.kΩ, Fail, .*, Forced β, in use, not among the sized values$/
        : /^650.Ω, .*in use, not among the sized values$/,
    );
    expect(stop()).toEqual([rungs()[at]]);
  });
});
