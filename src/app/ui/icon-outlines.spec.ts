import { TestBed } from '@angular/core/testing';
import { Icon } from './icon.ts';
import { ICON_NAMES, iconOutline } from './icon-outlines.ts';

describe('icons', () => {
  it.each(ICON_NAMES)('has an outline of numbers and commands for %s', (name) => {
    expect(iconOutline(name)).toMatch(/^M[\d\s.,a-zA-Z-]+$/);
    expect(iconOutline(name)).not.toContain('undefined');
  });

  it('is hidden from readers: the word beside it is the name', async () => {
    const fixture = TestBed.createComponent(Icon);
    fixture.componentRef.setInput('name', 'stage');
    await fixture.whenStable();
    const svg = (fixture.nativeElement as HTMLElement).querySelector('svg');
    expect(svg?.getAttribute('aria-hidden')).toBe('true');
    expect(svg?.querySelector('path')?.getAttribute('d')).toBe(iconOutline('stage'));
  });
});
