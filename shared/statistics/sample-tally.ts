import { CRITERIA, criterionIds, type PRE } from '../checks/criteria.ts';
import type { Criterion } from '../checks/evaluation.ts';
import { FigureBoard } from '../checks/figure-board.ts';
import { meets } from '../checks/margin.ts';

const IDS = criterionIds();
const SIGN = Int8Array.from(IDS, (id) => (CRITERIA[id].relation === '<=' ? 1 : -1));

/** Whether samples meet the criteria of one transistor, and how many miss each. */
export class SampleTally extends FigureBoard {
  /** Samples that missed a criterion, by the criterion's number without prefix. */
  private readonly missed = new Float64Array(IDS.length);
  /** Numbers of the criteria that count. */
  private readonly asked: Uint8Array;
  /** 1 for figures that must not exceed their limit, −1 for those that must reach it. */
  private readonly sign: Int8Array;

  /**
   * @param criteria of the stage at its corners: those without a computed value do not count
   * @param prefix of the criteria of a transistor in front
   */
  constructor(
    criteria: readonly Criterion[],
    readonly prefix: '' | typeof PRE,
  ) {
    super();
    const computed = new Set(criteria.filter(isComputed).map(({ id }) => id));
    this.asked = Uint8Array.from(IDS.flatMap((id, k) => (computed.has(prefix + id) ? [k] : [])));
    this.sign = Int8Array.from(this.asked, (k) => SIGN[k] ?? 1);
    // What a sample does not come to asks nothing of it.
    this.limits.fill(NaN);
  }

  noteAt(k: number, value: number, limit: number): void {
    this.note(k, value, limit);
  }

  /** Only margins need a unit. */
  measureIn(): void {
    return;
  }

  /** Whether the figures noted for a sample meet everything; counts those that do not. */
  judge(): boolean {
    const { asked, sign, figures, limits, missed } = this;
    let met = true;
    for (let at = asked.length - 1; at >= 0; at--) {
      const k = asked[at] ?? 0;
      if (!meets(sign[at] ?? 1, figures[k] ?? NaN, limits[k] ?? NaN)) {
        met = false;
        missed[k] = (missed[k] ?? 0) + 1;
      }
    }
    return met;
  }

  /** How many samples missed which criterion, by id; those nobody missed are left out. */
  misses(): [string, number][] {
    return IDS.flatMap((id, k): [string, number][] => {
      const count = this.missed[k] ?? 0;
      return count > 0 ? [[this.prefix + id, count]] : [];
    });
  }
}

/** An infinite value is computed, and missed. The tested range counts data, not a figure of the circuit. */
function isComputed({ id, value, limit, status }: Criterion): boolean {
  return !id.endsWith('tested-range') && limit !== null && (value !== null || status === 'fail');
}
