import type { Drive } from '../stage/drive.ts';
import { clean, refused, type Derived } from './derived.ts';
import type { LevelPoint, LogicOutputRecord } from './logic-output-record.ts';

/** What an output's record says of a drive; rails, pull-up and reset are the designer's. */
export interface DriveLevels {
  readonly kind: Drive['kind'];
  readonly high: {
    readonly dropV: number;
    readonly currentA: number;
    readonly unloadedDropV: number;
  } | null;
  readonly low: {
    readonly levelV: number;
    readonly currentA: number;
    readonly unloadedV: number | null;
  };
  readonly sourceLimitA: number | null;
  readonly sinkLimitA: number | null;
  readonly portTotalA: number | null;
  readonly maximumV: number | null;
}

/** Points one can choose: those that print a low level and, for push-pull outputs, a high one. */
export function drivePoints(record: LogicOutputRecord): number[] {
  return record.points.flatMap((point, index) => {
    const high = record.output === 'open-collector' || highOf(point) !== null;
    return high && lowOf(point) !== null && !isLight(point, record) ? index : [];
  });
}

/**
 * The levels of one printed point, with the light-load level of the same supply where one is printed. A
 * bipolar output without one keeps its drop unloaded too. Pin limits are the absolute maximum, else the
 * recommended current, else the tested one; all before the policy's derating.
 *
 * @param index place of the point in `points`, one of `drivePoints`
 * @returns the levels, or why the point gives none
 */
export function deriveDrive(record: LogicOutputRecord, index: number): Derived<DriveLevels> {
  const point = record.points[index];
  if (point === undefined) return refused(`${record.partNumber} has no such point.`);
  const light = record.points.find((other) => isLight(other, record) && holdsFor(other, point));
  const low = lowLevel(point, light);
  if (low === null) return refused(`${record.partNumber} prints no low level at this point.`);
  const isOpen = record.output === 'open-collector';
  const high = isOpen ? null : highLevel(point, light, record.bipolar);
  if (high === null && !isOpen) {
    return refused(`${record.partNumber} prints no high level at this point.`);
  }
  return {
    ok: true,
    data: {
      kind: record.output,
      high,
      low,
      ...pinLimits(record, point),
      maximumV: record.maximumV,
    },
    remarks: record.outputA === null ? ['No absolute maximum of the pin is printed.'] : [],
  };
}

function highLevel(point: LevelPoint, light: LevelPoint | undefined, bipolar: boolean) {
  const loaded = highOf(point);
  if (loaded === null) return null;
  const unloaded = light === undefined ? null : highOf(light);
  const restingDropV = bipolar ? loaded.dropV : 0;
  return { ...loaded, unloadedDropV: unloaded === null ? restingDropV : unloaded.dropV };
}

function lowLevel(point: LevelPoint, light: LevelPoint | undefined) {
  const loaded = lowOf(point);
  const unloaded = light === undefined ? null : lowOf(light);
  return loaded === null ? null : { ...loaded, unloadedV: unloaded?.levelV ?? null };
}

function pinLimits(record: LogicOutputRecord, point: LevelPoint) {
  const supplyV = point.supplyV?.min ?? null;
  const recommended = record.recommended.find(
    (row) => row.supplyV === null || row.supplyV === supplyV,
  );
  const isOpen = record.output === 'open-collector';
  const sourceA = record.outputA ?? recommended?.sourceA ?? point.sourceA;
  return {
    sourceLimitA: isOpen ? null : sourceA,
    sinkLimitA: record.outputA ?? recommended?.sinkA ?? point.sinkA,
    portTotalA: record.totalA ?? record.groupA,
  };
}

function highOf({ highV, highDropV, supplyV, sourceA }: LevelPoint) {
  const dropV = highDropV ?? (highV === null || supplyV === null ? null : supplyV.min - highV);
  return dropV === null || sourceA === null ? null : { dropV: clean(dropV), currentA: sourceA };
}

function lowOf({ lowV, sinkA }: LevelPoint) {
  return lowV === null || sinkA === null ? null : { levelV: lowV, currentA: sinkA };
}

const LIGHT_SHARE = 0.05;

/** A point at a twentieth of the record's largest current or less tells the unloaded level. */
function isLight(point: LevelPoint, record: LogicOutputRecord): boolean {
  const currentOf = ({ sourceA, sinkA }: LevelPoint) => Math.max(sourceA ?? 0, sinkA ?? 0);
  const largestA = Math.max(...record.points.map(currentOf));
  return currentOf(point) <= LIGHT_SHARE * largestA;
}

/** Whether a point's supply covers the other's; a point without one covers any. */
function holdsFor({ supplyV: wide }: LevelPoint, { supplyV: narrow }: LevelPoint): boolean {
  if (wide === null) return true;
  return narrow !== null && wide.min <= narrow.min && narrow.max <= wide.max;
}
