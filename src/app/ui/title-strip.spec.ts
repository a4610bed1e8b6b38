import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { StripCell, TitleStrip } from './title-strip.ts';

@Component({
  selector: 'app-strip-host',
  imports: [StripCell, TitleStrip],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<app-title-strip reference="Q12" name="Brine agitator relay">
    <app-strip-cell label="Policy">General practice, v3</app-strip-cell>
    <button stripActions type="button">New stage</button>
  </app-title-strip>`,
})
class StripHost {}

describe('TitleStrip', () => {
  it('is the heading of the page, with label over value and the acts', async () => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(StripHost);
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.querySelector('h1')?.textContent.replace(/\s+/g, ' ').trim()).toBe(
      'Q12, Brine agitator relay',
    );
    expect(element.querySelector('.label')?.textContent).toBe('Policy');
    expect(element.querySelector('.value')?.textContent.trim()).toBe('General practice, v3');
    expect(element.querySelector('.acts button')).not.toBeNull();
  });
});
