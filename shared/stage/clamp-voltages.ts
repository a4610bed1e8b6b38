import type { StageInput } from './stage-input.ts';
import type { Writable } from './writable.ts';

/** Voltages of a coil's clamp; forward drops and zener voltages at their worst ends. */
export interface ClampVoltages {
  /** Largest collector–emitter voltage at turn-off, V. */
  readonly peakV: number;
  /** Smallest voltage across the coil while its current falls, V; not above 0 where it never falls. */
  readonly smallestV: number;
  /** Largest voltage across the clamp itself, V. */
  readonly ownV: number;
  /** Largest voltage across the coil, V. */
  readonly largestV: number;
  /** What the clamp must stand without conducting, V; null for clamps across the coil. */
  readonly standOffV: number | null;
}

/** Smallest forward drop a silicon diode is counted with, V. */
const LEAST_FORWARD_V = 0.5;

/** @returns null where the stage has no clamp */
export function clampVoltages(input: StageInput): ClampVoltages | null {
  if (input.clamp.kind === 'none') return null;
  const voltages = { peakV: 0, smallestV: 0, ownV: 0, largestV: 0, standOffV: null };
  setClampVoltages(voltages, input);
  return voltages;
}

/** Writes the voltages of a stage's clamp at its highest supply. */
export function setClampVoltages(voltages: Writable<ClampVoltages>, input: StageInput): void {
  const { clamp, supplyV } = input;
  const forwardV = clamp.forwardV ?? 0;
  const leastZenerV = clamp.zenerV?.min ?? 0;
  const mostZenerV = clamp.zenerV?.max ?? 0;
  switch (clamp.kind) {
    case 'none':
      return;
    case 'diode':
    case 'diode-zener': {
      const inSeries = clamp.kind === 'diode-zener';
      voltages.ownV = forwardV + (inSeries ? mostZenerV : 0);
      voltages.largestV = voltages.ownV;
      voltages.peakV = supplyV.max + voltages.ownV;
      voltages.smallestV = LEAST_FORWARD_V + (inSeries ? leastZenerV : 0);
      return;
    }
    case 'zener-across-transistor':
    case 'tvs-across-transistor':
      voltages.ownV = mostZenerV;
      voltages.peakV = mostZenerV;
      voltages.smallestV = leastZenerV - supplyV.max;
      voltages.largestV = Math.max(0, mostZenerV - supplyV.max);
      voltages.standOffV =
        clamp.kind === 'tvs-across-transistor' ? (clamp.standOffV ?? leastZenerV) : leastZenerV;
  }
}
