import { needsOf, type TransistorKind } from '../../../shared/stage/topology-needs.ts';
import { type Clamp, NO_CLAMP } from '../../../shared/stage/clamp.ts';
import type { Drive } from '../../../shared/stage/drive.ts';
import { Load } from '../../../shared/stage/load.ts';
import { GENERAL_PRACTICE, type Policy } from '../../../shared/stage/policy.ts';
import { STAGE_FORMAT, StageInput, type Topology } from '../../../shared/stage/stage-input.ts';
import { TransistorData } from '../../../shared/stage/transistor-data.ts';
import type { PreDriver } from '../../../shared/stage/two-transistors.ts';
import { preferredValues } from '../../../shared/units/preferred-values.ts';

/** What the person says about a new stage before its sheet opens. */
export interface NewStageWords {
  readonly reference: string;
  readonly title: string;
  readonly topology: Topology;
  readonly loadKind: Load['kind'];
}

type Span = Readonly<Record<'min' | 'max', number>>;

/** A transistor without data: the sheet says what is open until one is picked. */
export const noTransistor = (
  polarity: 'npn' | 'pnp',
  kind: TransistorKind = 'transistor',
): TransistorData =>
  TransistorData.parse({
    partNumber: 'not chosen',
    polarity,
    darlington: kind === 'darlington',
    limits: { vceoV: null, icA: null, powerW: null, tjMaxDegC: 150 },
    thermal: { rthJaKPerW: null },
    ...{ gain: [], saturation: [], baseEmitter: [] },
    internal: kind === 'pre-biased' ? { r1Ohm: 10_000, r2Ohm: 10_000 } : null,
  });

/** The output transistor a topology starts with. */
export function startingTransistor(topology: Topology): TransistorData {
  const { polarity, kinds } = needsOf(topology);
  return noTransistor(polarity, kinds[0]);
}

/** A 3.3 V output; an open collector where only that can turn a PNP off. */
export function startingDrive(topology: Topology): Drive {
  const common = {
    railV: { min: 3.0, max: 3.6 },
    ...{ railTracksSupply: false, leakageA: 0, reset: null, groundShiftV: 0 },
    low: { levelV: 0.4, currentA: 0.008, unloadedV: null },
    ...{ sinkLimitA: 0.02, port: null, portTotalA: null, maximumV: null },
  };
  return topology === 'high-side-pnp'
    ? {
        ...common,
        kind: 'open-collector',
        high: null,
        sourceLimitA: null,
        pullUp: { valueOhm: 10_000, tolerance: 0.05, ratingW: null },
      }
    : {
        ...common,
        kind: 'push-pull',
        high: { dropV: 0.6, currentA: 0.008, unloadedDropV: 0 },
        sourceLimitA: 0.02,
        pullUp: null,
      };
}

const LED_V = { min: 1.8, max: 2.4 };
const LED_A = 0.01;
/** Share of the supply that a string may take, so that its resistor still sets the current. */
const STRING_SHARE = 0.5;

const COIL_W = 0.4;
const rounded = (value: number) => Number(value.toPrecision(3));

/** A small load of the kind at the supply: usual values of the trade that the designer replaces. */
export function startingLoad(kind: Load['kind'], supplyV: Span): Load {
  const middleV = (supplyV.min + supplyV.max) / 2;
  switch (kind) {
    case 'coil':
      return Load.parse({
        ...{ kind, tolerance: 0.1, referenceDegC: 20, inductanceH: null, maximumV: null },
        resistanceOhm: rounded(middleV ** 2 / COIL_W),
        ...{ operateV: rounded(0.7 * middleV), releaseV: rounded(0.1 * middleV) },
      });
    case 'resistor':
      return { kind, resistanceOhm: 1000, tolerance: 0.05 };
    case 'led-string': {
      const count = Math.max(1, Math.floor((STRING_SHARE * supplyV.min) / LED_V.max));
      const acrossV = Math.max(0.5, middleV - (count * (LED_V.min + LED_V.max)) / 2);
      return {
        ...{ kind, count, forwardV: LED_V, tolerance: 0.05, maximumA: 0.03, minimumA: null },
        resistanceOhm: preferredValues('E24', acrossV / LED_A, 1e6)[0] ?? 1e6,
      };
    }
    case 'lamp':
      return { kind, nominalV: middleV, currentA: 0.04, coldRatio: 12 };
    case 'logic-input':
      return {
        ...{ kind, pullUpOhm: 4700, tolerance: 0.05, ratingW: 0.1, count: 1 },
        ...cmosLevels(supplyV),
        ...{ leakageA: 1e-6, lowCurrentA: 1e-6, capacitanceF: 1e-11, wiringF: 2e-11 },
        riseTimeLimitSec: null,
      };
  }
}

/** Input levels of CMOS logic at its own supply: 30 and 70 % of it (common practice). */
const cmosLevels = (supplyV: Span) => ({
  vilV: rounded(0.3 * supplyV.min),
  vihV: rounded(0.7 * supplyV.max),
});

/** The clamp a load asks for: a coil its diode, any other none. */
export function clampFor(load: Load, clamp: Clamp): Clamp {
  if (load.kind !== 'coil') return NO_CLAMP;
  return clamp.kind === 'none' ? { ...NO_CLAMP, kind: 'diode', forwardV: 1 } : clamp;
}

type Surroundings = Pick<StageInput, 'topology' | 'drive' | 'load'> & { readonly supplyV: Span };

/** The base network a stage starts with: forced β 10 at its load, nothing outside a pre-biased part. */
export function startingNetwork(
  stage: Surroundings,
): Pick<StageInput, 'baseResistor' | 'shuntResistor'> {
  if (stage.topology === 'low-side-pre-biased') {
    return { baseResistor: { valueOhm: 0, tolerance: 0.05, ratingW: 0.1 }, shuntResistor: null };
  }
  const baseA = startingLoadA(stage) / STARTING_BETA;
  return {
    baseResistor: { valueOhm: below(acrossBaseV(stage) / baseA), tolerance: 0.05, ratingW: 0.25 },
    shuntResistor: { valueOhm: 22_000, tolerance: 0.05, ratingW: 0.1 },
  };
}

/** The transistor in front of a two-transistor high side: its load is the base resistor behind it. */
export function startingPreDriver({ drive, supplyV }: Surroundings, rbOhm: number): PreDriver {
  const baseA = supplyV.max / rbOhm / STARTING_BETA;
  return {
    transistor: noTransistor('npn'),
    baseResistor: {
      valueOhm: below((highV(drive) - VBE_V) / baseA),
      ...{ tolerance: 0.05, ratingW: 0.1 },
    },
    shuntResistor: { valueOhm: 22_000, tolerance: 0.05, ratingW: 0.1 },
  };
}

/** The rule of thumb of saturated switches (common practice). */
const STARTING_BETA = 10;
const VBE_V = 0.8;

const highV = ({ railV, high }: Drive) => railV.min - (high?.dropV ?? 0);

/** What is left for RB with the output on. */
function acrossBaseV({ topology, supplyV, drive }: Surroundings): number {
  if (needsOf(topology).polarity === 'pnp') return supplyV.min - VBE_V - drive.low.levelV;
  return highV(drive) - VBE_V * (topology === 'low-side-darlington' ? 2 : 1);
}

/** The most the load takes, roughly. */
function startingLoadA({ load, supplyV }: Surroundings): number {
  switch (load.kind) {
    case 'coil':
    case 'resistor':
      return supplyV.max / load.resistanceOhm;
    case 'led-string':
      return Math.max(0.1, supplyV.max - load.count * load.forwardV.min) / load.resistanceOhm;
    case 'lamp':
      return load.currentA;
    case 'logic-input':
      return supplyV.max / load.pullUpOhm + load.count * load.lowCurrentA;
  }
}

/** The E24 value next below, at least 10 Ω. */
const below = (ohm: number) => preferredValues('E24', 10, Math.max(10, ohm)).at(-1) ?? 10;

/**
 * A stage to start from: 24 V (a level translator: 5 V), a small load and a 3.3 V output, usual values of the trade that
 * the designer replaces by the project's own.
 */
export function startingStage(asked: NewStageWords, policy: Policy = GENERAL_PRACTICE): StageInput {
  const { topology, reference, title, loadKind } = asked;
  const supplyV =
    topology === 'level-translator' ? { min: 4.75, max: 5.25 } : { min: 21.6, max: 26.4 };
  const load = startingLoad(loadKind, supplyV);
  const drive = startingDrive(topology);
  const around = { topology, supplyV, load, drive };
  const network = startingNetwork(around);
  const { valueOhm } = network.baseResistor;
  const two = topology === 'two-transistor-high-side' && valueOhm !== null;
  return StageInput.parse({
    format: STAGE_FORMAT,
    ...{ reference, title, ...around, ...network, policy },
    ambientDegC: { min: 0, max: 50 },
    clamp: clampFor(load, NO_CLAMP),
    transistor: startingTransistor(topology),
    preDriver: two ? startingPreDriver(around, valueOhm) : null,
  });
}
