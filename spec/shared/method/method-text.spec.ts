import { describe, expect, it } from 'vitest';
import { ownCriterionIds } from '../../../shared/checks/criteria.ts';
import { CAUTIONS } from '../../../shared/method/cautions.ts';
import { CRITERIA_TEXT } from '../../../shared/method/criteria-text.ts';
import { GLOSSARY } from '../../../shared/method/glossary.ts';

describe('text of the method page', () => {
  it('explains every criterion the engine judges, and no other', () => {
    expect(Object.keys(CRITERIA_TEXT).sort()).toEqual([...ownCriterionIds()].sort());
  });

  it('asks a question of each criterion and answers where its limit comes from and what helps', () => {
    for (const [id, { asks, limit, cure }] of Object.entries(CRITERIA_TEXT)) {
      expect(asks, id).toMatch(/^[A-Z].*\?$/);
      expect(limit, id).toMatch(/^[A-Z].*\.$/);
      expect(cure, id).toMatch(/^[A-Z].*\.$/);
    }
  });

  it('lists the glossary in the order of the alphabet with anchors of its own', () => {
    const terms = GLOSSARY.map(({ term }) => term);
    expect(terms).toEqual([...terms].sort((a, b) => a.localeCompare(b)));
    expect(new Set(GLOSSARY.map(({ id }) => id)).size).toBe(GLOSSARY.length);
  });

  it('says the four cautions: judgement, governed fields, stored energy, part data', () => {
    expect(CAUTIONS.map(({ id }) => id)).toEqual([
      'judgement',
      'governed-fields',
      'stored-energy',
      'part-data',
    ]);
  });
});
