import type { StageInput } from '../stage/stage-input.ts';
import type { StageModel } from '../stage/stage-model.ts';

/** A clamp diode must block at least so many times the highest supply. */
export const REVERSE_FACTOR = 2;

export type ClampFault = 'no-clamp' | 'clamp-conducts-at-supply' | 'diode-reverse-voltage';

/** What is wrong with a coil's clamp whatever the margins say; null where nothing is. */
export function clampFault({ input, clamp }: StageModel): ClampFault | null {
  if (input.load.kind !== 'coil') return null;
  if (clamp === null) return 'no-clamp';
  const supplyV = input.supplyV.max;
  if (clamp.standOffV !== null) {
    return clamp.standOffV > supplyV ? null : 'clamp-conducts-at-supply';
  }
  const { reverseV } = input.clamp;
  return reverseV !== null && reverseV < REVERSE_FACTOR * supplyV ? 'diode-reverse-voltage' : null;
}

/** Whether the forward voltages of an LED string leave nothing of the supply. */
export function takesSupply({ load }: StageInput, availableV: number): boolean {
  return load.kind === 'led-string' && availableV <= 0;
}

/** Whether a stage fails at its nominal point by a fault that has no margin. */
export function failsByItself(model: StageModel): boolean {
  return clampFault(model) !== null || takesSupply(model.input, model.nominal.condition.availableV);
}
