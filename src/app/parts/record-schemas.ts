import { DiodeRecord } from '../../../shared/parts/diode-record.ts';
import { LoadRecord } from '../../../shared/parts/load-record.ts';
import { LogicOutputRecord } from '../../../shared/parts/logic-output-record.ts';
import type { PartKind } from '../../../shared/parts/part-record.ts';
import { TransistorRecord } from '../../../shared/parts/transistor-record.ts';
import { outlineOf, type Group } from './record-outline.ts';

const SCHEMAS = {
  transistor: TransistorRecord,
  load: LoadRecord,
  'logic-output': LogicOutputRecord,
  diode: DiodeRecord,
} as const;

/** The outline of the record of a kind of part. */
export function outlineOfKind(kind: PartKind): Group {
  const outline = outlineOf(SCHEMAS[kind], 'record');
  if (outline.kind !== 'group') throw new RangeError(`the record of a ${kind} has no fields`);
  return outline;
}
