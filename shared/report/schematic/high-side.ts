import { drawBaseResistor, drawShuntResistor } from './base-network.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { drawDrive } from './drive-side.ts';
import { clampsTransistor, drawClamp, drawLoad, loadHeight } from './load-column.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { drawHighSideFigures } from './switch-figures.ts';
import { drawReturn, drawSupply, drawTransistor, transistorPlace } from './transistor-part.ts';

/**
 * PNP between supply and load: the drive's low output turns it on.
 *
 * @returns the height of the drawing
 */
export function drawHighSide(drawing: DrawingBuilder, subject: SchematicSubject): number {
  const { frame } = subject;
  const shuntY = frame.top + 32;
  const baseY = frame.top + 152;
  const { loadEndY } = drawSwitchedSupply(drawing, subject, {
    shuntY,
    baseY,
    loadY: loadJointY(subject, baseY),
  });
  const railY = loadEndY + 16;
  drawing.wire(frame.columnX, loadEndY, frame.columnX, railY);
  drawReturn(drawing, subject, railY);
  drawDrive(drawing, subject, baseY, railY);
  drawBaseResistor(drawing, subject, transistorPlace(subject).baseX, baseY);
  return railY + 32;
}

/** The joint between the collector of a PNP and its load, as high as it can be. */
export const loadJointY = (subject: SchematicSubject, baseY: number): number =>
  baseY + (clampsTransistor(subject) ? 80 : 64);

/** Supply, PNP with its base–emitter resistor, load and clamp: all of a high side but what drives it. */
export function drawSwitchedSupply(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  { shuntY, baseY, loadY }: Readonly<Record<'shuntY' | 'baseY' | 'loadY', number>>,
): { readonly loadEndY: number } {
  const { frame, stage } = subject;
  const { columnX: x, nodeX } = frame;
  const { up, down } = transistorPlace(subject);
  drawSupply(drawing, subject);
  drawing.wire(x, frame.top, x, baseY - up);
  drawTransistor(drawing, subject, baseY);
  drawing.wire(x, baseY + down, x, loadY);
  drawLoad(drawing, subject, loadY);
  if (stage.shuntResistor !== null) {
    drawing.dot(x, shuntY);
    drawing.wire(x, shuntY, nodeX, shuntY, nodeX, baseY - 104);
    drawShuntResistor(drawing, subject, baseY - 104);
    drawing.wire(nodeX, baseY - 40, nodeX, baseY);
    drawing.dot(nodeX, baseY);
  }
  drawClamp(drawing, subject, loadY, [baseY - 56, loadJointY(subject, baseY)]);
  drawHighSideFigures(drawing, subject, { baseY, collectorY: loadY });
  return { loadEndY: loadY + loadHeight(subject) };
}
