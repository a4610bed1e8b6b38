import type { CornerFigures } from '../../checks/evaluation.ts';
import type { StageInput, Topology } from '../../stage/stage-input.ts';
import { drawCornerBlock } from './corner-block.ts';
import type { Drawing } from './drawing.ts';
import { DrawingBuilder } from './drawing-builder.ts';
import { frameOf } from './frame.ts';
import { drawHighSide } from './high-side.ts';
import { drawLowSide } from './low-side.ts';
import { schematicName } from './schematic-name.ts';
import {
  OUTPUT_PARTS,
  type SchematicDesignators,
  type SchematicOptions,
  type SchematicSubject,
} from './schematic-subject.ts';
import { drawTwoTransistors } from './two-transistors.ts';

type Draw = (drawing: DrawingBuilder, subject: SchematicSubject) => number;

/** One entry per topology. */
const DRAW: Readonly<Record<Topology, Draw>> = {
  'low-side-npn': drawLowSide,
  'high-side-pnp': drawHighSide,
  'two-transistor-high-side': drawTwoTransistors,
  'low-side-darlington': drawLowSide,
  'low-side-pre-biased': drawLowSide,
  'level-translator': drawLowSide,
};

/**
 * The circuit of a stage as data: symbols, wires, dots, texts, current arrows and node voltages on a grid of
 * 8 units, supply at the top, return at the bottom, signal from left to right.
 *
 * @param stage parsed stage; a base resistor without value is drawn as not sized
 * @param figures currents and voltages of one corner, or null to leave them out
 * @param designators of the board's drawing; symbols of the trade stand in for missing ones
 */
export function drawSchematic(
  stage: StageInput,
  figures: CornerFigures | null,
  designators: SchematicDesignators,
  options: SchematicOptions,
): Drawing {
  const frame = frameOf(stage, options.layout);
  const resistor = options.resistor === 'box' ? 'resistor-box' : 'resistor-zigzag';
  const parts = OUTPUT_PARTS;
  const subject = { stage, figures, designators, frame, resistor, parts } as const;
  const drawing = new DrawingBuilder();
  drawCornerBlock(drawing, subject);
  const height = DRAW[stage.topology](drawing, subject);
  return drawing.finish(frame.width, height, schematicName(subject));
}
