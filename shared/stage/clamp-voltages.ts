import type { StageInput } from './stage-input.ts';

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
  const { clamp, supplyV } = input;
  const forwardV = clamp.forwardV ?? 0;
  const zener = clamp.zenerV ?? { min: 0, max: 0 };
  switch (clamp.kind) {
    case 'none':
      return null;
    case 'diode':
      return acrossCoil(supplyV.max, forwardV, LEAST_FORWARD_V);
    case 'diode-zener':
      return acrossCoil(supplyV.max, forwardV + zener.max, zener.min + LEAST_FORWARD_V);
    case 'zener-across-transistor':
      return acrossTransistor(supplyV.max, zener, zener.min);
    case 'tvs-across-transistor':
      return acrossTransistor(supplyV.max, zener, clamp.standOffV ?? zener.min);
  }
}

function acrossCoil(supplyV: number, largestV: number, smallestV: number): ClampVoltages {
  return { peakV: supplyV + largestV, smallestV, ownV: largestV, largestV, standOffV: null };
}

function acrossTransistor(
  supplyV: number,
  zener: { min: number; max: number },
  standOffV: number,
): ClampVoltages {
  return {
    peakV: zener.max,
    smallestV: zener.min - supplyV,
    ownV: zener.max,
    largestV: Math.max(0, zener.max - supplyV),
    standOffV,
  };
}
