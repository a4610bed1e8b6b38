import type { StageInput, Topology } from '../../stage/stage-input.ts';
import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import { designatorRuns, inputsText, loadLines, resistorText } from './part-words.ts';
import {
  FRONT_PARTS,
  OUTPUT_PARTS,
  type SchematicSubject,
  type SwitchParts,
} from './schematic-subject.ts';

const TOPOLOGY_NAMES: Readonly<Record<Topology, string>> = {
  'low-side-npn': 'Low-side NPN',
  'high-side-pnp': 'High-side PNP',
  'two-transistor-high-side': 'Two-transistor high side',
  'low-side-darlington': 'Low-side Darlington',
  'low-side-pre-biased': 'Low-side pre-biased',
  'level-translator': 'Level translator',
};

/** What people call the topology. */
export const topologyName = (topology: Topology): string => TOPOLOGY_NAMES[topology];

/** The circuit in one sentence with its live values. */
export function schematicName(subject: SchematicSubject): string {
  const { stage, figures } = subject;
  const parts = [
    `${topologyName(stage.topology)} switch ${stage.reference}, ${stage.transistor.partNumber}`,
    ...insideWords(subject),
    ...networkWords(subject, OUTPUT_PARTS, stage),
    ...frontWords(subject),
    ...loadWords(subject),
  ];
  const live =
    figures === null
      ? []
      : [
          `collector current ${formatQuantity(figures.icA, 'A')}`,
          `base current ${formatQuantity(figures.ibA, 'A')}`,
          `VCE ${formatQuantity(figures.vceV, 'V')}`,
        ];
  return `${[...parts, ...live].join('; ')}.`;
}

type Network = Pick<StageInput, 'shuntResistor'> & Pick<StageInput, 'baseResistor'>;

function networkWords(
  subject: SchematicSubject,
  { baseResistor: rb, shuntResistor: rbe, ofWhat }: SwitchParts,
  { baseResistor, shuntResistor }: Network,
): string[] {
  const named = (part: Parameters<typeof designatorRuns>[1]) =>
    plainText(designatorRuns(subject, part));
  const base = resistorText(baseResistor.valueOhm, baseResistor.tolerance);
  const preBiased = subject.stage.topology === 'low-side-pre-biased';
  return [
    baseResistor.valueOhm === 0 ? [] : `base resistor${ofWhat} ${named(rb)} ${base}`,
    shuntResistor === null
      ? preBiased
        ? []
        : `no base–emitter resistor${ofWhat}`
      : `base–emitter resistor${ofWhat} ${named(rbe)} ${resistorText(shuntResistor.valueOhm, shuntResistor.tolerance)}`,
  ].flat();
}

function frontWords(subject: SchematicSubject): string[] {
  const { preDriver } = subject.stage;
  if (preDriver === null) return [];
  const designator = plainText(designatorRuns(subject, 'preDriver'));
  return [
    `pre-driver ${designator}, ${preDriver.transistor.partNumber}`,
    ...networkWords(subject, FRONT_PARTS, preDriver),
  ];
}

function insideWords({ stage }: SchematicSubject): string[] {
  const { internal } = stage.transistor;
  if (stage.topology !== 'low-side-pre-biased' || internal === null) return [];
  const r2 = internal.r2Ohm === null ? 'no R2' : `R2 ${formatQuantity(internal.r2Ohm, 'Ohm')}`;
  return [`inside R1 ${formatQuantity(internal.r1Ohm, 'Ohm')}, ${r2}`];
}

function loadWords(subject: SchematicSubject): string[] {
  const { load } = subject.stage;
  const name = plainText(designatorRuns(subject, 'load'));
  const words = [`load ${name} ${loadLines(subject).join(', ')}`];
  if (load.kind === 'led-string') {
    const series = plainText(designatorRuns(subject, 'loadResistor'));
    words.push(`series resistor ${series} ${resistorText(load.resistanceOhm, load.tolerance)}`);
  }
  if (load.kind === 'logic-input') words.push(`drives ${inputsText(load.count)}`);
  return words;
}
