import { concat, defer, map, of, switchMap, timer, type Observable } from 'rxjs';
import type { Evaluation } from '../../../shared/checks/evaluation.ts';
import type { Sizing } from '../../../shared/sizing/sizing.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';

/** What the engine says about one state of the sheet. */
export interface Judgement {
  readonly input: StageInput;
  readonly evaluation: Evaluation;
  /** null until the worker has sized this state. */
  readonly sizing: Sizing | null;
}

/** The engine as the stream needs it. */
export interface Engine {
  /** At once, or from the worker where it takes long. */
  evaluate(input: StageInput): Observable<Evaluation>;
  size(input: StageInput): Observable<Sizing>;
}

/** Sizing waits until typing rests. */
export const SIZING_REST_MS = 120;

/**
 * Every state of the sheet judged: verdicts first and at once, so that one rendering shows the change and them; the
 * window when the worker has it. A newer state drops whatever is still under way for an older one. A base resistor
 * left open is judged at the recommended value.
 */
export function judgements(inputs: Observable<StageInput>, engine: Engine): Observable<Judgement> {
  return inputs.pipe(
    switchMap((input) =>
      input.baseResistor.valueOhm === null ? sizedFirst(input, engine) : judgedFirst(input, engine),
    ),
  );
}

function judgedFirst(input: StageInput, engine: Engine): Observable<Judgement> {
  return defer(() => engine.evaluate(input)).pipe(
    switchMap((evaluation) =>
      concat(
        of({ input, evaluation, sizing: null }),
        timer(SIZING_REST_MS).pipe(
          switchMap(() => engine.size(input)),
          map((sizing) => ({ input, evaluation, sizing })),
        ),
      ),
    ),
  );
}

function sizedFirst(input: StageInput, engine: Engine): Observable<Judgement> {
  return engine.size(input).pipe(
    switchMap((sizing) => {
      const baseResistor = { ...input.baseResistor, valueOhm: sizing.recommendedOhm };
      return engine
        .evaluate({ ...input, baseResistor })
        .pipe(map((evaluation) => ({ input, evaluation, sizing })));
    }),
  );
}
