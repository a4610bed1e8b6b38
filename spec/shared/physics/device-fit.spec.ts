import { describe, expect, it } from 'vitest';
import {
  baseVoltageV,
  collectorCurrentA,
  meetLoadLine,
  outputResistanceOhm,
  voltageAtCurrentV,
} from '../../../shared/physics/device-model.ts';
import { deviceAt, fitDevice, USUAL_EARLY_V } from '../../../shared/physics/device-fit.ts';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import { GENERAL_PRACTICE } from '../../../shared/stage/policy.ts';
import { partModel } from '../../../shared/stage/part-model.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { find, transistors } from '../parts/library-file.ts';

const NO_FIGURES = { earlyV: null, betaR: null, isA: null, rcOhm: null };
const TEMPCO = GENERAL_PRACTICE.rceTempcoPerK;

function data(partNumber: string): TransistorData {
  const derived = deriveTransistor(find(transistors, partNumber));
  if (!derived.ok) throw new Error(derived.reason);
  return derived.data;
}

function fitted(part: TransistorData) {
  const { gain, saturation, baseEmitter, junctions } = partModel(part, GENERAL_PRACTICE);
  const rows = { gain, saturation, baseEmitter, junctions, icMaxA: part.limits.icA };
  return { model: fitDevice(part.model ?? NO_FIGURES, rows), saturation };
}

const usable = transistors
  .filter(({ family }) => family !== 'darlington-array' && family !== 'pre-biased')
  .map(({ partNumber }) => partNumber);
const single = usable.filter((name) => !data(name).darlington);

describe('the device fitted to a part', () => {
  it.each(usable)('of %s is finite, and says where each figure comes from', (name) => {
    const { model } = fitted(data(name));
    const { isA, reverseGain, earlyV, collectorOhm } = model;
    for (const figure of [isA, reverseGain, earlyV]) expect(figure).toBeGreaterThan(0);
    expect(collectorOhm).toBeGreaterThanOrEqual(0);
    expect(model.origin.earlyV).toBe('usual');
    expect(earlyV).toBe(USUAL_EARLY_V);
    expect(model.origin.gain).toBe('rows');
  });

  // Typical rows, else 0.7 of the maxima: the fit may smooth them, never lie about them.
  it.each(single)('of %s comes back to the VCE(sat) rows it was fitted to', (name) => {
    const { model, saturation } = fitted(data(name));
    if (saturation === null) throw new Error('no rows');
    saturation.rowA.forEach((icA, k) => {
      const ibA = icA / (saturation.testBeta[k] ?? 1);
      const device = deviceAt(model, ibA, 25, TEMPCO);
      const volt = voltageAtCurrentV(device, { kind: 'current', ibA }, icA);
      expect(volt / (saturation.usualV[k] ?? 0)).toBeGreaterThan(0.5);
      expect(volt / (saturation.usualV[k] ?? 0)).toBeLessThan(1.5);
      expect(volt).toBeLessThan((saturation.maxV[k] ?? 0) * 1.05);
    });
  });

  // Common practice: small-signal parts drop 0.1 to 0.3 V at a forced β of 10; their VBE is 0.6 to 0.8 V.
  it.each(['2N3904', '2N2222A', 'BC547B', '2N3906'])(
    'of %s drops what small-signal transistors drop at 10 mA, 1 mA',
    (name) => {
      const device = deviceAt(fitted(data(name)).model, 1e-3, 25, TEMPCO);
      const volt = voltageAtCurrentV(device, { kind: 'current', ibA: 1e-3 }, 0.01);
      expect(volt).toBeGreaterThan(0.03);
      expect(volt).toBeLessThan(0.3);
      expect(baseVoltageV(device, 0.01, 1e-3)).toBeGreaterThan(0.6);
      expect(baseVoltageV(device, 0.01, 1e-3)).toBeLessThan(0.9);
    },
  );

  it('has the gain of the specimen halfway between the limits at the current of its base', () => {
    // 2N3904 at 10 mA: 100 to 300 printed (onsemi 2N3903/D), so 173 halfway on the logarithm.
    const device = deviceAt(fitted(data('2N3904')).model, 0.01 / 173.2, 25, TEMPCO);
    expect(device.gain).toBeCloseTo(173.2, 0);
    const hot = deviceAt(fitted(data('2N3904')).model, 0.01 / 173.2, 100, TEMPCO);
    expect(hot.gain / device.gain).toBeGreaterThan(1.2);
  });

  it('takes the figures a part record gives before its rows', () => {
    const own = { earlyV: 74, betaR: 0.74, isA: 6.7e-15, rcOhm: 1 };
    const { model } = fitted({ ...data('2N3904'), model: own });
    expect(model).toMatchObject({ earlyV: 74, reverseGain: 0.74, isA: 6.7e-15, collectorOhm: 1 });
    expect(new Set([model.origin.earlyV, model.origin.isA, model.origin.reverseGain])).toEqual(
      new Set(['part']),
    );
  });

  it('does with usual figures where a part prints no row at all', () => {
    const bare = { ...data('2N3904'), gain: [], saturation: [], baseEmitter: [] };
    const { model } = fitted(bare);
    expect(new Set(Object.values(model.origin))).toEqual(new Set(['usual']));
    const device = deviceAt(model, 1e-4, 25, TEMPCO);
    expect(device.gain).toBe(100);
    expect(collectorCurrentA(device, { kind: 'current', ibA: 1e-4 }, 5)).toBeGreaterThan(0.01);
  });

  it('carries no current below the drop of a Darlington, and its drop above it', () => {
    const name = usable.find((each) => data(each).darlington) ?? '';
    const { model, saturation } = fitted(data(name));
    const icA = saturation?.rowA[0] ?? 0;
    const drive = { kind: 'current', ibA: icA / (saturation?.testBeta[0] ?? 1) } as const;
    const device = deviceAt(model, drive.ibA, 25, TEMPCO);
    expect(collectorCurrentA(device, drive, 0.5)).toBe(0);
    expect(voltageAtCurrentV(device, drive, icA)).toBeGreaterThan(0.6);
  });
});

describe('curves of a fitted device', () => {
  const { model } = fitted(data('2N3904'));

  it('rise with VCE and with the base current, whatever the part', () => {
    for (const name of usable) {
      const each = fitted(data(name)).model;
      const icMaxA = data(name).limits.icA ?? 0.1;
      const base = icMaxA / 500;
      let before = -Infinity;
      const device = deviceAt(each, base, 25, TEMPCO);
      for (const vceV of [0.05, 0.1, 0.2, 0.5, 0.8, 1, 2, 5, 10, 20]) {
        const icA = collectorCurrentA(device, { kind: 'current', ibA: base }, vceV);
        expect(icA).toBeGreaterThanOrEqual(before);
        before = icA;
      }
      const more = deviceAt(each, 1.5 * base, 25, TEMPCO);
      expect(collectorCurrentA(more, { kind: 'current', ibA: 1.5 * base }, 5)).toBeGreaterThan(
        collectorCurrentA(device, { kind: 'current', ibA: base }, 5),
      );
    }
  });

  it('meet a load line on both: on the line, and on the curve', () => {
    const drive = { kind: 'current', ibA: 2.71e-3 } as const;
    const device = deviceAt(model, drive.ibA, 25, TEMPCO);
    const { vceV, icA, slopeOhm } = meetLoadLine(device, drive, 26.4, 1092);
    expect(icA).toBeCloseTo((26.4 - vceV) / 1092, 9);
    expect(collectorCurrentA(device, drive, vceV)).toBeCloseTo(icA, 7);
    const [low, high] = [-1e-4, 1e-4].map((step) => collectorCurrentA(device, drive, vceV + step));
    expect(slopeOhm).toBeCloseTo(2e-4 / ((high ?? 0) - (low ?? 0)), 2);
  });

  it('show VA/IC as slope in the active region', () => {
    const drive = { kind: 'current', ibA: 5e-5 } as const;
    const device = deviceAt(model, drive.ibA, 25, TEMPCO);
    const { vceV, icA, slopeOhm } = meetLoadLine(device, drive, 12, 500);
    expect(vceV).toBeGreaterThan(1);
    // ro = VA/IC with IC at VCE = 0; at VCE the current has grown by 1 + VCE/VA.
    expect(slopeOhm).toBeCloseTo(outputResistanceOhm(USUAL_EARLY_V + vceV, icA), -2);
  });
});
