import { column, tableOf, type PartTable, type TableHead } from './part-table.ts';
import { limitSetName, type LimitSet } from './transistor-limits.ts';
import type { TransistorRecord } from './transistor-record.ts';

type NumberKey = {
  [K in keyof LimitSet]: LimitSet[K] extends number | null ? K : never;
}[keyof LimitSet];

const RATINGS: readonly [NumberKey, string, string][] = [
  ['vceoV', 'VCEO, collector to emitter', 'V'],
  ['vcboV', 'VCBO, collector to base', 'V'],
  ['veboV', 'VEBO, emitter to base', 'V'],
  ['vccV', 'VCC, supply or output', 'V'],
  ['inputMinV', 'VI, input, lowest', 'V'],
  ['inputMaxV', 'VI, input, highest', 'V'],
  ['clampReverseV', 'VR, clamp diode', 'V'],
  ['icA', 'IC, collector', 'A'],
  ['icPeakA', 'ICM, collector, peak', 'A'],
  ['ioA', 'IO, output', 'A'],
  ['ibA', 'IB, base', 'A'],
  ['ibPeakA', 'IBM, base, peak', 'A'],
  ['emitterTotalA', 'IE, all emitters together', 'A'],
  ['powerW', 'Ptot at TA 25 °C', 'W'],
  ['powerCaseW', 'Ptot at TC 25 °C', 'W'],
  ['unclampedEnergyJ', 'E, unclamped inductive load', 'J'],
];

const THERMAL: readonly [NumberKey, string, string][] = [
  ['rthJaKPerW', 'RθJA, junction to ambient', 'K/W'],
  ['rthJcKPerW', 'RθJC, junction to case', 'K/W'],
  ['rthJsKPerW', 'RθJS, junction to soldering point', 'K/W'],
  ['deratingWPerK', 'Derating above TA 25 °C', 'W/K'],
  ['deratingCaseWPerK', 'Derating above TC 25 °C', 'W/K'],
  ['tjMaxDegC', 'TJ, highest', '°C'],
];

const PLACES = {
  ambient: 'TA',
  case: 'TC',
  'mounting-base': 'TMB',
  'soldering-point': 'TS',
} as const;

interface LimitRow {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  readonly set: LimitSet;
}

/** Ratings and thermal figures, each maker's beside the others'. */
export function limitTables(record: TransistorRecord, head: TableHead): PartTable[] {
  const sets = [record.limits, ...record.alternatives];
  const rowsOf = (rules: typeof RATINGS) =>
    rules.flatMap(([key, name, unit]) =>
      sets.flatMap((set): LimitRow[] => {
        const value = set[key];
        return value === null ? [] : [{ name, value, unit, set }];
      }),
    );
  const power = sets.flatMap((set) =>
    set.powerAt.map(({ place, tempDegC, powerW }) => ({
      name: `Ptot at ${PLACES[place]} ${tempDegC} °C`,
      value: powerW,
      unit: 'W',
      set,
    })),
  );
  const packages = sets.flatMap((set) =>
    set.rthJaByPackage.map((row) => ({
      name: `RθJA, ${row.package}`,
      value: row.rthJaKPerW,
      unit: 'K/W',
      set,
    })),
  );
  return [
    ...limitTable({ ...head, id: 'limits', title: 'Absolute maximum ratings' }, [
      ...rowsOf(RATINGS),
      ...power,
    ]),
    ...limitTable({ ...head, id: 'thermal', title: 'Thermal figures' }, [
      ...rowsOf(THERMAL),
      ...packages,
    ]),
  ];
}

function limitTable(head: TableHead, rows: readonly LimitRow[]): PartTable[] {
  const sourced = rows.map((row) => ({
    ...row,
    source: row.set.source,
    confidence: row.set.confidence,
    note: row.set.note,
  }));
  return tableOf(head, sourced, [
    column('Limit', null, ({ name }) => name),
    column('Value', null, ({ value, unit }) => ({ value, unit })),
    column('Maker', null, ({ set }) => limitSetName(set)),
  ]);
}
