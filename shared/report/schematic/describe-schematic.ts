import { plainText, type Drawing } from './drawing.ts';

/** One figure of the drawing in words. */
export interface SchematicLine {
  /** The same as in the drawing, so that the two can be compared. */
  readonly ref: string;
  readonly name: string;
  readonly value: string;
}

/** The drawing as text: the same nodes, parts and figures, in the order they were drawn. */
export function describeSchematic(drawing: Drawing): readonly SchematicLine[] {
  return drawing.elements.flatMap((element) => {
    if (element.kind !== 'text' || element.figure === null) return [];
    const { ref, name } = element.figure;
    return [{ ref, name, value: plainText(element.runs) }];
  });
}
