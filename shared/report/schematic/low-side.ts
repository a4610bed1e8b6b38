import { drawBaseResistor, drawShuntResistor } from './base-network.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { drawDrive, driveHeadroom } from './drive-side.ts';
import { drawClamp, drawLoad, drawLogicInput, loadHeight } from './load-column.ts';
import type { SchematicSubject } from './schematic-subject.ts';
import { drawLowSideFigures } from './switch-figures.ts';
import { drawReturn, drawSupply, drawTransistor, transistorPlace } from './transistor-part.ts';

/**
 * NPN, Darlington or pre-biased part between load and return: supply, load and transistor in one column, the drive at
 * its left; the logic of a level translator at its right.
 *
 * @returns the height of the drawing
 */
export function drawLowSide(drawing: DrawingBuilder, subject: SchematicSubject): number {
  const x = subject.frame.columnX;
  const { up } = transistorPlace(subject);
  const loadY = subject.frame.top + 16;
  const collectorY = loadY + loadHeight(subject);
  const baseY = collectorY + 8 + up + driveHeadroom(subject);
  const railY = baseY + 112;

  drawSupply(drawing, subject);
  drawing.wire(x, subject.frame.top, x, loadY);
  drawLoad(drawing, subject, loadY);
  drawLogicInput(drawing, subject, collectorY);
  drawing.wire(x, collectorY, x, baseY - up);
  drawGroundedEmitter(drawing, subject, baseY, railY);
  drawClamp(drawing, subject, loadY, [collectorY, baseY + 80]);
  drawLowSideFigures(drawing, subject, { baseY, collectorY });
  return railY + 32;
}

/** The logic output, the base network and a transistor with its emitter at the return rail. */
export function drawGroundedEmitter(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  baseY: number,
  railY: number,
): void {
  const { stage, frame } = subject;
  const { columnX: x, nodeX } = frame;
  const { baseX, down } = transistorPlace(subject);
  drawTransistor(drawing, subject, baseY);
  drawing.wire(x, baseY + down, x, railY);
  drawReturn(drawing, subject, railY);
  drawDrive(drawing, subject, baseY, railY);
  drawBaseResistor(drawing, subject, baseX, baseY);
  if (stage.shuntResistor === null) return;
  drawing.dot(nodeX, baseY);
  drawing.wire(nodeX, baseY, nodeX, baseY + 24);
  drawShuntResistor(drawing, subject, baseY + 24);
  drawing.wire(nodeX, baseY + 88, nodeX, railY);
  drawing.dot(nodeX, railY);
}
