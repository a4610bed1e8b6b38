import { criterionIds, type CriterionId } from './criteria.ts';
import type { Unit } from './evaluation.ts';

/** Stands where a limit is set for a criterion that has no figure yet. */
export const UNSET = -Infinity;

/**
 * The figures of one corner, or of one sample, with their limits, by the number of the criterion: what the families of
 * criteria write. Kept so small that a call costs two stores.
 */
export abstract class FigureBoard {
  protected readonly figures = new Float64Array(criterionIds().length).fill(NaN);
  protected readonly limits = new Float64Array(criterionIds().length).fill(UNSET);

  /** @param limit NaN where none is set */
  note(k: number, value: number, limit: number): void {
    this.figures[k] = value;
    this.limits[k] = limit;
  }

  /** Notes a figure that stands at one corner only, whichever is being judged. */
  abstract noteAt(k: number, value: number, limit: number, corner: number): void;

  /** Measures a criterion in another unit than the table's. */
  abstract measureIn(id: CriterionId, unit: Unit): void;
}
