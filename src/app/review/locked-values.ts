import type { Revision } from '../../../shared/contract/revision.ts';
import { choiceWords } from '../../../shared/report/definition-words.ts';
import type { StageInput } from '../../../shared/stage/stage-input.ts';
import { formatPercent, formatQuantity } from '../../../shared/units/engineering-notation.ts';

export interface LockedValue {
  readonly label: string;
  readonly text: string;
}

/** The values an approver wants to see before signing, in words with units. */
export function lockedValues({ definition, evaluation }: Revision): LockedValue[] {
  const { baseResistor, shuntResistor, supplyV, ambientDegC, drive, transistor } = definition;
  const valueOhm = evaluation.baseResistorOhm ?? baseResistor.valueOhm;
  const chosen = valueOhm === null ? null : { valueOhm, tolerance: baseResistor.tolerance };
  return [
    { label: 'RB', text: resistorText(chosen) },
    { label: 'RBE', text: resistorText(shuntResistor) },
    { label: 'Transistor', text: transistor.partNumber },
    { label: 'Clamp', text: clampText(definition) },
    { label: 'Supply', text: rangeText(supplyV, 'V') },
    { label: 'Ambient', text: rangeText(ambientDegC, '°C') },
    { label: choiceWords(definition.load.kind), text: loadText(definition) },
    { label: 'Drive pin', text: rangeText(drive.railV, 'V') },
  ];
}

function resistorText(resistor: { valueOhm: number; tolerance: number } | null): string {
  if (resistor === null) return 'none';
  return `${formatQuantity(resistor.valueOhm, 'Ohm')} ±${formatPercent(resistor.tolerance)}`;
}

/** `21.6 … 26.4 V`; the unit once where both ends have it. */
function rangeText({ min, max }: { min: number; max: number }, unit: string): string {
  const [low = '', lowUnit = ''] = formatQuantity(min, unit).split('\u00a0');
  const high = formatQuantity(max, unit);
  return high.endsWith(`\u00a0${lowUnit}`)
    ? `${low} … ${high}`
    : `${low}\u00a0${lowUnit} … ${high}`;
}

function clampText({ clamp }: StageInput): string {
  if (clamp.kind === 'none') return 'none';
  const volts = clamp.zenerV?.max ?? clamp.forwardV;
  const words = choiceWords(clamp.kind);
  return volts === null
    ? words
    : `${words}, ${formatQuantity(volts, 'V', { digits: 2, pad: true })}`;
}

function loadText({ load }: StageInput): string {
  switch (load.kind) {
    case 'coil':
    case 'resistor':
      return resistorText({ valueOhm: load.resistanceOhm, tolerance: load.tolerance });
    case 'led-string':
      return `${load.count} LEDs, ${formatQuantity(load.resistanceOhm, 'Ohm')}`;
    case 'lamp':
      return `${formatQuantity(load.nominalV, 'V')}, ${formatQuantity(load.currentA, 'A')}`;
    case 'logic-input':
      return `${load.count} inputs, RC ${formatQuantity(load.pullUpOhm, 'Ohm')}`;
  }
}
