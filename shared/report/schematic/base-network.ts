import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { designatorRuns, resistorText } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';

/** The base resistor on its way from the output to the base, with a capacitor across it where fitted. */
export function drawBaseResistor(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
): void {
  const { stage, frame } = subject;
  const { seriesX } = frame;
  const bypassed = stage.speedUpCapacitorF !== null;
  drawing.symbol(subject.resistor, { x: seriesX, y: baseY }, 'baseResistor', 90);
  drawing.wire(frame.driveX + 32, baseY, seriesX - 32, baseY);
  drawing.wire(seriesX + 32, baseY, frame.columnX - 40, baseY);
  if (bypassed) drawCapacitor(drawing, subject, baseY);

  const designator = designatorRuns(subject, 'baseResistor');
  const value = resistorText(stage.baseResistor.valueOhm, stage.baseResistor.tolerance);
  const labelY = bypassed ? baseY + 26 : baseY - 31;
  drawing.text(seriesX, labelY, 'designator', designator, {
    anchor: 'middle',
    part: 'baseResistor',
  });
  drawing.text(seriesX, labelY + 16, 'value', [{ text: value }], {
    anchor: 'middle',
    part: 'baseResistor',
    figure: { ref: 'baseResistor', name: `${plainText(designator)}, base resistor` },
  });
  drawing.name('baseResistor', `${plainText(designator)}, base resistor, ${value}`);
}

function drawCapacitor(drawing: DrawingBuilder, subject: SchematicSubject, baseY: number): void {
  const { stage, frame } = subject;
  const { seriesX } = frame;
  const y = baseY - 32;
  drawing.symbol('capacitor', { x: seriesX, y }, 'speedUpCapacitor', 90);
  for (const side of [-1, 1]) {
    drawing.dot(seriesX + side * 40, baseY);
    drawing.wire(seriesX + side * 40, baseY, seriesX + side * 40, y, seriesX + side * 16, y);
  }
  const designator = designatorRuns(subject, 'speedUpCapacitor');
  const value = formatQuantity(stage.speedUpCapacitorF, 'F');
  const options = { anchor: 'middle', part: 'speedUpCapacitor' } as const;
  drawing.text(seriesX, y - 29, 'designator', designator, options);
  drawing.text(seriesX, y - 14, 'value', [{ text: value }], {
    ...options,
    figure: { ref: 'speedUpCapacitor', name: `${plainText(designator)}, speed-up capacitor` },
  });
  drawing.name('speedUpCapacitor', `${plainText(designator)}, speed-up capacitor, ${value}`);
}

/**
 * The resistor from base to emitter, its top terminal at `topY`. Wires to its two ends are the topology's.
 */
export function drawShuntResistor(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  topY: number,
): void {
  const { stage, frame } = subject;
  if (stage.shuntResistor === null) return;
  drawing.symbol(subject.resistor, { x: frame.nodeX, y: topY + 32 }, 'shuntResistor');
  const designator = designatorRuns(subject, 'shuntResistor');
  const value = resistorText(stage.shuntResistor.valueOhm, stage.shuntResistor.tolerance);
  const options = { anchor: 'end', part: 'shuntResistor' } as const;
  const crowded = stage.speedUpCapacitorF !== null && stage.topology === 'high-side-pnp';
  const labelY = topY + (crowded ? 12 : 30);
  drawing.text(frame.nodeX - 16, labelY, 'designator', designator, options);
  drawing.text(frame.nodeX - 16, labelY + 16, 'value', [{ text: value }], {
    ...options,
    figure: { ref: 'shuntResistor', name: `${plainText(designator)}, base–emitter resistor` },
  });
  drawing.name('shuntResistor', `${plainText(designator)}, base–emitter resistor, ${value}`);
}
