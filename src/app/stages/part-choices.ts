import { contactNames } from '../../../shared/parts/derive-load.ts';
import { drivePoints } from '../../../shared/parts/derive-drive.ts';
import { makerNames } from '../../../shared/parts/chosen-limits.ts';
import { gainGroups } from '../../../shared/parts/chosen-rows.ts';
import type { PartRecord } from '../../../shared/parts/part-record.ts';
import { formatQuantity } from '../../../shared/units/engineering-notation.ts';

/** What a designer still has to say about a record before it fills a stage. */
export interface PartChoice {
  readonly key: string;
  readonly label: string;
  readonly options: readonly { readonly value: string; readonly text: string }[];
}

const OPEN = (text: string) => ({ value: '', text });
const plain = (value: string) => ({ value, text: value });

/** The questions a record asks, none where it leaves nothing open. */
export function partChoices(record: PartRecord): readonly PartChoice[] {
  return asked(record).filter(({ options }) => options.length > 1);
}

function asked(record: PartRecord): readonly PartChoice[] {
  switch (record.kind) {
    case 'transistor':
      return [
        {
          key: 'group',
          label: 'Gain group',
          options: [OPEN('Any: rows without a group'), ...gainGroups(record).map(plain)],
        },
        {
          key: 'maker',
          label: 'Maker',
          options: [OPEN('Any: the safest figure'), ...makerNames(record).map(plain)],
        },
      ];
    case 'load':
      return [
        {
          key: 'coil',
          label: 'Coil',
          options: record.coils.map(({ nominalV, resistanceOhm }, index) => ({
            value: String(index),
            text: `${formatQuantity(nominalV, 'V')}, ${formatQuantity(resistanceOhm, 'Ohm')}`,
          })),
        },
        {
          key: 'contacts',
          label: 'Contacts',
          options: [OPEN('Any: the hardest figure'), ...contactNames(record).map(plain)],
        },
      ];
    case 'logic-output':
      return [
        {
          key: 'point',
          label: 'Guaranteed point',
          options: drivePoints(record).map((index) => ({
            value: String(index),
            text: pointText(record.points[index]),
          })),
        },
      ];
    case 'diode':
      return [];
  }
}

type Point = Extract<PartRecord, { kind: 'logic-output' }>['points'][number];

function pointText(point: Point | undefined): string {
  if (point === undefined) return '';
  const { supplyV, sourceA, sinkA, tempDegC } = point;
  const span = (low: number, high: number, unit: string) =>
    low === high
      ? formatQuantity(low, unit)
      : `${formatQuantity(low, unit)} … ${formatQuantity(high, unit)}`;
  return [
    supplyV === null ? 'any supply' : span(supplyV.min, supplyV.max, 'V'),
    formatQuantity(sourceA ?? sinkA, 'A'),
    tempDegC === null ? '' : span(tempDegC.min, tempDegC.max, '°C'),
  ]
    .filter((word) => word !== '')
    .join(', ');
}
