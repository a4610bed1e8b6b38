import { TestBed } from '@angular/core/testing';
import type { CriterionStatus } from '../../../shared/checks/evaluation.ts';
import { VerdictMark } from './verdict-mark.ts';

describe('VerdictMark', () => {
  it.each([
    ['pass', 'Pass'],
    ['marginal', 'Marginal'],
    ['fail', 'Fail'],
    ['open', 'Open'],
    ['stated', 'Stated'],
  ] satisfies [CriterionStatus, string][])(
    'says %s in a word beside its icon',
    async (status, word) => {
      const fixture = TestBed.createComponent(VerdictMark);
      fixture.componentRef.setInput('status', status);
      await fixture.whenStable();
      const element = fixture.nativeElement as HTMLElement;
      expect(element.textContent.trim()).toBe(word);
      expect(element.querySelector('svg')).not.toBeNull();
      expect(element.classList).toContain(status);
    },
  );
});
