/**
 * Random numbers that depend on nothing but a seed and the numbers of a stream, so that any worker draws the same.
 *
 * Generator: xoshiro128++ of Blackman and Vigna, "Scrambled linear pseudorandom number generators", ACM TOMS 47 (2021),
 * article 36. Its state is filled by the 32-bit finalizer of MurmurHash3 (Appleby, public domain).
 */
export class RandomStream {
  private readonly state = new Int32Array(4);
  /** Words drawn ahead: the generator runs in the variables of one loop. */
  private readonly ahead = new Int32Array(AHEAD);
  private at = AHEAD;

  /** Starts the stream that a seed and two numbers name. */
  start(seed: number, stream: number, block: number): void {
    let hash = mixed(0x9e3779b9, seed >>> 0);
    hash = mixed(hash, Math.floor(seed / 2 ** 32) >>> 0);
    hash = mixed(hash, stream);
    hash = mixed(hash, block);
    for (let k = 0; k < 4; k++) {
      hash = mixed(hash, k + 1);
      this.state[k] = hash;
    }
    // All zero is the one state the generator does not leave.
    if (this.state.every((word) => word === 0)) this.state[0] = 1;
    this.at = AHEAD;
  }

  /** 32 random bits as a signed integer. */
  next(): number {
    if (this.at === AHEAD) this.drawAhead();
    return this.ahead[this.at++] ?? 0;
  }

  private drawAhead(): void {
    const { state, ahead } = this;
    let s0 = state[0] ?? 0;
    let s1 = state[1] ?? 0;
    let s2 = state[2] ?? 0;
    let s3 = state[3] ?? 0;
    for (let k = 0; k < AHEAD; k++) {
      const sum = (s0 + s3) | 0;
      ahead[k] = (((sum << 7) | (sum >>> 25)) + s0) | 0;
      const shifted = s1 << 9;
      s2 ^= s0;
      s3 ^= s1;
      s1 ^= s2;
      s0 ^= s3;
      s2 ^= shifted;
      s3 = (s3 << 11) | (s3 >>> 21);
    }
    state[0] = s0;
    state[1] = s1;
    state[2] = s2;
    state[3] = s3;
    this.at = 0;
  }

  /** Fills a column with numbers evenly spread between 0 and 1, neither included. */
  fillUniform(column: Float64Array): void {
    for (let k = 0; k < column.length; k++) column[k] = this.uniform();
  }

  /**
   * Fills a column with normally distributed numbers in units of 3 σ, redrawn beyond ±3 σ: all lie from −1 to 1.
   *
   * Method: the ziggurat of Marsaglia and Tsang, Journal of Statistical Software 5 (2000), issue 8, with the separate bits for
   * layer and place of Doornik, "An improved ziggurat method to generate normal random samples" (2005). Its tail lies
   * beyond 3.44 σ and is never asked for.
   */
  fillNormal(column: Float64Array): void {
    for (let k = 0; k < column.length; k++) column[k] = this.normal() / CUT_SIGMA;
  }

  private uniform(): number {
    return ((this.next() >>> 0) + 0.5) * 2 ** -32;
  }

  private normal(): number {
    for (;;) {
      const bits = this.next();
      const layer = bits & (LAYERS - 1);
      const share = ((bits >> 8) + 0.5) * 2 ** -23;
      const x = share * (LAYER_X[layer] ?? 0);
      const inside = Math.abs(share) < (LAYER_RATIO[layer] ?? 0) || this.underCurve(layer, x);
      if (inside && Math.abs(x) <= CUT_SIGMA) return x;
    }
  }

  /** Whether a point beside the sure part of its layer still lies under the bell curve. */
  private underCurve(layer: number, x: number): boolean {
    if (layer === 0) return false;
    const outer = LAYER_X[layer] ?? 0;
    const inner = LAYER_X[layer + 1] ?? 0;
    const high = Math.exp(-0.5 * (outer * outer - x * x));
    const low = Math.exp(-0.5 * (inner * inner - x * x));
    return low + this.uniform() * (high - low) < 1;
  }
}

/** Few, since what is drawn ahead of the end of a column is thrown away. */
const AHEAD = 128;

/** Tolerances are read as ±3 σ; nothing lies beyond. */
const CUT_SIGMA = 3;

/** 128 layers of equal area; R and V as published. */
const LAYERS = 128;
const TAIL_FROM = 3.442619855899;
const LAYER_AREA = 9.91256303526217e-3;

const LAYER_X = layerEdges();
const LAYER_RATIO = Float64Array.from(
  { length: LAYERS },
  (_, k) => (LAYER_X[k + 1] ?? 0) / (LAYER_X[k] ?? 1),
);

function layerEdges(): Float64Array {
  const edges = new Float64Array(LAYERS + 1);
  let height = Math.exp(-0.5 * TAIL_FROM * TAIL_FROM);
  edges[0] = LAYER_AREA / height;
  edges[1] = TAIL_FROM;
  for (let k = 2; k < LAYERS; k++) {
    const edge = Math.sqrt(-2 * Math.log(LAYER_AREA / (edges[k - 1] ?? 1) + height));
    edges[k] = edge;
    height = Math.exp(-0.5 * edge * edge);
  }
  return edges;
}

function mixed(hash: number, word: number): number {
  let h = (Math.imul(hash, 31) + word + 0x9e3779b9) | 0;
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return h ^ (h >>> 16);
}
