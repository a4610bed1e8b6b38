import { copperRatio } from '../physics/coil.ts';
import { lampSteadyA } from '../physics/lamp.ts';
import type { LedStringLoad } from './load.ts';
import type { StageInput } from './stage-input.ts';
import type { Writable } from './writable.ts';

/** The load as the collector sees it: what voltage is there to drop, and over what resistance. */
export interface CollectorPath {
  /** Supply less the load's own fixed voltage, V; with current from other inputs, their share of it added. */
  readonly availableV: number;
  readonly loadOhm: number;
}

/** The conditions a load's own figures stand at. */
export interface LoadEnds {
  readonly ambientDegC: number;
  readonly settled: boolean;
  /** End of the tolerance: 1, −1, or 0 for nominal. */
  readonly sign: number;
  /** End of an LED string's forward voltage: 1, −1, or 0 for the middle. */
  readonly forwardSign: number;
}

/** Temperature of the load at an instant, °C: a coil warms up over ambient while it is on. */
export function loadDegC(input: StageInput, { ambientDegC, settled }: LoadEnds): number {
  return input.load.kind === 'coil' && settled
    ? ambientDegC + input.load.temperatureRiseK
    : ambientDegC;
}

/** Smallest resistance a load is taken for, Ω: copper near absolute zero must not divide by nothing. */
export const SMALLEST_LOAD_OHM = 1e-9;

/** Writes what the collector sees. */
export function setCollectorPath(
  path: Writable<CollectorPath>,
  input: StageInput,
  supplyV: number,
  ends: LoadEnds,
): void {
  const { load } = input;
  path.availableV = supplyV;
  if (load.kind === 'coil') {
    const ratio = copperRatio(loadDegC(input, ends), load.referenceDegC);
    const loadOhm = load.resistanceOhm * (1 + ends.sign * load.tolerance) * ratio;
    path.loadOhm = Math.max(SMALLEST_LOAD_OHM, loadOhm);
  } else if (load.kind === 'lamp') {
    path.loadOhm = supplyV / lampSteadyA(load, supplyV);
  } else if (load.kind === 'logic-input') {
    path.loadOhm = load.pullUpOhm * (1 + ends.sign * load.tolerance);
    path.availableV = supplyV + load.count * load.lowCurrentA * path.loadOhm;
  } else {
    path.loadOhm = load.resistanceOhm * (1 + ends.sign * load.tolerance);
    if (load.kind === 'led-string') path.availableV = supplyV - load.count * forwardV(load, ends);
  }
}

/** What an LED's forward voltage moves by, V/K; a penalty only. */
const LED_V_PER_K = 0.002;
const LED_SHEET_DEG_C = 25;

function forwardV(load: LedStringLoad, { forwardSign, ambientDegC }: LoadEnds): number {
  const { min, max } = load.forwardV;
  const awayK = ambientDegC - LED_SHEET_DEG_C;
  if (forwardSign < 0) return Math.max(0, min - LED_V_PER_K * Math.max(0, awayK));
  if (forwardSign > 0) return max + LED_V_PER_K * Math.max(0, -awayK);
  return (min + max) / 2;
}

/** Forward voltage of one specimen of an LED at an ambient, V: expected figures move both ways. */
export function expectedForwardV(sheetV: number, ambientDegC: number): number {
  return Math.max(0, sheetV - LED_V_PER_K * (ambientDegC - LED_SHEET_DEG_C));
}
