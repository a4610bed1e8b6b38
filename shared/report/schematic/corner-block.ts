import { formatPercent, formatQuantity } from '../../units/engineering-notation.ts';
import type { StageInput } from '../../stage/stage-input.ts';
import { plainText } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { designatorRuns } from './part-words.ts';
import {
  FRONT_PARTS,
  isOfFront,
  type SchematicSubject,
  type SwitchParts,
} from './schematic-subject.ts';

const MINUS = '\u2212';
const END = { '+': '+', '-': MINUS } as const;

/** Says at the top left which corner the figures belong to. */
export function drawCornerBlock(drawing: DrawingBuilder, subject: SchematicSubject): void {
  if (subject.frame.compact || subject.figures === null) return;
  drawing.text(16, 24, 'corner-title', [{ text: 'Corner' }]);
  cornerRows(subject).forEach(([label, value], row) => {
    drawing.text(16, 42 + 16 * row, 'corner-label', [{ text: label }]);
    drawing.text(78, 42 + 16 * row, 'corner-value', [{ text: value }], {
      figure: { ref: `corner-${label}`, name: `Corner, ${label}` },
    });
  });
}

function cornerRows(subject: SchematicSubject): readonly (readonly [string, string])[] {
  const { figures } = subject;
  if (figures === null) return [];
  const { corner } = figures;
  const rows: [string, string | null][] = [
    ['supply', formatQuantity(figures.supplyV, 'V')],
    ['ambient', formatQuantity(figures.ambientDegC, '°C')],
    ['pin', corner['drive'] ?? null],
    ['resistors', resistorEnds(subject)],
    loadRow(subject, corner['load']),
    ['gain', corner['gain'] ?? null],
  ];
  return rows.flatMap(([label, value]) => (value === null ? [] : [[label, value] as const]));
}

/** The load's end; that of the base resistor where the transistor in front has it as its load. */
function loadRow(subject: SchematicSubject, sign: string | undefined): [string, string | null] {
  const { figures, stage } = subject;
  if (figures !== null && isOfFront(figures)) {
    return ['load', end1(plainText(designatorRuns(subject, 'baseResistor')), sign)];
  }
  return [stage.load.kind === 'coil' ? 'coil' : 'load', end(sign, toleranceOf(stage))];
}

function resistorEnds(subject: SchematicSubject): string | null {
  const { figures } = subject;
  const corner = figures?.corner ?? {};
  const { baseResistor, shuntResistor } =
    figures !== null && isOfFront(figures) ? FRONT_PARTS : subject.parts;
  const name = (part: SwitchParts['baseResistor' | 'shuntResistor']) =>
    plainText(designatorRuns(subject, part));
  const ends = [
    end1(name(baseResistor), corner['rb']),
    end1(name(shuntResistor), corner['rbe']),
  ].filter((text) => text !== null);
  return ends.length === 0 ? null : ends.join(', ');
}

const end1 = (name: string, sign: string | undefined) =>
  sign === '+' || sign === '-' ? `${name} ${END[sign]}` : null;

function end(sign: string | undefined, tolerance: number | null): string | null {
  if ((sign !== '+' && sign !== '-') || tolerance === null) return null;
  return `${END[sign]}${formatPercent(tolerance)}`;
}

const toleranceOf = ({ load }: StageInput) => ('tolerance' in load ? load.tolerance : null);
