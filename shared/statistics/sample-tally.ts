import { CRITERIA, criterionIds, type PRE } from '../checks/criteria.ts';
import type { Criterion } from '../checks/evaluation.ts';
import type { FigureSink } from '../checks/figure-sink.ts';
import { meets } from '../checks/margin.ts';

const IDS = criterionIds();
const SIGN = Int8Array.from(IDS, (id) => (CRITERIA[id].relation === '<=' ? 1 : -1));

/** Whether samples meet the criteria of one transistor, and how many miss each. */
export class SampleTally implements FigureSink {
  /** Whether the sample at hand has met everything so far. */
  met = true;
  /** Samples that missed a criterion, by the criterion's number without prefix. */
  readonly missed = new Float64Array(IDS.length);
  private readonly counts: Uint8Array;

  /**
   * @param criteria of the stage at its corners: those without a computed value do not count
   * @param prefix of the criteria of a transistor in front
   */
  constructor(
    criteria: readonly Criterion[],
    readonly prefix: '' | typeof PRE,
  ) {
    const computed = new Set(criteria.filter(isComputed).map(({ id }) => id));
    this.counts = Uint8Array.from(IDS, (id) => (computed.has(prefix + id) ? 1 : 0));
  }

  note(k: number, value: number, limit: number): void {
    if (this.counts[k] === 1 && !meets(SIGN[k] ?? 1, value, limit)) {
      this.met = false;
      this.missed[k] = (this.missed[k] ?? 0) + 1;
    }
  }

  /** Only margins need a unit. */
  measureIn(): void {
    return;
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
