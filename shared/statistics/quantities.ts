import type { StageInput } from '../stage/stage-input.ts';
import { RandomStream } from './random-stream.ts';

/**
 * What is drawn for a sample, in the order that numbers its random streams: append, never reorder, or old seeds give
 * other samples. `uniform` runs from 0 to 1, `normal` from −1 to 1 at ±3 σ.
 */
const QUANTITIES = {
  supply: 'uniform',
  rail: 'uniform',
  ambient: 'uniform',
  source: 'uniform',
  baseResistor: 'normal',
  shuntResistor: 'normal',
  load: 'normal',
  pullUp: 'normal',
  gain: 'normal',
  vbe: 'normal',
  vceSat: 'normal',
  forwardV: 'normal',
  r1: 'normal',
  ratio: 'normal',
  preBaseResistor: 'normal',
  preShuntResistor: 'normal',
  preGain: 'normal',
  preVbe: 'normal',
  preVceSat: 'normal',
} as const satisfies Record<string, 'uniform' | 'normal'>;
type Quantity = keyof typeof QUANTITIES;

const NAMES = Object.keys(QUANTITIES) as Quantity[];

/** Columns of drawn numbers by quantity; one that a stage lacks stays 0. */
export type Draws = Readonly<Record<Quantity, Float64Array>>;

/** Draws the samples of a stage block by block. The same seed draws the same for whatever a stage has, whatever else it has. */
export class Drawing {
  readonly draws: Draws;
  private readonly needed: readonly Quantity[];
  private readonly stream = new RandomStream();

  constructor(input: StageInput, seed: number, size: number) {
    this.draws = Object.fromEntries(NAMES.map((name) => [name, new Float64Array(size)])) as Draws;
    this.needed = NAMES.filter((name) => has(input, name));
    this.seed = seed;
  }

  private readonly seed: number;

  /** Fills the columns with the numbers of one block. */
  fill(block: number): void {
    for (const name of this.needed) {
      this.stream.start(this.seed, NAMES.indexOf(name), block);
      if (QUANTITIES[name] === 'uniform') this.stream.fillUniform(this.draws[name]);
      else this.stream.fillNormal(this.draws[name]);
    }
  }
}

function has(
  { load, drive, topology, shuntResistor, preDriver }: StageInput,
  name: Quantity,
): boolean {
  switch (name) {
    case 'shuntResistor':
      return shuntResistor !== null;
    case 'load':
      return load.kind !== 'lamp';
    case 'pullUp':
      return drive.kind === 'open-collector';
    case 'forwardV':
      return load.kind === 'led-string';
    case 'r1':
    case 'ratio':
      return topology === 'low-side-pre-biased';
    default:
      return !name.startsWith('pre') || preDriver !== null;
  }
}
