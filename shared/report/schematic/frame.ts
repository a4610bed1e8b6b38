/** Where the columns of a drawing stand. Every number is a multiple of the grid. */
export interface Frame {
  readonly width: number;
  /** On a phone: no corner block, and only the figures that matter most. */
  readonly compact: boolean;
  readonly driveX: number;
  readonly pullUpX: number;
  /** Centre of the base resistor. */
  readonly seriesX: number;
  /** The base node, with the base-emitter resistor. */
  readonly nodeX: number;
  /** Load and transistor. */
  readonly columnX: number;
  /** Clamp across the load. */
  readonly clampX: number;
  /** Clamp across the transistor, which leaves room for its name. */
  readonly outerClampX: number;
  /** The node of the supply symbol. */
  readonly top: number;
}

export const WIDE: Frame = {
  width: 560,
  compact: false,
  driveX: 64,
  pullUpX: 104,
  seriesX: 200,
  nodeX: 288,
  columnX: 400,
  clampX: 488,
  outerClampX: 536,
  top: 32,
};

export const COMPACT: Frame = {
  width: 360,
  compact: true,
  driveX: 32,
  pullUpX: 72,
  seriesX: 120,
  nodeX: 176,
  columnX: 256,
  clampX: 320,
  outerClampX: 344,
  top: 24,
};
