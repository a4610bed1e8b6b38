import { SHEET_DEG_C } from '../physics/constants.ts';
import {
  currentSteps,
  expectedGain,
  leastGain,
  limitSaturationV,
  mostGain,
  type Sample,
} from '../physics/curves.ts';
import { fitDevice, type DeviceModel } from '../physics/device-fit.ts';
import type { GainTable } from '../physics/gain.ts';
import type { SaturationLine } from '../physics/saturation.ts';
import type { PartModel } from './part-model.ts';
import type { TransistorData } from './transistor-data.ts';

const NO_FIGURES = { earlyV: null, betaR: null, isA: null, rcOhm: null };

/** The device expected of a part. */
export function deviceOfPart(part: PartModel, { model, limits }: TransistorData): DeviceModel {
  return fitDevice(model ?? NO_FIGURES, { ...part, icMaxA: limits.icA });
}

/** The VCE(sat) line of a part at 25 °C and the IC/IB of its rows, in V over A. */
export interface SheetSaturation {
  /** Through the printed maxima, and on above the last row. */
  readonly sheet: readonly Sample[];
  readonly beyond: readonly Sample[];
  readonly maxima: readonly Sample[];
  readonly typical: readonly Sample[];
  /** The straight piece with the most current on it below its end: V0 + RCE(sat)·IC. */
  readonly piece: {
    readonly interceptV: number;
    readonly slopeOhm: number;
    readonly fromA: number;
    readonly toA: number;
  };
  /** Smallest IC/IB of the rows. */
  readonly testBeta: number;
}

/** Even steps of every VCE(sat) curve, so that curves of one chart stand at the same currents. */
export const SATURATION_STEPS = 40;

export function sheetSaturation(
  line: SaturationLine,
  { saturation }: TransistorData,
  rceTempcoPerK: number,
  toA: number,
): SheetSaturation {
  const rowA = [...line.rowA];
  const sheetAt = { tjDegC: SHEET_DEG_C, rceTempcoPerK, forcedBeta: 0, gain: Infinity };
  const samples = currentSteps([0, toA], rowA, SATURATION_STEPS, 'equal').map((icA): Sample => [
    icA,
    limitSaturationV(line, icA, sheetAt),
  ]);
  const last = rowA.length - 1;
  return {
    sheet: samples.filter(([icA]) => icA <= line.lastIcA),
    beyond: samples.filter(([icA]) => icA >= line.lastIcA),
    maxima: rowA.map((icA, k) => [icA, line.maxV[k] ?? 0]),
    typical: saturation
      .filter(({ typV }) => typV !== null)
      .map(({ icA, typV }): Sample => [icA, typV ?? 0])
      .sort(([a], [b]) => a - b),
    piece: {
      interceptV: line.interceptV[last] ?? 0,
      slopeOhm: line.slopeOhm[last] ?? 0,
      fromA: rowA[last - 1] ?? 0,
      toA: line.lastIcA,
    },
    testBeta: Math.min(...line.testBeta),
  };
}

/** hFE of a part over IC in A, at 25 °C unless named otherwise. */
export interface GainOverCurrent {
  readonly least: readonly Sample[];
  readonly leastCold: readonly Sample[];
  readonly expected: readonly Sample[];
  readonly most: readonly Sample[];
  /** Rows as printed at 25 °C. */
  readonly minima: readonly Sample[];
  readonly typical: readonly Sample[];
  readonly maxima: readonly Sample[];
}

const LOG_STEPS = 40;

/**
 * @param span collector currents to draw, A
 * @param coldDegC junction temperature of the second minimum, °C
 */
export function gainOverCurrent(
  table: GainTable,
  { gain, darlington }: TransistorData,
  span: readonly [number, number],
  coldDegC: number,
): GainOverCurrent {
  const rows = gain.filter(({ tempDegC }) => tempDegC === SHEET_DEG_C);
  const currents = currentSteps(
    span,
    rows.map(({ icA }) => icA),
    LOG_STEPS,
    'ratio',
  );
  const over = (figure: (icA: number) => number) =>
    currents.map((icA): Sample => [icA, figure(icA)]);
  const printed = (key: 'min' | 'typ' | 'max') =>
    rows
      .flatMap((row): Sample[] => (row[key] === null ? [] : [[row.icA, row[key]]]))
      .sort(([a], [b]) => a - b);
  return {
    least: over((icA) => leastGain(table, icA, SHEET_DEG_C)),
    leastCold: over((icA) => leastGain(table, icA, coldDegC)),
    expected: over((icA) => expectedGain(table, icA, SHEET_DEG_C, darlington ? 2 : 1)),
    most: over((icA) => mostGain(table, icA, SHEET_DEG_C)),
    minima: printed('min'),
    typical: printed('typ'),
    maxima: printed('max'),
  };
}

/** hFE of a part over the junction temperature in °C, at one collector current. */
export interface GainOverTemperature {
  readonly least: readonly Sample[];
  readonly expected: readonly Sample[];
  readonly most: readonly Sample[];
}

const TEMPERATURE_STEPS = 30;

export function gainOverTemperature(
  table: GainTable,
  { darlington }: TransistorData,
  icA: number,
  [fromDegC, toDegC]: readonly [number, number],
): GainOverTemperature {
  const even = Array.from(
    { length: TEMPERATURE_STEPS + 1 },
    (_, k) => fromDegC + ((toDegC - fromDegC) * k) / TEMPERATURE_STEPS,
  );
  // Penalties set in at 25 °C: the bend is met.
  const degrees =
    fromDegC < SHEET_DEG_C && toDegC > SHEET_DEG_C
      ? [...even, SHEET_DEG_C].sort((a, b) => a - b)
      : even;
  const over = (figure: (degC: number) => number) =>
    degrees.map((degC): Sample => [degC, figure(degC)]);
  return {
    least: over((degC) => leastGain(table, icA, degC)),
    expected: over((degC) => expectedGain(table, icA, degC, darlington ? 2 : 1)),
    most: over((degC) => mostGain(table, icA, degC)),
  };
}
