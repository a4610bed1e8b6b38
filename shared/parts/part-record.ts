import * as z from 'zod';
import { DiodeRecord } from './diode-record.ts';
import { LoadRecord } from './load-record.ts';
import { LogicOutputRecord } from './logic-output-record.ts';
import { TransistorRecord } from './transistor-record.ts';

export const PART_KINDS = ['transistor', 'load', 'logic-output', 'diode'] as const;
export type PartKind = (typeof PART_KINDS)[number];

/**
 * A part as published: SI units, each name ending with its unit, rows as printed with their source and
 * confidence. Parsing fills what was left out, so a parsed record has every key.
 */
export const PartRecord = z.discriminatedUnion(
  'kind',
  [TransistorRecord, LoadRecord, LogicOutputRecord, DiodeRecord],
  { error: `expected a kind of part: ${PART_KINDS.join(', ')}` },
);
export type PartRecord = z.infer<typeof PartRecord>;
/** What a caller may send: optional keys left out. */
export type PartFile = z.input<typeof PartRecord>;
