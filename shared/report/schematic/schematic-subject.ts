import type { CornerFigures } from '../../checks/evaluation.ts';
import type { StageInput } from '../../stage/stage-input.ts';
import type { Frame } from './frame.ts';

/** Designators of the board's drawing; null where none is given yet. */
export interface SchematicDesignators {
  readonly baseResistor: string | null;
  readonly shuntResistor: string | null;
  readonly pullUp: string | null;
  readonly speedUpCapacitor: string | null;
  readonly load: string | null;
  readonly clamp: string | null;
  readonly clampZener: string | null;
  readonly drive: string | null;
  readonly loadResistor: string | null;
  readonly preDriver: string | null;
  readonly preBaseResistor: string | null;
  readonly preShuntResistor: string | null;
}

export interface SchematicOptions {
  readonly layout: 'wide' | 'compact';
  readonly resistor: 'box' | 'zigzag';
}

/** Which of the stage's parts stand around the transistor that is drawn. */
export interface SwitchParts {
  readonly transistor: 'transistor' | 'preDriver';
  readonly baseResistor: 'baseResistor' | 'preBaseResistor';
  readonly shuntResistor: 'shuntResistor' | 'preShuntResistor';
  /** Follows what a part is called aloud. */
  readonly ofWhat: string;
}

export const OUTPUT_PARTS = {
  transistor: 'transistor',
  baseResistor: 'baseResistor',
  shuntResistor: 'shuntResistor',
  ofWhat: '',
} as const satisfies SwitchParts;

export const FRONT_PARTS = {
  transistor: 'preDriver',
  baseResistor: 'preBaseResistor',
  shuntResistor: 'preShuntResistor',
  ofWhat: ' of the pre-driver',
} as const satisfies SwitchParts;

/** All that a drawing follows from. */
export interface SchematicSubject {
  readonly stage: StageInput;
  /** Currents and voltages of one corner; null leaves them out. */
  readonly figures: CornerFigures | null;
  readonly designators: SchematicDesignators;
  readonly frame: Frame;
  readonly resistor: 'resistor-box' | 'resistor-zigzag';
  readonly parts: SwitchParts;
}

/** Whether figures are those of a transistor in front of another: its corners vary the VEB of the one behind. */
export const isOfFront = ({ corner }: CornerFigures): boolean => 'veb' in corner;

/** The figures where they belong to the transistor that is drawn, not to the other one of two. */
export function ownFigures({ figures, parts }: SchematicSubject): CornerFigures | null {
  const inFront = parts.transistor === FRONT_PARTS.transistor;
  return figures !== null && isOfFront(figures) === inFront ? figures : null;
}
