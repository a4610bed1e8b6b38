/**
 * Operating points of 80 randomly made devices in stages, solved by a general-purpose root finder from the full Ebers–Moll
 * transport equations (scipy.optimize.root, script and table beside this file). The engine is given what a data sheet would
 * print of each device at IC/IB = 10; the device model is given its parameters.
 */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import * as z from 'zod';
import { nominalFigures } from '../../shared/checks/corner-figures.ts';
import { baseVoltageV, voltageAtCurrentV } from '../../shared/physics/device-model.ts';
import { thermalVoltageV } from '../../shared/physics/constants.ts';
import { StageInput } from '../../shared/stage/stage-input.ts';

/** One case of the table: device, three tested rows, stage and solved point. */
interface Case {
  readonly device: Record<'isA' | 'betaF' | 'betaR' | 'rcOhm', number>;
  readonly rows: readonly Point[];
  readonly stage: Record<'supplyV' | 'loadOhm' | 'driveV' | 'rbOhm' | 'rbeOhm', number>;
  readonly point: Point;
}
type Point = Record<'icA' | 'ibA' | 'vbeV' | 'vceV', number>;

const FIGURES = 25;

function caseOf(figures: readonly number[]): Case {
  const at = (k: number) => figures[k] ?? NaN;
  const pointAt = (k: number): Point => ({
    icA: at(k),
    ibA: at(k + 1),
    vbeV: at(k + 2),
    vceV: at(k + 3),
  });
  return {
    device: { isA: at(0), betaF: at(1), betaR: at(2), rcOhm: at(3) },
    rows: [4, 8, 12].map(pointAt),
    stage: { supplyV: at(16), loadOhm: at(17), driveV: at(18), rbOhm: at(19), rbeOhm: at(20) },
    point: pointAt(21),
  };
}

const file = new URL('./ebers-moll-points.json', import.meta.url);
const cases = z.array(z.array(z.number()).length(FIGURES).transform(caseOf)).length(40);
const { asTested, beyondTest } = z
  .object({ asTested: cases, beyondTest: cases })
  .parse(JSON.parse(readFileSync(file, 'utf8')));

/** The stage with the device as its data sheet would print it, every tolerance 0, no heating. */
function printed({ device, rows, stage }: Case, betaR: number | null): StageInput {
  return StageInput.parse({
    format: 'sinkwell-stage/1',
    reference: 'Q1',
    title: 'Random device',
    topology: 'low-side-npn',
    supplyV: { min: stage.supplyV, max: stage.supplyV },
    ambientDegC: { min: 25, max: 25 },
    drive: {
      kind: 'push-pull',
      railV: { min: stage.driveV, max: stage.driveV },
      high: { dropV: 0, currentA: 1000 },
      low: { levelV: 0, currentA: 1000 },
      sourceLimitA: null,
      sinkLimitA: null,
    },
    load: { kind: 'resistor', resistanceOhm: stage.loadOhm, tolerance: 0 },
    baseResistor: { valueOhm: stage.rbOhm, tolerance: 0 },
    shuntResistor: { valueOhm: stage.rbeOhm, tolerance: 0 },
    transistor: {
      partNumber: 'random',
      polarity: 'npn',
      limits: { vceoV: 100, icA: 1, powerW: 1e5, tjMaxDegC: 26 },
      thermal: { rthJaKPerW: 1e-9 },
      gain: [{ icA: 0.15, min: device.betaF, max: device.betaF }],
      saturation: rows.map(({ icA, ibA, vceV }) => ({ icA, ibA, maxV: vceV })),
      baseEmitter: rows.map(({ icA, ibA, vbeV }) => ({ icA, ibA, minV: vbeV, maxV: vbeV })),
      model: { betaR },
    },
    policy: { name: 'General practice' },
  });
}

/** How far the engine lies from the solved points: smallest and largest deviation. */
function deviations(
  from: readonly Case[],
  figure: 'icA' | 'ibA' | 'vceV',
  own: 'own βR' | 'usual βR',
): [number, number] {
  const shares = from.map((each) => {
    const stage = printed(each, own === 'own βR' ? each.device.betaR : null);
    return nominalFigures(stage)[figure] / each.point[figure] - 1;
  });
  return [Math.min(...shares), Math.max(...shares)];
}

describe('the table', () => {
  it('holds points that satisfy the transport equations and both loops', () => {
    const vt = thermalVoltageV(25);
    for (const { device, stage, point } of [...asTested, ...beyondTest]) {
      const forward = device.isA * Math.exp(point.vbeV / vt);
      const vbcV = point.vbeV - point.vceV + point.icA * device.rcOhm;
      const back = device.isA * Math.exp(vbcV / vt);
      expect((forward - back * (1 + 1 / device.betaR)) / point.icA).toBeCloseTo(1, 5);
      expect((forward / device.betaF + back / device.betaR) / point.ibA).toBeCloseTo(1, 5);
      expect((stage.supplyV - point.vceV) / stage.loadOhm / point.icA).toBeCloseTo(1, 7);
      const baseA = (stage.driveV - point.vbeV) / stage.rbOhm - point.vbeV / stage.rbeOhm;
      expect(baseA / point.ibA).toBeCloseTo(1, 7);
    }
  });
});

describe('the limit model at the root finder’s operating points', () => {
  it.each([
    // Near the tested IC/IB the rows answer nearly alone; below it no credit is taken, so VCE(sat) is high.
    ['forced β 8 to 14: IC', asTested, 'icA', 'usual βR', -5e-4, 0],
    ['forced β 8 to 14: IB', asTested, 'ibA', 'usual βR', -1e-3, 5e-4],
    ['forced β 8 to 14: VCE', asTested, 'vceV', 'usual βR', 0, 0.08],
    // Far beyond it VBE falls a little that the rows do not tell: IB is low. The published difference carries VCE(sat).
    ['forced β 18 to 45: IC', beyondTest, 'icA', 'usual βR', -1e-3, 1e-5],
    ['forced β 18 to 45: IB', beyondTest, 'ibA', 'usual βR', -6e-3, 0],
    ['forced β 18 to 45: VCE', beyondTest, 'vceV', 'usual βR', -1e-3, 0.15],
    ['forced β 18 to 45: VCE with the part’s own βR', beyondTest, 'vceV', 'own βR', 0, 0.01],
  ] as const)('%s', (_, from, figure, own, least, most) => {
    const [low, high] = deviations(from, figure, own);
    expect(low).toBeGreaterThanOrEqual(least);
    expect(high).toBeLessThanOrEqual(most);
  });

  it('is saturated at all of them', () => {
    for (const each of [...asTested, ...beyondTest]) {
      expect(nominalFigures(printed(each, null)).saturated).toBe(true);
    }
  });
});

describe('the expected device at the root finder’s operating points', () => {
  it('has the same VCE and VBE to a microvolt', () => {
    for (const { device, point } of [...asTested, ...beyondTest]) {
      const model = {
        isA: device.isA,
        gain: device.betaF,
        reverseGain: device.betaR,
        earlyV: 1e12,
        collectorOhm: device.rcOhm,
        dropV: 0,
        thermalV: thermalVoltageV(25),
        junctions: 1,
      };
      const { icA, ibA, vbeV, vceV } = point;
      expect(voltageAtCurrentV(model, { kind: 'current', ibA }, icA)).toBeCloseTo(vceV, 6);
      expect(baseVoltageV(model, icA, ibA)).toBeCloseTo(vbeV, 6);
    }
  });
});
