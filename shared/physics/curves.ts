import { SHEET_DEG_C } from './constants.ts';
import { deviceAt, type DeviceModel } from './device-fit.ts';
import {
  collectorCurrentA,
  voltageAtCurrentV,
  type BaseDrive,
  type Device,
} from './device-model.ts';
import {
  EXPECTED_GAIN_EXPONENT,
  gainBetween,
  gainRatio,
  maximumGain,
  minimumGain,
  type GainTable,
} from './gain.ts';
import {
  forcedBetaStepV,
  interceptAtV,
  pieceAt,
  resistanceRatio,
  type SaturationLine,
} from './saturation.ts';

/** A point of a curve, in SI units and °C. */
export type Sample = readonly [x: number, y: number];

/** Width of the knee that is drawn in fine steps, V, and the steps there and beyond. */
const KNEE_V = 0.4;
const KNEE_STEPS = 20;
const ACTIVE_STEPS = 24;

/** IC in A over VCE in V of a device held at one base drive, close in the knee. */
export function outputCurve(device: Device, drive: BaseDrive, toV: number): Sample[] {
  const kneeV = Math.min(device.dropV + KNEE_V, toV);
  const knee = Array.from({ length: KNEE_STEPS + 1 }, (_, k) => (kneeV * k) / KNEE_STEPS);
  const active = Array.from(
    { length: ACTIVE_STEPS },
    (_, k) => kneeV + ((toV - kneeV) * (k + 1)) / ACTIVE_STEPS,
  );
  const volts = kneeV < toV ? [...knee, ...active] : knee;
  return volts.map((vceV) => [vceV, collectorCurrentA(device, drive, vceV)]);
}

/** Currents from end to end in equal steps, rows between included, so that corners of a line are met. */
export function currentSteps(
  [fromA, toA]: readonly [number, number],
  rowA: readonly number[],
  steps: number,
  spacing: 'equal' | 'ratio',
): number[] {
  const at = (share: number) =>
    spacing === 'ratio' ? fromA * Math.pow(toA / fromA, share) : fromA + (toA - fromA) * share;
  const even = Array.from({ length: steps + 1 }, (_, k) => at(k / steps));
  const rows = rowA.filter((icA) => icA > fromA && icA < toA);
  return [...even, ...rows].sort((a, b) => a - b);
}

/** What a point of the VCE(sat) line depends on besides IC. */
export interface SaturationCondition {
  readonly tjDegC: number;
  readonly rceTempcoPerK: number;
  /** IC/IB in the circuit, and hFE there; at the rows' own IC/IB nothing is added. */
  readonly forcedBeta: number;
  readonly gain: number;
}

/** Largest VCE(sat) at a collector current by the line through the printed rows, V: limit figures. */
export function limitSaturationV(
  line: SaturationLine,
  icA: number,
  { tjDegC, rceTempcoPerK, forcedBeta, gain }: SaturationCondition,
): number {
  const k = pieceAt(line, icA);
  return (
    interceptAtV(line, k, tjDegC) +
    forcedBetaStepV(forcedBeta, line.testBeta[k] ?? 0, gain, line.reverseGain, tjDegC) +
    (line.slopeOhm[k] ?? 0) * resistanceRatio(tjDegC, rceTempcoPerK) * icA
  );
}

/** VCE(sat) expected at a collector current and IC/IB, V; Infinity where the device leaves saturation. */
export function expectedSaturationV(
  model: DeviceModel,
  icA: number,
  { forcedBeta, tjDegC, rceTempcoPerK }: Omit<SaturationCondition, 'gain'>,
): number {
  if (icA <= 0) return NaN;
  const ibA = icA / forcedBeta;
  const device = deviceAt(model, ibA, tjDegC, rceTempcoPerK);
  return voltageAtCurrentV(device, { kind: 'current', ibA }, icA);
}

/** Guaranteed minimum of hFE at a collector current and junction temperature: the cold costs, heat gives nothing. */
export function leastGain(table: GainTable, icA: number, tjDegC: number): number {
  return minimumGain(table, icA) * gainRatio(Math.min(tjDegC, SHEET_DEG_C), table.exponent);
}

/** Largest hFE at a collector current and junction temperature: heat adds, the cold gives nothing. */
export function mostGain(table: GainTable, icA: number, tjDegC: number): number {
  return maximumGain(table, icA) * gainRatio(Math.max(tjDegC, SHEET_DEG_C), table.exponent);
}

/** hFE expected at a collector current and junction temperature: halfway between the limits, both ways. */
export function expectedGain(
  table: GainTable,
  icA: number,
  tjDegC: number,
  junctions: number,
): number {
  return gainBetween(table, icA, 0) * gainRatio(tjDegC, EXPECTED_GAIN_EXPONENT * junctions);
}
