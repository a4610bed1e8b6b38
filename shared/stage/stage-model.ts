import { maximumVbeV, minimumVbeV, vbeBetweenV } from '../physics/base-emitter.ts';
import { gainBetween, maximumGain, minimumGain } from '../physics/gain.ts';
import { pieceAt } from '../physics/saturation.ts';
import { type ClampVoltages, clampVoltages } from './clamp-voltages.ts';
import { loadDegC, type LoadEnds, setCollectorPath } from './collector-path.ts';
import { cornerSpace, type CornerSpace, type CornerVariable } from './corners.ts';
import { type DriveSource, driveSource } from './drive-source.ts';
import { insideModel, type InsideModel } from './internal-resistors.ts';
import { isDarlington, partModel, type PartModel, type Specimen } from './part-model.ts';
import type { StageInput } from './stage-input.ts';
import type { Writable } from './writable.ts';

/** What does not depend on RB at one load condition: full load current and the part's figures there, 25 °C. */
export interface LoadCondition {
  readonly supplyV: number;
  readonly ambientDegC: number;
  readonly coilDegC: number;
  readonly availableV: number;
  readonly loadOhm: number;
  /** Load current with VCE = 0, A. */
  readonly fullA: number;
  readonly gainMin: number;
  readonly gainMax: number;
  readonly vbeMinV: number;
  readonly vbeMaxV: number;
  /** Piece of the saturation line at `fullA`. */
  readonly piece: number;
}

/** A stage made ready for its corners: tables compiled once, nothing looked up by name inside the loop. */
export interface StageModel {
  readonly input: StageInput;
  readonly part: PartModel;
  /** The specimen that expected figures belong to; null for limit figures. */
  readonly specimen: Specimen | null;
  readonly corners: CornerSpace;
  /** By supply, ambient, load, instant and the load's own voltage: bit 4, 3, 2, 1, 0. */
  readonly conditions: readonly LoadCondition[];
  /** By supply, ambient and drive: bit 2, 1, 0. */
  readonly drives: readonly DriveSource[];
  /** Ends of RBE, Ω; Infinity where none is fitted. */
  readonly shuntOhm: readonly [number, number];
  /** null for parts without resistors inside. */
  readonly inside: InsideModel | null;
  /** null for loads that are no coil, and for coils without clamp. */
  readonly clamp: ClampVoltages | null;
  /** Share of the time conduction loss counts. */
  readonly conductionShare: number;
  readonly nominal: { readonly condition: LoadCondition; readonly drive: DriveSource };
}

const ENDS = [0, 1] as const;

/** What stands around a transistor that is only one of two in its stage. */
export interface Surroundings {
  /** Sources in place of the logic output, by supply, ambient and drive: bit 2, 1, 0. */
  readonly drives?: readonly DriveSource[];
  readonly nominalDrive?: DriveSource;
  /** Voltage in series with the load, by supply, ambient and end: bit 2, 1, 0. V */
  readonly seriesV?: readonly number[];
  readonly nominalSeriesV?: number;
}

/**
 * Everything of a stage that its base resistor does not change.
 *
 * @param specimen for expected figures: the specimen of the part they belong to
 */
export function stageModel(
  input: StageInput,
  around: Surroundings = {},
  specimen: Specimen | null = null,
): StageModel {
  const { shuntResistor, supplyV, ambientDegC, policy, drive } = input;
  const inside = insideModel(input);
  const part = partModel(input.transistor, policy, isDarlington(input), inside, specimen !== null);
  const condition = (supply: number, ends: LoadEnds, seriesV: number) =>
    loadCondition(input, part, specimen, supply, ends, seriesV);
  const supplies = [supplyV.min, supplyV.max] as const;
  const ambients = [ambientDegC.min, ambientDegC.max] as const;
  const conditions = ENDS.flatMap((s) =>
    ENDS.flatMap((a) =>
      ENDS.flatMap((l) =>
        ENDS.flatMap((t) =>
          ENDS.map((v) =>
            condition(
              supplies[s],
              {
                ambientDegC: ambients[a],
                settled: t === 1,
                sign: 2 * l - 1,
                forwardSign: 2 * v - 1,
              },
              around.seriesV?.[(s << 2) | (a << 1) | v] ?? 0,
            ),
          ),
        ),
      ),
    ),
  );
  const drives = ENDS.flatMap((s) =>
    ENDS.flatMap(() => [
      driveSource(input, supplies[s], drive.railV.min, false, 1),
      driveSource(input, supplies[s], drive.railV.max, true, -1),
    ]),
  );
  const shunt = shuntResistor ?? { valueOhm: Infinity, tolerance: 0 };
  const middleV = (supplyV.min + supplyV.max) / 2;
  const room = Math.min(ambientDegC.max, Math.max(ambientDegC.min, 25));
  return {
    input,
    part,
    specimen,
    corners: cornerSpace(lacking(input, inside, around)),
    conditions,
    drives: around.drives ?? drives,
    shuntOhm: [shunt.valueOhm * (1 - shunt.tolerance), shunt.valueOhm * (1 + shunt.tolerance)],
    inside,
    clamp: input.load.kind === 'coil' ? clampVoltages(input) : null,
    conductionShare:
      input.frequencyHz > 0 && input.frequencyHz >= policy.averagingHz ? input.duty : 1,
    nominal: {
      condition: condition(
        middleV,
        { ambientDegC: room, settled: true, sign: 0, forwardSign: 0 },
        around.nominalSeriesV ?? 0,
      ),
      drive:
        around.nominalDrive ??
        driveSource(input, middleV, (drive.railV.min + drive.railV.max) / 2, false, 0),
    },
  };
}

/** Variables the corners of a stage do without. */
function lacking(
  { shuntResistor, load }: StageInput,
  inside: InsideModel | null,
  around: Surroundings,
): CornerVariable[] {
  const lacks: CornerVariable[] = [];
  if (shuntResistor === null || inside !== null) lacks.push('rbe');
  if (inside === null) lacks.push('r1');
  if (inside?.ratio == null) lacks.push('ratio');
  if (load.kind === 'lamp') lacks.push('load');
  if (load.kind !== 'led-string') lacks.push('vf');
  if (around.seriesV === undefined) lacks.push('veb');
  return lacks;
}

function loadCondition(
  input: StageInput,
  part: PartModel,
  specimen: Specimen | null,
  supplyV: number,
  ends: LoadEnds,
  seriesV: number,
): LoadCondition {
  const condition = {
    supplyV,
    ambientDegC: 0,
    coilDegC: 0,
    availableV: 0,
    loadOhm: 0,
    fullA: 0,
    gainMin: 0,
    gainMax: 0,
    vbeMinV: 0,
    vbeMaxV: 0,
    piece: 0,
  };
  setLoadCondition(condition, input, part, specimen, supplyV, ends, seriesV);
  return condition;
}

/** Writes what stands at one load condition. */
export function setLoadCondition(
  condition: Writable<LoadCondition>,
  input: StageInput,
  part: PartModel,
  specimen: Specimen | null,
  supplyV: number,
  ends: LoadEnds,
  seriesV: number,
): void {
  setCollectorPath(condition, input, supplyV, ends);
  condition.availableV -= seriesV;
  const fullA = Math.max(0, condition.availableV) / condition.loadOhm;
  condition.supplyV = supplyV;
  condition.ambientDegC = ends.ambientDegC;
  condition.coilDegC = loadDegC(input, ends);
  condition.fullA = fullA;
  const { gain, baseEmitter, saturation } = part;
  condition.piece = saturation === null ? 0 : pieceAt(saturation, fullA);
  if (specimen === null) {
    condition.gainMin = gain === null ? Infinity : minimumGain(gain, fullA);
    condition.gainMax = gain === null ? Infinity : maximumGain(gain, fullA);
    condition.vbeMinV = minimumVbeV(baseEmitter, fullA);
    condition.vbeMaxV = maximumVbeV(baseEmitter, fullA);
  } else {
    condition.gainMin = gain === null ? Infinity : gainBetween(gain, fullA, specimen.gain);
    condition.gainMax = condition.gainMin;
    condition.vbeMinV = vbeBetweenV(baseEmitter, fullA, specimen.vbe);
    condition.vbeMaxV = condition.vbeMinV;
  }
}
