import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  curvesAtCorner,
  footOfCurve,
  outputCharacteristics,
  saturationAtCorner,
  stageTemperatures,
} from '../../../shared/checks/stage-curves.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { gainOverCurrent, gainOverTemperature } from '../../../shared/stage/part-curves.ts';
import { leaves, replaced } from '../../document-places.ts';
import { repeats, seed } from '../../long-run.ts';
import { HIGH_SIDE_FILE, RELAY_FILE } from '../relay-stage.ts';

const STAGES = repeats(400, 20_000);
const SEED = seed(20261202);

/** Figures a field still takes, far from what anybody means. */
const number = fc.oneof(
  fc.constantFrom(1e-12, 1e-9, 1e-6, 1e-3, 0.5, 1, 25, 150, 400, 1e3, 1e6),
  fc.double({ min: 1e-9, max: 1e6, noNaN: true }),
);

describe('curves of hostile stages', () => {
  it(`neither throw nor hold NaN (seed ${SEED})`, () => {
    let drawn = 0;
    fc.assert(
      fc.property(
        fc.constantFrom<unknown>(RELAY_FILE, HIGH_SIDE_FILE),
        fc.array(fc.tuple(fc.nat(), number), { minLength: 1, maxLength: 4 }),
        (base, changes) => {
          const places = leaves(base);
          const file = changes.reduce<unknown>(
            (document, [place, value]) =>
              replaced(document, places[place % places.length] ?? [], value),
            base,
          );
          const parsed = StageInput.safeParse(file);
          if (!parsed.success) return;
          const at = curvesAtCorner(parsed.data, null);
          if (at === null) return;
          drawn++;
          const { gain } = at.part;
          const { transistor } = at.input;
          const curves = [
            ...outputCharacteristics(at, 'current').map(({ samples }) => samples),
            ...outputCharacteristics(at, 'voltage').map(({ samples }) => samples),
            footOfCurve(at, 0.4),
            saturationAtCorner(at)?.corner ?? [],
            saturationAtCorner(at)?.expected ?? [],
            ...(gain === null
              ? []
              : [
                  gainOverCurrent(gain, transistor, [1e-6, 1], -40).least,
                  gainOverCurrent(gain, transistor, [1e-6, 1], -40).expected,
                  gainOverTemperature(gain, transistor, at.fullA, stageTemperatures(at)).most,
                ]),
          ];
          for (const [x, y] of curves.flat()) {
            expect(Number.isNaN(x) || Number.isNaN(y)).toBe(false);
          }
          expect(Number.isNaN(at.expected.vceV + at.expected.icA)).toBe(false);
        },
      ),
      { numRuns: STAGES, seed: SEED },
    );
    expect(drawn).toBeGreaterThan(STAGES / 4);
  });
});
