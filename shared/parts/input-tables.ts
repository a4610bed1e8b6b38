import type { InputFigures } from './input-rows.ts';
import { column, figuresTable, tableOf, type PartTable, type TableHead } from './part-table.ts';

/** Tables of parts with resistors inside. */
export function inputTables(input: InputFigures | null, head: TableHead): PartTable[] {
  if (input === null) return [];
  const named = (id: string, title: string) => ({ ...head, id, title });
  return [
    ...resistorTables(input, named),
    ...tableOf(named('input-on', 'Input voltage, on: VI(on)'), input.on, [
      column('IO', 'A', ({ outputA }) => outputA),
      column('VO', 'V', ({ outputV }) => outputV),
      column('min', 'V', ({ minV }) => minV),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
    ...tableOf(named('input-off', 'Input voltage, off: VI(off)'), input.off, [
      column('IO', 'A', ({ outputA }) => outputA),
      column('VCC', 'V', ({ vccV }) => vccV),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
    ...tableOf(named('output-on', 'Output voltage, on: VO(on)'), input.outputOn, [
      column('IO', 'A', ({ outputA }) => outputA),
      column('II', 'A', ({ inputA }) => inputA),
      column('typ', 'V', ({ typV }) => typV),
      column('max', 'V', ({ maxV }) => maxV),
    ]),
    ...tableOf(named('input-current', 'Input current II'), input.current, [
      column('VI', 'V', ({ inputV }) => inputV),
      column('typ', 'A', ({ typA }) => typA),
      column('max', 'A', ({ maxA }) => maxA),
    ]),
    ...tableOf(named('input-current-off', 'Input current, off: II(off)'), input.offCurrent, [
      column('IC', 'A', ({ outputA }) => outputA),
      column('T', '°C', ({ tempDegC }) => tempDegC),
      column('min', 'A', ({ minA }) => minA),
      column('typ', 'A', ({ typA }) => typA),
    ]),
    ...tableOf(named('input-gain', 'Current gain from the input: GI'), input.gain, [
      column('IO', 'A', ({ outputA }) => outputA),
      column('VO', 'V', ({ outputV }) => outputV),
      column('min', '1', ({ min }) => min),
    ]),
  ];
}

function resistorTables(
  { r1, r2, ratio, baseEmitterOhm }: InputFigures,
  named: (id: string, title: string) => TableHead,
): PartTable[] {
  const resistors = [
    r1 === null ? [] : { ...r1, name: 'R1, in series with the base' },
    r2 === null ? [] : { ...r2, name: 'R2, base to emitter' },
  ].flat();
  return [
    ...tableOf(named('resistors', 'Resistors inside'), resistors, [
      column('Resistor', null, ({ name }) => name),
      column('min', 'Ohm', ({ minOhm }) => minOhm),
      column('typ', 'Ohm', ({ typOhm }) => typOhm),
      column('max', 'Ohm', ({ maxOhm }) => maxOhm),
    ]),
    ...tableOf(named('resistor-ratio', 'Ratio R2/R1'), ratio === null ? [] : [ratio], [
      column('min', '1', ({ min }) => min),
      column('typ', '1', ({ typ }) => typ),
      column('max', '1', ({ max }) => max),
    ]),
    ...figuresTable(
      named('resistors-stage', 'Base–emitter resistors of the stages inside'),
      baseEmitterOhm.map((value, index) => ({
        name: `stage ${index + 1}, nominal`,
        value,
        unit: 'Ohm',
      })),
    ),
  ];
}
