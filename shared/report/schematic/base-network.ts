import { formatQuantity } from '../../units/engineering-notation.ts';
import { plainText } from './drawing.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { designatorRuns, resistorText } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { textWidth } from './text-box.ts';

/**
 * The base resistor on its way from the output to the base at `baseX`, with a capacitor across it where fitted; a bare
 * wire where a pre-biased part does without.
 */
export function drawBaseResistor(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseX: number,
  baseY: number,
): void {
  const { stage, frame, parts } = subject;
  const { seriesX } = frame;
  const part = parts.baseResistor;
  if (stage.baseResistor.valueOhm === 0) {
    drawing.wire(frame.driveX + 32, baseY, baseX, baseY);
    return;
  }
  const bypassed = stage.speedUpCapacitorF !== null;
  drawing.symbol(subject.resistor, { x: seriesX, y: baseY }, part, 90);
  drawing.wire(frame.driveX + 32, baseY, seriesX - 32, baseY);
  drawing.wire(seriesX + 32, baseY, baseX, baseY);
  if (bypassed) drawCapacitor(drawing, subject, baseY);

  const designator = designatorRuns(subject, part);
  const name = `${plainText(designator)}, base resistor${parts.ofWhat}`;
  const value = resistorText(stage.baseResistor.valueOhm, stage.baseResistor.tolerance);
  const labelY = bypassed ? baseY + 24 : baseY - 31;
  // Below the resistor the name must clear the one from base to emitter.
  const clearX = frame.nodeX - 12 - textWidth([{ text: value }], 'value') / 2;
  const labelX = bypassed ? Math.min(seriesX, clearX) : seriesX;
  drawing.text(labelX, labelY, 'designator', designator, {
    anchor: 'middle',
    part,
  });
  drawing.text(labelX, labelY + (bypassed ? 14 : 16), 'value', [{ text: value }], {
    anchor: 'middle',
    part,
    figure: { ref: part, name },
  });
  drawing.name(part, `${name}, ${value}`);
}

function drawCapacitor(drawing: DrawingBuilder, subject: SchematicSubject, baseY: number): void {
  const { stage, frame } = subject;
  const { seriesX } = frame;
  const y = baseY - 32;
  drawing.symbol('capacitor', { x: seriesX, y }, 'speedUpCapacitor', 90);
  for (const side of [-1, 1]) {
    drawing.dot(seriesX + side * 32, baseY);
    drawing.wire(seriesX + side * 32, baseY, seriesX + side * 32, y, seriesX + side * 16, y);
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

/** The resistor from base to emitter, its top terminal at `topY`. Wires to its two ends are the topology's. */
export function drawShuntResistor(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  topY: number,
): void {
  const { stage, frame, parts } = subject;
  const part = parts.shuntResistor;
  if (stage.shuntResistor === null) return;
  drawing.symbol(subject.resistor, { x: frame.nodeX, y: topY + 32 }, part);
  const designator = designatorRuns(subject, part);
  const name = `${plainText(designator)}, base–emitter resistor${parts.ofWhat}`;
  const value = resistorText(stage.shuntResistor.valueOhm, stage.shuntResistor.tolerance);
  const options = { anchor: 'end', part } as const;
  const crowded = stage.speedUpCapacitorF !== null && stage.topology === 'high-side-pnp';
  const labelY = topY + (crowded ? 12 : 30);
  drawing.text(frame.nodeX - 16, labelY, 'designator', designator, options);
  drawing.text(frame.nodeX - 16, labelY + 16, 'value', [{ text: value }], {
    ...options,
    figure: { ref: part, name },
  });
  drawing.name(part, `${name}, ${value}`);
}
