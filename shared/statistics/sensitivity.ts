import { obstacleTo } from '../checks/applicability.ts';
import { nominalOf, pointAt, unknownNominal } from '../checks/corner-figures.ts';
import type { Nominal } from '../checks/evaluation.ts';
import { SHEET_DEG_C, ZERO_CELSIUS_K } from '../physics/constants.ts';
import { isHighSide } from '../stage/drive-source.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { TransistorData } from '../stage/transistor-data.ts';
import { byFigure, SPREAD_FIGURES, type SpreadFigure } from './spread-figures.ts';

/** What a figure answers to, and how it is moved: a stage with that input times a factor near 1. */
const INPUTS = {
  supply: (stage, by) => ({ ...stage, supplyV: scaledSpan(stage.supplyV, by) }),
  rail: (stage, by) => ({
    ...stage,
    drive: { ...stage.drive, railV: scaledSpan(stage.drive.railV, by) },
  }),
  source: scaledSource,
  'base-resistor': (stage, by) => {
    const { baseResistor } = stage;
    const valueOhm = (baseResistor.valueOhm ?? 0) * by;
    return { ...stage, baseResistor: { ...baseResistor, valueOhm } };
  },
  'shunt-resistor': (stage, by) => {
    const { shuntResistor } = stage;
    return shuntResistor === null
      ? stage
      : { ...stage, shuntResistor: { ...shuntResistor, valueOhm: shuntResistor.valueOhm * by } };
  },
  'pull-up': (stage, by) => {
    const { drive } = stage;
    if (drive.kind !== 'open-collector') return stage;
    const pullUp = { ...drive.pullUp, valueOhm: drive.pullUp.valueOhm * by };
    return { ...stage, drive: { ...drive, pullUp } };
  },
  load: scaledLoad,
  'forward-voltage': (stage, by) =>
    stage.load.kind === 'led-string'
      ? { ...stage, load: { ...stage.load, forwardV: scaledSpan(stage.load.forwardV, by) } }
      : stage,
  gain: (stage, by) => ({ ...stage, transistor: scaledGain(stage.transistor, by) }),
  vbe: (stage, by) => ({
    ...stage,
    transistor: {
      ...stage.transistor,
      baseEmitter: stage.transistor.baseEmitter.map((row) => ({
        ...row,
        minV: times(row.minV, by),
        typV: times(row.typV, by),
        maxV: times(row.maxV, by),
      })),
    },
  }),
  'vce-sat': (stage, by) => ({
    ...stage,
    transistor: {
      ...stage.transistor,
      saturation: stage.transistor.saturation.map((row) => ({
        ...row,
        typV: times(row.typV, by),
        maxV: times(row.maxV, by),
      })),
    },
  }),
  'internal-resistors': (stage, by) => {
    const { internal } = stage.transistor;
    if (internal === null) return stage;
    const scaled = { ...internal, r1Ohm: internal.r1Ohm * by, r2Ohm: times(internal.r2Ohm, by) };
    return { ...stage, transistor: { ...stage.transistor, internal: scaled } };
  },
  'pre-gain': (stage, by) =>
    stage.preDriver === null
      ? stage
      : {
          ...stage,
          preDriver: { ...stage.preDriver, transistor: scaledGain(stage.preDriver.transistor, by) },
        },
  'pre-base-resistor': (stage, by) => {
    const { preDriver } = stage;
    if (preDriver === null) return stage;
    const { baseResistor } = preDriver;
    const scaled = { ...baseResistor, valueOhm: baseResistor.valueOhm * by };
    return { ...stage, preDriver: { ...preDriver, baseResistor: scaled } };
  },
  'thermal-resistance': (stage, by) => {
    const { transistor } = stage;
    const rthJaKPerW = times(transistor.thermal.rthJaKPerW, by);
    const powerW = times(transistor.limits.powerW, 1 / by);
    return {
      ...stage,
      transistor: {
        ...transistor,
        thermal: { ...transistor.thermal, rthJaKPerW },
        limits: { ...transistor.limits, powerW },
      },
    };
  },
  ambient: (stage, by) => {
    const { min, max } = stage.ambientDegC;
    const nominalK = Math.min(max, Math.max(min, SHEET_DEG_C)) + ZERO_CELSIUS_K;
    const movedDegC = nominalK * by - ZERO_CELSIUS_K;
    return { ...stage, ambientDegC: { min: movedDegC, max: movedDegC } };
  },
} as const satisfies Record<string, (stage: StageInput, by: number) => StageInput>;
export type SensitivityInput = keyof typeof INPUTS;

/** What each figure of the nominal stage changes by for +1 % of one input, in the figure's unit; null where unknown. */
export interface SensitivityRow {
  readonly input: SensitivityInput;
  readonly change: Readonly<Record<SpreadFigure, number | null>>;
}

export interface Sensitivity {
  readonly nominal: Readonly<Record<SpreadFigure, number | null>>;
  /** Inputs that move nothing are left out. */
  readonly rows: readonly SensitivityRow[];
}

const STEP = 0.01;

/**
 * How the figures of the nominal stage answer to each input: central difference over ±1 %. Pure and total.
 *
 * @param input a parsed stage with its base resistor; without one, or where the stage cannot be judged, nothing is known
 */
export function sensitivityOf(input: StageInput): Sensitivity {
  if (obstacleTo(input) !== null || input.baseResistor.valueOhm === null) {
    return { nominal: figuresOf(unknownNominal()), rows: [] };
  }
  const at = (stage: StageInput) => figuresOf(nominalOf(pointAt(stage, null)));
  const rows = (Object.keys(INPUTS) as SensitivityInput[]).map((name): SensitivityRow => {
    const up = at(INPUTS[name](input, 1 + STEP));
    const down = at(INPUTS[name](input, 1 - STEP));
    return { input: name, change: byFigure((figure) => half(up[figure], down[figure])) };
  });
  const moves = ({ change }: SensitivityRow) =>
    SPREAD_FIGURES.some((figure) => change[figure] !== null && change[figure] !== 0);
  return { nominal: at(input), rows: rows.filter(moves) };
}

function half(up: number | null, down: number | null): number | null {
  return up === null || down === null ? null : (up - down) / 2;
}

function figuresOf(nominal: Nominal): Record<SpreadFigure, number | null> {
  return byFigure((figure) => (figure === 'vceSatV' ? nominal.vceV : nominal[figure]));
}

function times(value: number | null, by: number): number | null {
  return value === null ? null : value * by;
}

function scaledSpan<T extends { min: number; max: number }>(span: T, by: number): T {
  return { ...span, min: span.min * by, max: span.max * by };
}

/** The output's resistance: its drop at the tested current less that at no load, or a PNP's low level. */
function scaledSource(stage: StageInput, by: number): StageInput {
  const { drive } = stage;
  if (isHighSide(stage)) {
    return { ...stage, drive: { ...drive, low: { ...drive.low, levelV: drive.low.levelV * by } } };
  }
  if (drive.kind !== 'push-pull') return stage;
  const { unloadedDropV, dropV } = drive.high;
  const high = { ...drive.high, dropV: unloadedDropV + (dropV - unloadedDropV) * by };
  return { ...stage, drive: { ...drive, high } };
}

function scaledLoad(stage: StageInput, by: number): StageInput {
  const { load } = stage;
  switch (load.kind) {
    case 'lamp':
      return { ...stage, load: { ...load, currentA: load.currentA / by } };
    case 'logic-input':
      return { ...stage, load: { ...load, pullUpOhm: load.pullUpOhm * by } };
    default:
      return { ...stage, load: { ...load, resistanceOhm: load.resistanceOhm * by } };
  }
}

function scaledGain(part: TransistorData, by: number): TransistorData {
  const gain = part.gain.map((row) => ({
    ...row,
    min: times(row.min, by),
    typ: times(row.typ, by),
    max: times(row.max, by),
  }));
  return { ...part, gain };
}
