import { NO_CLAMP } from './clamp.ts';
import type { StageInput } from './stage-input.ts';

/** The NPN in front of a two-transistor high side. */
export type PreDriver = NonNullable<StageInput['preDriver']>;

/** The NPN in front as a stage of its own: the PNP's base resistor is its load. */
export function frontStage(input: StageInput, front: PreDriver, rbOhm: number): StageInput {
  return {
    ...input,
    topology: 'low-side-npn',
    supplyV: { ...input.supplyV, surge: null, dip: null },
    load: {
      kind: 'resistor',
      resistanceOhm: rbOhm,
      tolerance: input.baseResistor.tolerance,
    },
    transistor: front.transistor,
    baseResistor: front.baseResistor,
    shuntResistor: front.shuntResistor,
    clamp: NO_CLAMP,
    saturationLimitV: null,
    preDriver: null,
  };
}

/**
 * The PNP behind as a stage of its own: nothing but RBE holds it off, against what the NPN in front lets through.
 *
 * @param offA largest collector current of the NPN while off, A
 */
export function outputStage(input: StageInput, offA: number): StageInput {
  const { min, max } = input.supplyV;
  return {
    ...input,
    topology: 'high-side-pnp',
    drive: {
      ...input.drive,
      kind: 'open-collector',
      railV: { min, max },
      railTracksSupply: true,
      high: null,
      pullUp: { valueOhm: 1, tolerance: 0, ratingW: null },
      leakageA: offA,
      reset: null,
      groundShiftV: 0,
    },
    speedUpCapacitorF: null,
    preDriver: null,
  };
}
