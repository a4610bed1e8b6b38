import type { Topology } from '../../stage/stage-input.ts';
import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import { designatorRuns, loadLines, resistorText } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';

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
  const designator = (part: Parameters<typeof designatorRuns>[1]) =>
    plainText(designatorRuns(subject, part));
  const parts = [
    `${topologyName(stage.topology)} switch ${stage.reference}, ${stage.transistor.partNumber}`,
    `base resistor ${designator('baseResistor')} ${resistorText(stage.baseResistor.valueOhm, stage.baseResistor.tolerance)}`,
    stage.shuntResistor === null
      ? 'no base–emitter resistor'
      : `base–emitter resistor ${designator('shuntResistor')} ${resistorText(stage.shuntResistor.valueOhm, stage.shuntResistor.tolerance)}`,
    `load ${designator('load')} ${loadLines(subject).join(', ')}`,
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
