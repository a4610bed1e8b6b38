import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import { judgePart, rankParts } from '../../../shared/sizing/rank-parts.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { transistors } from '../parts/library-file.ts';
import { highSideStage, relayStage, RELAY_FILE } from '../relay-stage.ts';

const library = transistors.flatMap((record) => {
  const derived = deriveTransistor(record);
  return derived.ok ? [derived.data] : [];
});
const ranking = (stage: StageInput) =>
  rankParts(
    library.map((transistor) => ({
      partNumber: transistor.partNumber,
      ...judgePart(stage, transistor),
    })),
  );

describe.each([
  ['24 V relay on the low side', relayStage()],
  ['24 V relay on the high side', highSideStage()],
])('parts for the %s', (_, stage) => {
  const ranked = ranking(stage);

  it('are all of the library but its array, each with a reason', () => {
    expect(transistors).toHaveLength(36);
    expect(ranked).toHaveLength(35);
    for (const { reason, partNumber } of ranked) expect(reason, partNumber).toMatch(/^.{12,}\.$/);
  });

  it('come by verdict and then by their smallest margin', () => {
    const order = ['pass', 'marginal', 'open', 'fail', null];
    ranked.slice(1).forEach((part, k) => {
      const before = ranked[k];
      if (before === undefined) return;
      const step = order.indexOf(part.verdict) - order.indexOf(before.verdict);
      expect(step).toBeGreaterThanOrEqual(0);
      if (step === 0 && part.verdict !== null) {
        expect(part.margin ?? -Infinity).toBeLessThanOrEqual(before.margin ?? -Infinity);
      }
    });
  });

  it('have a base resistor sized for them, and the verdict of the stage with it', () => {
    const sized = ranked.filter((part) => part.sized);
    expect(sized.length).toBeGreaterThan(5);
    for (const { stage: own, verdict, margin, baseResistorOhm, partNumber } of sized) {
      if (own === null) throw new Error(`no stage for ${partNumber}`);
      const wired = own.transistor.internal !== null && baseResistorOhm === 0;
      if (!wired) expect(sizeStage(own).recommendedOhm, partNumber).toBe(baseResistorOhm);
      const evaluation = evaluateStage(own);
      expect(evaluation.verdict, partNumber).toBe(verdict);
      const margins = evaluation.criteria.map((each) => each.margin).filter((m) => m !== null);
      expect(margin, partNumber).toBe(Math.min(...margins));
    }
  });
});

describe('a part that is not of the stage’s kind', () => {
  const part = (partNumber: string, stage = relayStage()) => {
    const transistor = library.find((each) => each.partNumber === partNumber);
    if (transistor === undefined) throw new Error(`no ${partNumber}`);
    return judgePart(stage, transistor);
  };

  it('of the other polarity cannot stand there', () => {
    expect(part('2N3906')).toMatchObject({ stage: null, verdict: null, baseResistorOhm: null });
    expect(part('2N3906').reason).toContain('PNP');
  });

  it('changes a low-side stage to its own topology, without the outer RBE where one is inside', () => {
    expect(part('MPSA13').stage?.topology).toBe('low-side-darlington');
    expect(part('DTC123J').stage).toMatchObject({
      topology: 'low-side-pre-biased',
      shuntResistor: null,
    });
    expect(part('2N2222A').stage?.topology).toBe('low-side-npn');
  });

  it('with resistors inside does without an outer one where its input allows', () => {
    const strong = { ...RELAY_FILE.drive, railV: { min: 4.75, max: 5.25 } };
    const load = { kind: 'resistor', resistanceOhm: 2400, tolerance: 0.05 };
    const found = part('DTC123J', relayStage({ drive: strong, load, clamp: null }));
    expect(found).toMatchObject({ baseResistorOhm: 0, sized: true });
    expect(found.verdict).not.toBe('fail');
  });

  it('with resistors inside stands on the low side only', () => {
    expect(part('DTC114E', highSideStage()).reason).toContain('low-side stages only');
  });

  it('without a base resistor that works is judged at the nearest and says what no value meets', () => {
    const weak = relayStage({ drive: { ...RELAY_FILE.drive, sourceLimitA: 0.002 } });
    const found = part('2N3904', weak);
    expect(found).toMatchObject({ verdict: 'fail', sized: false });
    expect(found.baseResistorOhm).not.toBeNull();
    expect(found.reason).toMatch(/^No base resistor meets (forced β|drive current)\.$/);
  });

  it('used beyond its rows is open and says which', () => {
    expect(part('BC547B')).toMatchObject({ verdict: 'open', worst: 'tested-range' });
    expect(part('BC547B').reason).toContain('hFE');
  });
});
