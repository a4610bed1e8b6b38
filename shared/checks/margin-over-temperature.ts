import type { StageInput } from '../stage/stage-input.ts';
import { evaluateStage } from './evaluate-stage.ts';
import type { Criterion } from './evaluation.ts';

/** Margins of a stage whose ambient is one temperature. */
export interface MarginsAtTemperature {
  readonly ambientDegC: number;
  /** By criterion; null where it has none there. */
  readonly margins: Readonly<Record<string, number | null>>;
}

const STEPS = 16;
/** An ambient that is one temperature is shown with this on either side, K. */
const AROUND_K = 10;

/**
 * The margins over ambient temperature, one temperature at each step of the generator so that a caller can pause in
 * between: each costs an evaluation.
 *
 * @param ids criteria to follow
 */
export function* marginOverTemperature(
  input: StageInput,
  ids: readonly string[],
): Generator<MarginsAtTemperature, void> {
  const { min, max } = input.ambientDegC;
  const [from, to] = max > min ? [min, max] : [min - AROUND_K, max + AROUND_K];
  for (let step = 0; step <= STEPS; step++) {
    const ambientDegC = from + ((to - from) * step) / STEPS;
    const at = { ...input, ambientDegC: { min: ambientDegC, max: ambientDegC } };
    const { criteria } = evaluateStage(at);
    const margins = ids.map((id) => [id, criteria.find((each) => each.id === id)?.margin ?? null]);
    yield { ambientDegC, margins: Object.fromEntries(margins) as Record<string, number | null> };
  }
}

/** The criteria with the least margins of a result, the least first. */
export function leastMargins(criteria: readonly Criterion[], count: number): readonly Criterion[] {
  return criteria
    .filter(({ margin }) => margin !== null)
    .sort((a, b) => (a.margin ?? 0) - (b.margin ?? 0))
    .slice(0, count);
}
