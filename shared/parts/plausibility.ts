import type { DiodeRecord } from './diode-record.ts';
import { disordered, outside, type Doubt } from './doubt.ts';
import { loadDoubts } from './load-doubts.ts';
import type { LevelPoint, LogicOutputRecord } from './logic-output-record.ts';
import type { PartRecord } from './part-record.ts';
import { transistorDoubts } from './transistor-doubts.ts';

/**
 * What looks slipped in a part record: figures out of order, units off by a thousand, ratings that
 * contradict each other. A doubt never refuses a record; data sheets do print contradictions.
 *
 * @returns doubts with the path of the figure, in the order of the record; none where all is usual
 */
export function plausibilityDoubts(record: PartRecord): Doubt[] {
  return [...disordered(record).filter(({ path }) => !isThreshold(path)), ...doubtsOfKind(record)];
}

/** VI(on) prints the least that switches on for sure, above the typical one; VI(off) the other way. */
const isThreshold = (path: string) => path.startsWith('input.on.') || path.startsWith('input.off.');

function doubtsOfKind(record: PartRecord): Doubt[] {
  switch (record.kind) {
    case 'transistor':
      return transistorDoubts(record);
    case 'load':
      return loadDoubts(record);
    case 'logic-output':
      return record.points.flatMap((point, index) => levelDoubts(record, point, `points.${index}`));
    case 'diode':
      return diodeDoubts(record);
  }
}

function levelDoubts({ outputA }: LogicOutputRecord, point: LevelPoint, path: string): Doubt[] {
  const supplyV = point.supplyV?.max ?? null;
  const levels = [0, supplyV ?? Infinity] as const;
  const currents = [1e-9, outputA ?? 1] as const;
  return [
    ...outside(`${path}.highV`, point.highV, levels, 'V'),
    ...outside(`${path}.highDropV`, point.highDropV, levels, 'V'),
    ...outside(`${path}.lowV`, point.lowV, [0, (supplyV ?? Infinity) / 2], 'V'),
    ...outside(`${path}.sourceA`, point.sourceA, currents, 'A'),
    ...outside(`${path}.sinkA`, point.sinkA, currents, 'A'),
  ];
}

function diodeDoubts({ forward, reverse, reverseV, breakdown }: DiodeRecord): Doubt[] {
  const clamping = breakdown?.clampingV ?? null;
  return [
    ...forward.flatMap(({ typV, maxV }, index) => [
      ...outside(`forward.${index}.typV`, typV, [0.1, 3], 'V'),
      ...outside(`forward.${index}.maxV`, maxV, [0.1, 3], 'V'),
    ]),
    ...reverse.flatMap(({ voltageV, maxA }, index) => [
      ...outside(`reverse.${index}.voltageV`, voltageV, [0, reverseV ?? Infinity], 'V'),
      ...outside(`reverse.${index}.maxA`, maxA, [0, 0.1], 'A'),
    ]),
    ...outside('breakdown.clampingV', clamping, [breakdown?.zenerV.min ?? 0, Infinity], 'V'),
  ];
}
