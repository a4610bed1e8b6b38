import type { CriterionId } from './criteria.ts';
import type { Unit } from './evaluation.ts';

/** Where the families of criteria put their figures. */
export interface FigureSink {
  /**
   * Takes in a figure of one corner, or of one sample.
   *
   * @param k the criterion's number
   * @param limit NaN where none is set
   * @param corner number of the corner; −1 for a figure that no corner moves
   */
  note(k: number, value: number, limit: number, corner: number): void;
  /** Measures a criterion in another unit than the table's. */
  measureIn(id: CriterionId, unit: Unit): void;
}
