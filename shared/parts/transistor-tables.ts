import { inputTables } from './input-tables.ts';
import { limitTables } from './limit-tables.ts';
import { column, figuresTable, tableOf, type PartTable } from './part-table.ts';
import { sourceOf } from './provenance.ts';
import type { TransistorRecord } from './transistor-record.ts';

/** All data-sheet groups of a transistor, in the order of a data sheet. */
export function transistorTables(record: TransistorRecord): PartTable[] {
  const { confidence, sources } = record;
  const electrical = (id: string, title: string) => ({
    id,
    title,
    source: sourceOf(sources, 'electrical'),
    confidence,
  });
  const limits = { id: '', title: '', source: sourceOf(sources, 'limits'), confidence };
  return [
    ...limitTables(record, limits),
    ...tableOf(electrical('gain', 'Current gain hFE'), record.gain, [
      column('IC', 'A', ({ icA }) => icA),
      column('VCE', 'V', ({ vceV }) => vceV),
      column('T', '°C', ({ tempDegC }) => tempDegC),
      column('Group', null, ({ group }) => group),
      column('min', '1', ({ min }) => min),
      column('typ', '1', ({ typ }) => typ),
      column('max', '1', ({ max }) => max),
    ]),
    ...tableOf(electrical('saturation', 'Saturation voltage VCE(sat)'), record.saturation, [
      column('IC', 'A', ({ icA }) => icA),
      column('IB', 'A', ({ ibA }) => ibA),
      column('IC/IB', '1', ({ icA, ibA }) => icA / ibA),
      column('Grade', null, ({ variant }) => variant),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
    ...tableOf(electrical('base-emitter', 'Base–emitter voltage VBE'), record.baseEmitter, [
      column('Kind', null, ({ kind }) => (kind === 'sat' ? 'VBE(sat)' : 'VBE(on)')),
      column('IC', 'A', ({ icA }) => icA),
      column('IB', 'A', ({ ibA }) => ibA),
      column('VCE', 'V', ({ vceV }) => vceV),
      column('min', 'V', ({ minV }) => minV),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
    ...tableOf(electrical('leakage', 'Cut-off currents'), record.leakage, [
      column('Symbol', null, ({ symbol }) => symbol),
      column('VCB', 'V', ({ vcbV }) => vcbV),
      column('VCE', 'V', ({ vceV }) => vceV),
      column('VEB', 'V', ({ vebV }) => vebV),
      column('VBE', 'V', ({ vbeV }) => vbeV),
      column('VCC', 'V', ({ vccV }) => vccV),
      column('T', '°C', ({ tempDegC }) => tempDegC),
      column('max', 'A', ({ maxA }) => maxA),
    ]),
    ...inputTables(record.input, electrical('input', '')),
    ...switchingTable(record, electrical('switching', 'Switching times')),
    ...dynamicTables(record, electrical),
    ...clampTables(record, electrical('clamp-diode', 'Clamp diode')),
  ];
}

type Head = Parameters<typeof tableOf>[0];

function switchingTable(record: TransistorRecord, head: Head): PartTable[] {
  return tableOf(head, record.switching, [
    column('IC', 'A', ({ icA }) => icA),
    column('IB1', 'A', ({ ib1A }) => ib1A),
    column('IB2', 'A', ({ ib2A }) => ib2A),
    column('VCC on', 'V', ({ vccOnV }) => vccOnV),
    column('VCC off', 'V', ({ vccOffV }) => vccOffV),
    column('VBE off', 'V', ({ vbeOffV }) => vbeOffV),
    column('VEB off', 'V', ({ vebOffV }) => vebOffV),
    column('td', 's', ({ tdSec }) => tdSec),
    column('tr', 's', ({ trSec }) => trSec),
    column('ts', 's', ({ tsSec }) => tsSec),
    column('tf', 's', ({ tfSec }) => tfSec),
    column('ton', 's', ({ tonSec }) => tonSec),
    column('toff', 's', ({ toffSec }) => toffSec),
    column('tPLH typ', 's', ({ lowToHighTypSec }) => lowToHighTypSec),
    column('tPLH max', 's', ({ lowToHighMaxSec }) => lowToHighMaxSec),
    column('tPHL typ', 's', ({ highToLowTypSec }) => highToLowTypSec),
    column('tPHL max', 's', ({ highToLowMaxSec }) => highToLowMaxSec),
  ]);
}

function dynamicTables(
  record: TransistorRecord,
  electrical: (id: string, title: string) => Head,
): PartTable[] {
  const { outputCapacitance, transitionFrequency } = record;
  const capacitance = outputCapacitance === null ? [] : [outputCapacitance];
  const frequency = transitionFrequency === null ? [] : [transitionFrequency];
  return [
    ...tableOf(electrical('capacitance', 'Output capacitance Cobo'), capacitance, [
      column('VCB', 'V', ({ vcbV }) => vcbV),
      column('typ', 'F', ({ typF }) => typF),
      column('max', 'F', ({ maxF }) => maxF),
    ]),
    ...tableOf(electrical('transition-frequency', 'Transition frequency fT'), frequency, [
      column('IC', 'A', ({ icA }) => icA),
      column('VCE', 'V', ({ vceV }) => vceV),
      column('min', 'Hz', ({ minHz }) => minHz),
      column('typ', 'Hz', ({ typHz }) => typHz),
    ]),
    ...figuresTable(electrical('temperature', 'Temperature coefficients'), [
      { name: 'VBE(on)', value: record.vbeOnTempcoVPerK, unit: 'V/K' },
      { name: 'VBE(sat)', value: record.vbeSatTempcoVPerK, unit: 'V/K' },
    ]),
  ];
}

function clampTables({ clampDiode }: TransistorRecord, head: Head): PartTable[] {
  if (clampDiode === null) return [];
  return [
    ...tableOf(
      head,
      [clampDiode],
      [
        column('IF', 'A', ({ forwardA }) => forwardA),
        column('VF typ', 'V', ({ typV }) => typV),
        column('VF max', 'V', ({ maxV }) => maxV),
      ],
    ),
    ...tableOf(
      { ...head, id: 'clamp-leakage', title: 'Clamp diode leakage' },
      clampDiode.leakage.map((row) => ({ ...row, source: clampDiode.source })),
      [column('T', '°C', ({ tempDegC }) => tempDegC), column('max', 'A', ({ maxA }) => maxA)],
    ),
  ];
}
