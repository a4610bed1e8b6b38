import { TestBed } from '@angular/core/testing';
import { SymbolText } from './symbol-text.ts';

describe('SymbolText', () => {
  it('marks up subscripts and reads as one word', async () => {
    const fixture = TestBed.createComponent(SymbolText);
    fixture.componentRef.setInput('text', 'Peak VCE');
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.textContent).toBe('Peak VCE');
    expect(element.querySelector('sub')?.textContent).toBe('CE');
  });
});
