import { formatQuantity } from '../../units/engineering-notation.ts';
import { drawBaseResistor, drawShuntResistor } from './base-network.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { drawDrive, driveHeadroom } from './drive-side.ts';
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
 * NPN between load and return: supply, load and transistor in one column, the drive at its left.
 *
 * @returns the height of the drawing
 */
export function drawLowSide(drawing: DrawingBuilder, subject: SchematicSubject): number {
  const { stage, frame } = subject;
  const { columnX: x, nodeX } = frame;
  const loadY = frame.top + 16;
  const collectorY = loadY + loadHeight(subject);
  const baseY = collectorY + 40 + driveHeadroom(subject);
  const railY = baseY + 112;

  drawSupply(drawing, subject);
  drawing.wire(x, frame.top, x, loadY);
  drawLoad(drawing, subject, loadY);
  drawing.wire(x, collectorY, x, baseY - 32);
  drawTransistor(drawing, subject, baseY);
  drawing.wire(x, baseY + 32, x, railY);
  drawReturn(drawing, subject, railY);

  drawDrive(drawing, subject, baseY, railY);
  drawBaseResistor(drawing, subject, baseY);
  if (stage.shuntResistor !== null) {
    drawing.dot(nodeX, baseY);
    drawing.wire(nodeX, baseY, nodeX, baseY + 24);
    drawShuntResistor(drawing, subject, baseY + 24);
    drawing.wire(nodeX, baseY + 88, nodeX, railY);
    drawing.dot(nodeX, railY);
  }
  if (stage.clamp.kind === 'diode' || stage.clamp.kind === 'diode-zener') {
    drawClampAcrossLoad(drawing, subject, loadY);
  } else if (stage.clamp.kind !== 'none') {
    drawClampAcrossTransistor(drawing, subject, collectorY, baseY + 80);
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
  drawing.text(x + 12, collectorY - 5, 'voltage', [{ text: voltText(figures.vceV) }], {
    figure: { ref: 'vce', name: 'Collector–emitter voltage' },
  });
  drawing.text(
    nodeX - (compact ? 10 : 21),
    baseY - 9,
    'voltage',
    lead('V', 'BE', voltText(figures.vbeV)),
    {
      figure: { ref: 'vbe', name: 'Base–emitter voltage' },
    },
  );
  drawing.arrow(nodeX + (compact ? 20 : 42), baseY, 'right');
  drawing.text(
    nodeX + (compact ? 10 : 44),
    baseY + (compact ? 29 : 20),
    'current',
    lead('I', 'B', amps(figures.ibA)),
    { anchor: compact ? 'start' : 'middle', figure: { ref: 'ib', name: 'Base current' } },
  );
  if (stage.shuntResistor === null || compact) return;
  drawing.arrow(nodeX, baseY + 100, 'down');
  drawing.text(nodeX + 12, baseY + 104, 'current', [{ text: amps(figures.shuntA) }], {
    figure: { ref: 'ishunt', name: 'Current of the base–emitter resistor' },
  });
}
