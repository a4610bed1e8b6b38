import type { CornerFigures } from '../../checks/evaluation.ts';
import type { StageInput, Topology } from '../../stage/stage-input.ts';
import { drawCornerBlock } from './corner-block.ts';
import type { Drawing } from './drawing.ts';
import { DrawingBuilder } from './drawing-builder.ts';
import { COMPACT, WIDE } from './frame.ts';
import { drawHighSide } from './high-side.ts';
import { drawLowSide } from './low-side.ts';
import { schematicName } from './schematic-name.ts';
import type {
  SchematicDesignators,
  SchematicOptions,
  SchematicSubject,
} from './schematic-subject.ts';

type Draw = (drawing: DrawingBuilder, subject: SchematicSubject) => number;

/** One entry per topology that can be drawn; a new one is a file of its own and a line here. */
const DRAW: Partial<Record<Topology, Draw>> = {
  'low-side-npn': drawLowSide,
  'high-side-pnp': drawHighSide,
};

/** Whether a circuit of this topology can be drawn. */
export const canDraw = (topology: Topology): boolean => DRAW[topology] !== undefined;

/**
 * The circuit of a stage as data: symbols, wires, dots, texts, current arrows and node voltages on a grid of
 * 8 units, supply at the top, return at the bottom, signal from left to right.
 *
 * @param stage parsed stage; a base resistor without value is drawn as not sized
 * @param figures currents and voltages of one corner, or null to leave them out
 * @param designators of the board's drawing; symbols of the trade stand in for missing ones
 * @returns the drawing, or null where the topology has none
 */
export function drawSchematic(
  stage: StageInput,
  figures: CornerFigures | null,
  designators: SchematicDesignators,
  options: SchematicOptions,
): Drawing | null {
  const draw = DRAW[stage.topology];
  if (draw === undefined) return null;
  const frame = options.layout === 'wide' ? WIDE : COMPACT;
  const resistor = options.resistor === 'box' ? 'resistor-box' : 'resistor-zigzag';
  const subject = { stage, figures, designators, frame, resistor } as const;
  const drawing = new DrawingBuilder();
  drawCornerBlock(drawing, subject);
  const height = draw(drawing, subject);
  return drawing.finish(frame.width, height, schematicName(subject));
}
