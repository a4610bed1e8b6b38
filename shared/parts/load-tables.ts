import type { LoadRecord } from './load-record.ts';
import { column, figuresTable, percent, tableOf, type PartTable } from './part-table.ts';
import { sourceOf } from './provenance.ts';

/** All groups of a load record. */
export function loadTables(record: LoadRecord): PartTable[] {
  const { confidence, sources } = record;
  const source = sourceOf(sources, 'electrical');
  const head = (id: string, title: string) => ({ id, title, source, confidence });
  return [
    ...figuresTable(head('series', 'Series'), [
      { name: 'Reference temperature', value: record.referenceDegC, unit: '°C' },
      { name: 'Resistance tolerance, ±', value: percent(record.tolerance), unit: '%' },
      { name: 'Overload figures hold at', value: record.maximumReferenceDegC, unit: '°C' },
    ]),
    ...tableOf(head('levels', 'Levels, of nominal voltage'), record.levels, [
      column('Contacts', null, ({ contacts }) => contacts),
      column('must operate', '%', ({ operate }) => percent(operate)),
      column('must release', '%', ({ release }) => percent(release)),
      column('highest', '%', ({ maximum }) => percent(maximum)),
    ]),
    ...coilTable(record, head('coils', 'Coils')),
    ...tableOf(head('temperatures', 'Over temperature'), record.temperatures, [
      column('T', '°C', ({ tempDegC }) => tempDegC),
      column('R', 'Ohm', ({ resistanceOhm }) => resistanceOhm),
      column('operates at', 'V', ({ operateV }) => operateV),
    ]),
    ...tableOf(head('suppression', 'Turn-off with suppression'), record.suppression, [
      column('Method', null, ({ method }) => method),
      column('drop-out', 's', ({ dropOutSec }) => dropOutSec),
      column('peak, theory', 'V', ({ theoreticalPeakV }) => theoreticalPeakV),
      column('peak, recorded', 'V', ({ recordedPeakV }) => recordedPeakV),
    ]),
    ...filamentTables(record, head),
    ...tableOf(head('leds', 'Forward voltage'), record.leds, [
      column('Colour', null, ({ colour }) => colour),
      column('IF', 'A', ({ currentA }) => currentA),
      column('min', 'V', ({ minV }) => minV),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
  ];
}

type Head = Parameters<typeof tableOf>[0];

function coilTable({ coils }: LoadRecord, head: Head): PartTable[] {
  return tableOf(head, coils, [
    column('nominal', 'V', ({ nominalV }) => nominalV),
    column('R', 'Ohm', ({ resistanceOhm }) => resistanceOhm),
    column('I', 'A', ({ currentA }) => currentA),
    column('P', 'W', ({ powerW }) => powerW),
    column('L', 'H', ({ inductanceH }) => inductanceH),
    column('must operate', 'V', ({ operateV }) => operateV),
    column('must release', 'V', ({ releaseV }) => releaseV),
    column('range from', 'V', ({ rangeV }) => rangeV?.min ?? null),
    column('range to', 'V', ({ rangeV }) => rangeV?.max ?? null),
    column('range from', '%', ({ range }) => percent(range?.min ?? null)),
    column('range to', '%', ({ range }) => percent(range?.max ?? null)),
    column('operate time', 's', ({ operateTimeSec }) => operateTimeSec),
    column('release time', 's', ({ releaseTimeSec }) => releaseTimeSec),
  ]);
}

function filamentTables(
  { filament }: LoadRecord,
  head: (id: string, title: string) => Head,
): PartTable[] {
  if (filament === null) return [];
  return [
    ...figuresTable(head('filament', 'Filament'), [
      { name: 'Nominal voltage', value: filament.nominalV, unit: 'V' },
      { name: 'Current', value: filament.currentA, unit: 'A' },
      { name: 'Cold over hot resistance, least', value: filament.coldRatio.min, unit: '1' },
      { name: 'Cold over hot resistance, most', value: filament.coldRatio.max, unit: '1' },
    ]),
    ...tableOf(head('filament-remarks', 'Inrush as published'), filament.remarks, [
      column('Remark', null, ({ text }) => text),
    ]),
  ];
}
