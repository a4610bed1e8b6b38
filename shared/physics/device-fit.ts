import type { BaseEmitterTable } from './base-emitter.ts';
import { vbeBetweenV } from './base-emitter.ts';
import { SHEET_DEG_C, thermalVoltageV } from './constants.ts';
import { saturationCurrentA, saturationCurrentRatio, type Device } from './device-model.ts';
import { EXPECTED_GAIN_EXPONENT, gainBetween, gainRatio, type GainTable } from './gain.ts';
import {
  DARLINGTON_DROP_V,
  expectedResistanceRatio,
  USUAL_REVERSE_GAIN,
  type SaturationLine,
} from './saturation.ts';

/** Model figures a part record gives; null where it gives none. */
export interface ModelFigures {
  readonly earlyV: number | null;
  readonly betaR: number | null;
  readonly isA: number | null;
  readonly rcOhm: number | null;
}

/** The tables of a part that the model is fitted to. */
export interface FittedRows {
  readonly gain: GainTable | null;
  readonly saturation: SaturationLine | null;
  readonly baseEmitter: BaseEmitterTable;
  /** 2 in a Darlington. */
  readonly junctions: number;
  /** Largest collector current, A; null where the sheet gives none. */
  readonly icMaxA: number | null;
}

/** Where a figure of the model comes from. */
export type FigureOrigin = 'part' | 'rows' | 'usual';

/** The expected device of a part at 25 °C. It draws curves; no verdict rests on it. */
export interface DeviceModel {
  readonly isA: number;
  readonly reverseGain: number;
  readonly earlyV: number;
  readonly collectorOhm: number;
  readonly dropV: number;
  readonly junctions: number;
  /** null: the usual gain. */
  readonly gain: GainTable | null;
  readonly origin: Readonly<
    Record<'isA' | 'reverseGain' | 'earlyV' | 'collectorOhm' | 'gain', FigureOrigin>
  >;
}

/** Judgement: Early voltage where a part gives none, V; small-signal transistors lie between 50 and 100 V. */
export const USUAL_EARLY_V = 75;

/** Judgement: gain of a part that prints no row. */
const USUAL_GAIN = 100;

/** Judgement: VBE of a silicon junction at a hundredth of the largest collector current, V (as in the off state). */
const USUAL_VBE_V = 0.55;
const USUAL_VBE_SHARE = 0.01;
const USUAL_IC_MAX_A = 0.1;

/** Judgement: a silicon junction that carries current lies between these, V; what a row shows above is resistance. */
const JUNCTION_V = { least: 0.3, most: 0.8 } as const;

/** Bounds of a fitted reverse gain: beyond them the rows say more about resistance than about it. */
const REVERSE_GAIN = { least: 0.05, most: 5 } as const;

/** The usual specimen: halfway between the gain limits, typical VCE(sat) and VBE or what stands in for them. */
const USUAL_SPECIMEN = 0;

/**
 * The device expected of a part: its own model figures first, then what its rows show, then usual figures.
 *
 * RC is the slope of the typical VCE(sat) rows over IC (least squares), βR what their offset then leaves; with one row βR is
 * usual and RC what it leaves. IS is set by the VBE row of the lowest current, where resistance counts least.
 */
export function fitDevice(figures: ModelFigures, rows: FittedRows): DeviceModel {
  const { gain, saturation, junctions } = rows;
  const dropV = junctions > 1 ? DARLINGTON_DROP_V : 0;
  const sheet = saturation === null ? [] : saturationRows(saturation, gain, dropV);
  const reverse = reverseGainOf(figures, sheet);
  const collector = collectorOhmOf(figures, sheet, reverse.value);
  const early = chosen(figures.earlyV, null, USUAL_EARLY_V);
  const bare = { reverseGain: reverse.value, earlyV: early.value, collectorOhm: collector.value };
  const current = saturationCurrentOf(figures, rows, { ...bare, dropV, junctions });
  return {
    ...bare,
    isA: current.value,
    dropV,
    junctions,
    gain,
    origin: {
      isA: current.origin,
      reverseGain: reverse.origin,
      earlyV: early.origin,
      collectorOhm: collector.origin,
      gain: gain === null ? 'usual' : 'rows',
    },
  };
}

interface Chosen {
  readonly value: number;
  readonly origin: FigureOrigin;
}

function chosen(own: number | null, fitted: number | null, usual: number): Chosen {
  if (own !== null) return { value: own, origin: 'part' };
  if (fitted !== null) return { value: fitted, origin: 'rows' };
  return { value: usual, origin: 'usual' };
}

interface SheetRow {
  readonly icA: number;
  readonly vceV: number;
  readonly beta: number;
  readonly gain: number;
}

/** VCE(sat) rows of the usual specimen, without the drop of a Darlington's output stage. */
function saturationRows(line: SaturationLine, gain: GainTable | null, dropV: number): SheetRow[] {
  return [...line.rowA].map((icA, k) => {
    const beta = line.testBeta[k] ?? 1;
    // A row proves its IC/IB, so the gain cannot be lower.
    const usual = Math.max(usualGain(gain, icA), 1.01 * beta);
    return { icA, vceV: Math.max(0, (line.usualV[k] ?? 0) - dropV), beta, gain: usual };
  });
}

const usualGain = (gain: GainTable | null, icA: number): number =>
  gain === null ? USUAL_GAIN : gainBetween(gain, icA, USUAL_SPECIMEN);

const mean = (values: readonly number[]) =>
  values.reduce((sum, value) => sum + value, 0) / values.length;

/** Slope of VCE over IC through the rows, at least 0 Ω; null with fewer than two currents. */
function slopeOhm(sheet: readonly SheetRow[]): number | null {
  if (sheet.length < 2) return null;
  const [meanA, meanV] = [mean(sheet.map(({ icA }) => icA)), mean(sheet.map((row) => row.vceV))];
  const [products, squares] = sheet.reduce<[number, number]>(
    ([xy, xx], { icA, vceV }) => [
      xy + (icA - meanA) * (vceV - meanV),
      xx + (icA - meanA) * (icA - meanA),
    ],
    [0, 0],
  );
  return Math.max(0, products / squares);
}

function reverseGainOf(figures: ModelFigures, sheet: readonly SheetRow[]): Chosen {
  const ohm = figures.rcOhm ?? slopeOhm(sheet);
  if (ohm === null) return chosen(figures.betaR, null, USUAL_REVERSE_GAIN);
  const thermalV = thermalVoltageV(SHEET_DEG_C);
  // VCE(sat) = VT·ln{[1 + (βf + 1)/βR]/[1 − βf/βF]} turned round, row by row.
  const logs = sheet.map(({ icA, vceV, beta, gain }) => {
    const ratio = Math.exp(Math.max(0, vceV - ohm * icA) / thermalV) * (1 - beta / gain) - 1;
    const value = ratio > 0 ? (beta + 1) / ratio : REVERSE_GAIN.most;
    return Math.log(Math.min(REVERSE_GAIN.most, Math.max(REVERSE_GAIN.least, value)));
  });
  const fitted = logs.length === 0 ? null : Math.exp(mean(logs));
  return chosen(figures.betaR, fitted, USUAL_REVERSE_GAIN);
}

/** What the rows leave for RC once βR is known: least squares through IC = 0, at least 0 Ω. */
function collectorOhmOf(
  figures: ModelFigures,
  sheet: readonly SheetRow[],
  reverseGain: number,
): Chosen {
  const thermalV = thermalVoltageV(SHEET_DEG_C);
  const [products, squares] = sheet.reduce<[number, number]>(
    ([xy, xx], { icA, vceV, beta, gain }) => {
      const innerV = thermalV * Math.log((1 + (beta + 1) / reverseGain) / (1 - beta / gain));
      return [xy + icA * (vceV - innerV), xx + icA * icA];
    },
    [0, 0],
  );
  return chosen(figures.rcOhm, squares > 0 ? Math.max(0, products / squares) : null, 0);
}

function saturationCurrentOf(
  { isA }: ModelFigures,
  { baseEmitter, gain, saturation, icMaxA, junctions }: FittedRows,
  bare: Omit<Device, 'isA' | 'gain' | 'thermalV'>,
): Chosen {
  const rowA = baseEmitter.maximum.icA[0];
  const icA = rowA ?? USUAL_VBE_SHARE * (icMaxA ?? USUAL_IC_MAX_A);
  const rowV =
    rowA === undefined ? USUAL_VBE_V * junctions : vbeBetweenV(baseEmitter, rowA, USUAL_SPECIMEN);
  const vbeV = Math.min(JUNCTION_V.most, Math.max(JUNCTION_V.least, rowV / junctions)) * junctions;
  const device = { ...bare, gain: usualGain(gain, icA), thermalV: thermalVoltageV(SHEET_DEG_C) };
  // VBE(sat) rows are driven as the VCE(sat) rows are; elsewhere the active region stands.
  const beta = baseEmitter.guaranteed ? (saturation?.testBeta[0] ?? device.gain) : device.gain;
  const value = saturationCurrentA(device, icA, icA / beta, vbeV);
  return chosen(isA, rowA === undefined ? null : value, value);
}

/** βF at which a base current lives: hFE of the collector current it makes in the active region. */
function gainAtBase(model: DeviceModel, ibA: number, ratio: number): number {
  const { gain } = model;
  if (gain === null) return USUAL_GAIN * ratio;
  let low = Math.log(ibA);
  let high = low + LARGEST_LOG_GAIN;
  for (let step = 0; step < GAIN_STEPS; step++) {
    const middle = (low + high) / 2;
    const icA = Math.exp(middle);
    if (usualGain(gain, icA) * ratio * ibA > icA) low = middle;
    else high = middle;
  }
  return usualGain(gain, Math.exp(low)) * ratio;
}

const LARGEST_LOG_GAIN = Math.log(1e6);
const GAIN_STEPS = 50;

/**
 * The device at a junction temperature, with the gain that belongs to a base current.
 *
 * @param rceTempcoPerK how collector resistance moves with temperature, 1/K
 */
export function deviceAt(
  model: DeviceModel,
  ibA: number,
  tjDegC: number,
  rceTempcoPerK: number,
): Device {
  const { isA, reverseGain, earlyV, collectorOhm, dropV, junctions } = model;
  const ratio = gainRatio(tjDegC, EXPECTED_GAIN_EXPONENT * junctions);
  return {
    isA: isA * saturationCurrentRatio(tjDegC),
    gain: gainAtBase(model, Math.max(ibA, SMALLEST_BASE_A), ratio),
    reverseGain,
    earlyV,
    collectorOhm: collectorOhm * expectedResistanceRatio(tjDegC, rceTempcoPerK),
    dropV,
    thermalV: thermalVoltageV(tjDegC),
    junctions,
  };
}

/** Below this a base current is none, A. */
const SMALLEST_BASE_A = 1e-12;
