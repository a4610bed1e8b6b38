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
  const { topology } = definition;
  const valueOhm = evaluation.baseResistorOhm ?? baseResistor.valueOhm;
  const chosen = valueOhm === null ? null : { valueOhm, tolerance: baseResistor.tolerance };
  return [
    { label: 'Topology', text: choiceWords(topology) },
    { label: 'RB', text: chosen?.valueOhm === 0 ? 'none' : resistorText(chosen) },
    { label: 'RBE', text: resistorText(shuntResistor) },
    { label: 'Transistor', text: transistor.partNumber },
    ...insideValues(definition),
    ...frontValues(definition),
    { label: 'Clamp', text: clampText(definition) },
    { label: 'Supply', text: rangeText(supplyV, 'V') },
    { label: 'Ambient', text: rangeText(ambientDegC, '°C') },
    { label: choiceWords(definition.load.kind), text: loadText(definition) },
    { label: 'Drive pin', text: rangeText(drive.railV, 'V') },
    ...switchingValues(definition),
  ];
}

/** The transistor in front of a two-transistor high side, with its network. */
function frontValues({ topology, preDriver }: StageInput): LockedValue[] {
  if (topology !== 'two-transistor-high-side' || preDriver === null) return [];
  return [
    { label: 'Pre-driver', text: preDriver.transistor.partNumber },
    { label: 'RB1', text: resistorText(preDriver.baseResistor) },
    { label: 'RBE1', text: resistorText(preDriver.shuntResistor) },
  ];
}

function insideValues({ topology, transistor: { internal } }: StageInput): LockedValue[] {
  if (topology !== 'low-side-pre-biased' || internal === null) return [];
  const { r1Ohm, r2Ohm } = internal;
  const ohm = (value: number | null) => (value === null ? 'none' : formatQuantity(value, 'Ohm'));
  return [{ label: 'R1 and R2 inside', text: `${ohm(r1Ohm)}, ${ohm(r2Ohm)}` }];
}

function switchingValues({ frequencyHz, duty, speedUpCapacitorF }: StageInput): LockedValue[] {
  return [
    frequencyHz === 0
      ? []
      : {
          label: 'Switching',
          text: `${formatQuantity(frequencyHz, 'Hz')}, ${formatPercent(duty)} on`,
        },
    speedUpCapacitorF === null
      ? []
      : { label: 'Speed-up capacitor', text: formatQuantity(speedUpCapacitorF, 'F') },
  ].flat();
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
      return `${load.count} LEDs, ${resistorText({ valueOhm: load.resistanceOhm, tolerance: load.tolerance })}`;
    case 'lamp':
      return `${formatQuantity(load.nominalV, 'V')}, ${formatQuantity(load.currentA, 'A')}`;
    case 'logic-input':
      return `${load.count} × input, RC ${resistorText({ valueOhm: load.pullUpOhm, tolerance: load.tolerance })}`;
  }
}
