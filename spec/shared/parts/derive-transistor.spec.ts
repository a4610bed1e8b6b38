import { describe, expect, it } from 'vitest';
import { makerNames } from '../../../shared/parts/chosen-limits.ts';
import { gainGroups } from '../../../shared/parts/chosen-rows.ts';
import {
  deriveTransistor,
  type TransistorChoice,
} from '../../../shared/parts/derive-transistor.ts';
import type { TransistorData } from '../../../shared/stage/transistor-data.ts';
import { find, transistors } from './library-file.ts';

function derived(partNumber: string, choice: TransistorChoice = {}): TransistorData {
  const result = deriveTransistor(find(transistors, partNumber), choice);
  if (!result.ok) throw new Error(result.reason);
  return result.data;
}

describe('deriveTransistor', () => {
  it('gives the 2N3904 of onsemi 2N3903/D Rev. 9, with document and pages', () => {
    const data = derived('2N3904');
    expect(data).toMatchObject({
      partNumber: '2N3904',
      polarity: 'npn',
      darlington: false,
      package: 'TO-92',
      limits: { vceoV: 40, vcboV: 60, veboV: 6, icA: 0.2, powerW: 0.625, tjMaxDegC: 150 },
      thermal: { rthJaKPerW: 200, rthJcKPerW: 83.3 },
      switching: { tdSec: 3.5e-8, trSec: 3.5e-8, tsSec: 2e-7, tfSec: 5e-8, icA: 0.01 },
      capacitanceF: 4e-12,
      internal: null,
    });
    expect(data.gain[2]).toEqual({
      icA: 0.01,
      vceV: 1,
      min: 100,
      typ: null,
      max: 300,
      tempDegC: 25,
    });
    expect(data.saturation).toHaveLength(2);
    expect(data.baseEmitter[0]).toEqual({
      kind: 'sat',
      icA: 0.01,
      ibA: 0.001,
      minV: 0.65,
      typV: null,
      maxV: 0.85,
    });
    expect(data.source).toContain('2N3903/D, Rev. 9, August 2021');
    expect(data.source).toContain('pp. 1-2');
  });

  it('leaves the base current IBL and the emitter current IEBO behind', () => {
    expect(derived('2N3904').leakage).toEqual([
      { kind: 'icex', currentA: 5e-8, voltageV: 30, tempDegC: 25 },
    ]);
    expect(derived('2N5551').leakage.map(({ kind, tempDegC }) => [kind, tempDegC])).toEqual([
      ['icbo', 25],
      ['icbo', 100],
    ]);
  });

  it('derives every part of the library but the array', () => {
    const refusals = transistors
      .filter((record) => !deriveTransistor(record).ok)
      .map(({ partNumber }) => partNumber);
    expect(refusals).toEqual(['ULN2003A']);
    expect(deriveTransistor(find(transistors, 'ULN2003A'))).toEqual({
      ok: false,
      reason: 'ULN2003A is an array: a stage takes single transistors.',
    });
  });

  it('flags Darlingtons and magnitudes of PNP parts', () => {
    expect(derived('TIP127')).toMatchObject({ darlington: true, polarity: 'pnp' });
    expect(derived('2N3906').limits.vceoV).toBe(40);
  });

  it('keeps VBE(on) rows as such where no VBE(sat) is printed', () => {
    expect(derived('BC337-40').baseEmitter.map(({ kind, icA, maxV }) => [kind, icA, maxV])).toEqual(
      [
        ['on', 0.5, 1.2],
        ['on', 0.3, 1.2],
      ],
    );
  });

  it('gives no switching row where only totals are printed, and says so', () => {
    const result = deriveTransistor(find(transistors, '2N2219A'));
    expect(result).toMatchObject({ ok: true, data: { switching: null } });
    expect(result.ok ? result.remarks : []).toEqual([
      'Only turn-on and turn-off totals are printed: no switching row.',
    ]);
  });
});

describe('with the maker open', () => {
  it('takes the safest figure any maker prints', () => {
    expect(derived('2N2222A')).toMatchObject({
      limits: { tjMaxDegC: 175, powerW: 0.5, icPeakA: 0.8 },
      thermal: { rthJaKPerW: 350, rthJcKPerW: 146 },
      switching: { tsSec: 2.25e-7 },
    });
    expect(derived('BC337-40').limits.icA).toBe(0.5);
    expect(derived('PN2222A').limits.icA).toBe(0.6);
    expect(derived('BC547B').limits.powerW).toBe(0.5);
    expect(derived('TIP41C').thermal).toEqual({ rthJaKPerW: 62.5, rthJcKPerW: 1.92 });
  });

  it('keeps rows of all makers', () => {
    const hot = derived('BC817-40').leakage.filter(({ tempDegC }) => tempDegC === 150);
    expect(hot.map(({ currentA }) => currentA)).toEqual([5e-5, 5e-6]);
  });
});

describe('with the maker fixed', () => {
  it('takes its ratings, and the listed ones where it prints none', () => {
    const philips = derived('2N2222A', { maker: 'Philips Semiconductors' });
    expect(philips.limits).toMatchObject({ tjMaxDegC: 200, icPeakA: 0.8, vceoV: 40 });
    expect(philips.switching?.tsSec).toBe(2e-7);
    expect(philips.source).toContain('limits of Philips Semiconductors');
    expect(derived('2N2222A', { maker: 'STMicroelectronics' })).toMatchObject({
      limits: { tjMaxDegC: 175, icPeakA: null },
      switching: { tsSec: 2.25e-7 },
    });
  });

  it('drops rows of others where it prints the same point', () => {
    const gain = derived('BD139', { maker: 'Philips Semiconductors' }).gain;
    expect(gain.map(({ icA, min, max }) => [icA, min, max])).toEqual([
      [0.5, 25, null],
      [0.005, 40, null],
      [0.15, 63, 250],
    ]);
  });

  it('tells mountings of one maker apart', () => {
    const names = makerNames(find(transistors, 'BC847B'));
    expect(new Set(names).size).toBe(3);
    const alumina = names.find((name) => name.includes('alumina')) ?? '';
    expect(derived('BC847B', { maker: alumina }).thermal.rthJaKPerW).toBe(417);
    expect(derived('BC847B').thermal.rthJaKPerW).toBe(556);
  });

  it('refuses a maker the record does not have', () => {
    expect(deriveTransistor(find(transistors, '2N3904'), { maker: 'Nobody' })).toEqual({
      ok: false,
      reason: '2N3904 has no figures of Nobody.',
    });
  });

  it('names every choice of the library once', () => {
    for (const record of transistors) {
      const names = makerNames(record);
      expect(new Set(names).size, record.partNumber).toBe(names.length);
    }
  });
});

describe('gain groups', () => {
  it('replaces the common row at the point the group prints', () => {
    expect(gainGroups(find(transistors, 'BD139'))).toEqual(['-10', '-16']);
    const at150mA = (group: string | null) =>
      derived('BD139', { group })
        .gain.filter(({ icA }) => icA === 0.15)
        .map(({ min, max }) => [min, max]);
    expect(at150mA('-16')).toEqual([[100, 250]]);
    expect(at150mA('-10')).toEqual([[63, 160]]);
    expect(at150mA(null)).toEqual([
      [40, 250],
      [63, 250],
    ]);
  });

  it('refuses a group the record does not have', () => {
    expect(deriveTransistor(find(transistors, 'BD139'), { group: '-25' })).toEqual({
      ok: false,
      reason: 'BD139 has no gain group -25.',
    });
  });
});

describe('pre-biased parts', () => {
  it('gives R1, R2, tolerances and input rows of the DTC114E', () => {
    const data = derived('DTC114E');
    expect(data.internal).toEqual({
      r1Ohm: 10_000,
      r2Ohm: 10_000,
      r1Tolerance: 0.3,
      ratioTolerance: 0.2,
      input: {
        onV: 3,
        onOutputA: 0.01,
        offV: 0.5,
        currentA: 8.8e-4,
        testV: 5,
        gi: 30,
        maximumV: 40,
      },
    });
    expect(data.limits).toMatchObject({ vceoV: 50, icA: 0.05 });
    expect(data.saturation).toEqual([{ icA: 0.01, ibA: 5e-4, typV: 0.1, maxV: 0.3 }]);
    expect(data.leakage).toEqual([{ kind: 'ices', currentA: 5e-7, voltageV: 50, tempDegC: 25 }]);
  });

  it('takes the thermal resistance of the package, else the largest', () => {
    expect(derived('PDTC143X', { package: 'SOT23' }).thermal.rthJaKPerW).toBe(500);
    expect(derived('PDTC143X').thermal.rthJaKPerW).toBe(833);
  });

  it('prefers a printed R2 over the ratio', () => {
    expect(derived('DTC123J').internal).toMatchObject({ r1Ohm: 2200, r2Ohm: 47_000 });
    expect(derived('PDTC143X').internal?.r2Ohm).toBeCloseTo(9870, 6);
  });
});
