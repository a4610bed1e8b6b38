import type { DiodeRecord } from './diode-record.ts';
import { column, figuresTable, tableOf, type PartTable } from './part-table.ts';
import { sourceOf } from './provenance.ts';

/** All groups of a diode record. */
export function diodeTables(record: DiodeRecord): PartTable[] {
  const { confidence, sources, breakdown } = record;
  const head = (id: string, title: string, of: 'limits' | 'electrical' = 'electrical') => {
    return { id, title, source: sourceOf(sources, of), confidence };
  };
  return [
    ...figuresTable(head('limits', 'Limits', 'limits'), [
      { name: 'VR, reverse voltage', value: record.reverseV, unit: 'V' },
      { name: 'IF, forward current', value: record.currentA, unit: 'A' },
      { name: 'IFSM, surge', value: record.surgeA, unit: 'A' },
      { name: 'Ptot at TA 25 °C', value: record.powerW, unit: 'W' },
      { name: 'RθJA, junction to ambient', value: record.rthJaKPerW, unit: 'K/W' },
      { name: 'TJ, highest', value: record.tjMaxDegC, unit: '°C' },
    ]),
    ...tableOf(head('forward', 'Forward voltage VF'), record.forward, [
      column('IF', 'A', ({ currentA }) => currentA),
      column('T', '°C', ({ tempDegC }) => tempDegC),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
    ...tableOf(head('reverse', 'Reverse current IR'), record.reverse, [
      column('VR', 'V', ({ voltageV }) => voltageV),
      column('T', '°C', ({ tempDegC }) => tempDegC),
      column('max', 'A', ({ maxA }) => maxA),
    ]),
    ...tableOf(head('breakdown', 'Breakdown'), breakdown === null ? [] : [breakdown], [
      column('IZ', 'A', ({ testA }) => testA),
      column('VZ min', 'V', ({ zenerV }) => zenerV.min),
      column('VZ max', 'V', ({ zenerV }) => zenerV.max),
      column('stand-off', 'V', ({ standOffV }) => standOffV),
      column('clamping', 'V', ({ clampingV }) => clampingV),
      column('at', 'A', ({ clampingA }) => clampingA),
    ]),
    ...figuresTable(head('dynamic', 'Dynamic figures'), [
      { name: 'trr, reverse recovery', value: record.recoverySec, unit: 's' },
      { name: 'C, junction', value: record.capacitanceF, unit: 'F' },
    ]),
  ];
}
