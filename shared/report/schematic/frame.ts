import type { StageInput } from '../../stage/stage-input.ts';
import { transistorSymbol } from './transistor-choice.ts';

/** Where the columns of a drawing stand. Every number is a multiple of the grid, those of texts apart. */
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
  /** Where the text of the base node's voltage begins. */
  readonly nodeTextX: number;
  /** Middle of the output's figures on its wire. */
  readonly outputX: number;
  /** How far below the collector's joint its voltage stands: plainly, and with logic at the joint. */
  readonly collectorTextY: readonly [number, number];
  /** Load and transistor. */
  readonly columnX: number;
  /** Column at the right of this one; the edge of the drawing where there is none. */
  readonly nextColumnX: number;
  /** Clamp across the load. */
  readonly clampX: number;
  /** Clamp across the transistor, which leaves room for its name. */
  readonly outerClampX: number;
  /** Input terminal of the logic that the collector drives. */
  readonly inputX: number;
  /** The node of the supply symbol. */
  readonly top: number;
}

const WIDE: Frame = {
  width: 560,
  compact: false,
  driveX: 64,
  pullUpX: 104,
  seriesX: 200,
  nodeX: 288,
  nodeTextX: 267,
  outputX: 124,
  collectorTextY: [-5, -5],
  columnX: 400,
  nextColumnX: 560,
  clampX: 488,
  outerClampX: 536,
  inputX: 472,
  top: 32,
};

const COMPACT: Frame = {
  width: 360,
  compact: true,
  driveX: 32,
  pullUpX: 72,
  seriesX: 120,
  nodeX: 176,
  nodeTextX: 166,
  outputX: 92,
  collectorTextY: [-5, -30],
  columnX: 256,
  nextColumnX: 360,
  clampX: 320,
  outerClampX: 344,
  inputX: 296,
  top: 24,
};

/** The pair of a Darlington and the resistors of a pre-biased part take more room between base and column. */
const WIDE_BROAD: Frame = {
  ...WIDE,
  ...{ driveX: 40, pullUpX: 80, seriesX: 184, nodeX: 264, nodeTextX: 243, outputX: 100 },
};
const COMPACT_BROAD: Frame = {
  ...COMPACT,
  ...{ pullUpX: 64, seriesX: 112, nodeX: 160, nodeTextX: 156, columnX: 272 },
  collectorTextY: [14, -30],
};

/** Two transistors: the base line of the one behind ends at the column of the one in front. */
const WIDE_OUTPUT: Frame = { ...WIDE, nodeX: 296, nodeTextX: 275 };
const COMPACT_OUTPUT: Frame = {
  ...COMPACT,
  ...{ nodeX: 224, nodeTextX: 204, columnX: 272, clampX: 328 },
};

/** The frame of a circuit with one transistor, or of the output of one with two. */
export function frameOf(stage: StageInput, layout: 'wide' | 'compact'): Frame {
  const wide = layout === 'wide';
  if (stage.topology === 'two-transistor-high-side') return wide ? WIDE_OUTPUT : COMPACT_OUTPUT;
  const broad = !['npn', 'pnp'].includes(transistorSymbol(stage));
  if (broad) return wide ? WIDE_BROAD : COMPACT_BROAD;
  return wide ? WIDE : COMPACT;
}

/** The transistor in front of another: its column carries the base resistor of the one behind. */
export function frontFrame(behind: Frame): Frame {
  const own = behind.compact
    ? { pullUpX: 64, seriesX: 104, nodeX: 144, columnX: 192 }
    : { driveX: 32, pullUpX: 72, seriesX: 152, nodeX: 208, outputX: 86, columnX: 264 };
  return { ...behind, ...own, nextColumnX: behind.columnX };
}
