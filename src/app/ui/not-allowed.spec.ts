import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { NotAllowed } from './not-allowed.ts';

@Component({
  selector: 'app-not-allowed-host',
  imports: [NotAllowed],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<span id="why">{{ reason() }}</span>
    <button type="button" reasonId="why" [appNotAllowed]="reason()" (click)="count()">
      Pass
    </button>`,
})
class Host {
  readonly reason = signal<string | null>('Finding 2 is open.');
  pressed = 0;

  protected count(): void {
    this.pressed++;
  }
}

describe('NotAllowed', () => {
  const create = async () => {
    const fixture = TestBed.createComponent(Host);
    await fixture.whenStable();
    const button = (fixture.nativeElement as HTMLElement).querySelector('button')!;
    return { fixture, button, host: fixture.componentInstance };
  };

  it('keeps the button focusable, names the reason and swallows the click', async () => {
    const { button, host } = await create();
    button.click();
    expect(host.pressed).toBe(0);
    expect(button.disabled).toBe(false);
    expect(button.getAttribute('aria-disabled')).toBe('true');
    expect(button.getAttribute('aria-describedby')).toBe('why');
  });

  it('is a plain button once the reason is gone', async () => {
    const { fixture, button, host } = await create();
    host.reason.set(null);
    await fixture.whenStable();
    button.click();
    expect(host.pressed).toBe(1);
    expect(button.hasAttribute('aria-disabled')).toBe(false);
    expect(button.hasAttribute('aria-describedby')).toBe(false);
  });
});
