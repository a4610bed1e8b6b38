import { formatNumber, formatPercent, formatQuantity } from '../../units/engineering-notation.ts';
import type { Run } from './drawing.ts';
import type { SchematicDesignators, SchematicSubject } from './schematic-subject.ts';

/** `V` with a subscript. */
export const symbolRuns = (letter: string, sub: string): readonly Run[] => [
  { text: letter },
  { text: sub, sub: true },
];

const FALLBACK: Readonly<Record<keyof SchematicDesignators, readonly Run[]>> = {
  baseResistor: symbolRuns('R', 'B'),
  shuntResistor: symbolRuns('R', 'BE'),
  pullUp: symbolRuns('R', 'PU'),
  speedUpCapacitor: symbolRuns('C', 'B'),
  load: symbolRuns('R', 'L'),
  clamp: [{ text: 'D' }],
  clampZener: [{ text: 'DZ' }],
  drive: [{ text: 'U' }],
  loadResistor: symbolRuns('R', 'L'),
  preDriver: symbolRuns('Q', '1'),
  preBaseResistor: symbolRuns('R', 'B1'),
  preShuntResistor: symbolRuns('R', 'BE1'),
};

/** Symbols of loads whose letter is not that of a resistor. */
const LOAD_SYMBOLS = {
  coil: [{ text: 'K' }],
  resistor: FALLBACK.load,
  'led-string': [{ text: 'D' }],
  lamp: [{ text: 'DS' }],
  'logic-input': symbolRuns('R', 'C'),
} as const;

/** The designator of the board's drawing, else the symbol of the trade. */
export function designatorRuns(
  subject: SchematicSubject,
  part: keyof SchematicDesignators,
): readonly Run[] {
  const given = subject.designators[part];
  if (given !== null && given !== '') return [{ text: given }];
  return part === 'load' ? LOAD_SYMBOLS[subject.stage.load.kind] : FALLBACK[part];
}

/** `2 inputs` */
export const inputsText = (count: number): string => `${count} ${count === 1 ? 'input' : 'inputs'}`;

/** `620 Ω ±5 %` */
export function resistorText(valueOhm: number | null, tolerance: number): string {
  if (valueOhm === null) return 'not sized';
  return `${formatQuantity(valueOhm, 'Ohm')} ±${formatPercent(tolerance)}`;
}

/** Figures of the load, one line each, at most three. */
export function loadLines({ stage }: SchematicSubject): readonly string[] {
  const { load } = stage;
  switch (load.kind) {
    case 'coil': {
      const resistance = resistorText(load.resistanceOhm, load.tolerance);
      return load.inductanceH === null
        ? [resistance]
        : [resistance, formatQuantity(load.inductanceH, 'H')];
    }
    case 'resistor':
      return [resistorText(load.resistanceOhm, load.tolerance)];
    case 'led-string':
      return [load.count === 1 ? '1 LED' : `${load.count} LEDs`];
    case 'lamp':
      return [formatQuantity(load.nominalV, 'V'), formatQuantity(load.currentA, 'A')];
    case 'logic-input':
      return [resistorText(load.pullUpOhm, load.tolerance)];
  }
}

/** Splits a part number that is too long for one line, at a space if it can; what still does not fit ends in an ellipsis. */
export function wrapped(text: string, perLine: number): readonly string[] {
  if (text.length <= perLine) return [text];
  const space = text.lastIndexOf(' ', perLine);
  const end = space > 0 ? space : perLine;
  const rest = text.slice(end).trimStart();
  return [text.slice(0, end), rest.length <= perLine ? rest : `${rest.slice(0, perLine - 1)}…`];
}

/** A node voltage; from 10 mV up in volts, so that voltages of one drawing compare at sight. */
export function voltText(valueV: number): string {
  return Math.abs(valueV) < 0.01
    ? formatQuantity(valueV, 'V')
    : `${formatNumber(valueV, { pad: true })}\u00a0V`;
}
