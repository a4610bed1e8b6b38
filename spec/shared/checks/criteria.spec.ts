import { describe, expect, it } from 'vitest';
import { CRITERIA, criterionIds, criterionNumber } from '../../../shared/checks/criteria.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { cornerWords } from '../../../shared/report/corner-words.ts';
import { highSideStage, relayStage, RELAY_FILE } from '../relay-stage.ts';

const STAGES = [
  relayStage(),
  highSideStage(),
  relayStage({
    frequencyHz: 1000,
    duty: 0.5,
    supplyV: { min: 21.6, max: 26.4, surge: 30, dip: 12 },
    drive: { ...RELAY_FILE.drive, reset: { kind: 'high-z' } },
    clamp: { ...RELAY_FILE.clamp, powerRatingW: 0.5 },
  }),
];

describe('the table of criteria', () => {
  it('names every criterion once and in plain words', () => {
    const names = criterionIds().map((id) => CRITERIA[id].name);
    expect(new Set(names).size).toBe(names.length);
    criterionIds().forEach((id, k) => {
      expect(criterionNumber(id)).toBe(k);
    });
  });

  it('orders the criteria of every result', () => {
    for (const stage of STAGES) {
      const order = evaluateStage(stage).criteria.map(({ id }) =>
        (criterionIds() as readonly string[]).indexOf(id),
      );
      expect(order).not.toContain(-1);
      expect(order).toEqual([...order].sort((a, b) => a - b));
    }
  });

  it('finds words for the corner of every criterion that has one', () => {
    for (const stage of STAGES) {
      for (const { id, corner } of evaluateStage(stage).criteria) {
        if (corner !== null) expect(cornerWords(corner, id), id).not.toBe('');
      }
    }
  });
});

describe('cornerWords', () => {
  it('says the worst corner of the overdrive factor shortly', () => {
    const criterion = evaluateStage(relayStage()).criteria[0];
    expect(cornerWords(criterion?.corner ?? {}, 'overdrive-factor')).toBe(
      'supply high, cold, weak pin, RB high',
    );
  });

  it('says that the off state follows at once on being on', () => {
    expect(cornerWords({ ambient: 'max', rb: '-', rbe: '+' }, 'off-base-voltage')).toBe(
      'hot, RB low, RBE high, just switched off',
    );
  });
});
