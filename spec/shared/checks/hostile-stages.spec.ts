import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeStage } from '../../../shared/sizing/judge-stage.ts';
import { judgePart } from '../../../shared/sizing/rank-parts.ts';
import { stageResult } from '../../../shared/sizing/result.ts';
import { sizeShunt } from '../../../shared/sizing/size-shunt.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { leaves, replaced } from '../../document-places.ts';
import { repeats, seed } from '../../long-run.ts';
import { HIGH_SIDE_FILE, RELAY_FILE } from '../relay-stage.ts';

const STAGES = repeats(2000, 100_000);
const SEED = seed(20261201);

/** Numbers that slip through or sit at the edge of every range. */
const NASTY = [
  0, -0, 1e-300, 5e-324, 1e-12, 1e-9, 1e-3, 0.5, 1, 25, 150, 400, 1e3, 1e6, 1e12, 1e300, -1,
  -273.15,
];
const number = fc.oneof(
  fc.constantFrom(...NASTY),
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.double({ min: 1e-6, max: 1e3, noNaN: true }),
);
const anything = fc.oneof(number, fc.constantFrom(null, '', 'x', true, [], {}, 'NaN'));

const BASES: unknown[] = [
  RELAY_FILE,
  HIGH_SIDE_FILE,
  { ...RELAY_FILE, frequencyHz: 1000, duty: 0.5, clamp: { ...RELAY_FILE.clamp, powerRatingW: 1 } },
  {
    ...RELAY_FILE,
    shuntResistor: null,
    drive: { ...RELAY_FILE.drive, reset: { kind: 'pull-up', pullUpOhm: 1e4 } },
    supplyV: { min: 10, max: 20, surge: 60, dip: 6 },
    load: { kind: 'resistor', resistanceOhm: 220, tolerance: 0.1 },
  },
  {
    ...RELAY_FILE,
    load: {
      kind: 'led-string',
      count: 3,
      forwardV: { min: 1.8, max: 2.4 },
      resistanceOhm: 1000,
      tolerance: 0.05,
      maximumA: 0.03,
      minimumA: 0.01,
    },
  },
  { ...HIGH_SIDE_FILE, load: { kind: 'lamp', nominalV: 24, currentA: 0.02, coldRatio: 12 } },
  {
    ...RELAY_FILE,
    topology: 'two-transistor-high-side',
    transistor: HIGH_SIDE_FILE.transistor,
    baseResistor: { valueOhm: 6200, tolerance: 0.05, ratingW: 0.5 },
    preDriver: {
      transistor: RELAY_FILE.transistor,
      baseResistor: { valueOhm: 4700, tolerance: 0.05, ratingW: 0.1 },
      shuntResistor: null,
    },
  },
  {
    ...RELAY_FILE,
    topology: 'low-side-darlington',
    transistor: { ...RELAY_FILE.transistor, darlington: true },
  },
  {
    ...RELAY_FILE,
    topology: 'low-side-pre-biased',
    frequencyHz: 10,
    duty: 0.5,
    transistor: {
      ...RELAY_FILE.transistor,
      internal: {
        r1Ohm: 4700,
        r2Ohm: 1e4,
        input: {
          onV: 2.5,
          onOutputA: 0.02,
          offV: 0.3,
          currentA: 1e-3,
          testV: 5,
          gi: 50,
          maximumV: 20,
        },
      },
    },
  },
  {
    ...RELAY_FILE,
    topology: 'level-translator',
    supplyV: { min: 4.5, max: 5.5 },
    load: {
      kind: 'logic-input',
      pullUpOhm: 4700,
      tolerance: 0.05,
      ratingW: 0.1,
      count: 2,
      vilV: 0.8,
      vihV: 2,
      leakageA: 1e-6,
      lowCurrentA: 4e-4,
      capacitanceF: 1e-11,
      wiringF: 1e-11,
      riseTimeLimitSec: 1e-6,
    },
  },
];

/** A stage file with up to six of its values replaced by numbers good, odd and absurd. */
const hostile = fc
  .tuple(
    fc.constantFrom(...BASES),
    fc.array(fc.tuple(fc.nat(), fc.oneof({ weight: 4, arbitrary: number }, anything)), {
      minLength: 1,
      maxLength: 6,
    }),
  )
  .map(([base, changes]) =>
    changes.reduce<unknown>((document, [pick, value]) => {
      const places = leaves(document);
      const place = places[pick % places.length];
      return place === undefined ? document : replaced(document, place, value);
    }, base),
  );

/** Paths of numbers that no JSON document can hold. */
function unsound(value: unknown, path = '$'): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path];
  if (value === null || typeof value !== 'object') return [];
  return Object.entries(value).flatMap(([key, inner]) => unsound(inner, `${path}.${key}`));
}

describe(`${STAGES} hostile stage files, seed ${SEED}`, () => {
  it('are refused or judged: no exception, no NaN, no loop', { timeout: 600_000 }, () => {
    let judged = 0;
    fc.assert(
      fc.property(hostile, (document) => {
        const parsed = StageInput.safeParse(document);
        if (!parsed.success) {
          expect(parsed.error.issues.length).toBeGreaterThan(0);
          return;
        }
        judged++;
        const started = performance.now();
        const judgedStage = judgeStage(parsed.data);
        const result = stageResult(judgedStage);
        expect(performance.now() - started).toBeLessThan(20_000);
        expect(judgedStage.sizing.conflict?.ways.join(' ') ?? '').not.toMatch(/NaN|undefined|null/);
        // Sizing RBE and judging a part cost several runs: one stage in eight has to do.
        if (judged % 8 === 0) {
          expect(unsound(sizeShunt(judgedStage.input))).toEqual([]);
          expect(unsound(judgePart(parsed.data, parsed.data.transistor))).toEqual([]);
        }
        expect(unsound(result)).toEqual([]);
        expect(JSON.parse(JSON.stringify(result))).toEqual(result);
      }),
      { seed: SEED, numRuns: STAGES, endOnFailure: true },
    );
    // Most changes must get through the parser, or the engine has not been tried.
    expect(judged).toBeGreaterThan(STAGES / 8);
  });
});
