/**
 * The data sheets behind the shipped library, by the sources each record names: what is printed at a row comes out of the
 * interpolation at that row. Expected figures are taken from the records by plain sorting, not by the engine's own tables.
 */
import { describe, expect, it } from 'vitest';
import { maximumVbeV, minimumVbeV } from '../../shared/physics/base-emitter.ts';
import { maximumGain, minimumGain } from '../../shared/physics/gain.ts';
import { leakageA } from '../../shared/physics/leakage.ts';
import { pieceAt } from '../../shared/physics/saturation.ts';
import { deriveTransistor } from '../../shared/parts/derive-transistor.ts';
import { insideModel } from '../../shared/stage/internal-resistors.ts';
import { partModel } from '../../shared/stage/part-model.ts';
import { GENERAL_PRACTICE } from '../../shared/stage/policy.ts';
import type { TransistorData } from '../../shared/stage/transistor-data.ts';
import { transistors } from '../shared/parts/library-file.ts';
import { relayStage } from '../shared/relay-stage.ts';

const parts = transistors.flatMap((record): TransistorData[] => {
  const derived = deriveTransistor(record);
  return derived.ok ? [derived.data] : [];
});
const named = (matches: (part: TransistorData) => boolean) =>
  parts.filter(matches).map((part) => [part.partNumber, part] as const);

function modelOf(part: TransistorData) {
  const topology = part.internal === null ? 'low-side-npn' : 'low-side-pre-biased';
  const inside = insideModel({ ...relayStage(), topology, transistor: part });
  return partModel(part, GENERAL_PRACTICE, part.darlington, inside);
}

/** What rows of one current come to, by that current. */
function byCurrent<T extends { readonly icA: number }>(
  rows: readonly T[],
  read: (row: T) => number | null,
  merge: (...values: number[]) => number,
): [number, number][] {
  const currents = [...new Set(rows.filter((row) => read(row) !== null).map(({ icA }) => icA))];
  return currents
    .sort((a, b) => a - b)
    .map((icA) => {
      const printed = rows.filter((row) => row.icA === icA).map(read);
      return [icA, merge(...printed.filter((value) => value !== null))];
    });
}

describe('rows of the library', () => {
  it('belong to 35 single transistors', () => {
    expect(parts).toHaveLength(35);
  });

  it.each(named(({ gain, internal }) => internal === null && gain.some(({ min }) => min !== null)))(
    '%s: hFE minimum and maximum',
    (_, part) => {
      const { gain } = modelOf(part);
      if (gain === null) throw new Error('no gain table');
      const sheet = part.gain.filter(({ tempDegC }) => tempDegC === 25);
      const lowered = measuredHigher(sheet);
      for (const [icA, min] of byCurrent(sheet, (row) => row.min, Math.min)) {
        const found = minimumGain(gain, icA);
        if (lowered.has(icA)) expect(found).toBeLessThanOrEqual(min);
        else expect(found / min).toBeCloseTo(1, 9);
      }
      for (const [icA, max] of byCurrent(sheet, (row) => row.max, Math.max)) {
        expect(maximumGain(gain, icA)).toBeGreaterThanOrEqual(max * (1 - 1e-9));
      }
    },
  );

  it.each(named(({ saturation }) => saturation.some(({ maxV }) => maxV !== null)))(
    '%s: VCE(sat) maximum',
    (_, part) => {
      const { saturation } = modelOf(part);
      if (saturation === null) throw new Error('no saturation line');
      let highestV = 0;
      for (const [icA, maxV] of byCurrent(part.saturation, (row) => row.maxV, Math.max)) {
        highestV = Math.max(highestV, maxV);
        const k = pieceAt(saturation, icA);
        const volt = (saturation.interceptV[k] ?? 0) + (saturation.slopeOhm[k] ?? 0) * icA;
        expect(volt).toBeCloseTo(highestV, 9);
      }
    },
  );

  const printsSat = ({ baseEmitter }: TransistorData) =>
    baseEmitter.some(({ kind, maxV }) => kind === 'sat' && maxV !== null);
  it.each(named(printsSat))('%s: VBE(sat) maximum and minimum', (_, part) => {
    const { baseEmitter } = modelOf(part);
    const sat = part.baseEmitter.filter(({ kind }) => kind === 'sat');
    for (const [icA, maxV] of byCurrent(sat, (row) => row.maxV, Math.max)) {
      expect(maximumVbeV(baseEmitter, icA)).toBeCloseTo(maxV, 9);
    }
    for (const [icA, minV] of byCurrent(sat, (row) => row.minV, Math.min)) {
      expect(minimumVbeV(baseEmitter, icA)).toBeCloseTo(minV, 9);
    }
  });

  const CLASSES = [['icbo'], ['ices', 'icex'], ['iceo']];
  it.each(named(({ leakage, darlington }) => leakage.length > 0 && !darlington))(
    '%s: leakage at each printed temperature',
    (_, part) => {
      const { leakage } = modelOf(part);
      const used = CLASSES.map((kinds) =>
        part.leakage.filter(({ kind }) => kinds.includes(kind)),
      ).find((rows) => rows.length > 0);
      if (leakage === null || used === undefined) throw new Error('no leakage');
      for (const degC of new Set(used.map(({ tempDegC }) => tempDegC))) {
        const printed = used.filter(({ tempDegC }) => tempDegC === degC);
        const largestA = Math.max(...printed.map(({ currentA }) => currentA));
        expect(leakageA(leakage, degC) / largestA).toBeCloseTo(1, 9);
      }
    },
  );
});

/** Currents of rows measured at a VCE that a pair of rows shows to flatter: those minima are cut. */
function measuredHigher(sheet: TransistorData['gain']): Set<number> {
  const flattering = sheet.flatMap((high) =>
    sheet
      .filter((low) => low.icA === high.icA && (low.vceV ?? 0) < (high.vceV ?? 0))
      .filter((low) => (low.min ?? Infinity) < (high.min ?? 0))
      .map(() => high),
  );
  return new Set(
    sheet
      .filter(({ icA, vceV }) => flattering.some((row) => icA > row.icA && vceV === row.vceV))
      .map(({ icA }) => icA),
  );
}

describe('common practice: a saturated small-signal part drops 0.1 to 0.3 V at IC/IB 10', () => {
  const small = ({ limits, darlington, internal, saturation }: TransistorData) =>
    !darlington &&
    internal === null &&
    (limits.icA ?? 1) <= 0.8 &&
    saturation.some(({ icA, ibA, maxV }) => maxV !== null && icA / ibA === 10);
  const found = named(small);

  it('is about so of the limits at 10 mA: 0.09 to 0.4 V', () => {
    expect(found.length).toBeGreaterThan(9);
    for (const [partNumber, part] of found) {
      const { saturation } = modelOf(part);
      if (saturation === null) throw new Error(partNumber);
      const k = pieceAt(saturation, 0.01);
      const volt = (saturation.interceptV[k] ?? 0) + (saturation.slopeOhm[k] ?? 0) * 0.01;
      expect(volt, partNumber).toBeGreaterThanOrEqual(0.09);
      expect(volt, partNumber).toBeLessThanOrEqual(0.4);
    }
  });
});
