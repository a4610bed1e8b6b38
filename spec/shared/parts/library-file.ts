import { readFileSync } from 'node:fs';
import * as z from 'zod';
import { DiodeRecord } from '../../../shared/parts/diode-record.ts';
import { LoadRecord } from '../../../shared/parts/load-record.ts';
import { LogicOutputRecord } from '../../../shared/parts/logic-output-record.ts';
import { TransistorRecord } from '../../../shared/parts/transistor-record.ts';

const folder = new URL('../../../server/seed/library/', import.meta.url);

function readLibrary<T extends z.ZodType>(file: string, schema: T): z.infer<T>[] {
  const text = readFileSync(new URL(file, folder), 'utf8');
  return z.array(schema).parse(JSON.parse(text));
}

/** The shipped part library, parsed by its schemas. */
export const transistors = readLibrary('transistors.json', TransistorRecord);
export const loads = readLibrary('loads.json', LoadRecord);
export const logicOutputs = readLibrary('logic-outputs.json', LogicOutputRecord);
export const diodes = readLibrary('diodes.json', DiodeRecord);

/** The record of a part number; a test that names a part not in the library fails at once. */
export function find<T extends { partNumber: string }>(records: T[], partNumber: string): T {
  const record = records.find((candidate) => candidate.partNumber === partNumber);
  if (record === undefined) throw new Error(`no ${partNumber} in the library`);
  return record;
}
