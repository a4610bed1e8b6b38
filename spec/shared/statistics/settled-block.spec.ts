import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluateStage } from '../../../shared/checks/evaluate-stage.ts';
import {
  BLOCK,
  PERCENTILES,
  type SampleShare,
  SampleRun,
  spreadOf,
} from '../../../shared/statistics/monte-carlo.ts';
import { spreadOfValues } from '../../../shared/statistics/order-statistics.ts';
import { Drawing } from '../../../shared/statistics/quantities.ts';
import { SampledTransistor } from '../../../shared/statistics/sampled-transistor.ts';
import { byFigure } from '../../../shared/statistics/spread-figures.ts';
import { StageInput } from '../../../shared/stage/stage-input.ts';
import { HIGH_SIDE_FILE, RELAY_FILE, TYPE_2N3904 } from '../relay-stage.ts';

const request = { samples: BLOCK, seed: 5 };

/** The same block, each sample brought to its balance by the operating point itself. */
function oneByOne(input: StageInput): SampleShare {
  const transistor = new SampledTransistor(input, evaluateStage(input).criteria, '');
  const { draws } = drawn(input);
  const figures = byFigure(() => new Float64Array(BLOCK));
  let met = 0;
  for (let k = 0; k < BLOCK; k++) {
    transistor.settleAt(draws, k);
    if (transistor.judge()) met++;
    const { point } = transistor;
    figures.overdriveFactor[k] = point.overdrive;
    figures.vceSatV[k] = point.vceV;
    figures.icA[k] = point.icA;
    figures.powerW[k] = point.powerW;
    figures.tjDegC[k] = point.tjDegC;
  }
  const missed = Object.fromEntries(transistor.tally.misses());
  return { samples: BLOCK, met, missed, figures };
}

function drawn(input: StageInput): Drawing {
  const drawing = new Drawing(input, request.seed, BLOCK);
  drawing.fill(0);
  return drawing;
}

/** How many samples of the block are found together, not one by one; null where the stage does not allow it. */
function foundTogether(input: StageInput): number | null {
  const transistor = new SampledTransistor(input, evaluateStage(input).criteria, '');
  transistor.take(drawn(input).draws);
  return transistor.foundTogether;
}

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const span = (min: number, max: number) =>
  fc.tuple(number(min, max), number(min, max)).map(([a, b]) => ({
    min: Math.min(a, b),
    max: Math.max(a, b),
  }));
const tolerance = number(0, 0.3);

const load = fc.oneof(
  fc.record({
    kind: fc.constant('resistor'),
    resistanceOhm: number(100, 20_000),
    tolerance,
  }),
  fc
    .record({ resistanceOhm: number(100, 20_000), tolerance, temperatureRiseK: number(0, 80) })
    .chain((coil) =>
      fc
        .record({
          maximumV: fc.option(number(10, 60)),
          coilMaxDegC: fc.option(number(50, 155)),
          releaseTimeLimitSec: fc.option(number(0.001, 0.1)),
        })
        .map((limits) => ({ ...RELAY_FILE.load, ...coil, ...limits })),
    ),
);

const part = fc.record({
  thermal: fc.record({ rthJaKPerW: number(1, 2000), rthJcKPerW: fc.constant(null) }),
  gainScale: number(0.2, 3),
  single: fc.boolean(),
});

/** Any single transistor with a coil or a resistor, the drive from far too weak to far too strong. */
const stages = fc
  .record({
    kind: fc.constantFrom('npn', 'darlington', 'open drain', 'push-pull pnp'),
    supplyV: span(5, 40),
    ambientDegC: span(-55, 150),
    railV: span(1.5, 6),
    railTracksSupply: fc.boolean(),
    dropV: number(0, 1),
    load,
    part,
    rbOhm: number(1.5, 5.5).map((decade) => 10 ** decade),
    rb: tolerance,
    shunt: fc.option(fc.record({ valueOhm: number(1000, 1e5), tolerance })),
    speedUpCapacitorF: fc.option(number(1e-11, 1e-8)),
  })
  .map((each) => {
    const pnp = each.kind === 'open drain' || each.kind === 'push-pull pnp';
    const file = pnp ? HIGH_SIDE_FILE : RELAY_FILE;
    const drive =
      each.kind === 'push-pull pnp'
        ? { ...RELAY_FILE.drive, railV: each.supplyV, railTracksSupply: each.railTracksSupply }
        : pnp
          ? file.drive
          : {
              ...RELAY_FILE.drive,
              railV: each.railV,
              railTracksSupply: each.railTracksSupply,
              high: { dropV: each.dropV, currentA: 0.008 },
            };
    const { gain, ...transistor } = file.transistor;
    const scaled = gain.map((row) => ({ ...row, min: row.min * each.part.gainScale, max: null }));
    const darlington = each.kind === 'darlington';
    return StageInput.parse({
      ...file,
      topology: darlington ? 'low-side-darlington' : file.topology,
      supplyV: each.supplyV,
      ambientDegC: each.ambientDegC,
      drive,
      load: each.load,
      baseResistor: { valueOhm: each.rbOhm, tolerance: each.rb, ratingW: 0.1 },
      shuntResistor: each.shunt === null ? null : { ...each.shunt, ratingW: 0.1 },
      speedUpCapacitorF: each.speedUpCapacitorF,
      clamp: each.load.kind === 'coil' ? file.clamp : null,
      saturationLimitV: 0.3,
      transistor: {
        ...transistor,
        darlington,
        thermal: each.part.thermal,
        gain: each.part.single ? scaled.slice(2, 3) : scaled,
      },
    });
  });

/** Equal but for the rounding of another order of operations. */
function expectNear(found: number | null | undefined, wanted: number | null | undefined): void {
  if (typeof found !== 'number' || typeof wanted !== 'number') expect(found).toBe(wanted);
  else
    expect(Math.abs(found - wanted)).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(wanted), 1e-3));
}

describe('samples found together', () => {
  it('are those found one by one: yield, misses, percentiles', { timeout: 60_000 }, () => {
    let together = 0;
    let apart = 0;
    fc.assert(
      fc.property(stages, (input) => {
        const run = new SampleRun(input, request);
        while (run.step());
        const found = spreadOf(request, [run.share()]);
        const wanted = oneByOne(input);
        expect(found.yield).toBe(wanted.met / BLOCK);
        expect(found.missed).toEqual(
          Object.fromEntries(
            Object.entries(wanted.missed).map(([id, count]) => [id, count / BLOCK]),
          ),
        );
        byFigure((name) => {
          const { quantiles } = spreadOfValues([wanted.figures[name]], PERCENTILES);
          quantiles.forEach((quantile, k) => {
            expectNear(found.percentiles[name][k], quantile);
          });
        });
        const count = foundTogether(input) ?? 0;
        together += count;
        apart += BLOCK - count;
      }),
      { seed: 20261201, numRuns: 60 },
    );
    // Both ways were tried.
    expect(together).toBeGreaterThan(8 * BLOCK);
    expect(apart).toBeGreaterThan(8 * BLOCK);
  });

  it('are all those of a relay driver that saturates', () => {
    expect(foundTogether(StageInput.parse(RELAY_FILE))).toBe(BLOCK);
    expect(foundTogether(StageInput.parse(HIGH_SIDE_FILE))).toBe(BLOCK);
  });

  it('need a stage whose samples stand by themselves', () => {
    const switching = { ...RELAY_FILE, frequencyHz: 1000, duty: 0.5 };
    expect(foundTogether(StageInput.parse(switching))).toBeNull();
    const bare = { ...RELAY_FILE, transistor: { ...TYPE_2N3904, gain: [] } };
    expect(foundTogether(StageInput.parse(bare))).toBeNull();
  });
});
