import { TestBed } from '@angular/core/testing';
import type { CriterionStatus } from '../../../shared/checks/evaluation.ts';
import { MarginBar } from './margin-bar.ts';

describe('MarginBar', () => {
  const render = async (margin: number | null, status: CriterionStatus) => {
    const fixture = TestBed.createComponent(MarginBar);
    fixture.componentRef.setInput('margin', margin);
    fixture.componentRef.setInput('status', status);
    await fixture.whenStable();
    return (fixture.nativeElement as HTMLElement).querySelector('svg')!;
  };

  it('has bar, band and limit tick for a figure with a margin', async () => {
    const svg = await render(0.25, 'pass');
    expect(svg.querySelector('rect.bar')?.getAttribute('width')).toBe('21');
    expect(svg.querySelector('.band')).not.toBeNull();
    expect(svg.querySelector('.limit')).not.toBeNull();
  });

  it('draws a dashed line for an open criterion and nothing for a stated one', async () => {
    const open = await render(null, 'open');
    expect(open.querySelector('.open')).not.toBeNull();
    expect(open.querySelector('.bar')).toBeNull();
    expect((await render(null, 'stated')).children).toHaveLength(0);
  });
});
