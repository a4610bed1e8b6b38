import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import { judgeStage } from '../../../shared/sizing/judge-stage.ts';
import { stageResult } from '../../../shared/sizing/result.ts';
import { sizeStage } from '../../../shared/sizing/size-stage.ts';
import { highSideStage, RELAY_FILE, relayStage, TYPE_2N3904, TYPE_2N3906 } from '../relay-stage.ts';

const open = { baseResistor: { ...RELAY_FILE.baseResistor, valueOhm: null } };

describe('the base resistor of the 24 V relay stage', () => {
  const sizing = sizeStage(relayStage(open));

  it('may be 240 to 680 Ω in E24: tested pin current below, forced β above', () => {
    expect(sizing).toMatchObject({
      rbMinOhm: 240,
      rbMaxOhm: 680,
      setBy: { min: 'tested-range', max: 'forced-beta' },
      conflict: null,
    });
  });

  it('is recommended as 620 Ω, the largest with every RB-dependent margin', () => {
    expect(sizing.recommendedOhm).toBe(620);
    const at = (valueOhm: number) => sizing.candidates.find((each) => each.valueOhm === valueOhm);
    expect(at(620)).toMatchObject({ worst: 'forced-beta', verdict: 'pass' });
    expect(at(680)).toMatchObject({ worst: 'forced-beta', verdict: 'marginal' });
    expect(at(750)).toMatchObject({ worst: 'forced-beta', verdict: 'fail' });
    expect(at(220)).toMatchObject({ worst: 'tested-range', verdict: 'open' });
  });

  it('shows every value of the series from below to above the window, rising', () => {
    const values = sizing.candidates.map(({ valueOhm }) => valueOhm);
    expect(values.slice(values.indexOf(220), values.indexOf(750) + 1)).toEqual([
      220, 240, 270, 300, 330, 360, 390, 430, 470, 510, 560, 620, 680, 750,
    ]);
  });

  it('has no window behind a pull-up that lets too little through whatever RB is', () => {
    // At most 3 V over 10.5 kΩ: IC/IB near 100. From 10 to 13 Ω the figure moves by 0.03 %.
    const sized = sizeStage(
      relayStage({
        ...open,
        shuntResistor: null,
        drive: {
          ...RELAY_FILE.drive,
          kind: 'open-collector',
          high: null,
          pullUp: { valueOhm: 10_000, tolerance: 0.05, ratingW: 0.1 },
        },
      }),
    );
    expect(sized).toMatchObject({ rbMinOhm: null, rbMaxOhm: null, recommendedOhm: null });
    expect(sized.candidates.map(({ verdict }) => verdict)).not.toContain('pass');
  });

  it('does not depend on the value in use', () => {
    expect(sizeStage(relayStage())).toEqual(sizing);
  });

  it('gains resolution in E96 around the same ends', () => {
    const fine = sizeStage(relayStage({ ...open, policy: { name: 'x', series: 'E96' } }));
    expect(fine.rbMinOhm).toBeGreaterThan(236);
    expect(fine.rbMinOhm).toBeLessThanOrEqual(243);
    expect(fine.rbMaxOhm).toBeGreaterThanOrEqual(680);
    expect(fine.rbMaxOhm).toBeLessThan(720);
  });
});

describe('sizeStage', () => {
  it('has no window and no recommendation where the demands conflict, and says what would help', () => {
    const weak = { ...RELAY_FILE.drive, sourceLimitA: 0.002 };
    const sizing = sizeStage(relayStage({ ...open, drive: weak }));
    expect(sizing).toMatchObject({ rbMinOhm: null, rbMaxOhm: null, recommendedOhm: null });
    expect([...(sizing.conflict?.between ?? [])].sort()).toEqual(['drive-current', 'forced-beta']);
    expect(sizing.conflict?.ways.join(' ')).toContain('a transistor in front');
    expect(sizing.candidates.length).toBeGreaterThan(3);
  });

  it('keeps the window of a stage that fails by something RB does not decide', () => {
    const load = { ...RELAY_FILE.load, operateV: 21.5 };
    const sizing = sizeStage(relayStage({ ...open, load }));
    expect(sizing.recommendedOhm).toBe(620);
    expect(judgeStage(relayStage({ ...open, load })).evaluation.verdict).toBe('fail');
  });

  it('recommends the widest margin where nothing passes outright', () => {
    // At 620 Ω the pin has 6 % left, at 680 Ω forced β has 3 %: none passes, 620 Ω has more.
    const drive = { ...RELAY_FILE.drive, sourceLimitA: 0.0068 };
    const narrow = sizeStage(relayStage({ ...open, drive }));
    expect(narrow.candidates.map(({ verdict }) => verdict)).not.toContain('pass');
    expect(narrow).toMatchObject({ rbMinOhm: 620, rbMaxOhm: 680, recommendedOhm: 620 });
    expect(narrow.setBy).toEqual({ min: 'drive-current', max: 'forced-beta' });
  });

  it('sizes a PNP on an open drain', () => {
    const sizing = sizeStage(highSideStage());
    expect(sizing.recommendedOhm).not.toBeNull();
    expect(sizing.setBy.max).toBe('forced-beta');
  });

  it('gives nothing for a stage it cannot judge', () => {
    const sizing = sizeStage(relayStage({ transistor: TYPE_2N3906 }));
    expect(sizing.candidates).toEqual([]);
  });

  it('is passed by the value it recommends: size, then check', () => {
    for (const supply of [10, 12, 24, 30]) {
      for (const loadOhm of [600, 1500, 4000]) {
        const input = relayStage({
          ...open,
          supplyV: { min: supply * 0.95, max: supply * 1.05 },
          load: { kind: 'resistor', resistanceOhm: loadOhm, tolerance: 0.05 },
          clamp: null,
        });
        const { recommendedOhm, candidates } = sizeStage(input);
        if (recommendedOhm === null) continue;
        const judged = evaluateStage({
          ...input,
          baseResistor: { ...input.baseResistor, valueOhm: recommendedOhm },
        });
        const chosen = candidates.find(({ valueOhm }) => valueOhm === recommendedOhm);
        const worst = judged.criteria.find(({ id }) => id === chosen?.worst);
        expect(worst?.margin).toBe(chosen?.margin);
        expect(['pass', 'marginal']).toContain(worst?.status);
      }
    }
  });
});

describe('judgeStage', () => {
  it('judges an open base resistor at the recommended value', () => {
    const judged = judgeStage(relayStage(open));
    expect(judged.input.baseResistor.valueOhm).toBe(620);
    expect(judged.evaluation).toMatchObject({ verdict: 'marginal', baseResistorOhm: 620 });
  });

  it('fails where no value can be recommended', () => {
    const drive = { ...RELAY_FILE.drive, sourceLimitA: 0.002 };
    const { evaluation, input } = judgeStage(relayStage({ ...open, drive }));
    expect(input.baseResistor.valueOhm).toBeNull();
    expect(evaluation.verdict).toBe('fail');
  });

  it('leaves a given value alone', () => {
    expect(judgeStage(relayStage()).input.baseResistor.valueOhm).toBe(1000);
  });
});

describe('stageResult', () => {
  it('has the keys of the format in its order, and survives JSON', () => {
    const result = stageResult(judgeStage(relayStage({ transistor: TYPE_2N3904 })));
    expect(Object.keys(result)).toEqual([
      'format',
      'reference',
      'verdict',
      'engine',
      'corners',
      'criteria',
      'nominal',
      'sizing',
      'findings',
    ]);
    expect(Object.keys(result.criteria[0] ?? {})).toEqual([
      'id',
      'value',
      'limit',
      'relation',
      'unit',
      'margin',
      'status',
      'corner',
    ]);
    expect(Object.keys(result.sizing)).toEqual([
      'rbMinOhm',
      'rbMaxOhm',
      'setBy',
      'recommendedOhm',
      'candidates',
    ]);
    expect(JSON.parse(JSON.stringify(result))).toEqual(result);
  });
});
