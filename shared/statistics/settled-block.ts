import { fillVbeBetweenV } from '../physics/base-emitter.ts';
import { copperRatio } from '../physics/coil.ts';
import { SHEET_DEG_C } from '../physics/constants.ts';
import { fillGainBetween, gainRatio, type GainTable } from '../physics/gain.ts';
import {
  drawSpecimen,
  expectedInterceptAtV,
  expectedResistanceRatio,
  forcedBetaStepV,
  pieceAt,
  type SaturationLine,
} from '../physics/saturation.ts';
import { SMALLEST_LOAD_OHM } from '../stage/collector-path.ts';
import { driveSource, isHighSide } from '../stage/drive-source.ts';
import type { CoilLoad, ResistorLoad } from '../stage/load.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';
import type { Draws } from './quantities.ts';

/** What `settle` finds for each sample of a block, a column each. */
const COLUMNS = [
  'supplyV',
  'railV',
  'ambientDegC',
  'loadDegC',
  'loadOhm',
  'fullA',
  'logFullA',
  'rbOhm',
  'rbeOhm',
  'gain25',
  'vbe25V',
  'tjDegC',
  'vbeV',
  'gain',
  'driveA',
  'ibA',
  'forcedBeta',
  'overdrive',
  'rceSatOhm',
  'icA',
  'vceV',
  'powerW',
] as const;
type Column = (typeof COLUMNS)[number];

const SECANT_STEPS = 12;

/** Where the junction of a sample is looked for. */
export interface JunctionSearch {
  /** Rise over ambient to start from, K. */
  readonly riseK: number;
  /** What the balance is expected to move by with the junction, K per K. */
  readonly feedback: number;
  /** How near it must be brought, K. */
  readonly nearK: number;
  /** Samples that reach this are left to the operating point, °C. */
  readonly belowDegC: number;
}

/**
 * The operating points of a block of samples, column by column: what `OperatingPoint` finds for a single transistor with
 * a coil or a resistor behind a push-pull output or a low side, as long as it is saturated and its pin inside the tested
 * current. Numbers stand in typed arrays and in the variables of one loop, where they cost no allocation.
 */
export class SettledBlock {
  readonly columns: Readonly<Record<Column, Float64Array>>;
  /** Piece of the saturation line in use. */
  readonly piece: Uint8Array;
  /** 1 where a sample is found; the others need the operating point itself. */
  readonly found: Uint8Array;

  private readonly input: StageInput;
  private readonly load: CoilLoad | ResistorLoad;
  private readonly gain: GainTable;
  private readonly saturation: SaturationLine;
  private readonly search: JunctionSearch;
  private readonly model: StageModel;

  private constructor(
    input: StageInput,
    model: StageModel,
    load: CoilLoad | ResistorLoad,
    gain: GainTable,
    saturation: SaturationLine,
    search: JunctionSearch,
    size: number,
  ) {
    this.columns = Object.fromEntries(
      COLUMNS.map((name) => [name, new Float64Array(size)]),
    ) as Record<Column, Float64Array>;
    this.piece = new Uint8Array(size);
    this.found = new Uint8Array(size);
    this.input = input;
    this.model = model;
    this.load = load;
    this.gain = gain;
    this.saturation = saturation;
    this.search = search;
  }

  /**
   * @param input the stage with its tolerances
   * @param model of the same stage, for expected figures
   * @returns null for stages whose samples need the operating point itself
   */
  static of(
    input: StageInput,
    model: StageModel,
    size: number,
    search: JunctionSearch,
  ): SettledBlock | null {
    const { load, drive, frequencyHz } = input;
    const { gain, saturation } = model.part;
    if (gain === null || saturation === null || model.inside !== null) return null;
    if (load.kind !== 'coil' && load.kind !== 'resistor') return null;
    if (frequencyHz > 0 || (drive.kind === 'open-collector' && !isHighSide(input))) return null;
    return new SettledBlock(input, model, load, gain, saturation, search, size);
  }

  /** Finds the samples of a block of drawn columns. */
  settle(draws: Draws): void {
    this.placeSupply(draws);
    this.placeLoad(draws.load);
    this.placeResistors(draws);
    const { fullA, logFullA, gain25, vbe25V } = this.columns;
    fillGainBetween(gain25, this.gain, logFullA, draws.gain);
    fillVbeBetweenV(vbe25V, this.model.part.baseEmitter, fullA, logFullA, draws.vbe);
    this.settleJunctions(draws);
  }

  private placeSupply(draws: Draws): void {
    const { supplyV, railV, ambientDegC } = this.columns;
    fillSpan(supplyV, this.input.supplyV, draws.supply);
    fillSpan(railV, this.input.drive.railV, draws.rail);
    fillSpan(ambientDegC, this.input.ambientDegC, draws.ambient);
  }

  private placeLoad(share: Float64Array): void {
    const { load } = this;
    const { supplyV, ambientDegC, loadDegC, loadOhm, fullA, logFullA } = this.columns;
    const { resistanceOhm, tolerance } = load;
    const riseK = load.kind === 'coil' ? load.temperatureRiseK : 0;
    for (let k = 0; k < loadOhm.length; k++) {
      const degC = (ambientDegC[k] ?? 0) + riseK;
      const sheetOhm = resistanceOhm * (1 + (share[k] ?? 0) * tolerance);
      const ohm =
        load.kind === 'coil'
          ? Math.max(SMALLEST_LOAD_OHM, sheetOhm * copperRatio(degC, load.referenceDegC))
          : sheetOhm;
      const current = (supplyV[k] ?? 0) / ohm;
      loadDegC[k] = degC;
      loadOhm[k] = ohm;
      fullA[k] = current;
      logFullA[k] = Math.log(current);
    }
  }

  private placeResistors(draws: Draws): void {
    const { rbOhm, rbeOhm } = this.columns;
    const { baseResistor, shuntResistor } = this.input;
    const base = baseResistor.valueOhm ?? Infinity;
    const shunt = shuntResistor ?? { valueOhm: Infinity, tolerance: 0 };
    fillTolerance(rbOhm, base, baseResistor.tolerance, draws.baseResistor);
    fillTolerance(rbeOhm, shunt.valueOhm, shunt.tolerance, draws.shuntResistor);
  }

  /** The output as drawn: its open voltage moves with rail or supply, its resistance with its drop, both straight. */
  private output() {
    const { input, columns } = this;
    const onSupply = isHighSide(input) || input.drive.railTracksSupply;
    const { openV, sourceOhm, testedA } = driveSource(input, 0, 0, false, 0);
    return {
      rootV: onSupply ? columns.supplyV : columns.railV,
      openBy: openV,
      mostOhm: sourceOhm,
      testedA: testedA * (1 + 1e-12),
    };
  }

  /** Secant steps to the junction's balance, as the operating point takes them. */
  private settleJunctions(draws: Draws): void {
    const { model, columns, saturation, piece: pieces, found } = this;
    const { supplyV, ambientDegC, rbOhm, rbeOhm, fullA, loadOhm, gain25, vbe25V } = columns;
    const { rootV, openBy, mostOhm, testedA } = this.output();
    const { vbeTempcoVPerK, rthJaKPerW } = model.part;
    const rth = rthJaKPerW ?? 0;
    const { exponent } = this.gain;
    const { rceTempcoPerK } = model.input.policy;
    const { conductionShare } = model;
    const { riseK, feedback, nearK, belowDegC } = this.search;
    const { slopeOhm, testBeta, upToA, reverseGain } = saturation;
    for (let k = 0; k < fullA.length; k++) {
      drawSpecimen(saturation, at(draws.vceSat, k));
      const ambient = at(ambientDegC, k);
      const full = at(fullA, k);
      const availableV = at(supplyV, k);
      const ohm = at(loadOhm, k);
      const openV = at(rootV, k) + openBy;
      const driveOhm = at(draws.source, k) * mostOhm + at(rbOhm, k);
      const shuntOhm = at(rbeOhm, k);
      const fullPiece = pieceAt(saturation, full);
      let t = ambient + Math.max(0, riseK);
      let before = 0;
      let gapBefore = 0;
      found[k] = 0;
      for (let step = 0; step <= SECANT_STEPS && t >= ambient && t < belowDegC; step++) {
        const vbeV = Math.max(0, at(vbe25V, k) + vbeTempcoVPerK * (t - SHEET_DEG_C));
        const gain = at(gain25, k) * gainRatio(t, exponent);
        const driveA = (openV - vbeV) / driveOhm;
        const ibA = driveA - vbeV / shuntOhm;
        const forcedBeta = full / ibA;
        if (!(ibA > 0 && forcedBeta < gain && driveA <= testedA)) break;
        const slopeRatio = expectedResistanceRatio(t, rceTempcoPerK);
        let piece = fullPiece;
        let rceOhm = 0;
        let current = 0;
        for (;;) {
          const interceptV =
            expectedInterceptAtV(saturation, piece, t) +
            forcedBetaStepV(forcedBeta, at(testBeta, piece), gain, reverseGain, t);
          rceOhm = at(slopeOhm, piece) * slopeRatio;
          current = (availableV - interceptV) / (ohm + rceOhm);
          if (piece === 0 || current > at(upToA, piece - 1)) break;
          piece--;
        }
        const icA = Math.max(0, Math.min(current, at(upToA, piece), full));
        const vceV = Math.max(0, availableV - icA * ohm);
        const powerW = conductionShare * (vceV * icA + vbeV * ibA);
        const gap = ambient + rth * powerW - t;
        if (Math.abs(gap) < nearK) {
          found[k] = 1;
          pieces[k] = piece;
          columns.tjDegC[k] = t;
          columns.vbeV[k] = vbeV;
          columns.gain[k] = gain;
          columns.driveA[k] = driveA;
          columns.ibA[k] = ibA;
          columns.forcedBeta[k] = forcedBeta;
          columns.overdrive[k] = (gain * ibA) / full;
          columns.rceSatOhm[k] = rceOhm;
          columns.icA[k] = icA;
          columns.vceV[k] = vceV;
          columns.powerW[k] = powerW;
          break;
        }
        const next =
          step === 0 ? t + gap / (1 - feedback) : t - (gap * (t - before)) / (gap - gapBefore);
        before = t;
        gapBefore = gap;
        t = next;
      }
    }
  }
}

/** An entry of a column; so small that a call costs nothing. */
export function at(column: Float64Array, k: number): number {
  return column[k] ?? NaN;
}

function fillSpan(
  column: Float64Array,
  { min, max }: { readonly min: number; readonly max: number },
  share: Float64Array,
): void {
  for (let k = 0; k < column.length; k++) column[k] = min + at(share, k) * (max - min);
}

function fillTolerance(
  column: Float64Array,
  valueOhm: number,
  tolerance: number,
  share: Float64Array,
): void {
  for (let k = 0; k < column.length; k++) column[k] = valueOhm * (1 + at(share, k) * tolerance);
}
