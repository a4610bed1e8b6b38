import { TestBed } from '@angular/core/testing';
import { EmptyState } from './empty-state.ts';

describe('EmptyState', () => {
  it('says what belongs here', async () => {
    const fixture = TestBed.createComponent(EmptyState);
    fixture.componentRef.setInput('icon', 'stage');
    fixture.componentRef.setInput('heading', 'No stage yet');
    fixture.componentRef.setInput('text', 'A stage is one transistor.');
    await fixture.whenStable();
    const text = (fixture.nativeElement as HTMLElement).textContent;
    expect(text).toContain('No stage yet');
    expect(text).toContain('A stage is one transistor.');
  });
});
