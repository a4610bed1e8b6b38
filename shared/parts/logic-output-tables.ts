import type { LogicOutputRecord } from './logic-output-record.ts';
import { column, figuresTable, tableOf, type PartTable } from './part-table.ts';
import { sourceOf } from './provenance.ts';

/** All groups of a logic output record. */
export function logicOutputTables(record: LogicOutputRecord): PartTable[] {
  const { confidence, sources } = record;
  const head = (id: string, title: string, of: 'limits' | 'electrical') => {
    return { id, title, source: sourceOf(sources, of), confidence };
  };
  return [
    ...figuresTable(head('limits', 'Limits', 'limits'), [
      { name: 'Supply, lowest', value: record.supplyV?.min ?? null, unit: 'V' },
      { name: 'Supply, highest', value: record.supplyV?.max ?? null, unit: 'V' },
      { name: 'One output', value: record.outputA, unit: 'A' },
      { name: 'All outputs together', value: record.totalA, unit: 'A' },
      { name: 'A group of pins', value: record.groupA, unit: 'A' },
      { name: 'Supply pin', value: record.supplyPinA, unit: 'A' },
      { name: 'Pull-up voltage', value: record.maximumV, unit: 'V' },
    ]),
    ...tableOf(
      head('recommended', 'Recommended output current', 'electrical'),
      record.recommended,
      [
        column('Supply', 'V', ({ supplyV }) => supplyV),
        column('source', 'A', ({ sourceA }) => sourceA),
        column('sink', 'A', ({ sinkA }) => sinkA),
      ],
    ),
    ...tableOf(head('points', 'Guaranteed levels', 'electrical'), record.points, [
      column('supply from', 'V', ({ supplyV }) => supplyV?.min ?? null),
      column('supply to', 'V', ({ supplyV }) => supplyV?.max ?? null),
      column('T from', '°C', ({ tempDegC }) => tempDegC?.min ?? null),
      column('T to', '°C', ({ tempDegC }) => tempDegC?.max ?? null),
      column('source', 'A', ({ sourceA }) => sourceA),
      column('VOH min', 'V', ({ highV }) => highV),
      column('below rail, max', 'V', ({ highDropV }) => highDropV),
      column('sink', 'A', ({ sinkA }) => sinkA),
      column('VOL max', 'V', ({ lowV }) => lowV),
    ]),
  ];
}
