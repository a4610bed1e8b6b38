import { TestBed } from '@angular/core/testing';
import { BrandMark } from './brand-mark.ts';

describe('BrandMark', () => {
  it('is one path in the colour of the text, hidden from readers', async () => {
    const fixture = TestBed.createComponent(BrandMark);
    await fixture.whenStable();
    const svg = (fixture.nativeElement as HTMLElement).querySelector('svg');
    expect(svg?.getAttribute('aria-hidden')).toBe('true');
    expect(svg?.querySelectorAll('path')).toHaveLength(1);
    expect(svg?.querySelector('path')?.getAttribute('fill')).toBe('currentcolor');
  });
});
