import { formatQuantity } from '../units/engineering-notation.ts';
import type { DiodeRecord } from './diode-record.ts';
import type { LoadRecord } from './load-record.ts';
import type { LogicOutputRecord } from './logic-output-record.ts';
import type { PartRecord } from './part-record.ts';
import type { TransistorRecord } from './transistor-record.ts';

/**
 * A part in one line for lists: `NPN, 40 V, 200 mA`, `relay coil, 3 V to 48 V`.
 *
 * @param record any part record; figures it does not print are left out
 */
export function describePart(record: PartRecord): string {
  return wordsOf(record)
    .filter((word) => word !== null)
    .join(', ');
}

function wordsOf(record: PartRecord): Words {
  switch (record.kind) {
    case 'transistor':
      return transistorWords(record);
    case 'load':
      return loadWords(record);
    case 'logic-output':
      return logicWords(record);
    case 'diode':
      return diodeWords(record);
  }
}

type Words = (string | null)[];

const quantity = (value: number | null, unit: string) =>
  value === null ? null : formatQuantity(value, unit);

const FAMILY_WORDS = {
  transistor: '',
  darlington: ' Darlington',
  'pre-biased': ' pre-biased',
  'darlington-array': ' Darlington array',
} as const;

function transistorWords({ polarity, family, limits, input }: TransistorRecord): Words {
  return [
    polarity.toUpperCase() + FAMILY_WORDS[family],
    quantity(limits.vceoV ?? limits.vccV, 'V'),
    quantity(limits.ioA ?? limits.icA, 'A'),
    family === 'pre-biased' ? resistorWords(input) : null,
  ];
}

function resistorWords(input: TransistorRecord['input']): string | null {
  if (!input?.r1) return null;
  const { r1, r2, ratio } = input;
  const fromRatio = ratio === null ? null : r1.typOhm * ratio.typ;
  const r2Ohm = r2 === null ? fromRatio : r2.typOhm;
  return [r1.typOhm, r2Ohm]
    .filter((value) => value !== null)
    .map((value) => formatQuantity(value, 'Ohm'))
    .join(' and ');
}

function loadWords({ family, coils, filament, leds, description }: LoadRecord): Words {
  const voltages = coils.map(({ nominalV }) => nominalV);
  const what = filament !== null || leds.length > 0 ? family : `${family} coil`;
  const least = Math.min(...voltages);
  const most = Math.max(...voltages);
  const span =
    least === most ? quantity(least, 'V') : `${quantity(least, 'V')} to ${quantity(most, 'V')}`;
  return [what, voltages.length === 0 ? description : span];
}

function logicWords({ output, supplyV, outputA, points }: LogicOutputRecord): Words {
  const tested = points.map(({ sourceA, sinkA }) => Math.max(sourceA ?? 0, sinkA ?? 0));
  const span =
    supplyV === null ? null : `${quantity(supplyV.min, 'V')} to ${quantity(supplyV.max, 'V')}`;
  const most = tested.length === 0 ? null : Math.max(...tested);
  return [
    output === 'push-pull' ? 'push-pull output' : 'open collector',
    span,
    most === null ? null : `tested to ${quantity(most, 'A')}`,
    outputA === null ? null : `${quantity(outputA, 'A')} maximum`,
  ];
}

function diodeWords({ family, reverseV, currentA, powerW, breakdown }: DiodeRecord): Words {
  if (breakdown !== null) {
    const { zenerV, standOffV } = breakdown;
    const span = `${quantity(zenerV.min, 'V')} to ${quantity(zenerV.max, 'V')}`;
    const standOff = standOffV === null ? null : `${quantity(standOffV, 'V')} stand-off`;
    return [family === 'tvs' ? 'TVS diode' : 'zener diode', span, standOff, quantity(powerW, 'W')];
  }
  const name = family === 'schottky' ? 'Schottky diode' : `${family} diode`;
  return [name, quantity(reverseV, 'V'), quantity(currentA, 'A')];
}
