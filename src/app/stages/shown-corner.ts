import type { Corner, Evaluation } from '../../../shared/checks/evaluation.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';

/** In place of a criterion: the figures at the middle of every tolerance. */
export const NOMINAL = 'nominal';

const DECIDED_AT_FULL_CURRENT: readonly string[] = ['overdrive-factor', 'forced-beta'];

/** The stage as judged: with the recommended resistor where the field is empty. */
export function judgedStage(stage: StageInput, evaluation: Evaluation): StageInput {
  const valueOhm = stage.baseResistor.valueOhm ?? evaluation.baseResistorOhm;
  return { ...stage, baseResistor: { ...stage.baseResistor, valueOhm } };
}

/**
 * The corner whose figures are on show; null for the middle of every tolerance.
 *
 * @param at id of a criterion, or `NOMINAL`
 */
export function shownCorner(evaluation: Evaluation, at: string): Corner | null {
  const found = evaluation.criteria.find(({ id }) => id === at)?.corner ?? null;
  // Saturation is decided as if VCE were zero: the drawing shows the VCE(sat) there will be.
  const asDecided = DECIDED_AT_FULL_CURRENT.includes(at);
  return found !== null && asDecided ? { ...found, vceSat: 'max' } : found;
}

/** Whether there are figures to show at all. */
export const hasFigures = (stage: StageInput, { corners }: Evaluation): boolean =>
  corners > 0 && stage.baseResistor.valueOhm !== null;
