import { frontStage } from '../../stage/two-transistors.ts';
import type { DrawingBuilder } from './drawing-builder.ts';
import { frontFrame } from './frame.ts';
import { drawSwitchedSupply, loadJointY } from './high-side.ts';
import { lastLoadMiddle } from './load-column.ts';
import { designatorRuns, resistorText } from './part-words.ts';
import { plainText } from './drawing.ts';
import { FRONT_PARTS, type SchematicSubject } from './schematic-subject.ts';
import { drawGroundedEmitter } from './low-side.ts';
import { drawFrontFigures } from './switch-figures.ts';
import { drawReturn, transistorPlace } from './transistor-part.ts';

/** Room below the rail of the transistor in front, so that the load's name clears it. */
const BELOW_RAIL_Y = 32;

/**
 * PNP between supply and load, turned on by an NPN in front: the base resistor stands between the two.
 *
 * @returns the height of the drawing
 */
export function drawTwoTransistors(drawing: DrawingBuilder, subject: SchematicSubject): number {
  const front = frontOf(subject);
  const { compact, columnX: x, top } = subject.frame;
  const baseY = top + 120;
  const highestY = loadJointY(subject, baseY);
  // On a narrow drawing the load's name has no room beside the transistor in front: it comes below.
  const frontY = compact
    ? baseY + 128 + aboveDrive(front)
    : highestY + lastLoadMiddle(subject) + 48;
  const frontRailY = frontY + 112;
  const loadY = compact ? frontRailY + BELOW_RAIL_Y : highestY;

  const { loadEndY } = drawSwitchedSupply(drawing, subject, { shuntY: top + 16, baseY, loadY });
  drawing.wire(x, loadEndY, x, loadEndY + 16);
  drawReturn(drawing, subject, loadEndY + 16, false);
  drawBetween(drawing, subject, front.frame.columnX, baseY, frontY - 32);
  drawGroundedEmitter(drawing, front, frontY, frontRailY);
  drawFrontFigures(drawing, front, subject, frontY);
  return Math.max(loadEndY + 16, frontRailY) + 32;
}

/** What a pull-up and a capacitor above the base resistor add between the two transistors. */
function aboveDrive({ stage }: SchematicSubject): number {
  const pullUp = stage.drive.kind === 'open-collector' ? 24 : 0;
  return pullUp + (stage.speedUpCapacitorF === null ? 0 : 32);
}

/** The NPN as a stage of its own. */
function frontOf(subject: SchematicSubject): SchematicSubject {
  const { stage, frame } = subject;
  const rbOhm = stage.baseResistor.valueOhm ?? 0;
  return {
    ...subject,
    stage: stage.preDriver === null ? stage : frontStage(stage, stage.preDriver, rbOhm),
    frame: frontFrame(frame),
    parts: FRONT_PARTS,
  };
}

/** The base resistor from the PNP's base line down to the collector of the transistor in front. */
function drawBetween(
  drawing: DrawingBuilder,
  subject: SchematicSubject,
  x: number,
  baseY: number,
  collectorY: number,
): void {
  const { stage } = subject;
  drawing.wire(transistorPlace(subject).baseX, baseY, x, baseY, x, baseY + 16);
  drawing.symbol(subject.resistor, { x, y: baseY + 48 }, 'baseResistor');
  drawing.wire(x, baseY + 80, x, collectorY);
  const designator = designatorRuns(subject, 'baseResistor');
  const name = `${plainText(designator)}, base resistor`;
  const value = resistorText(stage.baseResistor.valueOhm, stage.baseResistor.tolerance);
  const options = { anchor: 'end', part: 'baseResistor' } as const;
  drawing.text(x - 16, baseY + 30, 'designator', designator, options);
  drawing.text(x - 16, baseY + 46, 'value', [{ text: value }], {
    ...options,
    figure: { ref: 'baseResistor', name },
  });
  drawing.name('baseResistor', `${name}, ${value}`);
}
