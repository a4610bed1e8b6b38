import { describe, expect, it } from 'vitest';
import { figuresAtCorner } from '../../../shared/checks/corner-figures.ts';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import {
  leastMargins,
  marginOverTemperature,
} from '../../../shared/checks/margin-over-temperature.ts';
import {
  curvesAtCorner,
  outputCharacteristics,
  saturationAtCorner,
  type CurvesAtCorner,
} from '../../../shared/checks/stage-curves.ts';
import { limitSaturationV } from '../../../shared/physics/curves.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { relayStage } from '../relay-stage.ts';

const stage = relayStage();
const evaluation = evaluateStage(stage);
const cornerOf = (id: string) => {
  const corner = evaluation.criteria.find((each) => each.id === id)?.corner ?? null;
  if (corner === null) throw new Error(`no corner of ${id}`);
  return { ...corner, vceSat: 'max' };
};
const drawn = (id: string): CurvesAtCorner => {
  const at = curvesAtCorner(stage, cornerOf(id));
  if (at === null) throw new Error('nothing to draw');
  return at;
};

describe('curves of a stage at a corner', () => {
  it('start from the operating point that the drawing and the verdict show', () => {
    const figures = figuresAtCorner(stage, cornerOf('overdrive-factor'));
    const { limit, availableV, loadOhm } = drawn('overdrive-factor');
    expect(limit).toMatchObject({ vceV: figures.vceV, icA: figures.icA, ibA: figures.ibA });
    expect(limit.icA).toBeCloseTo((availableV - limit.vceV) / loadOhm, 9);
  });

  it('have the corner on the limit line of VCE(sat)', () => {
    for (const id of ['overdrive-factor', 'saturation-voltage', 'load-voltage']) {
      const at = drawn(id);
      const line = at.part.saturation;
      if (line === null) throw new Error('no rows');
      const volt = limitSaturationV(line, at.limit.icA, {
        tjDegC: at.limit.tjDegC,
        rceTempcoPerK: at.input.policy.rceTempcoPerK,
        forcedBeta: at.forcedBeta,
        gain: at.gain,
      });
      expect(volt).toBeCloseTo(at.limit.vceV, 9);
    }
  });

  it('meet the load line at less than the limit: what is expected is better than the worst', () => {
    const { expected, limit, availableV, loadOhm } = drawn('overdrive-factor');
    expect(expected.icA).toBeCloseTo((availableV - expected.vceV) / loadOhm, 9);
    expect(expected.vceV).toBeLessThan(limit.vceV);
    expect(expected.vceV).toBeGreaterThan(0.03);
    expect(expected.slopeOhm).toBeGreaterThan(1);
    expect(expected.slopeOhm).toBeLessThan(5);
  });

  // Common practice: the curves of one transistor meet at −VA, so IC in the active region grows by 1 + VCE/VA.
  it('are a family in round base currents that meets at −VA', () => {
    const at = drawn('overdrive-factor');
    const family = outputCharacteristics(at, 'current').filter(({ own }) => !own);
    expect(family.length).toBeGreaterThanOrEqual(3);
    family.forEach(({ drive, samples }, k) => {
      const first = family[0]?.drive;
      if (drive.kind !== 'current' || first?.kind !== 'current') throw new Error('no current');
      expect(drive.ibA / first.ibA).toBeCloseTo(k + 1, 9);
      const [[v0, i0], [v1, i1]] = [samples[30]!, samples[40]!];
      expect(v0 - (i0 * (v1 - v0)) / (i1 - i0)).toBeCloseTo(-at.earlyV, -1);
      expect(samples.at(-1)![1]).toBeLessThan(1.1 * at.fullA);
    });
  });

  it('hold the base voltage instead on request, ten millivolts apart', () => {
    const at = drawn('overdrive-factor');
    const family = outputCharacteristics(at, 'voltage').filter(({ own }) => !own);
    const volts = family.map(({ drive }) => (drive.kind === 'voltage' ? drive.vbeV : NaN));
    expect(volts).toHaveLength(5);
    expect(volts[1]! - volts[0]!).toBeCloseTo(0.01, 9);
    const ends = family.map(({ samples }) => samples.at(-1)![1]);
    // e^(10 mV/VT) from curve to curve: about 1.5 (common practice: a decade every 60 mV).
    for (let k = 1; k < ends.length; k++) {
      expect(ends[k]! / ends[k - 1]!).toBeGreaterThan(1.35);
      expect(ends[k]! / ends[k - 1]!).toBeLessThan(1.65);
    }
  });

  it('lay the corner over the part’s line, which stops at the last row', () => {
    const at = drawn('saturation-voltage');
    const curves = saturationAtCorner(at);
    if (curves === null) throw new Error('no rows');
    expect(curves.maxima).toEqual([
      [0.01, 0.2],
      [0.05, 0.3],
    ]);
    expect(curves.sheet.at(-1)).toEqual([0.05, 0.3]);
    expect(curves.beyond[0]).toEqual([0.05, 0.3]);
    expect(curves.piece).toMatchObject({ fromA: 0.01, toA: 0.05 });
    for (const [k, [icA, limitV]] of curves.corner.entries()) {
      const expected = curves.expected[k - 1];
      if (expected === undefined) continue;
      expect(expected[0]).toBe(icA);
      expect(expected[1]).toBeLessThan(limitV);
    }
  });

  it('are not drawn where nothing flows', () => {
    const dead = StageInput.parse({
      ...stage,
      shuntResistor: { valueOhm: 50, tolerance: 0.05 },
    });
    expect(curvesAtCorner(dead, cornerOf('overdrive-factor'))).toBeNull();
  });
});

describe('margin over ambient temperature', () => {
  it('ends at the margins of the verdict and lies nowhere below them', () => {
    const least = leastMargins(evaluation.criteria, 3);
    const ids = least.map(({ id }) => id);
    const points = [...marginOverTemperature(stage, ids)];
    expect(points.map(({ ambientDegC }) => ambientDegC)).toEqual(
      expect.arrayContaining([stage.ambientDegC.min, stage.ambientDegC.max]),
    );
    for (const { id, margin } of least) {
      const along = points.map(({ margins }) => margins[id] ?? Infinity);
      expect(Math.min(...along), id).toBeCloseTo(margin ?? NaN, 9);
      expect([along[0], along.at(-1)], id).toContain(Math.min(...along));
    }
  });

  it('lists the least margins first', () => {
    const margins = leastMargins(evaluation.criteria, 5).map(({ margin }) => margin ?? NaN);
    expect(margins).toHaveLength(5);
    expect(margins).toEqual([...margins].sort((a, b) => a - b));
  });

  it('shows a stage of one temperature with a little room on either side', () => {
    const fixed = { ...stage, ambientDegC: { min: 25, max: 25 } };
    const degrees = [...marginOverTemperature(fixed, [])].map(({ ambientDegC }) => ambientDegC);
    expect([degrees[0], degrees.at(-1)]).toEqual([15, 35]);
  });
});
