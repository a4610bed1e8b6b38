import { TestBed } from '@angular/core/testing';
import { REVISION_STATES, STATE_WORDS } from '../../../shared/review/revision-state.ts';
import { StateChip } from './state-chip.ts';

describe('StateChip', () => {
  it.each(REVISION_STATES)('shows %s as word and icon', async (state) => {
    const fixture = TestBed.createComponent(StateChip);
    fixture.componentRef.setInput('state', state);
    await fixture.whenStable();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.textContent.trim()).toBe(STATE_WORDS[state]);
    expect(element.querySelector('svg')).not.toBeNull();
  });
});
