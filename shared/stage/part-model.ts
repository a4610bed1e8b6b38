import { baseEmitterTable, type BaseEmitterTable } from '../physics/base-emitter.ts';
import { EXPECTED_GAIN_EXPONENT, gainTable, type GainTable } from '../physics/gain.ts';
import {
  cutOffAnchor,
  DARLINGTON_LEAKAGE,
  type CutOffAnchor,
  leakageTable,
  type LeakageTable,
} from '../physics/leakage.ts';
import { saturationLine, type SaturationLine } from '../physics/saturation.ts';
import { thermalResistanceInUse } from '../physics/thermal.ts';
import { insideGain, type InsideModel } from './internal-resistors.ts';
import type { Policy } from './policy.ts';
import type { StageInput } from './stage-input.ts';
import type { TransistorData } from './transistor-data.ts';

/** A transistor's rows made into the tables and lines the calculation reads; null where rows are missing. */
export interface PartModel {
  readonly gain: GainTable | null;
  readonly saturation: SaturationLine | null;
  readonly baseEmitter: BaseEmitterTable;
  readonly hasVbe: boolean;
  /** Into the base, or for a Darlington through the collector. */
  readonly leakage: LeakageTable | null;
  /** null where the sheet gives no collector current rating. */
  readonly anchor: CutOffAnchor | null;
  /** Base–emitter junctions in series: 2 in a Darlington. */
  readonly junctions: number;
  /** VBE at constant current, V/K. */
  readonly vbeTempcoVPerK: number;
  /** K/W; null where the sheet gives neither a thermal resistance nor a power. */
  readonly rthJaKPerW: number | null;
}

/** A Darlington has two junctions in series and two gains in a row. */
const DARLINGTON_JUNCTIONS = 2;

/**
 * Where one specimen of a part stands between its limits, a stage's expected figures with it: −1 at the least gain and as
 * far below the typical VBE and VCE(sat) as their maxima lie above, 1 at the maxima.
 */
export interface Specimen {
  readonly gain: number;
  readonly vbe: number;
  readonly vceSat: number;
}

/** Whether a stage's transistor is two in one: by its data, or because the topology asks for it. */
export const isDarlington = ({ topology, transistor }: StageInput): boolean =>
  transistor.darlington || topology === 'low-side-darlington';

/** The part as the policy's temperature laws and substitutes read it. */
export function partModel(
  part: TransistorData,
  policy: Policy,
  darlington = part.darlington,
  inside: InsideModel | null = null,
  expected = false,
): PartModel {
  const junctions = darlington ? DARLINGTON_JUNCTIONS : 1;
  const vbeMinV = policy.vbeMinV * junctions;
  const baseEmitter = baseEmitterTable(part.baseEmitter, vbeMinV);
  const { limits } = part;
  const gainRows = inside === null ? part.gain : insideGain(part.gain, inside);
  const gain = gainTable(gainRows, part.saturation, policy.gainExponent * junctions);
  return {
    gain:
      gain !== null && expected ? { ...gain, exponent: EXPECTED_GAIN_EXPONENT * junctions } : gain,
    saturation: saturationLine(part.saturation, part.model?.betaR ?? null, darlington),
    baseEmitter,
    hasVbe: baseEmitter.maximum.icA.length > 0,
    leakage: darlington
      ? leakageTable(part.leakage, policy.leakageDoublingK, DARLINGTON_LEAKAGE)
      : leakageTable(part.leakage, policy.leakageDoublingK),
    junctions,
    anchor:
      limits.icA === null
        ? null
        : cutOffAnchor(inside === null ? part.baseEmitter : [], limits.icA, vbeMinV),
    vbeTempcoVPerK: policy.vbeTempcoVPerK * junctions,
    rthJaKPerW: thermalResistanceInUse(part.thermal.rthJaKPerW, limits.powerW, limits.tjMaxDegC),
  };
}
