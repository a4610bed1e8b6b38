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
}

export interface SchematicOptions {
  readonly layout: 'wide' | 'compact';
  readonly resistor: 'box' | 'zigzag';
}

/** All that a drawing follows from. */
export interface SchematicSubject {
  readonly stage: StageInput;
  /** Currents and voltages of one corner; null leaves them out. */
  readonly figures: CornerFigures | null;
  readonly designators: SchematicDesignators;
  readonly frame: Frame;
  readonly resistor: 'resistor-box' | 'resistor-zigzag';
}
