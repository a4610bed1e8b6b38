import { isDarlington } from '../../stage/part-model.ts';
import type { StageInput } from '../../stage/stage-input.ts';

/** The symbol of a stage's output transistor; PNP Darlingtons are drawn as one transistor. */
export function transistorSymbol(
  stage: StageInput,
): 'npn' | 'pnp' | 'darlington-npn' | 'pre-biased-npn' {
  if (stage.topology === 'low-side-pre-biased') return 'pre-biased-npn';
  const { polarity } = stage.transistor;
  return polarity === 'npn' && isDarlington(stage) ? 'darlington-npn' : polarity;
}
