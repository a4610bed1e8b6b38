import { formatQuantity } from '../../units/engineering-notation.ts';
import { drawBaseResistor, drawShuntResistor } from './base-network.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { drawDrive } from './drive-side.ts';
import {
  drawClampAcrossLoad,
  drawClampAcrossTransistor,
  drawLoad,
  loadHeight,
} from './load-column.ts';
import { symbolRuns, voltText } from './part-words.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { drawReturn, drawSupply, drawTransistor } from './transistor-part.ts';

/**
 * PNP between supply and load: the drive's low output turns it on.
 *
 * @returns the height of the drawing
 */
export function drawHighSide(drawing: DrawingBuilder, subject: SchematicSubject): number {
  const { stage, frame } = subject;
  const { columnX: x, nodeX } = frame;
  const shuntY = frame.top + 32;
  const baseY = frame.top + 152;
  const across = stage.clamp.kind.endsWith('across-transistor');
  const collectorY = baseY + (across ? 80 : 64);
  const loadEndY = collectorY + loadHeight(subject);
  const railY = loadEndY + 16;

  drawSupply(drawing, subject);
  drawing.wire(x, frame.top, x, baseY - 32);
  drawTransistor(drawing, subject, baseY);
  drawing.wire(x, baseY + 32, x, collectorY);
  drawLoad(drawing, subject, collectorY);
  drawing.wire(x, loadEndY, x, railY);
  drawReturn(drawing, subject, railY);

  drawDrive(drawing, subject, baseY, railY);
  drawBaseResistor(drawing, subject, baseY);
  if (stage.shuntResistor !== null) {
    drawing.dot(x, shuntY);
    drawing.wire(x, shuntY, nodeX, shuntY, nodeX, baseY - 104);
    drawShuntResistor(drawing, subject, baseY - 104);
    drawing.wire(nodeX, baseY - 40, nodeX, baseY);
    drawing.dot(nodeX, baseY);
  }
  if (stage.clamp.kind === 'diode' || stage.clamp.kind === 'diode-zener') {
    drawClampAcrossLoad(drawing, subject, collectorY);
  } else if (stage.clamp.kind !== 'none') {
    drawClampAcrossTransistor(drawing, subject, baseY - 56, collectorY);
  }
  drawFigures(drawing, subject, baseY, collectorY);
  return railY + 32;
}

function drawFigures(
  drawing: DrawingBuilder,
  { stage, frame, figures }: SchematicSubject,
  baseY: number,
  collectorY: number,
): void {
  if (figures === null) return;
  const { columnX: x, nodeX, compact } = frame;
  const amps = (valueA: number) => formatQuantity(valueA, 'A', { pad: true });
  const lead = (letter: string, sub: string, text: string) =>
    compact ? [{ text }] : [...symbolRuns(letter, sub), { text: ` ${text}` }];

  drawing.arrow(x, collectorY - 8, 'down');
  drawing.text(x - 10, collectorY - 4, 'current', lead('I', 'C', amps(figures.icA)), {
    anchor: 'end',
    figure: { ref: 'ic', name: 'Collector current' },
  });
  drawing.text(
    x + 12,
    collectorY - 6,
    'voltage',
    [{ text: voltText(figures.supplyV - figures.vceV) }],
    {
      figure: { ref: 'vc', name: 'Voltage at the load' },
    },
  );
  drawing.text(
    nodeX - (compact ? 10 : 21),
    baseY + 20,
    'voltage',
    lead('V', 'EB', voltText(figures.vbeV)),
    {
      figure: { ref: 'vbe', name: 'Emitter–base voltage' },
    },
  );
  drawing.arrow(nodeX + (compact ? 20 : 42), baseY, 'left');
  drawing.text(
    nodeX + (compact ? 4 : 10),
    baseY - 9,
    'current',
    lead('I', 'B', amps(figures.ibA)),
    {
      figure: { ref: 'ib', name: 'Base current' },
    },
  );
  if (stage.shuntResistor === null || compact) return;
  drawing.arrow(nodeX, baseY - 30, 'down');
  drawing.text(nodeX + 12, baseY - 27, 'current', [{ text: amps(figures.shuntA) }], {
    figure: { ref: 'ishunt', name: 'Current of the base–emitter resistor' },
  });
}
