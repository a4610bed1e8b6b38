import { cornerNamed, cornerNumber } from '../stage/corners.ts';
import type { OperatingPoint } from '../stage/operating-point.ts';
import type { StageInput } from '../stage/stage-input.ts';
import type { Corner, CornerFigures, Nominal } from './evaluation.ts';
import { judgeFor } from './judge.ts';

/** The nominal figures have no corner. */
const NOMINAL_CORNER: Corner = {};

const UNKNOWN: Nominal = {
  icA: null,
  ibA: null,
  driveA: null,
  vceV: null,
  vbeV: null,
  rceSatOhm: null,
  forcedBeta: null,
  overdriveFactor: null,
  powerW: null,
  tjDegC: null,
};

/** A result without figures, for stages that cannot be judged. */
export function unknownNominal(): Nominal {
  return { ...UNKNOWN };
}

const finite = (value: number) => (Number.isFinite(value) ? value : null);

/** The figures of a point as a result states them. */
export function nominalOf(point: OperatingPoint): Nominal {
  const { gain, saturation, hasVbe } = point.model.part;
  const byInput = point.model.inside?.byInput === true;
  return {
    icA: finite(point.icA),
    ibA: finite(point.ibA),
    driveA: finite(point.driveA),
    vceV: saturation === null ? null : finite(point.vceV),
    vbeV: hasVbe || byInput ? finite(point.vbeV) : null,
    rceSatOhm: saturation === null ? null : finite(point.rceSatOhm),
    forcedBeta: finite(point.forcedBeta),
    overdriveFactor: gain === null ? null : finite(point.overdrive),
    powerW: finite(point.powerW),
    tjDegC: finite(point.tjDegC),
  };
}

function figuresOf(point: OperatingPoint, corner: Corner): CornerFigures {
  const { condition } = point;
  return {
    corner,
    supplyV: condition.supplyV,
    ambientDegC: condition.ambientDegC,
    outputV: outputV(point),
    driveA: point.driveA,
    ibA: point.ibA,
    shuntA: point.rbeOhm === Infinity ? 0 : point.vbeV / point.rbeOhm,
    icA: point.icA,
    vceV: point.vceV,
    vbeV: point.vbeV,
    forcedBeta: finite(point.forcedBeta),
    overdriveFactor: finite(point.overdrive) ?? 0,
    powerW: point.powerW,
    tjDegC: point.tjDegC,
    saturated: point.saturated,
  };
}

/** Voltage at the output while on, against the logic's return: high for an NPN, low for a PNP. */
function outputV(point: OperatingPoint): number {
  const seriesOhm = point.model.inside?.byInput === true ? point.outerRbOhm : point.rbOhm;
  const acrossV = point.vbeV + point.driveA * seriesOhm;
  return point.model.input.topology === 'high-side-pnp'
    ? point.condition.supplyV - acrossV
    : acrossV;
}

/** Stands for a base resistor left open, Ω: nothing comes through. */
const OPEN_OHM = 1e12;

/**
 * The on state at one corner, for the drawing. Of a two-transistor high side the corner of a `pre-` criterion shows the
 * transistor in front, any other the one behind.
 *
 * @param corner ends by name, as a criterion reports them; what it leaves out stands at its first end
 */
export function figuresAtCorner(input: StageInput, corner: Corner): CornerFigures {
  const point = pointAt(input, corner);
  const { corners } = point.model;
  return figuresOf(point, cornerNamed(corners, cornerNumber(corners, corner)));
}

/** The on state at the middle of every tolerance, settled. */
export function nominalFigures(input: StageInput): CornerFigures {
  return figuresOf(pointAt(input, null), NOMINAL_CORNER);
}

/** The operating point solved at a corner, or with null at the middle of every tolerance, settled. */
export function pointAt(input: StageInput, corner: Corner | null): OperatingPoint {
  const { point, rbOhm } = pointFor(input, corner !== null && 'veb' in corner);
  if (corner === null) point.placeNominal(rbOhm);
  else point.place(cornerNumber(point.model.corners, corner), rbOhm);
  const { ambientDegC } = point.condition;
  if (corner === null || corner['instant'] === 'settled') point.settle(ambientDegC);
  else point.solve(ambientDegC);
  return point;
}

/** The operating point of the stage's output transistor, or of the one in front of it. */
function pointFor(input: StageInput, inFront: boolean) {
  const rbOhm = input.baseResistor.valueOhm ?? OPEN_OHM;
  const judge = judgeFor(input);
  // Two transistors know of each other only after a run.
  if (input.preDriver !== null) judge.criteria(rbOhm);
  return inFront && judge.preJudge != null && input.preDriver !== null
    ? { point: judge.preJudge.point, rbOhm: input.preDriver.baseResistor.valueOhm }
    : { point: judge.point, rbOhm };
}
