import fc from 'fast-check';
import { deriveTransistor } from '../../../shared/parts/derive-transistor.ts';
import { StageInput, type Topology, TOPOLOGIES } from '../../../shared/stage/stage-input.ts';
import { transistors } from '../parts/library-file.ts';
import { HIGH_SIDE_FILE, RELAY_FILE } from '../relay-stage.ts';

const real = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Even in the logarithm, as preferred values are. */
const spread = (min: number, max: number) => real(Math.log(min), Math.log(max)).map(Math.exp);
const maybe = <T>(given: fc.Arbitrary<T>) => fc.option(given, { nil: null });
const span = (min: number, max: number) =>
  fc
    .tuple(real(min, max), real(0, max - min))
    .map(([low, more]) => ({ min: low, max: low + more }));

/** Library parts by what they suit, with the switching and leakage rows they print. */
const PARTS = transistors
  .map((record) => deriveTransistor(record))
  .flatMap((derived) => (derived.ok ? [derived.data] : []));
type PartData = (typeof PARTS)[number];

const suits: Record<Topology, (part: PartData) => boolean> = {
  'low-side-npn': ({ polarity, darlington, internal }) =>
    polarity === 'npn' && !darlington && internal === null,
  'high-side-pnp': ({ polarity, internal }) => polarity === 'pnp' && internal === null,
  'two-transistor-high-side': ({ polarity, internal }) => polarity === 'pnp' && internal === null,
  'low-side-darlington': ({ polarity, darlington }) => polarity === 'npn' && darlington,
  'low-side-pre-biased': ({ polarity, internal }) => polarity === 'npn' && internal !== null,
  'level-translator': ({ polarity, internal }) => polarity === 'npn' && internal === null,
};

const SWITCHING = {
  tdSec: 3.5e-8,
  trSec: 3.5e-8,
  tsSec: 2e-7,
  tfSec: 5e-8,
  icA: 0.01,
  ib1A: 0.001,
  ib2A: 0.001,
};

/** A part that prints less, or more, than it does. */
const partFor = (topology: Topology) =>
  fc
    .record({
      part: fc.constantFrom(...PARTS.filter(suits[topology])),
      rows: fc.constantFrom('as printed', 'one gain row', 'one saturation row', 'cold row'),
      switching: fc.boolean(),
      betaR: maybe(real(0.1, 5)),
      ratings: fc.boolean(),
    })
    .map(({ part, rows, switching, betaR, ratings }) => {
      const [row] = part.gain;
      const cold = row?.min == null ? [] : [{ ...row, min: row.min * 0.4, tempDegC: -55 }];
      const changed = {
        'as printed': {},
        'one gain row': { gain: part.gain.slice(0, 1) },
        'one saturation row': { saturation: part.saturation.slice(0, 1) },
        'cold row': { gain: [...part.gain, ...cold] },
      }[rows];
      return {
        ...part,
        ...changed,
        ...(switching ? { switching: SWITCHING } : {}),
        ...(betaR === null ? {} : { model: { earlyV: null, isA: null, rcOhm: null, betaR } }),
        ...(ratings ? { limits: { ...part.limits, icPeakA: 0.8, ibA: 0.1, veboV: 6 } } : {}),
      };
    });

const coil = fc.record({
  kind: fc.constant('coil'),
  resistanceOhm: spread(100, 5000),
  tolerance: real(0, 0.2),
  referenceDegC: real(15, 30),
  temperatureRiseK: real(0, 40),
  inductanceH: maybe(spread(0.05, 10)),
  operateV: maybe(real(3, 20)),
  releaseV: maybe(real(0.5, 3)),
  holdV: maybe(real(2, 8)),
  maximumV: maybe(real(20, 60)),
  maximumReferenceDegC: maybe(real(20, 60)),
  coilMaxDegC: maybe(real(90, 150)),
  releaseTimeLimitSec: maybe(spread(1e-3, 1)),
});
const resistor = fc.record({
  kind: fc.constant('resistor'),
  resistanceOhm: spread(50, 10_000),
  tolerance: real(0, 0.1),
});
const leds = fc.record({
  kind: fc.constant('led-string'),
  count: fc.integer({ min: 1, max: 4 }),
  forwardV: span(1.6, 2.4),
  resistanceOhm: spread(100, 5000),
  tolerance: real(0, 0.1),
  maximumA: maybe(real(0.01, 0.1)),
  minimumA: maybe(real(0.001, 0.01)),
});
const lamp = fc.record({
  kind: fc.constant('lamp'),
  nominalV: real(5, 30),
  currentA: spread(0.01, 0.2),
  coldRatio: real(8, 15),
});
const logic = fc.record({
  kind: fc.constant('logic-input'),
  pullUpOhm: spread(470, 47_000),
  tolerance: real(0, 0.05),
  ratingW: maybe(real(0.05, 0.5)),
  count: fc.integer({ min: 1, max: 10 }),
  vilV: real(0.3, 1.5),
  vihV: real(1.6, 4),
  leakageA: real(0, 2e-5),
  lowCurrentA: real(0, 1e-3),
  capacitanceF: maybe(spread(1e-12, 1e-9)),
  wiringF: maybe(spread(1e-12, 1e-10)),
  riseTimeLimitSec: maybe(spread(1e-7, 1e-5)),
});

const loadFor = (topology: Topology) => {
  if (topology === 'level-translator') return logic;
  const high = topology === 'high-side-pnp' || topology === 'two-transistor-high-side';
  return high ? fc.oneof(coil, resistor, leds, lamp) : fc.oneof(coil, resistor, leds, lamp, logic);
};

const reset = fc.record({
  kind: fc.constantFrom('driven-low', 'high-z', 'pull-up'),
  leakageA: real(0, 1e-5),
  pullUpOhm: fc.option(spread(1e3, 1e6), { nil: null, freq: 8 }),
});
const driveFor = (topology: Topology) => {
  const common = {
    railV: span(3, 6),
    railTracksSupply: topology === 'high-side-pnp' ? fc.boolean() : fc.constant(false),
    low: fc.record({
      levelV: real(0.1, 0.6),
      currentA: spread(1e-3, 0.05),
      unloadedV: maybe(real(0, 0.1)),
    }),
    sourceLimitA: maybe(spread(1e-3, 0.05)),
    sinkLimitA: maybe(spread(1e-3, 0.05)),
    leakageA: real(0, 1e-5),
    groundShiftV: fc.oneof(fc.constant(0), real(-0.5, 0.5)),
    maximumV: maybe(real(10, 60)),
    reset: maybe(reset),
  };
  const pushPull = fc.record({
    ...common,
    kind: fc.constant('push-pull'),
    high: fc.record({
      dropV: real(0.1, 1),
      currentA: spread(5e-4, 0.02),
      unloadedDropV: fc.oneof(fc.constant(0), real(0, 0.1)),
    }),
  });
  const openCollector = fc.record({
    ...common,
    kind: fc.constant('open-collector'),
    pullUp: fc.record({
      valueOhm: spread(1e3, 1e5),
      tolerance: real(0, 0.1),
      ratingW: maybe(real(0.05, 0.5)),
    }),
  });
  return fc.oneof(pushPull, openCollector);
};

const clamp = fc.oneof(
  fc.constant({ kind: 'none' }),
  fc.record({
    kind: fc.constantFrom('diode', 'diode-zener'),
    forwardV: real(0.6, 1.4),
    zenerV: span(8, 30),
    reverseV: maybe(real(20, 100)),
    currentRatingA: maybe(real(0.1, 1)),
    powerRatingW: maybe(real(0.1, 1)),
  }),
  fc.record({
    kind: fc.constantFrom('zener-across-transistor', 'tvs-across-transistor'),
    zenerV: span(20, 50),
    standOffV: real(15, 40),
    currentRatingA: maybe(real(0.1, 1)),
    powerRatingW: maybe(real(0.1, 1)),
  }),
);

const fitted = (min: number, max: number) =>
  fc.record({
    valueOhm: spread(min, max),
    tolerance: real(0, 0.1),
    ratingW: maybe(real(0.05, 0.5)),
  });

/** Stages of a topology with every load, drive and clamp it can have, sound and unsound alike. */
export const stagesOf = (topology: Topology): fc.Arbitrary<StageInput> =>
  fc
    .record({
      supplyV: fc
        .tuple(span(4, 32), maybe(real(30, 80)), maybe(real(2, 12)))
        .map(([ends, surge, dip]) => ({ ...ends, surge, dip })),
      ambientDegC: span(-40, 95),
      switched: maybe(fc.record({ frequencyHz: spread(0.1, 50_000), duty: real(0.05, 0.95) })),
      storageTimeLimitSec: maybe(spread(1e-7, 1e-4)),
      drive: driveFor(topology),
      load: loadFor(topology),
      baseResistor: fitted(150, 100_000),
      shuntResistor: maybe(fitted(1000, 100_000)),
      speedUpCapacitorF: maybe(spread(1e-11, 1e-9)),
      clamp,
      saturationLimitV: maybe(real(0.1, 1)),
      transistor: partFor(topology),
      front: partFor('low-side-npn'),
      frontShunt: maybe(fitted(1000, 100_000)),
      frontResistor: fitted(470, 47_000),
      policy: fc.record({
        name: fc.constantFrom('General practice', 'High reliability'),
        guaranteedOnly: fc.boolean(),
      }),
    })
    .map(({ switched, front, frontShunt, frontResistor, ...stage }) =>
      StageInput.parse({
        ...(topology === 'high-side-pnp' ? HIGH_SIDE_FILE : RELAY_FILE),
        ...stage,
        ...(switched ?? {}),
        topology,
        preDriver:
          topology === 'two-transistor-high-side'
            ? { transistor: front, baseResistor: frontResistor, shuntResistor: frontShunt }
            : null,
      }),
    );

export const everyTopology = fc.constantFrom(...TOPOLOGIES).chain(stagesOf);
