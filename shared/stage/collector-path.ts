import { copperRatio } from '../physics/coil.ts';
import type { StageInput } from './stage-input.ts';

/** The load as the collector sees it: what voltage is there to drop, and over what resistance. */
export interface CollectorPath {
  /** Supply less the load's own fixed voltage, V. */
  readonly availableV: number;
  readonly loadOhm: number;
}

/** Temperature of the load at an instant, °C: a coil warms up over ambient while it is on. */
export function loadDegC(input: StageInput, ambientDegC: number, settled: boolean): number {
  return input.load.kind === 'coil' && settled
    ? ambientDegC + input.load.temperatureRiseK
    : ambientDegC;
}

/** Whether this version can judge the load. */
export function isJudgedLoad(input: StageInput): boolean {
  return input.load.kind === 'coil' || input.load.kind === 'resistor';
}

/** Smallest resistance a coil is taken for, Ω: copper near absolute zero must not divide by nothing. */
const SMALLEST_LOAD_OHM = 1e-9;

/**
 * @param sign end of the load's tolerance: 1, −1, or 0 for nominal
 * @param degC temperature of the load
 */
export function collectorPath(
  input: StageInput,
  supplyV: number,
  sign: number,
  degC: number,
): CollectorPath {
  const { load } = input;
  if (load.kind === 'coil') {
    const ratio = copperRatio(degC, load.referenceDegC);
    const loadOhm = load.resistanceOhm * (1 + sign * load.tolerance) * ratio;
    return { availableV: supplyV, loadOhm: Math.max(SMALLEST_LOAD_OHM, loadOhm) };
  }
  if (load.kind === 'resistor') {
    return { availableV: supplyV, loadOhm: load.resistanceOhm * (1 + sign * load.tolerance) };
  }
  return { availableV: supplyV, loadOhm: Infinity };
}
