import { countsText, stageCount } from './state-counts-text.ts';

const counts = { draft: 3, 'in-check': 3, checked: 2, locked: 6, withdrawn: 0, superseded: 2 };

describe('state counts', () => {
  it('name what there is, finished first, without the superseded ones', () => {
    expect(countsText(counts)).toBe('6 locked, 2 checked, 3 in check, 3 draft');
    expect(stageCount(counts)).toBe(14);
  });
});
