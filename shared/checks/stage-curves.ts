import {
  currentSteps,
  expectedSaturationV,
  limitSaturationV,
  outputCurve,
  type Sample,
} from '../physics/curves.ts';
import { SHEET_DEG_C } from '../physics/constants.ts';
import { deviceAt, type DeviceModel, type FigureOrigin } from '../physics/device-fit.ts';
import {
  baseVoltageV,
  collectorCurrentA,
  meetLoadLine,
  outputResistanceOhm,
  type BaseDrive,
  type CurvePoint,
  type Device,
} from '../physics/device-model.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import {
  deviceOfPart,
  SATURATION_STEPS,
  sheetSaturation,
  type SheetSaturation,
} from '../stage/part-curves.ts';
import type { StageInput } from '../stage/stage-input.ts';
import { pointAt } from './corner-figures.ts';
import type { Corner } from './evaluation.ts';

/** The operating point of a corner in limit figures, as the verdict uses it. */
export interface LimitPoint {
  readonly vceV: number;
  readonly icA: number;
  readonly ibA: number;
  readonly tjDegC: number;
  /** Slope of the VCE(sat) line in use, Ω; 0 where no row is printed. */
  readonly rceSatOhm: number;
  readonly saturated: boolean;
}

/** The stage at one corner, its limit figures and the device expected in its place. */
export interface CurvesAtCorner {
  readonly limit: LimitPoint;
  /** Where the expected curve of the corner's base current meets its load line. */
  readonly expected: CurvePoint;
  /** Supply less the load's own voltage, V, and the load, Ω. */
  readonly availableV: number;
  readonly loadOhm: number;
  readonly fullA: number;
  readonly earlyV: number;
  readonly earlyOrigin: FigureOrigin;
  /** VA/IC at the expected current, Ω. */
  readonly roOhm: number;
  readonly forcedBeta: number;
  readonly gain: number;
  /** Whether the base current is one: a part with resistors inside takes an input current instead. */
  readonly byInput: boolean;
  readonly model: DeviceModel;
  readonly part: OperatingPoint['model']['part'];
  readonly input: StageInput;
}

/**
 * What the curves of a stage start from.
 *
 * @param corner as a criterion reports it; null: the middle of every tolerance
 * @returns null where the stage cannot be drawn: no load current, no drive, or a part without a row
 */
export function curvesAtCorner(input: StageInput, corner: Corner | null): CurvesAtCorner | null {
  const point = pointAt(input, corner);
  const { condition, ibA, icA, vceV, tjDegC, rceSatOhm, saturated, model } = point;
  const { availableV, loadOhm, fullA } = condition;
  const rowless = model.part.gain === null && model.part.saturation === null;
  if (rowless || !(fullA > 0 && ibA > 0 && Number.isFinite(tjDegC))) return null;
  const { transistor, policy } = model.input;
  const device = deviceOfPart(model.part, transistor);
  const own = deviceAt(device, ibA, tjDegC, policy.rceTempcoPerK);
  const expected = meetLoadLine(own, { kind: 'current', ibA }, availableV, loadOhm);
  return {
    limit: { vceV, icA, ibA, tjDegC, rceSatOhm, saturated },
    expected,
    availableV,
    loadOhm,
    fullA,
    earlyV: device.earlyV,
    earlyOrigin: device.origin.earlyV,
    roOhm: outputResistanceOhm(device.earlyV, expected.icA),
    forcedBeta: point.forcedBeta,
    gain: point.gain,
    byInput: model.inside?.byInput === true,
    model: device,
    part: model.part,
    input: model.input,
  };
}

export interface OutputCurve {
  readonly drive: BaseDrive;
  /** Whether this is the corner's own base drive. */
  readonly own: boolean;
  /** IC in A over VCE in V. */
  readonly samples: readonly Sample[];
}

/** Curves below the full load current, and the step between two at constant VBE, V. */
const FAMILY = 5;
const VBE_STEP_V = 0.01;
/** The curves go a little beyond the end of the load line. */
const BEYOND = 1.04;

/** Expected output characteristics up to the supply: a family in round steps and the corner's own drive. */
export function outputCharacteristics(
  at: CurvesAtCorner,
  held: BaseDrive['kind'],
): readonly OutputCurve[] {
  const toV = at.availableV * BEYOND;
  const device = (ibA: number) =>
    deviceAt(at.model, ibA, at.limit.tjDegC, at.input.policy.rceTempcoPerK);
  const own = device(at.limit.ibA);
  const ownDrive: BaseDrive =
    held === 'current'
      ? { kind: 'current', ibA: at.limit.ibA }
      : { kind: 'voltage', vbeV: baseVoltageV(own, at.expected.icA, at.limit.ibA) };
  const family = held === 'current' ? currentFamily(at, device) : voltageFamily(at.fullA, own);
  return [
    ...family.map((drive) => ({
      drive,
      own: false,
      samples: outputCurve(drive.kind === 'current' ? device(drive.ibA) : own, drive, toV),
    })),
    { drive: ownDrive, own: true, samples: outputCurve(own, ownDrive, toV) },
  ];
}

const FOOT_STEPS = 32;

/** The expected curve of the corner's own base current up to a small VCE, in fine equal steps. */
export function footOfCurve(at: CurvesAtCorner, toV: number): readonly Sample[] {
  const { limit, model, input } = at;
  const own = deviceAt(model, limit.ibA, limit.tjDegC, input.policy.rceTempcoPerK);
  return Array.from({ length: FOOT_STEPS + 1 }, (_, k) => {
    const vceV = (toV * k) / FOOT_STEPS;
    return [vceV, collectorCurrentA(own, { kind: 'current', ibA: limit.ibA }, vceV)];
  });
}

/** Base currents in round steps, the largest making at most the full load current at the end of the load line. */
function currentFamily(at: CurvesAtCorner, device: (ibA: number) => Device): BaseDrive[] {
  const activeA = at.fullA / (1 + at.availableV / at.earlyV);
  // The gain of a base current near the one asked for settles in two rounds.
  const roughA = activeA / device(activeA / USUAL_GAIN).gain;
  const largestA = activeA / device(roughA).gain;
  const stepA = familyStepA(largestA);
  const count = Math.floor(largestA / stepA + 1e-9);
  return Array.from({ length: count }, (_, k) => ({ kind: 'current', ibA: stepA * (k + 1) }));
}

/** The largest round step that goes into a current as often as there are to be curves, or once more. */
function familyStepA(largestA: number): number {
  const decade = 10 ** Math.floor(Math.log10(largestA / FAMILY));
  const factor = ROUND_STEPS.find((each) => each * decade <= (largestA / FAMILY) * (1 + 1e-9));
  return (factor ?? 1) * decade;
}

const ROUND_STEPS = [8, 6, 5, 4, 3, 2.5, 2, 1.5, 1];

/** Where the search for a base current's gain starts. */
const USUAL_GAIN = 100;

/** Base voltages 10 mV apart, the largest making at most the full load current. */
function voltageFamily(fullA: number, device: Device): BaseDrive[] {
  const topV = device.junctions * device.thermalV * Math.log(fullA / device.isA);
  const stepV = VBE_STEP_V * device.junctions;
  const last = Math.floor(topV / stepV);
  const first = Math.max(1, last - FAMILY + 1);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, k) => ({
    kind: 'voltage',
    vbeV: (first + k) * stepV,
  }));
}

/** VCE(sat) in V over IC in A, with the part's own line beneath the corner's. */
export interface SaturationAtCorner extends SheetSaturation {
  /** Limit at the corner's junction temperature and forced β. */
  readonly corner: readonly Sample[];
  /** Whether it is another line than the sheet's. */
  readonly cornerDiffers: boolean;
  readonly expected: readonly Sample[];
}

/** Rows far above the load current would press the stage's own part of the line into a corner. */
const LARGEST_SPAN = 5;
const AHEAD = 1.25;
/** Lines closer than this are one, V. */
const SAME_V = 1e-6;

/** @returns null where the part prints no VCE(sat) row */
export function saturationAtCorner(at: CurvesAtCorner): SaturationAtCorner | null {
  const { part, input, fullA, limit, forcedBeta, gain } = at;
  const line = part.saturation;
  if (line === null) return null;
  const near = [...line.rowA].filter((icA) => icA <= LARGEST_SPAN * fullA);
  const toA = AHEAD * Math.max(fullA, ...near);
  const { rceTempcoPerK } = input.policy;
  const condition = { tjDegC: limit.tjDegC, rceTempcoPerK, forcedBeta, gain };
  // A part judged by its input voltage takes its VO(on) rows as they stand.
  const judged = at.byInput ? { ...condition, forcedBeta: 0 } : condition;
  const currents = currentSteps([0, toA], near, SATURATION_STEPS, 'equal');
  const corner = currents.map((icA): Sample => [icA, limitSaturationV(line, icA, judged)]);
  const sheetAt = { ...judged, tjDegC: SHEET_DEG_C, forcedBeta: 0 };
  return {
    ...sheetSaturation(line, input.transistor, rceTempcoPerK, toA),
    corner,
    cornerDiffers: corner.some(
      ([icA, vceV]) => Math.abs(vceV - limitSaturationV(line, icA, sheetAt)) > SAME_V,
    ),
    expected: currents.slice(1).map((icA) => [icA, expectedSaturationV(at.model, icA, condition)]),
  };
}

/** Ambient temperatures of the stage, and the junction's of the corner, °C. */
export function stageTemperatures(at: CurvesAtCorner): readonly [number, number] {
  const { min, max } = at.input.ambientDegC;
  return [min, Math.max(max, at.limit.tjDegC, min + SMALLEST_SPAN_K)];
}

const SMALLEST_SPAN_K = 20;
