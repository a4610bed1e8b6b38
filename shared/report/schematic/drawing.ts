import type { SymbolName } from './symbols.ts';

/**
 * A circuit drawing as plain data, on a grid of 8 units. One unit is one CSS pixel on screen; the PDF scales
 * it. Nothing here knows a colour: the page and the PDF each bring their own.
 */
export const GRID = 8;

/** x to the right, y downwards. */
export interface Point {
  readonly x: number;
  readonly y: number;
}

/** `x` and `y` of the upper left corner. */
export interface Box extends Point {
  readonly width: number;
  readonly height: number;
}

/** What a part of the drawing is called in the stage file and in the form. */
export const PART_KEYS = [
  'supply',
  'drive',
  'pullUp',
  'baseResistor',
  'speedUpCapacitor',
  'shuntResistor',
  'transistor',
  'load',
  'loadResistor',
  'logicInput',
  'clamp',
  'preDriver',
  'preBaseResistor',
  'preShuntResistor',
] as const;
export type PartKey = (typeof PART_KEYS)[number];

/** A piece of text; `sub` is set as a subscript. */
export interface Run {
  readonly text: string;
  readonly sub?: boolean;
}

/** How a text is set: weight, size, face and colour follow from it. */
export type TextRole =
  | 'designator'
  | 'value'
  | 'terminal'
  | 'voltage'
  | 'current'
  | 'corner-title'
  | 'corner-label'
  | 'corner-value';

export interface DrawingText {
  readonly kind: 'text';
  /** On the baseline. */
  readonly at: Point;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly role: TextRole;
  readonly runs: readonly Run[];
  readonly part: PartKey | null;
  /** Set where the text is a figure that also stands in the list of `describeSchematic`. */
  readonly figure: { readonly ref: string; readonly name: string } | null;
}

export interface DrawingSymbol {
  readonly kind: 'symbol';
  readonly symbol: SymbolName;
  readonly at: Point;
  /** Degrees clockwise. */
  readonly turn: 0 | 90;
  readonly part: PartKey | null;
}

/** Upright and level stretches only; corners are not joints. */
export interface DrawingWire {
  readonly kind: 'wire';
  readonly points: readonly Point[];
}

export interface DrawingDot {
  readonly kind: 'dot';
  readonly at: Point;
}

/** The head of a current arrow, lying on a wire. */
export interface DrawingArrow {
  readonly kind: 'arrow';
  readonly at: Point;
  readonly points: 'right' | 'down' | 'left' | 'up';
}

export type DrawingElement = DrawingSymbol | DrawingWire | DrawingDot | DrawingArrow | DrawingText;

/** A part that can be chosen: the area it takes and what it is called aloud. */
export interface DrawingPart {
  readonly key: PartKey;
  readonly label: string;
  readonly box: Box;
}

export interface Drawing {
  readonly width: number;
  readonly height: number;
  /** The circuit with its values in one sentence, for whoever cannot see it. */
  readonly name: string;
  readonly elements: readonly DrawingElement[];
  readonly parts: readonly DrawingPart[];
}

/** The text of runs without their setting. */
export const plainText = (runs: readonly Run[]): string => runs.map(({ text }) => text).join('');
